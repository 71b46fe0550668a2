import type { Lufs } from '../units.ts';

/** Blocks quieter than this never count. */
export const ABSOLUTE_GATE: Lufs = -70;
/** Blocks this far under the loudness of what passed the first gate do not count either. */
const RELATIVE_GATE = -10;

/** Loudness of a K-weighted mean square, summed over channels by their weights. */
export function loudnessOf(weightedPower: number): Lufs {
  return -0.691 + 10 * Math.log10(weightedPower);
}

/**
 * The gated mean of block powers (ITU-R BS.1770-5, Annex 1, equations 4 to 7).
 *
 * @param powers K-weighted mean square of every block, channels summed.
 * @returns the loudness, or undefined where every block is gated out.
 */
export function gatedLoudness(powers: ArrayLike<number>): Lufs | undefined {
  const meanAbove = (threshold: Lufs): number | undefined => {
    let sum = 0;
    let count = 0;
    for (let index = 0; index < powers.length; index += 1) {
      const power = powers[index]!;
      if (power > 0 && loudnessOf(power) > threshold) {
        sum += power;
        count += 1;
      }
    }
    return count === 0 ? undefined : sum / count;
  };
  const first = meanAbove(ABSOLUTE_GATE);
  if (first === undefined) return undefined;
  const second = meanAbove(Math.max(ABSOLUTE_GATE, loudnessOf(first) + RELATIVE_GATE));
  return second === undefined ? undefined : loudnessOf(second);
}
