import { NotchworkError } from '../errors.ts';

/** Steps after which the search gives up; bisection alone needs fewer than 1,100 over all doubles. */
const MOST_STEPS = 2000;

/**
 * A root of a continuous function between two places where its signs differ, to the last digits:
 * within `4·ε·|root|`, or where the function is exactly 0.
 *
 * Brent's method (R. P. Brent, Algorithms for Minimization without Derivatives, 1973, chapter 4):
 * inverse quadratic interpolation, or the secant, where it converges, else bisection; never slower
 * than bisection by more than a constant power. Special cases: an end that is a root is returned.
 *
 * @throws NotchworkError `circuit-unsolvable` where the signs at the ends do not differ (NaN included).
 */
export function bracketedRoot(evaluate: (place: number) => number, from: number, to: number): number {
  let a = from;
  let b = to;
  let fa = evaluate(a);
  let fb = evaluate(b);
  if (fa === 0) return a;
  if (fb === 0) return b;
  if (!(fa > 0 !== fb > 0 && fa * 0 === 0 && fb * 0 === 0)) {
    throw new NotchworkError(
      'circuit-unsolvable',
      `No solution is bracketed: at ${from} the residue is ${fa}, at ${to} it is ${fb}.`,
    );
  }
  // b is the best estimate, a the one before, c the far end of the bracket.
  let c = a;
  let fc = fa;
  let step = b - a;
  let before = step;
  for (let count = 0; count < MOST_STEPS; count += 1) {
    if (fb > 0 === fc > 0) {
      c = a;
      fc = fa;
      step = b - a;
      before = step;
    }
    if (Math.abs(fc) < Math.abs(fb)) {
      [a, b, c] = [b, c, b];
      [fa, fb, fc] = [fb, fc, fb];
    }
    const tolerance = 2 * Number.EPSILON * Math.abs(b);
    const half = (c - b) / 2;
    if (Math.abs(half) <= tolerance || fb === 0) return b;
    if (Math.abs(before) < tolerance || Math.abs(fa) <= Math.abs(fb)) {
      step = half;
      before = half;
    } else {
      const { p, q } = interpolation([a, b, c], [fa, fb, fc]);
      const isInside = 2 * p < 3 * half * q - Math.abs(tolerance * q);
      const isShrinking = p < Math.abs((before * q) / 2);
      before = isInside && isShrinking ? step : half;
      step = isInside && isShrinking ? p / q : half;
    }
    a = b;
    fa = fb;
    b += Math.abs(step) > tolerance ? step : Math.sign(half) * Math.max(tolerance, Number.MIN_VALUE);
    fb = evaluate(b);
  }
  throw new NotchworkError('circuit-unsolvable', `The search between ${from} and ${to} did not settle.`);
}

/** Step `p/q` from b to where the interpolated curve is 0, with `p` made positive. */
function interpolation(
  [a, b, c]: readonly [number, number, number],
  [fa, fb, fc]: readonly [number, number, number],
): { p: number; q: number } {
  const s = fb / fa;
  let p: number;
  let q: number;
  if (a === c) {
    p = (c - b) * s;
    q = 1 - s;
  } else {
    const t = fa / fc;
    const r = fb / fc;
    p = s * ((c - b) * t * (t - r) - (b - a) * (r - 1));
    q = (t - 1) * (r - 1) * (s - 1);
  }
  return p > 0 ? { p, q: -q } : { p: -p, q };
}
