import { compensatedReal } from './compensated.ts';

const MOST_ITERATIONS = 24; // well-separated roots take three to six; a cluster is left to the complex search
const SETTLED = 1e-5; // relative; the iteration is of third order, so the step after this one is rounding
const CLUSTER = 1e-4; // relative gap under which two roots need the treatment of a couple
const MOST_POLISHING = 4;
const ROUNDING = 2 * Number.EPSILON;

/**
 * Whether the coefficients allow that all roots are real and negative: all of one sign, and
 * `c[k]² ≥ (1 + 1/k)(1 + 1/(n−k))·c[k−1]·c[k+1]` (Newton's inequalities). Necessary, not sufficient.
 */
function mayBeRealRooted(coefficients: Float64Array, degree: number): boolean {
  const slack = 1 - 1e-12; // equality holds for a multiple root, whose coefficients are rounded
  for (let power = 0; power <= degree; power++) {
    if (!(coefficients[power]! * coefficients[0]! > 0)) return false;
  }
  for (let power = 1; power < degree; power++) {
    const factor = (1 + 1 / power) * (1 + 1 / (degree - power)) * slack;
    const neighbours = coefficients[power - 1]! * coefficients[power + 1]!;
    if (coefficients[power]! ** 2 < factor * neighbours) return false;
  }
  return true;
}

/** One sweep of the Ehrlich–Aberth iteration on the real line; the largest relative step taken. */
function sweep(coefficients: Float64Array, degree: number, roots: number[]): number {
  let largest = 0;
  for (let index = 0; index < degree; index++) {
    const root = roots[index]!;
    let value = coefficients[degree]!;
    let slope = 0;
    for (let power = degree - 1; power >= 0; power--) {
      slope = slope * root + value;
      value = value * root + coefficients[power]!;
    }
    if (value === 0) continue;
    let repulsion = 0;
    for (let other = 0; other < degree; other++) {
      if (other !== index) repulsion += 1 / (root - roots[other]!);
    }
    const step = 1 / (slope / value - repulsion);
    roots[index] = root - step;
    const relative = Math.abs(step / root);
    if (!(relative <= largest)) largest = relative;
  }
  return largest;
}

/** One Weierstrass correction with compensated values; the largest relative step taken. */
function polish(coefficients: Float64Array, degree: number, roots: number[]): number {
  let largest = 0;
  for (let index = 0; index < degree; index++) {
    const root = roots[index]!;
    let product = coefficients[degree]!;
    for (let other = 0; other < degree; other++) {
      if (other !== index) product *= root - roots[other]!;
    }
    const step = compensatedReal(coefficients, degree, root) / product;
    roots[index] = root - step;
    const relative = Math.abs(step / root);
    if (!(relative <= largest)) largest = relative;
  }
  return largest;
}

function wellApart(roots: readonly number[]): boolean {
  for (let index = 1; index < roots.length; index++) {
    if (!(roots[index]! < roots[index - 1]! * (1 + CLUSTER))) return false;
  }
  return (roots[0] ?? -1) < 0;
}

/**
 * The roots of a polynomial all of whose roots are real, negative and apart, ascending in modulus, to
 * the last digit or so; `undefined` if it is not such a polynomial (the general search then takes over).
 *
 * Ehrlich–Aberth iteration in real arithmetic from `−c[k−1]/c[k]`, which Newton's inequalities keep in
 * order, then Weierstrass corrections with compensated values (O. Aberth, Math. Comp. 27, 1973).
 *
 * @param coefficients ascending powers, neither end zero, scaled so that powers neither overflow nor vanish.
 */
export function realRoots(coefficients: Float64Array, degree: number): number[] | undefined {
  if (!mayBeRealRooted(coefficients, degree)) return undefined;
  const roots: number[] = [];
  for (let power = 1; power <= degree; power++) {
    roots.push(-coefficients[power - 1]! / coefficients[power]!);
  }
  let iteration = 0;
  let step = Number.POSITIVE_INFINITY;
  while (!(step <= SETTLED)) {
    if (iteration++ === MOST_ITERATIONS) return undefined;
    step = sweep(coefficients, degree, roots);
  }
  if (!wellApart(roots)) return undefined;
  for (let round = 0; round < MOST_POLISHING; round++) {
    if (polish(coefficients, degree, roots) <= ROUNDING * degree) return roots;
  }
  return undefined;
}
