import { describe, expect, it } from 'vitest';
import { polishRoots } from '../../../src/filter/polish-roots.ts';
import { product } from './polynomials.ts';

const refine = (
  coefficients: readonly number[],
  singles: number[],
  couples: { middle: number; spread: number }[],
) => polishRoots(Float64Array.from(coefficients), coefficients.length - 1, { singles, couples });

describe('refining roots', () => {
  it('brings single roots and a pair to the last digits', () => {
    const { singles, couples } = refine(
      product([2, 1], [30, 1], [25, 6, 1]),
      [-2.01, -29.8],
      [{ middle: -3.02, spread: -16.1 }],
    );
    expect(singles[0]).toBeCloseTo(-2, 14);
    expect(singles[1]).toBeCloseTo(-30, 13);
    expect(couples[0]!.middle).toBeCloseTo(-3, 14);
    expect(couples[0]!.spread).toBeCloseTo(-16, 13);
  });

  it('lets a couple taken for real roots become a pair', () => {
    const { couples } = refine(product([1, 1], [25 + 1e-6, 10, 1]), [-1], [{ middle: -5.001, spread: 1e-5 }]);
    expect(couples[0]!.middle).toBeCloseTo(-5, 12);
    expect(couples[0]!.spread / -1e-6).toBeCloseTo(1, 7); // 25 + 1e-6 is itself rounded at 4e-15
  });

  it('lets a couple taken for a pair become two real roots', () => {
    const { couples } = refine(
      product([1, 1], [25 - 1e-6, 10, 1]),
      [-1],
      [{ middle: -4.999, spread: -1e-5 }],
    );
    expect(couples[0]!.middle).toBeCloseTo(-5, 12);
    expect(couples[0]!.spread / 1e-6).toBeCloseTo(1, 7);
  });

  it('parts two roots put in the same place', () => {
    const { couples } = refine(product([1, 1], [24.75, 10, 1]), [-1], [{ middle: -5, spread: 0 }]);
    expect(couples[0]!.spread).toBeCloseTo(0.25, 13);
  });

  it('holds a double root together without dividing by zero', () => {
    const { couples } = refine(product([1, 1], [25, 10, 1]), [-1.1], [{ middle: -5.01, spread: 0 }]);
    expect(couples[0]!.middle).toBeCloseTo(-5, 12);
    expect(Math.abs(couples[0]!.spread)).toBeLessThan(1e-10);
  });
});
