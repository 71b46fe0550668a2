import type { Hertz } from '../units.ts';

/** A second-order digital filter, `feedback[0]` 1. */
export interface Biquad {
  readonly feedforward: readonly [number, number, number];
  readonly feedback: readonly [number, number, number];
}

/**
 * The two filters of K-weighting (ITU-R BS.1770-5, Annex 1, tables 1 and 2) for any sample rate.
 *
 * The Recommendation prints coefficients for 48 kHz only. They are those of a high shelf and a high
 * pass in the bilinear transform, with the corner, quality and gain below (to which the printed
 * coefficients can be solved, all digits agreeing); other rates put the same corners in.
 */
export function kWeighting(sampleRate: Hertz): readonly [shelf: Biquad, highPass: Biquad] {
  const shelf = { corner: 1681.974450955533, quality: 0.7071752369554196, gain: 3.999843853973347 };
  const pass = { corner: 38.13547087602444, quality: 0.5003270373238773 };
  const k = Math.tan((Math.PI * shelf.corner) / sampleRate);
  const high = 10 ** (shelf.gain / 20);
  const band = high ** 0.4996667741545416;
  const a0 = 1 + k / shelf.quality + k * k;
  const w = Math.tan((Math.PI * pass.corner) / sampleRate);
  const c0 = 1 + w / pass.quality + w * w;
  return [
    {
      feedforward: [
        (high + (band * k) / shelf.quality + k * k) / a0,
        (2 * (k * k - high)) / a0,
        (high - (band * k) / shelf.quality + k * k) / a0,
      ],
      feedback: [1, (2 * (k * k - 1)) / a0, (1 - k / shelf.quality + k * k) / a0],
    },
    {
      // The printed high pass is not divided by c0 in its numerator; the constant of −0.691 dB allows for it.
      feedforward: [1, -2, 1],
      feedback: [1, (2 * (w * w - 1)) / c0, (1 - w / pass.quality + w * w) / c0],
    },
  ];
}

/** Runs both filters over a channel; the input stays as it is. */
export function kWeighted(channel: Float32Array, sampleRate: Hertz): Float64Array {
  const out = Float64Array.from(channel);
  for (const { feedforward, feedback } of kWeighting(sampleRate)) {
    let x1 = 0;
    let x2 = 0;
    let y1 = 0;
    let y2 = 0;
    for (let index = 0; index < out.length; index += 1) {
      const x = out[index]!;
      const y =
        feedforward[0] * x + feedforward[1] * x1 + feedforward[2] * x2 - feedback[1] * y1 - feedback[2] * y2;
      x2 = x1;
      x1 = x;
      y2 = y1;
      y1 = y;
      out[index] = y;
    }
  }
  return out;
}
