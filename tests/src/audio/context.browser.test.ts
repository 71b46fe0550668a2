import { expect } from '@open-wc/testing';
import { getContext } from 'tone';
import { hasWebAudio, openContext, type SoundContext } from '../../../src/audio/context.ts';
import { NotchworkError } from '../../../src/errors.ts';

/** A context of which a test decides everything. */
class FakeContext extends EventTarget {
  state: AudioContextState | 'interrupted' = 'suspended';
  currentTime = 0;
  onstatechange: unknown = null;
  readonly sampleRate = 48_000;
  readonly calls: string[] = [];
  /** What a call of `resume` does. */
  onResume = (): Promise<void> => Promise.resolve();

  resume(): Promise<void> {
    this.calls.push('resume');
    return this.onResume();
  }

  suspend(): Promise<void> {
    this.calls.push('suspend');
    return Promise.resolve();
  }

  close(): Promise<void> {
    this.calls.push('close');
    return Promise.resolve();
  }

  become(state: FakeContext['state']): void {
    this.state = state;
    this.dispatchEvent(new Event('statechange'));
  }
}

function openFake(devices?: EventTarget): { fake: FakeContext; sound: SoundContext } {
  const fake = new FakeContext();
  const sound = openContext({ sampleRate: 48_000, create: () => fake as unknown as AudioContext, devices });
  return { fake, sound };
}

const wait = (delay: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, delay));

async function problemOf(promise: Promise<unknown>): Promise<NotchworkError> {
  const outcome = await promise.catch((error: unknown) => error);
  expect(outcome).to.be.instanceOf(NotchworkError);
  expect((outcome as NotchworkError).code).to.equal('audio-unavailable');
  return outcome as NotchworkError;
}

describe('a context of the browser', () => {
  for (const sampleRate of [44_100, 48_000, 96_000, 192_000]) {
    it(`opens at ${sampleRate} Hz, starts, is the sound library's, and closes`, async () => {
      const sound = openContext({ sampleRate });
      expect(sound.raw.sampleRate).to.equal(sampleRate);
      expect(getContext().rawContext).to.equal(sound.raw);
      await sound.start();
      expect(sound.state.value).to.equal('running');
      await sound.close();
      expect(sound.state.value).to.equal('closed');
      await problemOf(sound.start());
    });
  }

  it('refuses a rate that the browser does not know, and names it', () => {
    expect(() => openContext({ sampleRate: 100 })).to.throw(NotchworkError, '0.1 kHz');
  });
});

describe('a browser without Web Audio', () => {
  it('is told from one with it', () => {
    expect(hasWebAudio({})).to.equal(false);
    expect(hasWebAudio({ webkitAudioContext: class {} })).to.equal(true);
    expect(hasWebAudio()).to.equal(true);
  });

  it('gets a word about what still works', () => {
    const own = Object.getOwnPropertyDescriptor(globalThis, 'AudioContext')!;
    Reflect.deleteProperty(globalThis, 'AudioContext');
    try {
      expect(() => openContext({ sampleRate: 48_000 })).to.throw(NotchworkError, 'no Web Audio');
    } finally {
      Object.defineProperty(globalThis, 'AudioContext', own);
    }
  });
});

describe('a context that does not do as it should', () => {
  it('refuses to start: after 5 s an error, and a later click may succeed', async () => {
    const { fake, sound } = openFake();
    fake.onResume = () => new Promise(() => {});
    const begun = performance.now();
    const { message } = await problemOf(sound.start());
    expect(performance.now() - begun).to.be.within(4900, 6500);
    expect(message).to.contain('Click once');
    fake.onResume = async () => fake.become('running');
    await sound.start();
    expect(sound.state.value).to.equal('running');
    await sound.close();
  });

  it('fails to start: the reason is told', async () => {
    const { fake, sound } = openFake();
    fake.onResume = () => Promise.reject(new Error('no device'));
    expect((await problemOf(sound.start())).message).to.contain('no device');
    await sound.close();
  });

  it('is interrupted, and comes back', async () => {
    const { fake, sound } = openFake();
    fake.become('running');
    expect(sound.state.value).to.equal('running');
    fake.become('interrupted');
    expect(sound.state.value).to.equal('interrupted');
    fake.become('running');
    expect(sound.state.value).to.equal('running');
    await sound.close();
  });

  it('stands still while it says that it runs: the device went away; starting wakes it', async () => {
    const devices = new EventTarget();
    const { fake, sound } = openFake(devices);
    fake.become('running');
    devices.dispatchEvent(new Event('devicechange'));
    await wait(700);
    expect(sound.state.value).to.equal('stalled');
    fake.onResume = async () => {
      fake.currentTime = 1;
    };
    await sound.start();
    expect(fake.calls).to.deep.equal(['suspend', 'resume']);
    expect(sound.state.value).to.equal('running');
    await sound.close();
  });

  it('listens to nothing any more once it is closed', async () => {
    const devices = new EventTarget();
    const { fake, sound } = openFake(devices);
    await sound.close();
    fake.become('running');
    devices.dispatchEvent(new Event('devicechange'));
    await wait(700);
    expect(sound.state.value).to.equal('closed');
  });
});
