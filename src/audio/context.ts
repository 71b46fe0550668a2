import './quiet-start.ts';
import { type ReadonlySignal, signal } from '@preact/signals-core';
import { AudioContext as StandardAudioContext } from 'standardized-audio-context';
import { Context, setContext } from 'tone';
import { messageOf, NotchworkError } from '../errors.ts';
import type { Hertz } from '../units.ts';
import type { SoundState } from './engine-types.ts';
import { Scope } from './scope.ts';

const START_PATIENCE = 5_000; // ms; Firefox takes two seconds to open a device for the first time
const STALL_LOOK = 1000; // ms between two looks at whether time passes

/** Extra collaborators for tests. */
export interface ContextOptions {
  readonly sampleRate: Hertz;
  /** Makes the context. @default standardized-audio-context's, over the browser's own */
  readonly create?: (options: AudioContextOptions) => AudioContext;
  /** Says when devices come and go. @default the browser's, where there is one */
  readonly devices?: EventTarget | undefined;
}

/** An audio context with what can happen to it. */
export interface SoundContext {
  readonly raw: AudioContext;
  readonly tone: Context;
  readonly state: ReadonlySignal<SoundState>;
  /** Starts it, in the user's own click. @throws NotchworkError `audio-unavailable` after 2 s without sound */
  start(): Promise<void>;
  close(): Promise<void>;
}

/** Whether the browser has Web Audio at all. */
export function hasWebAudio(scope: object = globalThis): boolean {
  return 'AudioContext' in scope || 'webkitAudioContext' in scope;
}

/**
 * The library's context has the methods and events of the browser's own; its types only say so in
 * another way. This is the one place where they are taken for each other.
 */
function standardContext(options: AudioContextOptions): AudioContext {
  return new StandardAudioContext(options) as unknown as AudioContext;
}

function unavailable(message: string, cause?: unknown): NotchworkError {
  return new NotchworkError('audio-unavailable', message, { cause });
}

function createRaw({ sampleRate, create }: ContextOptions): AudioContext {
  if (create === undefined && !hasWebAudio()) {
    throw unavailable(
      'This browser cannot play sound from a page (it has no Web Audio). Curves and files work all the same; for sound, use a current browser.',
    );
  }
  try {
    return (create ?? standardContext)({ sampleRate, latencyHint: 'interactive' });
  } catch (error) {
    throw unavailable(
      `The browser could not open sound at ${sampleRate / 1000} kHz (${messageOf(error)}). Choose 48 kHz, or check that a sound device is connected.`,
      error,
    );
  }
}

/**
 * Opens an audio context and makes it the sound library's. It is suspended until
 * {@link SoundContext.start}, which must happen in a click of the user.
 *
 * @throws NotchworkError `audio-unavailable` without Web Audio, or where the rate is refused.
 */
export function openContext(options: ContextOptions): SoundContext {
  const raw = createRaw(options);
  const scope = new Scope();
  const tone = new Context({ context: raw, clockSource: 'timeout', lookAhead: 0, updateInterval: 0.1 });
  setContext(tone);
  const now = (): SoundState => raw.state as SoundState;
  const state = signal<SoundState>(now());
  const follow = (): void => {
    state.value = now();
  };
  scope.listen(raw, 'statechange', follow);

  // A device that goes away may leave the context "running" with its time standing still.
  let seen = -1;
  const look = (): void => {
    const stalled = raw.state === 'running' && raw.currentTime === seen;
    seen = raw.currentTime;
    state.value = stalled ? 'stalled' : now();
    scope.timeout(look, STALL_LOOK);
  };
  look();
  const lookSoon = (): void => {
    seen = raw.currentTime;
    scope.timeout(() => {
      if (raw.state === 'running' && raw.currentTime === seen) state.value = 'stalled';
    }, STALL_LOOK / 2);
  };
  for (const type of ['sinkchange', 'error']) scope.listen(raw, type, lookSoon);
  const devices = 'devices' in options ? options.devices : globalThis.navigator?.mediaDevices;
  if (devices !== undefined) scope.listen(devices, 'devicechange', lookSoon);

  return {
    raw,
    tone,
    state,
    start: () => start(raw, state.peek()).finally(follow),
    async close() {
      scope.dispose();
      tone.dispose();
      if (raw.state !== 'closed') await raw.close().catch(() => {});
      state.value = 'closed';
    },
  };
}

async function start(raw: AudioContext, state: SoundState): Promise<void> {
  if (raw.state === 'closed') {
    throw unavailable('The sound was closed. Press play to open it again.');
  }
  if (raw.state === 'running' && state !== 'stalled') return;
  const begun = (async () => {
    // A stalled context says it runs; only stopping and starting it makes it look for a device.
    if (state === 'stalled') await raw.suspend();
    await raw.resume();
  })();
  let timer: ReturnType<typeof setTimeout> | undefined;
  const patience = new Promise<void>((resolve) => {
    timer = setTimeout(resolve, START_PATIENCE);
  });
  try {
    await Promise.race([begun, patience]);
  } catch (error) {
    throw unavailable(
      `The sound could not be started (${messageOf(error)}). Check that a sound device is connected, then press play again.`,
      error,
    );
  } finally {
    clearTimeout(timer);
    // Whether it is still waiting or failed after our patience ended, nobody listens any more.
    begun.catch(() => {});
  }
  if (raw.state !== 'running') {
    throw unavailable(
      'The browser did not let the sound start. Click once on the page and press play again; if that does not help, allow this page to play sound, and check that no other program holds the sound device.',
    );
  }
}
