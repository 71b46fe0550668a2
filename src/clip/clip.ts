import { NotchworkError } from '../errors.ts';
import type { Hertz, Seconds } from '../units.ts';

/** A recording: samples as floating point, full scale ±1. */
export interface Clip {
  readonly sampleRate: Hertz;
  /** One array for each channel, all of length `frames`. */
  readonly channels: readonly Float32Array[];
  readonly frames: number;
}

/** Longest clip, in seconds. */
export const LONGEST_CLIP: Seconds = 20 * 60;

/** Largest file, in bytes. */
export const LARGEST_FILE = 300e6;

/** Sample rates that the program works with. */
export const CLIP_RATES: readonly [lowest: Hertz, highest: Hertz] = [3000, 768_000];

/** Length of a clip in seconds. */
export function durationOf(clip: Clip): Seconds {
  return clip.frames / clip.sampleRate;
}

/** Largest magnitude in any channel. */
export function peakOf(clip: Clip): number {
  let peak = 0;
  for (const channel of clip.channels) {
    for (const sample of channel) {
      const size = Math.abs(sample);
      if (size > peak) peak = size;
    }
  }
  return peak;
}

/** A part of a clip; the samples are shared, not copied. */
export function regionOf(clip: Clip, start: Seconds, end: Seconds): Clip {
  const from = Math.min(Math.max(Math.round(start * clip.sampleRate), 0), clip.frames);
  const to = Math.min(Math.max(Math.round(end * clip.sampleRate), from), clip.frames);
  return {
    sampleRate: clip.sampleRate,
    channels: clip.channels.map((channel) => channel.subarray(from, to)),
    frames: to - from,
  };
}

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
