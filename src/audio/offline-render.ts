import type { Clip } from '../clip/clip.ts';
import { renderTail } from '../filter/render-tail.ts';
import type { DigitalSection } from '../filter/section.ts';
import { amplitude, type Decibels } from '../units.ts';
import type { RenderQuestion } from './render.worker.ts';
import { checkSections } from './section-nodes.ts';
import { WorkerPort } from './worker-port.ts';

const BLOCK = 1 << 17; // frames: some 10 ms of work, so that progress and cancelling are prompt

/** Choices for {@link renderOffline}. */
export interface RenderOptions {
  /** Gain of the whole. @default 0 dB */
  readonly gain?: Decibels;
  /** Append what still rings after the clip's end, at most 2 s. @default true */
  readonly tail?: boolean;
  readonly signal?: AbortSignal;
  /** Called with the share that is done, 0 to 1, in order; the last call is 1. */
  readonly onProgress?: (share: number) => void;
}

/** A block of the clip, followed by silence beyond its end. */
function blockAt(samples: Float32Array, from: number, length: number): Float32Array<ArrayBuffer> {
  const block = new Float32Array(length);
  if (from < samples.length) block.set(samples.subarray(from, from + length));
  return block;
}

/**
 * Renders a clip through a line, at the clip's own rate, in a worker: block by block with a cascade in
 * double precision, so that there is progress, it can be cancelled at any block, memory stays at the
 * result plus a block, and long clips give exactly what short ones do. The browser's offline rendering
 * offers none of the first three, and cutting a clip up for it would lose the filters' state.
 *
 * @param sections made for the clip's sample rate.
 * @returns a clip with as many channels, never shorter than the one given. Nothing limits its level.
 * @throws NotchworkError `filter-invalid` or `filter-unstable`; AbortError when called off.
 */
export async function renderOffline(
  clip: Clip,
  sections: readonly DigitalSection[],
  { gain = 0, tail = true, signal, onProgress }: RenderOptions = {},
): Promise<Clip> {
  signal?.throwIfAborted();
  checkSections(sections);
  const frames = clip.frames + (tail ? renderTail(sections, clip.sampleRate) : 0);
  const channels = clip.channels.map(() => new Float32Array(frames));
  const worker = new Worker(new URL('./render.worker.ts', import.meta.url), { type: 'module' });
  const port = new WorkerPort(worker, signal);
  const ask = (question: RenderQuestion, transfer: Transferable[] = []): Promise<readonly Float32Array[]> =>
    port.ask(question, transfer);
  try {
    await ask({ start: { sections, channels: channels.length, gain: amplitude(gain) } });
    for (let from = 0; from < frames; from += BLOCK) {
      const length = Math.min(BLOCK, frames - from);
      const block = clip.channels.map((samples) => blockAt(samples, from, length));
      const done = await ask(
        { block },
        block.map((samples) => samples.buffer),
      );
      for (const [channel, samples] of done.entries()) channels[channel]!.set(samples, from);
      onProgress?.((from + length) / frames);
    }
  } finally {
    port.close();
  }
  return { sampleRate: clip.sampleRate, channels, frames };
}
