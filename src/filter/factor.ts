import { NotchworkError } from '../errors.ts';
import type { TransferFunction } from '../transfer-function.ts';
import type { Complex } from './complex.ts';
import { isHurwitz } from './hurwitz.ts';
import { pairRoots } from './pairing.ts';
import { degreeOf, orderAtZero, polynomialRoots } from './roots.ts';
import type { AnalogueSection } from './section.ts';

const HIGHEST_ORDER = 3;

/** A transfer function that passes nothing. */
const SILENCE: AnalogueSection = { numerator: [0], denominator: [1] };

function unstable(): NotchworkError {
  return new NotchworkError(
    'filter-unstable',
    'The circuit is unstable: it has a pole in the right half-plane or on the imaginary axis, so it would oscillate or run away by itself. Reduce its gain or feedback.',
  );
}

function assertFinite(coefficients: readonly number[]): void {
  const bad = coefficients.findIndex((value) => !Number.isFinite(value));
  if (bad >= 0) {
    throw new NotchworkError(
      'filter-invalid',
      `Coefficient ${bad} of a transfer function is ${coefficients[bad]}; every one must be a finite number.`,
    );
  }
}

/** Multiplies a polynomial of order 3 or less, in place, by `constant + linear·s + square·s²`. */
function multiply(product: number[], constant: number, linear: number, square: number): void {
  for (let power = product.length - 1; power >= 0; power--) {
    product[power] =
      product[power]! * constant +
      (power > 0 ? product[power - 1]! * linear : 0) +
      (power > 1 ? product[power - 2]! * square : 0);
  }
}

/** `Π(1 − s/root)`, a root at 0 giving the factor s; ascending powers. */
function expand(real: readonly number[], pairs: readonly Complex[]): number[] {
  const product = [1];
  for (let count = real.length + 2 * pairs.length; count > 0; count--) product.push(0);
  for (const root of real) {
    if (root === 0) multiply(product, 0, 1, 0);
    else multiply(product, 1, -1 / root, 0);
  }
  for (const { re, im } of pairs) {
    const square = 1 / (re * re + im * im);
    multiply(product, 1, -2 * re * square, square);
  }
  return product;
}

/** Squared magnitude of a polynomial of order 3 or less at `jω`. */
function power(polynomial: readonly number[], omegaSquared: number): number {
  const length = polynomial.length;
  let even = polynomial[0]!;
  let odd = length > 1 ? polynomial[1]! : 0;
  if (length > 2) even -= polynomial[2]! * omegaSquared;
  if (length > 3) odd -= polynomial[3]! * omegaSquared;
  return even * even + omegaSquared * odd * odd;
}

/** Largest gain of a section at 0, at infinity and at the moduli of all poles: near enough to its peak. */
function peakOf(
  numerator: readonly number[],
  denominator: readonly number[],
  cornersSquared: readonly number[],
): number {
  let peak = (numerator[0]! / denominator[0]!) ** 2;
  const top = denominator.length - 1;
  if (numerator.length > top) peak = Math.max(peak, (numerator[top]! / denominator[top]!) ** 2);
  for (const omegaSquared of cornersSquared) {
    const gain = power(numerator, omegaSquared) / power(denominator, omegaSquared);
    if (gain > peak) peak = gain;
  }
  return Math.sqrt(peak);
}

function factorLong(
  numerator: readonly number[],
  denominator: readonly number[],
): readonly AnalogueSection[] {
  const poles = polynomialRoots(denominator);
  if (poles.real.some((pole) => !(pole < 0)) || poles.pairs.some(({ re }) => !(re < 0))) throw unstable();
  const groups = pairRoots(poles, polynomialRoots(numerator));
  const cornersSquared: number[] = [];
  for (const pole of poles.real) cornersSquared.push(pole * pole);
  for (const { re, im } of poles.pairs) cornersSquared.push(re * re + im * im);
  let gain = numerator[orderAtZero(numerator)]! / denominator[0]!;
  const parts = groups.map((group) => {
    const above = expand(group.zeros.real, group.zeros.pairs);
    const below = expand(group.poles.real, group.poles.pairs);
    const peak = peakOf(above, below, cornersSquared);
    gain *= peak;
    return { above, below, peak };
  });
  // Every section peaks at the same level; the first carries the sign.
  const share = Math.abs(gain) ** (1 / parts.length);
  return parts.map(({ above, below, peak }, index) => {
    const level = ((index === 0 ? Math.sign(gain) : 1) * share) / peak;
    return { numerator: above.map((value) => value * level), denominator: below };
  });
}

/**
 * A transfer function as a cascade of sections of order 3 or less, as few as possible, whose product
 * it is to about 1e-12. One of order 3 or less is one section, its coefficients as they stand. In a
 * longer one every zero goes with a pole near it and every section peaks at the same level, so that
 * no signal between two sections is much larger or smaller than it must be.
 *
 * A numerator that is all 0 (a volume control at its stop) gives one section that passes nothing.
 *
 * @throws NotchworkError `filter-unstable` for a pole in the right half-plane or on the axis;
 *   `filter-invalid` for coefficients that are not finite, a denominator that is all 0, or a numerator
 *   of higher order than the denominator.
 */
export function factor(transfer: TransferFunction): readonly AnalogueSection[] {
  assertFinite(transfer.numerator);
  assertFinite(transfer.denominator);
  const above = degreeOf(transfer.numerator);
  const below = degreeOf(transfer.denominator);
  if (below < 0) {
    throw new NotchworkError(
      'filter-invalid',
      'The denominator of a transfer function is 0 throughout; it has no value.',
    );
  }
  if (above < 0) return [SILENCE];
  const common = Math.min(orderAtZero(transfer.numerator), orderAtZero(transfer.denominator));
  const numerator = transfer.numerator.slice(common, above + 1);
  const denominator = transfer.denominator.slice(common, below + 1);
  if (above > below) {
    throw new NotchworkError(
      'filter-invalid',
      'The gain of the circuit rises without limit towards high frequencies, which no digital filter can follow. Add the stray capacitance or series resistance that a real circuit has.',
    );
  }
  if (below - common > HIGHEST_ORDER) return factorLong(numerator, denominator);
  if (!isHurwitz(denominator)) throw unstable();
  return [{ numerator, denominator }];
}
