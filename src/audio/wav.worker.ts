import type { Clip } from '../clip/clip.ts';
import { readWav } from '../clip/wav-reader.ts';
import { serve } from './worker-port.ts';

/** What the page sends. */
export interface WavQuestion {
  readonly bytes: ArrayBuffer;
  readonly allowTruncated: boolean;
}

serve<WavQuestion, Clip>(({ bytes, allowTruncated }) => {
  const clip = readWav(new Uint8Array(bytes), { allowTruncated });
  return { answer: clip, transfer: clip.channels.map((samples) => samples.buffer as ArrayBuffer) };
});
