import type { Lufs } from '../units.ts';
import { gatedLoudness, loudnessOf } from './gating.ts';

/**
 * K-weighted power of a clip, block by block, in narrow bands: enough to know its loudness through
 * any filter whose response is smooth over a band.
 */
export interface WeightedSpectrum {
  /** Centre of every band, in hertz. */
  readonly bands: Float64Array;
  /** Power of block b in band k at `b·bands.length + k`. */
  readonly powers: Float32Array;
  readonly blocks: number;
  /** Whether the clip was shorter than a gating block; no gates apply then. */
  readonly short: boolean;
}

/**
 * Integrated loudness of the clip after a linear filter, gates included.
 *
 * @param gain the filter's power gain |H|² at each of the spectrum's bands.
 * @returns undefined where every block is gated out: silence.
 */
export function loudnessThrough(spectrum: WeightedSpectrum, gain: ArrayLike<number>): Lufs | undefined {
  const { bands, powers, blocks, short } = spectrum;
  const count = bands.length;
  const filtered = new Float64Array(blocks);
  for (let block = 0; block < blocks; block += 1) {
    let sum = 0;
    for (let band = 0, at = block * count; band < count; band += 1, at += 1) {
      // Bands above half the sample rate hold nothing, and a digital filter has no gain there.
      if (powers[at]! > 0) sum += powers[at]! * gain[band]!;
    }
    filtered[block] = sum;
  }
  if (!short) return gatedLoudness(filtered);
  return filtered[0]! > 1e-12 ? loudnessOf(filtered[0]!) : undefined;
}
