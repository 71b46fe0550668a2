import { describe, expect, it } from 'vitest';
import { realRoots } from '../../../src/filter/real-roots.ts';
import { product, seeded } from './polynomials.ts';

const search = (coefficients: readonly number[]) =>
  realRoots(Float64Array.from(coefficients), coefficients.length - 1);

describe('the search on the real line', () => {
  it('finds roots that stand apart, ascending in modulus', () => {
    const roots = search(product([1, 1], [3, 1], [20, 1], [400, 1]));
    expect([...roots!].map((root) => Math.round(root))).toEqual([-1, -3, -20, -400]);
    for (const [index, root] of [-1, -3, -20, -400].entries()) {
      expect(Math.abs(roots![index]! / root - 1)).toBeLessThan(1e-15);
    }
  });

  it('does so for the other sign of all coefficients', () => {
    expect(search([-6, -11, -6, -1])).toEqual(search([6, 11, 6, 1]));
  });

  it('succeeds on nearly every polynomial with negative roots that stand apart', () => {
    const random = seeded(61);
    let found = 0;
    for (let round = 0; round < 500; round++) {
      let root = 10 ** (-4 * random());
      const factors = Array.from({ length: 3 + (round % 6) }, () => {
        root *= 1.5 + 10 * random();
        return [root, 1];
      });
      if (search(product(...factors)) !== undefined) found += 1;
    }
    // Where it gives up the general search takes over; that costs time, so it must be rare.
    expect(found).toBeGreaterThanOrEqual(495);
  });

  it.each([
    ['roots on both sides', [-6, 1, 4, 1]],
    ['a coefficient of 0', [1, 0, 3, 1]],
    ['a conjugate pair, betrayed by Newton’s inequalities', product([1, 1, 1], [1, 2])],
    ['a conjugate pair that the inequalities let pass', product([1, 1.99, 1], [1, 1e-3], [1, 1e3])],
    ['a double root', product([1, 1], [1, 1], [1, 30])],
    ['roots in a cluster', product([1, 1], [1, 1.00001], [1, 30])],
  ])('leaves %s to the general search', (_, coefficients) => {
    expect(search(coefficients)).toBeUndefined();
  });
});
