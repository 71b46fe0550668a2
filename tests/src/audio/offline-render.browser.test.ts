import { expect } from '@open-wc/testing';
import { renderOffline } from '../../../src/audio/offline-render.ts';
import { buildSections } from '../../../src/audio/section-nodes.ts';
import { NotchworkError } from '../../../src/errors.ts';
import type { DigitalSection } from '../../../src/filter/section.ts';
import { toneSections } from './line-sections.ts';

const RATE = 48_000;

/** Noise from a linear congruential generator (D. H. Lehmer's, constants of Park and Miller 1988). */
function noise(length: number, seed: number): Float32Array<ArrayBuffer> {
  let state = seed;
  return Float32Array.from({ length }, () => {
    state = (state * 16_807) % 2_147_483_647;
    return state / 2_147_483_647 - 0.5;
  });
}

/** The definition itself: `y[n] = Σ b·x − Σ a·y`, section after section, in double precision. */
function direct(input: ArrayLike<number>, sections: readonly DigitalSection[], length: number): Float64Array {
  let signal = Float64Array.from({ length }, (_, index) => input[index] ?? 0);
  for (const { feedforward, feedback } of sections) {
    const output = new Float64Array(length);
    for (let index = 0; index < length; index += 1) {
      let sum = 0;
      for (let delay = 0; delay < feedforward.length; delay += 1) {
        sum += feedforward[delay]! * (signal[index - delay] ?? 0);
        if (delay > 0) sum -= feedback[delay]! * (output[index - delay] ?? 0);
      }
      output[index] = sum;
    }
    signal = output;
  }
  return signal;
}

function largestDifference(one: ArrayLike<number>, other: ArrayLike<number>): number {
  let most = 0;
  for (let index = 0; index < one.length; index += 1)
    most = Math.max(most, Math.abs(one[index]! - other[index]!));
  return most;
}

const line = [...toneSections({ treble: 0.8 }), ...toneSections({ bass: 0.9 })];

describe('renderOffline', () => {
  it('agrees with the definition over several blocks and two channels, to single precision', async () => {
    const frames = 300_000; // more than two blocks, and not a multiple
    const channels = [noise(frames, 1), noise(frames, 2)];
    const rendered = await renderOffline({ sampleRate: RATE, channels, frames }, line, { gain: 6 });
    expect(rendered.channels).to.have.length(2);
    expect(rendered.frames).to.be.above(frames);
    for (const [channel, samples] of rendered.channels.entries()) {
      expect(samples.length).to.equal(rendered.frames);
      const expected = direct(channels[channel]!, line, rendered.frames).map(
        (value) => value * 10 ** (6 / 20),
      );
      // Half a step of single precision below 1.
      expect(largestDifference(samples, expected)).to.be.below(2 ** -24);
    }
  });

  it('agrees with the browser’s own nodes within 1e-6 of full scale', async () => {
    const frames = 48_000;
    const input = noise(frames, 3);
    const rendered = await renderOffline({ sampleRate: RATE, channels: [input], frames }, line, {
      tail: false,
    });
    const context = new OfflineAudioContext(1, frames, RATE);
    const buffer = context.createBuffer(1, frames, RATE);
    buffer.copyToChannel(input, 0);
    const source = context.createBufferSource();
    source.buffer = buffer;
    const { nodes } = buildSections(context, line);
    source.connect(nodes[0]!);
    nodes.at(-1)!.connect(context.destination);
    source.start(0);
    const played = await context.startRendering();
    expect(largestDifference(rendered.channels[0]!, played.getChannelData(0))).to.be.below(1e-6);
  });

  it('keeps what rings after the end, and no more than the clip without a tail', async () => {
    const clip = { sampleRate: RATE, channels: [new Float32Array(1000).fill(1)], frames: 1000 };
    const pole: DigitalSection = { feedforward: [1, 0], feedback: [1, -0.999] };
    const whole = await renderOffline(clip, [pole]);
    // ln(1e-5)/ln(0.999) = 11,507 samples until 100 dB down.
    expect(whole.frames - 1000).to.be.within(11_500, 11_520);
    expect(Math.abs(whole.channels[0]!.at(-1)!)).to.be.below(1e-5 * whole.channels[0]![999]!);
    const cut = await renderOffline(clip, [pole], { tail: false });
    expect(cut.frames).to.equal(1000);
    expect([...cut.channels[0]!]).to.deep.equal([...whole.channels[0]!.subarray(0, 1000)]);
  });

  it('gives the clip itself for an empty line', async () => {
    const channels = [noise(5000, 4)];
    const rendered = await renderOffline({ sampleRate: 8000, channels, frames: 5000 }, []);
    expect(rendered.sampleRate).to.equal(8000);
    expect([...rendered.channels[0]!]).to.deep.equal([...channels[0]!]);
  });

  it('tells its progress in order, ending with 1', async () => {
    const frames = 400_000;
    const shares: number[] = [];
    await renderOffline({ sampleRate: RATE, channels: [noise(frames, 5)], frames }, line, {
      onProgress: (share) => shares.push(share),
    });
    expect(shares.length).to.be.above(3);
    expect(shares).to.deep.equal([...shares].sort((first, second) => first - second));
    expect(shares.at(-1)).to.equal(1);
  });

  it('is called off in the middle', async () => {
    const frames = 20_000_000;
    const controller = new AbortController();
    const clip = { sampleRate: RATE, channels: [new Float32Array(frames)], frames };
    let calls = 0;
    const outcome = await renderOffline(clip, line, {
      signal: controller.signal,
      onProgress: () => {
        calls += 1;
        controller.abort();
      },
    }).catch((error: Error) => error.name);
    expect(outcome).to.equal('AbortError');
    expect(calls).to.equal(1);
  });

  it('is not begun when called off before', async () => {
    const clip = { sampleRate: RATE, channels: [new Float32Array(10)], frames: 10 };
    const outcome = await renderOffline(clip, line, { signal: AbortSignal.abort() }).catch(
      (error: Error) => error.name,
    );
    expect(outcome).to.equal('AbortError');
  });

  it('refuses a filter that would run away', async () => {
    const clip = { sampleRate: RATE, channels: [new Float32Array(10)], frames: 10 };
    const outcome = await renderOffline(clip, [{ feedforward: [1, 0], feedback: [1, -2] }]).catch(
      (error) => error,
    );
    expect(outcome).to.be.instanceOf(NotchworkError);
    expect(outcome.code).to.equal('filter-unstable');
  });

  it('is faster than real time', async () => {
    const frames = 60 * RATE;
    const channels = [noise(frames, 6), noise(frames, 7)];
    const start = performance.now();
    await renderOffline({ sampleRate: RATE, channels, frames }, line);
    const seconds = (performance.now() - start) / 1000;
    // A minute in stereo. Measured: about 1 s; ten times that would still be fast enough.
    expect(seconds).to.be.below(12);
  });
});
