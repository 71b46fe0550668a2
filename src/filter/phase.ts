import type { TransferFunction } from '../transfer-function.ts';
import type { Degrees } from '../units.ts';
import { degreeOf, orderAtZero, polynomialRoots } from './roots.ts';

const DEGREES = 180 / Math.PI;

/** The real and imaginary parts of `j/root` for every root that is not 0; conjugates one after the other. */
function reciprocals(polynomial: readonly number[]): Float64Array {
  const { real, pairs } = polynomialRoots(polynomial);
  const parts: number[] = [];
  for (const root of real) if (root !== 0) parts.push(0, 1 / root);
  for (const { re, im } of pairs) {
    const square = re * re + im * im;
    parts.push(im / square, re / square, -im / square, re / square);
  }
  return Float64Array.from(parts);
}

/** Adds `sign` times the phase of `Π(1 − jω/root)` in radians. */
function accumulate(out: Float64Array, parts: Float64Array, omegas: Float64Array, sign: 1 | -1): void {
  for (let at = 0; at < parts.length; at += 2) {
    const along = parts[at]!;
    const across = parts[at + 1]!;
    for (let point = 0; point < omegas.length; point++) {
      const omega = omegas[point]!;
      // 0 − …, so that a zero on the axis counts as one just left of it
      out[point]! += sign * Math.atan2(0 - omega * across, 1 - omega * along);
    }
  }
}

/** Phase towards 0 rad/s, in degrees: a quarter turn for every zero at 0, half a turn for a negative sign. */
function phaseAtOrigin({ numerator, denominator }: TransferFunction): Degrees {
  const above = orderAtZero(numerator);
  const below = orderAtZero(denominator);
  const inverted = numerator[above]! < 0 !== denominator[below]! < 0;
  return 90 * (above - below) + (inverted ? 180 : 0);
}

/** Angle of P(jω) in radians, within half a turn; NaN where P vanishes or overflows. */
function angleAt(polynomial: readonly number[], omega: number): number {
  let re = 0;
  let im = 0;
  for (let power = polynomial.length - 1; power >= 0; power--) {
    const turned = polynomial[power]! - im * omega;
    im = re * omega;
    re = turned;
  }
  return re === 0 && im === 0 ? Number.NaN : Math.atan2(im, re);
}

/**
 * Unwrapped phase in degrees, one value a point: continuous in ω whatever the spacing of the points.
 * Each root contributes the angle of `1 − jω/root`, which never crosses the negative axis; their sum
 * tells the whole turns, and the polynomials themselves the rest, so that roots which coincide (and are
 * then badly determined) cost no digits.
 *
 * It starts at 0 Hz from 90° for each zero there, plus 180° where the gain is negative; a zero on the
 * axis (a perfect notch) steps by +180°. NaN throughout where the numerator is 0.
 *
 * @param out receives the degrees; as long as `omegas`.
 * @param omegas the imaginary variable, ascending: rad/s for the analogue case; above 0.
 * @throws NotchworkError `filter-invalid` as {@link polynomialRoots} does.
 */
export function phaseAtOmegas(out: Float64Array, transfer: TransferFunction, omegas: Float64Array): void {
  if (degreeOf(transfer.numerator) < 0) {
    out.fill(Number.NaN);
    return;
  }
  out.fill(0);
  accumulate(out, reciprocals(transfer.numerator), omegas, 1);
  accumulate(out, reciprocals(transfer.denominator), omegas, -1);
  const start = phaseAtOrigin(transfer);
  for (let point = 0; point < out.length; point++) {
    const omega = omegas[point]!;
    const summed = start + DEGREES * out[point]!;
    const principal = DEGREES * (angleAt(transfer.numerator, omega) - angleAt(transfer.denominator, omega));
    const exact = principal + 360 * Math.round((summed - principal) / 360);
    out[point] = Number.isNaN(exact) ? summed : exact;
  }
}
