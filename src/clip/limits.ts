import { NotchworkError } from '../errors.ts';
import type { Hertz, Seconds } from '../units.ts';
import { type Clip, durationOf } from './clip.ts';

/** Longest clip, in seconds. */
export const LONGEST_CLIP: Seconds = 20 * 60;

/** Largest file, in bytes. */
export const LARGEST_FILE = 300e6;

/** Sample rates that the program works with. */
export const CLIP_RATES: readonly [lowest: Hertz, highest: Hertz] = [3000, 768_000];

/** @throws NotchworkError `clip-too-large` for a file beyond {@link LARGEST_FILE}. */
export function assertFileSize(bytes: number): void {
  if (bytes > LARGEST_FILE) {
    throw new NotchworkError(
      'clip-too-large',
      `This file has ${Math.round(bytes / 1e6)} MB; at most ${LARGEST_FILE / 1e6} MB are taken. Cut a part out of it, or save it at a lower rate.`,
    );
  }
}

/**
 * Checks what every clip must keep.
 *
 * @throws NotchworkError `clip-empty`, `clip-too-large` or `clip-unsupported`, each saying what to do.
 */
export function assertUsableClip(clip: Clip): void {
  const [lowest, highest] = CLIP_RATES;
  if (clip.frames === 0 || clip.channels.length === 0) {
    throw new NotchworkError('clip-empty', 'This recording has no samples in it. Choose another file.');
  }
  if (!(clip.sampleRate >= lowest && clip.sampleRate <= highest)) {
    throw new NotchworkError(
      'clip-unsupported',
      `This recording has a sample rate of ${clip.sampleRate} Hz; ${lowest} to ${highest} Hz are taken. Convert it to 48000 Hz.`,
    );
  }
  if (durationOf(clip) > LONGEST_CLIP) {
    throw new NotchworkError(
      'clip-too-large',
      `This recording is ${(durationOf(clip) / 60).toFixed(1)} minutes long; at most ${LONGEST_CLIP / 60} are taken. Cut the part you want to compare.`,
    );
  }
}
