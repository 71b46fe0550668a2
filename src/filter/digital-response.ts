import type { TransferFunction } from '../transfer-function.ts';
import type { Hertz } from '../units.ts';
import { toBilinearVariable } from './bilinear-variable.ts';
import { magnitudeAtSquares } from './magnitude.ts';
import { phaseAtOmegas } from './phase.ts';
import type { DigitalSection } from './section.ts';

/*
 * A digital section is evaluated in the bilinear variable: with z = e^{jω} on the unit circle it is an
 * ordinary rational function at j·tan(ω/2fs), the factors (1 + w)^n of numerator and denominator
 * cancelling. The same evaluation as for analogue sections serves, and low frequencies lose no digits.
 */

function inBilinearVariable({ feedforward, feedback }: DigitalSection): TransferFunction {
  return { numerator: toBilinearVariable(feedforward), denominator: toBilinearVariable(feedback) };
}

/** `tan(π·f/fs)` for each frequency; NaN above half the sample rate, where a sampled signal has nothing. */
function tangents(frequencies: Float64Array, sampleRate: Hertz): Float64Array {
  return frequencies.map((frequency) =>
    frequency <= sampleRate / 2 ? Math.tan((Math.PI * frequency) / sampleRate) : Number.NaN,
  );
}

function accumulate(
  out: Float64Array,
  sections: readonly DigitalSection[],
  points: Float64Array,
  evaluate: (out: Float64Array, transfer: TransferFunction, points: Float64Array) => void,
): void {
  out.fill(0);
  const one = new Float64Array(points.length);
  for (const section of sections) {
    evaluate(one, inBilinearVariable(section), points);
    for (let point = 0; point < points.length; point++) out[point]! += one[point]!;
  }
}

/**
 * Magnitude in dB of a cascade of digital sections: what the running filter does, the rounding of its
 * coefficients included. NaN above half the sample rate; −Infinity where it passes nothing.
 *
 * @param out receives the decibels; as long as `frequencies`.
 * @param frequencies in hertz, above 0.
 */
export function digitalMagnitudeInto(
  out: Float64Array,
  sections: readonly DigitalSection[],
  frequencies: Float64Array,
  sampleRate: Hertz,
): void {
  const squares = tangents(frequencies, sampleRate).map((tangent) => tangent * tangent);
  accumulate(out, sections, squares, magnitudeAtSquares);
}

/**
 * Phase in degrees of a cascade of digital sections, unwrapped as in `phase.ts`. NaN above half the
 * sample rate, and throughout where the cascade passes nothing.
 *
 * @param out receives the degrees; as long as `frequencies`.
 * @param frequencies in hertz, ascending, above 0.
 */
export function digitalPhaseInto(
  out: Float64Array,
  sections: readonly DigitalSection[],
  frequencies: Float64Array,
  sampleRate: Hertz,
): void {
  accumulate(out, sections, tangents(frequencies, sampleRate), phaseAtOmegas);
}
