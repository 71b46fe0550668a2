import { describe, expect, it } from 'vitest';
import { complexRoots } from '../../../src/filter/complex-roots.ts';
import { at, product, seeded } from './polynomials.ts';

/** Largest residual, relative to the sum of the sizes of the polynomial's terms there. */
function largestResidual(coefficients: readonly number[]): number {
  const degree = coefficients.length - 1;
  const { re, im } = complexRoots(Float64Array.from(coefficients), degree);
  return Math.max(
    ...[...re.keys()].map((index) => {
      const root = { re: re[index]!, im: im[index]! };
      const value = at(coefficients, root);
      const modulus = Math.hypot(root.re, root.im);
      const size = coefficients.reduce((sum, c, power) => sum + Math.abs(c) * modulus ** power, 0);
      return Math.hypot(value.re, value.im) / size;
    }),
  );
}

describe('the general search', () => {
  it('ends where the polynomial is rounding noise, random real coefficients up to order 16', () => {
    const random = seeded(71);
    for (let round = 0; round < 300; round++) {
      const coefficients = Array.from({ length: 4 + (round % 14) }, () => random() - 0.5);
      // n roundings of a product each, in the search and again in this test's own evaluation.
      expect(largestResidual(coefficients)).toBeLessThan(16 * 4 * Number.EPSILON);
    }
  });

  it('reaches roots eight decades apart', () => {
    const coefficients = product([1, 1e4], [1, 0.3, 1], [1, -1e-4]);
    const { re } = complexRoots(Float64Array.from(coefficients), 4);
    const sorted = [...re].sort((a, b) => a - b);
    expect(sorted[3]! / 1e4).toBeCloseTo(1, 12);
    expect(sorted.some((root) => Math.abs(root / -1e-4 - 1) < 1e-12)).toBe(true);
  });

  it('passes over coefficients that are 0', () => {
    // x⁶ + x³ − 2 = (x³ − 1)(x³ + 2).
    const { re, im } = complexRoots(Float64Array.from([-2, 0, 0, 1, 0, 0, 1]), 6);
    const moduli = [...re.keys()].map((index) => Math.hypot(re[index]!, im[index]!)).sort();
    moduli.forEach((modulus, index) => {
      expect(modulus).toBeCloseTo(index < 3 ? 1 : Math.cbrt(2), 13);
    });
  });

  it('ends on a root of multiplicity 8', () => {
    const { re, im } = complexRoots(Float64Array.from(product(...new Array<number[]>(8).fill([1, 1]))), 8);
    // Rounding spreads such a root over about the eighth root of 1e-16.
    for (const index of re.keys()) expect(Math.hypot(re[index]! + 1, im[index]!)).toBeLessThan(0.05);
  });
});
