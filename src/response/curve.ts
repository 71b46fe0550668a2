import type { Complex } from '../filter/complex.ts';
import { magnitudeAtSquares } from '../filter/magnitude.ts';
import { phaseAtOmegas } from '../filter/phase.ts';
import type { TransferFunction } from '../transfer-function.ts';
import { magnitudeAt } from '../transfer-function.ts';
import { type Decibels, decibels, type Hertz, radiansPerSecond } from '../units.ts';
import type { FrequencyGrid } from './grid.ts';

/** A sampled response. */
export interface Curve {
  /** Hertz, ascending. */
  readonly frequencies: Float64Array;
  /** Decibels, one for each frequency; −Infinity where nothing passes. */
  readonly magnitude: Float64Array;
  /** Degrees, unwrapped, one for each frequency. */
  readonly phase?: Float64Array;
}

/**
 * Magnitude in dB on a grid, `20·log10|H(jω)|`. This runs for every block on every move of a knob;
 * it allocates a few numbers a call and nothing a point.
 *
 * A numerator that is 0 gives −Infinity.
 *
 * @param out receives the decibels; as long as the grid.
 */
export function magnitudeInto(out: Float64Array, transfer: TransferFunction, grid: FrequencyGrid): void {
  magnitudeAtSquares(out, transfer, grid.omegaSquared);
}

/**
 * Phase in degrees on a grid, unwrapped whatever the spacing of its points; see `filter/phase.ts` for
 * where it starts. NaN where the numerator is 0.
 *
 * @param out receives the degrees; as long as the grid.
 * @throws NotchworkError `filter-invalid` for coefficients that are not finite or too far apart in size.
 */
export function phaseInto(out: Float64Array, transfer: TransferFunction, grid: FrequencyGrid): void {
  phaseAtOmegas(out, transfer, grid.omega);
}

/** Samples a transfer function on a grid: magnitude, and phase where it is asked for. */
export function curveOf(
  transfer: TransferFunction,
  grid: FrequencyGrid,
  options: { readonly phase?: boolean } = {},
): Curve {
  const magnitude = new Float64Array(grid.frequencies.length);
  magnitudeInto(magnitude, transfer, grid);
  if (options.phase !== true) return { frequencies: grid.frequencies, magnitude };
  const phase = new Float64Array(grid.frequencies.length);
  phaseInto(phase, transfer, grid);
  return { frequencies: grid.frequencies, magnitude, phase };
}

/** Level in dB as a function of frequency in hertz: what the figures are read off. */
export function levelOf(transfer: TransferFunction): (frequency: Hertz) => Decibels {
  return (frequency) => decibels(magnitudeAt(transfer, radiansPerSecond(frequency)));
}

/** P(jω) of a real polynomial. */
function valueAt(coefficients: readonly number[], omega: number): Complex {
  let re = 0;
  let im = 0;
  for (let power = coefficients.length - 1; power >= 0; power--) {
    const turned = -im * omega;
    im = re * omega;
    re = turned + coefficients[power]!;
  }
  return { re, im };
}

/**
 * The complex response H(jω) at one frequency. Infinite on a pole, NaN where numerator and
 * denominator vanish together.
 */
export function responseAt(transfer: TransferFunction, frequency: Hertz): Complex {
  const omega = radiansPerSecond(frequency);
  const above = valueAt(transfer.numerator, omega);
  const below = valueAt(transfer.denominator, omega);
  // Divided by the modulus twice rather than by its square, which may overflow.
  const size = Math.hypot(below.re, below.im);
  const unit = { re: below.re / size, im: below.im / size };
  return {
    re: (above.re * unit.re + above.im * unit.im) / size,
    im: (above.im * unit.re - above.re * unit.im) / size,
  };
}
