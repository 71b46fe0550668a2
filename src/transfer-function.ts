import type { RadiansPerSecond } from './units.ts';

/**
 * A rational transfer function of the complex frequency `s` (rad/s).
 *
 * Both arrays hold real coefficients in ascending powers of `s`: `numerator[k]` multiplies `s^k`.
 * The lengths may differ; `denominator` has at least one coefficient that is not zero.
 */
export interface TransferFunction {
  readonly numerator: readonly number[];
  readonly denominator: readonly number[];
}

/** Magnitude `|H(jω)|` at one angular frequency (rad/s), by Horner's rule on `jω`; Infinity on a pole. */
export function magnitudeAt(transfer: TransferFunction, omega: RadiansPerSecond): number {
  return polynomialSize(transfer.numerator, omega) / polynomialSize(transfer.denominator, omega);
}

function polynomialSize(coefficients: readonly number[], omega: number): number {
  let real = 0;
  let imaginary = 0;
  for (let power = coefficients.length - 1; power >= 0; power -= 1) {
    [real, imaginary] = [coefficients[power]! - omega * imaginary, omega * real];
  }
  return Math.hypot(real, imaginary);
}
