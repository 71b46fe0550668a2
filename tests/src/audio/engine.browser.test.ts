import { expect } from '@open-wc/testing';
import { createEngine } from '../../../src/audio/engine.ts';
import type { Engine, LineFilter } from '../../../src/audio/engine-types.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { toneSections } from './line-sections.ts';
import { sine } from './offline-rig.ts';

const wait = (delay: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, delay));

const tone = (treble: number): LineFilter => ({ key: 'tone', sections: toneSections({ treble }) });

const clipOf = (samples: Float32Array, sampleRate = 48_000) => ({
  sampleRate,
  channels: [samples],
  frames: samples.length,
});

/** Waits until a condition holds, at most for some seconds; the test fails by the check after it. */
async function until(condition: () => boolean, patience = 3000): Promise<void> {
  const end = performance.now() + patience;
  while (!condition() && performance.now() < end) await wait(20);
}

describe('the engine, live', () => {
  let engine: Engine;

  beforeEach(async () => {
    engine = await createEngine();
  });

  afterEach(async () => {
    await engine.dispose();
  });

  it('is quiet until there is a clip', async () => {
    expect(engine.sampleRate).to.equal(48_000);
    expect(engine.state.value.playing).to.equal(false);
    const outcome = await engine.play().catch((error: unknown) => error);
    expect(outcome).to.be.instanceOf(NotchworkError);
    expect((outcome as NotchworkError).code).to.equal('clip-empty');
  });

  it('plays a clip, moves on in it, shows its level, and stops', async () => {
    await engine.load(clipOf(sine(440, 2)));
    await engine.play();
    expect(engine.state.value).to.deep.equal({ sound: 'running', playing: true, problem: undefined });
    await until(() => engine.position() > 0.2);
    expect(engine.position()).to.be.above(0.2);
    const { level, limited, headroom } = engine.meter();
    // 0.5 is −6.02 dB; the meter falls by at most a fraction of that between two blocks.
    expect(level).to.be.within(-7, -6);
    expect(limited).to.equal(false);
    expect(headroom).to.equal(0);
    engine.stop();
    expect(engine.state.value.playing).to.equal(false);
    const place = engine.position();
    await wait(100);
    expect(engine.position()).to.equal(place);
  });

  it('says when a clip that does not loop has ended', async () => {
    await engine.load(clipOf(sine(440, 0.2)));
    engine.setLoop(false);
    await engine.play();
    await until(() => !engine.state.value.playing);
    expect(engine.state.value.playing).to.equal(false);
    expect(engine.position()).to.equal(0);
  });

  it('changes line, gain and bypass while it plays, as the meter shows', async () => {
    await engine.load(clipOf(sine(440, 1)));
    engine.setLine({ filters: [{ key: 'tone', sections: [{ feedforward: [0.5], feedback: [1] }] }] });
    await engine.play();
    await wait(300);
    engine.meter();
    await wait(60);
    expect(engine.meter().level).to.be.closeTo(-12.04, 0.8);
    engine.setGain(3);
    engine.setBypass(true);
    await wait(300);
    expect(engine.meter().level).to.be.closeTo(-6.02, 0.8);
  });

  it('plays a clip of another rate at the right speed', async () => {
    await engine.load(clipOf(sine(440, 1, 8000), 8000));
    engine.setLoop(false);
    await engine.play();
    const begun = performance.now();
    await until(() => !engine.state.value.playing);
    expect((performance.now() - begun) / 1000).to.be.within(0.8, 1.8);
  });

  it('keeps the clip that was asked for last, whichever is ready first', async () => {
    const long = clipOf(new Float32Array(48_000 * 60));
    const first = engine.load(long);
    await engine.load(clipOf(sine(440, 0.5)));
    await first;
    engine.seek(10);
    expect(engine.position()).to.equal(0);
  });

  it('refuses a region of length 0 in plain words, and plays on', async () => {
    await engine.load(clipOf(sine(440, 1)));
    await engine.play();
    expect(() => engine.setRegion({ start: 0.5, end: 0.5 })).to.throw(NotchworkError, 'too short to play');
    expect(engine.state.value.playing).to.equal(true);
  });

  it('goes through 60 changes a second without falling behind', async () => {
    await engine.load(clipOf(sine(220, 1)));
    engine.setLine({ filters: [tone(0)] });
    await engine.play();
    for (let step = 0; step <= 60; step += 1) {
      engine.setLine({ filters: [tone(step / 60)], gain: step / 20 });
      await wait(16);
    }
    expect(engine.state.value).to.deep.equal({ sound: 'running', playing: true, problem: undefined });
  });
});

describe('what an engine leaves behind', () => {
  /** Collects garbage; the browser is started so that a page can ask for it. */
  async function collect(): Promise<void> {
    const { gc } = globalThis as unknown as { gc?: () => void };
    expect(gc, 'the browser must be started with --js-flags=--expose-gc').to.be.a('function');
    for (let count = 0; count < 6; count += 1) {
      await wait(100);
      gc!();
    }
  }

  it('lets go of the filters it has replaced, while it plays', async () => {
    const engine = await createEngine();
    const made: WeakRef<object>[] = [];
    const { prototype } = BaseAudioContext;
    const create = prototype.createIIRFilter;
    prototype.createIIRFilter = function watched(feedforward, feedback) {
      const node = create.call(this, feedforward, feedback);
      made.push(new WeakRef(node));
      return node;
    };
    try {
      await engine.load(clipOf(sine(220, 1)));
      engine.setLine({ filters: [tone(0)] });
      await engine.play();
      for (let step = 1; step <= 12; step += 1) {
        engine.setLine({ filters: [tone(step / 12)] });
        await wait(120);
      }
      await wait(300);
      await collect();
      const perLine = tone(0.5).sections.length;
      const alive = made.filter((reference) => reference.deref() !== undefined).length;
      expect(made.length).to.be.at.least(8 * perLine);
      // The line in force, and at most one more that a fade has just left.
      expect(alive).to.be.at.most(2 * perLine);
    } finally {
      prototype.createIIRFilter = create;
      await engine.dispose();
    }
  });

  it('is closed and silent after disposal, and can be asked anything without harm', async () => {
    const engine = await createEngine({ sampleRate: 96_000 });
    expect(engine.sampleRate).to.equal(96_000);
    await engine.load(clipOf(sine(440, 0.5)));
    await engine.play();
    await engine.dispose();
    expect(engine.state.value.sound).to.equal('closed');
    expect(engine.state.value.playing).to.equal(false);
    engine.setLine({ filters: [tone(1)] });
    engine.setGain(-3);
    engine.setBypass(true);
    engine.stop();
    engine.meter();
    await engine.dispose();
  });
});

describe('an engine whose sound does not start', () => {
  it('says so in its state, and keeps everything else', async () => {
    const engine = await createEngine({
      create: (options) => {
        const context = new AudioContext(options);
        context.resume = () => new Promise(() => {});
        Object.defineProperty(context, 'state', { get: () => 'suspended' });
        return context;
      },
    });
    await engine.load(clipOf(sine(440, 0.5)));
    const outcome = await engine.play().catch((error: unknown) => error);
    expect((outcome as NotchworkError).code).to.equal('audio-unavailable');
    expect(engine.state.value.playing).to.equal(false);
    expect(engine.state.value.problem).to.contain('did not let the sound start');
    engine.seek(0.25);
    expect(engine.position()).to.equal(0.25);
    await engine.dispose();
  });
});
