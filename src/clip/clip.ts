import type { Hertz, Seconds } from '../units.ts';

/** A recording: samples as floating point, full scale ±1. */
export interface Clip {
  readonly sampleRate: Hertz;
  /** One array for each channel, all of length `frames`. */
  readonly channels: readonly Float32Array[];
  readonly frames: number;
}

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
