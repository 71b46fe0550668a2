import type { Clip } from './clip.ts';

/** A waveform as narrow as a screen: the extremes of every bucket of samples, over all channels. */
export interface Overview {
  /** Lowest sample of each bucket. */
  readonly low: Float32Array;
  /** Highest sample of each bucket. */
  readonly high: Float32Array;
}

/**
 * Extremes of a clip in equal buckets, first sample to last.
 *
 * @param buckets how many; a clip with fewer samples gets one bucket for each.
 */
export function overviewOf(clip: Clip, buckets: number): Overview {
  const count = Math.max(0, Math.min(Math.floor(buckets), clip.frames));
  const low = new Float32Array(count);
  const high = new Float32Array(count);
  for (const channel of clip.channels) {
    for (let bucket = 0; bucket < count; bucket += 1) {
      const start = Math.floor((bucket * clip.frames) / count);
      const end = Math.floor(((bucket + 1) * clip.frames) / count);
      let lowest = low[bucket]!;
      let highest = high[bucket]!;
      for (let frame = start; frame < end; frame += 1) {
        const sample = channel[frame]!;
        if (sample < lowest) lowest = sample;
        if (sample > highest) highest = sample;
      }
      low[bucket] = lowest;
      high[bucket] = highest;
    }
  }
  return { low, high };
}
