import { NotchworkError } from '../errors.ts';
import { differenceOfProducts } from './compensated.ts';
import type { Complex } from './complex.ts';
import { complexRoots } from './complex-roots.ts';
import { mergeMultipleRoots } from './multiple-roots.ts';
import { polishRoots } from './polish-roots.ts';
import { realRoots } from './real-roots.ts';
import { type Couple, type RootStructure, structureOf } from './root-structure.ts';

/** Roots of a real polynomial; exact zeros among them, roots at infinity left out. */
export interface PolynomialRoots {
  /** Real roots, ascending in modulus; a root of multiplicity m stands m times. */
  readonly real: readonly number[];
  /** One of each conjugate pair, the one with `im > 0`, ascending in modulus. */
  readonly pairs: readonly Complex[];
}

/**
 * A couple whose imaginary part is under this, squared and relative, is a double real root: that
 * changes the coefficients by less than the rounding they came with, and an RC network has no others.
 */
const REAL_ENOUGH = 64 * Number.EPSILON;

const NO_ROOTS: PolynomialRoots = { real: [], pairs: [] };

/** Index of the highest coefficient that is not exactly 0; −1 for the zero polynomial. */
export function degreeOf(coefficients: ArrayLike<number>): number {
  let degree = coefficients.length - 1;
  while (degree >= 0 && coefficients[degree] === 0) degree -= 1;
  return degree;
}

/** How many powers of the variable divide the polynomial: its coefficients that are exactly 0 at the low end. */
export function orderAtZero(coefficients: ArrayLike<number>): number {
  let order = 0;
  while (order < coefficients.length - 1 && coefficients[order] === 0) order += 1;
  return order;
}

/** The two roots of `constant + linear·x + square·x²`, as a couple. */
function quadratic(constant: number, linear: number, square: number): RootStructure {
  const half = linear / 2;
  const discriminant = differenceOfProducts(half, half, square, constant);
  if (discriminant < 0) {
    return {
      singles: [],
      couples: [{ middle: (0 - half) / square, spread: discriminant / square / square }],
    };
  }
  // The larger root first and the smaller from the product: no cancellation.
  const sum = -(half + (half < 0 ? -1 : 1) * Math.sqrt(discriminant));
  return { singles: [sum / square, constant / sum], couples: [] };
}

function structureOfScaled(coefficients: Float64Array, degree: number): RootStructure {
  if (degree === 1) return { singles: [-coefficients[0]! / coefficients[1]!], couples: [] };
  if (degree === 2) return quadratic(coefficients[0]!, coefficients[1]!, coefficients[2]!);
  const real = realRoots(coefficients, degree);
  if (real !== undefined) return { singles: real, couples: [] };
  const rough = structureOf(complexRoots(coefficients, degree));
  return mergeMultipleRoots(coefficients, polishRoots(coefficients, degree, rough));
}

function split({ middle, spread }: Couple, real: number[], pairs: Complex[], unit: number): void {
  const half = Math.sqrt(Math.abs(spread));
  if (-spread > REAL_ENOUGH * middle ** 2) pairs.push({ re: middle * unit, im: half * unit });
  else if (spread <= 0) real.push(middle * unit, middle * unit);
  else real.push((middle + half) * unit, (middle - half) * unit);
}

function assertUsable(coefficients: ArrayLike<number>, degree: number): void {
  for (let power = 0; power <= degree; power++) {
    if (!Number.isFinite(coefficients[power])) {
      throw new NotchworkError(
        'filter-invalid',
        `Coefficient ${power} of a polynomial is ${coefficients[power]}; every one must be a finite number.`,
      );
    }
  }
  if (degree < 0) {
    throw new NotchworkError('filter-invalid', 'A polynomial whose coefficients are all 0 has no roots.');
  }
}

function isAscending(roots: readonly number[]): boolean {
  for (let index = 1; index < roots.length; index++) {
    if (!(Math.abs(roots[index]!) >= Math.abs(roots[index - 1]!))) return false;
  }
  return true;
}

function assertFound(real: readonly number[], pairs: readonly Complex[], degree: number): void {
  let sum = 0;
  for (const root of real) sum += root * 0;
  for (const { re, im } of pairs) sum += re * 0 + im * 0;
  if (sum !== 0) {
    // 0 times anything finite is 0; times infinity or NaN it is NaN.
    throw new NotchworkError(
      'filter-invalid',
      `The coefficients of a polynomial of degree ${degree} lie too far apart in size to find its roots.`,
    );
  }
}

/**
 * The coefficients between the lowest and the highest that is not 0, with the variable measured in
 * `unit` (a power of two near the roots' geometric mean) and the lowest near 1: all exact shifts.
 */
function rescale(coefficients: ArrayLike<number>, low: number, high: number, unit: number): Float64Array {
  const scaled = new Float64Array(high - low + 1);
  let shift = 2 ** -Math.floor(Math.log2(Math.abs(coefficients[low]!)));
  for (let power = low; power <= high; power++) {
    scaled[power - low] = coefficients[power]! * shift;
    shift *= unit;
  }
  return scaled;
}

/**
 * Roots of the real polynomial `Σ coefficients[k]·x^k`. Where the roots stand apart they are good to
 * about 1e-15 of their modulus, whatever decades they span; roots that nearly meet are as good as
 * the coefficients determine them, and their quadratic keeps its digits.
 *
 * Coefficients that are exactly 0 at the low end give roots at exactly 0; at the high end they lower
 * the degree (a root at infinity).
 *
 * @param coefficients ascending powers, at least one not 0; made for degrees up to about 20.
 * @throws NotchworkError `filter-invalid` for coefficients that are not finite, all 0, or too far
 *   apart in size for double precision.
 */
export function polynomialRoots(coefficients: ArrayLike<number>): PolynomialRoots {
  const high = degreeOf(coefficients);
  assertUsable(coefficients, high);
  const low = orderAtZero(coefficients);
  const degree = high - low;
  if (degree === 0) return low === 0 ? NO_ROOTS : { real: new Array<number>(low).fill(0), pairs: [] };
  const decline = Math.log2(Math.abs(coefficients[low]!)) - Math.log2(Math.abs(coefficients[high]!));
  const unit = 2 ** Math.round(decline / degree);
  const { singles, couples } = structureOfScaled(rescale(coefficients, low, high, unit), degree);
  const real: number[] = [];
  const pairs: Complex[] = [];
  for (let count = 0; count < low; count++) real.push(0);
  for (const root of singles) real.push(root * unit);
  for (const couple of couples) split(couple, real, pairs, unit);
  // Those of the search on the real line come in order already.
  if (!isAscending(real)) real.sort((a, b) => Math.abs(a) - Math.abs(b));
  if (pairs.length > 1) pairs.sort((a, b) => Math.hypot(a.re, a.im) - Math.hypot(b.re, b.im));
  assertFound(real, pairs, degree);
  return { real, pairs };
}
