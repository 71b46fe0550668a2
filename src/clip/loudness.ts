import type { Lufs, Seconds } from '../units.ts';
import type { Clip } from './clip.ts';
import { ABSOLUTE_GATE, gatedLoudness, loudnessOf } from './gating.ts';
import { kWeighted } from './k-weighting.ts';

/** Length of a gating block, in seconds, and how far the next one is. */
export const BLOCK: Seconds = 0.4;
export const HOP: Seconds = 0.1;

/** A loudness, or why there is none. */
export type Loudness =
  | { readonly kind: 'measured'; readonly lufs: Lufs }
  /** Shorter than a gating block: measured over the whole instead, without gates. */
  | { readonly kind: 'short'; readonly lufs: Lufs }
  | { readonly kind: 'silent' };

/** Weight of a channel: 1 for left, right and centre, 1.41 for the surrounds of five, 0 for the low-frequency channel of six. */
export function channelWeight(channel: number, count: number): number {
  if (count === 6 && channel === 3) return 0;
  const firstSurround = count >= 6 ? 4 : 3;
  return count >= 5 && channel >= firstSurround ? 1.41 : 1;
}

/** K-weighted mean square of every gating block, channels summed by their weights. */
export function blockPowers(clip: Clip): Float64Array {
  const hop = Math.round(HOP * clip.sampleRate);
  const perBlock = Math.round(BLOCK / HOP);
  const hops = Math.floor(clip.frames / hop);
  const sums = new Float64Array(hops);
  clip.channels.forEach((channel, index) => {
    const weight = channelWeight(index, clip.channels.length);
    if (weight === 0) return;
    const weighted = kWeighted(channel, clip.sampleRate);
    for (let at = 0; at < hops; at += 1) {
      let sum = 0;
      for (let frame = at * hop; frame < (at + 1) * hop; frame += 1) sum += weighted[frame]! ** 2;
      sums[at] = sums[at]! + weight * sum;
    }
  });
  const blocks = Math.max(0, hops - perBlock + 1);
  return Float64Array.from({ length: blocks }, (_, at) => {
    let sum = 0;
    for (let part = 0; part < perBlock; part += 1) sum += sums[at + part]!;
    return sum / (perBlock * hop);
  });
}

/** Integrated loudness of a clip after ITU-R BS.1770-5, gates included. */
export function measureLoudness(clip: Clip): Loudness {
  const powers = blockPowers(clip);
  if (powers.length > 0) {
    const lufs = gatedLoudness(powers);
    return lufs === undefined ? { kind: 'silent' } : { kind: 'measured', lufs };
  }
  let power = 0;
  clip.channels.forEach((channel, index) => {
    const weighted = kWeighted(channel, clip.sampleRate);
    const sum = weighted.reduce((total, value) => total + value * value, 0);
    power += (channelWeight(index, clip.channels.length) * sum) / Math.max(1, clip.frames);
  });
  const lufs = loudnessOf(power);
  return power > 0 && lufs > ABSOLUTE_GATE ? { kind: 'short', lufs } : { kind: 'silent' };
}
