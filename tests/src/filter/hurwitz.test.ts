import { describe, expect, it } from 'vitest';
import { isHurwitz } from '../../../src/filter/hurwitz.ts';
import { polynomialRoots } from '../../../src/filter/roots.ts';
import { product, seeded } from './polynomials.ts';

describe('Hurwitz polynomials', () => {
  it.each([
    ['a constant has no roots', [5]],
    ['a real root on the left', [2, 1]],
    ['the same with the other sign throughout', [-2, -1]],
    ['a damped pair', [1, 0.01, 1]],
    ['Butterworth of order 3 (any filter handbook)', [1, 2, 2, 1]],
    [
      'Butterworth of order 4 (any filter handbook)',
      [1, 2.6131259297527532, 3.414213562373095, 2.6131259297527532, 1],
    ],
    ['order 3 just on the safe side of c1·c2 = c0·c3', [1, 1, 1 + 1e-15, 1]],
  ])('%s', (_, coefficients) => {
    expect(isHurwitz(coefficients)).toBe(true);
  });

  it.each([
    ['a root at 0', [0, 1]],
    ['a real root on the right', [-2, 1]],
    ['a pair on the axis', [1, 0, 1]],
    ['a pair on the right', [1, -0.01, 1]],
    ['order 3 exactly on the edge: (1 + s)(1 + s²)', [1, 1, 1, 1]],
    ['order 3 just beyond the edge', [1 + 1e-15, 1, 1, 1]],
    // E. J. Routh's own kind of example: all coefficients positive, two roots on the right.
    ['all coefficients positive, yet unstable', [24, 2, 3, 1, 1]],
    ['a pair on the axis in order 4', product([1, 0, 1], [1, 1], [1, 2])],
    ['a coefficient that is not a number', [1, Number.NaN, 1]],
  ])('not %s', (_, coefficients) => {
    expect(isHurwitz(coefficients)).toBe(false);
  });

  it('agrees with the roots for 2,000 random polynomials of order 3 to 9', () => {
    const random = seeded(21);
    let stable = 0;
    for (let round = 0; round < 2000; round++) {
      const pairs = 1 + Math.floor(random() * 3);
      const reals = 1 + Math.floor(random() * 3);
      const factors: number[][] = [];
      for (let count = 0; count < reals; count++) factors.push([1, 10 ** (2 * random())]);
      for (let count = 0; count < pairs; count++) {
        // About one pair in six lies on the right.
        factors.push([1, random() - 0.15, 10 ** (2 * random() - 1)]);
      }
      const coefficients = product(...factors);
      const { real, pairs: found } = polynomialRoots(coefficients);
      const expected = real.every((root) => root < 0) && found.every(({ re }) => re < 0);
      expect(isHurwitz(coefficients)).toBe(expected);
      if (expected) stable += 1;
    }
    expect(stable).toBeGreaterThan(500);
    expect(stable).toBeLessThan(1800);
  });
});
