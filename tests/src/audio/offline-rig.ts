import { Context } from 'tone';
import type { AudioClock } from '../../../src/audio/clock.ts';

/**
 * An offline rendering in which code runs at given times of the sound, as it would live: the
 * rendering is halted (`OfflineAudioContext.suspend`, the browser's own), the code runs, and the
 * rendering goes on. So the live chain can be measured as it is, disconnections and warm-up included.
 */
export class OfflineRig {
  readonly context: OfflineAudioContext;
  readonly tone: Context;
  readonly clock: AudioClock;
  readonly #due = new Map<number, Set<() => void>>();
  #block = 0;

  constructor(seconds: number, sampleRate = 48_000, channels = 1) {
    this.context = new OfflineAudioContext(channels, Math.round(seconds * sampleRate), sampleRate);
    this.tone = new Context({ context: this.context, clockSource: 'offline', lookAhead: 0 });
    const { context } = this;
    this.clock = {
      get now() {
        return context.currentTime;
      },
      running: true,
      at: (time, action) => this.#at(time, action),
    };
  }

  /** Runs `action` when the rendering has reached `time`. */
  script(time: number, action: () => void): void {
    this.#at(time, action);
  }

  /** A source that plays samples once, from the start of the rendering. */
  source(...channels: Float32Array[]): AudioBufferSourceNode {
    const { context } = this;
    const buffer = context.createBuffer(channels.length, channels[0]!.length, context.sampleRate);
    channels.forEach((samples, index) => {
      buffer.copyToChannel(samples as Float32Array<ArrayBuffer>, index);
    });
    const node = context.createBufferSource();
    node.buffer = buffer;
    node.start(0);
    return node;
  }

  /** Renders; one array for each channel. */
  async render(): Promise<Float32Array[]> {
    const buffer = await this.context.startRendering();
    return Array.from({ length: buffer.numberOfChannels }, (_, channel) => buffer.getChannelData(channel));
  }

  #at(time: number, action: () => void): () => void {
    const { sampleRate, length } = this.context;
    // The rendering can be halted between blocks of 128 frames, and only ahead.
    const block = Math.max(Math.ceil((time * sampleRate) / 128 - 1e-6), this.#block + 1);
    let actions = this.#due.get(block);
    if (actions === undefined) {
      actions = new Set();
      this.#due.set(block, actions);
      if (block * 128 < length) {
        void this.context.suspend((block * 128) / sampleRate).then(() => {
          this.#block = block;
          for (const run of this.#due.get(block)!) run();
          void this.context.resume();
        });
      }
    }
    actions.add(action);
    return () => actions.delete(action);
  }
}

/** A sine wave of amplitude 0.5 unless told otherwise. */
export function sine(frequency: number, seconds: number, sampleRate = 48_000, amplitude = 0.5): Float32Array {
  return Float32Array.from(
    { length: Math.round(seconds * sampleRate) },
    (_, index) => amplitude * Math.sin((2 * Math.PI * frequency * index) / sampleRate),
  );
}
