import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { degreeOf, orderAtZero, polynomialRoots } from '../../../src/filter/roots.ts';
import { product, seeded } from './polynomials.ts';

/** Relative distance of a list of real roots from the expected ones, both ascending in modulus. */
function largestError(found: readonly number[], expected: readonly number[]): number {
  expect(found).toHaveLength(expected.length);
  return Math.max(...expected.map((root, index) => Math.abs(found[index]! / root - 1)));
}

describe('degree and order at zero', () => {
  it('count exact zeros at either end only', () => {
    expect(degreeOf([0, 1, 0, 2, 0, 0])).toBe(3);
    expect(orderAtZero([0, 0, 1, 0, 2])).toBe(2);
    expect(degreeOf([0, 0])).toBe(-1);
    expect(degreeOf([])).toBe(-1);
    expect(degreeOf([1e-300])).toBe(0);
  });
});

describe('roots in closed form', () => {
  it('are none for a constant', () => {
    expect(polynomialRoots([7])).toEqual({ real: [], pairs: [] });
  });

  it('are exact for order 1', () => {
    expect(polynomialRoots([3, 2])).toEqual({ real: [-1.5], pairs: [] });
  });

  it('keep the small root of a quadratic that loses it by the school formula', () => {
    // x² + 1e8·x + 1: the roots are −1e-8 and −1e8 but for 1e-16 of themselves (Viète).
    expect(largestError(polynomialRoots([1, 1e8, 1]).real, [-1e-8, -1e8])).toBeLessThan(4e-16);
  });

  it('keep the digits of a discriminant that nearly vanishes', () => {
    // (1 + x)(1 + (1 + 2⁻²⁶)x) multiplied out without rounding.
    const tiny = 2 ** -26;
    const { real } = polynomialRoots([1, 2 + tiny, 1 + tiny]);
    expect(largestError(real, [-1 / (1 + tiny), -1])).toBeLessThan(4e-16);
  });

  it('are a pair where the discriminant is negative, of either leading sign', () => {
    expect(polynomialRoots([5, 2, 1])).toEqual({ real: [], pairs: [{ re: -1, im: 2 }] });
    expect(polynomialRoots([-5, -2, -1])).toEqual({ real: [], pairs: [{ re: -1, im: 2 }] });
    expect(polynomialRoots([4, 0, 1])).toEqual({ real: [], pairs: [{ re: 0, im: 2 }] });
  });

  it('are two real ones of opposite sign', () => {
    expect(polynomialRoots([-6, 1, 1])).toEqual({ real: [2, -3], pairs: [] });
  });

  it('are the roots of unity for x^n − 1 (de Moivre)', () => {
    for (const order of [3, 4, 5, 7, 12]) {
      const coefficients = [-1, ...new Array<number>(order - 1).fill(0), 1];
      const { real, pairs } = polynomialRoots(coefficients);
      expect(real.map((root) => Math.round(root * 1e15) / 1e15).sort()).toEqual(order % 2 ? [1] : [-1, 1]);
      const angles = pairs
        .map(({ re, im }) => (Math.atan2(im, re) * order) / (2 * Math.PI))
        .sort((a, b) => a - b);
      angles.forEach((angle, index) => {
        expect(angle).toBeCloseTo(index + 1, 13);
      });
      for (const { re, im } of pairs) expect(Math.hypot(re, im)).toBeCloseTo(1, 14);
    }
  });

  it('are the Butterworth poles on the unit circle (S. Butterworth 1930)', () => {
    // Order 5 from the factors of the handbooks: (1 + s)(1 + 0.618s + s²)(1 + 1.618s + s²).
    const golden = (1 + Math.sqrt(5)) / 2;
    const { real, pairs } = polynomialRoots(product([1, 1], [1, golden - 1, 1], [1, golden, 1]));
    expect(real[0]).toBeCloseTo(-1, 14);
    const expected = [Math.PI * 0.6, Math.PI * 0.8];
    const angles = pairs.map(({ re, im }) => Math.atan2(im, re)).sort();
    angles.forEach((angle, index) => {
      expect(angle).toBeCloseTo(expected[index]!, 13);
    });
  });
});

describe('roots at 0 and at infinity', () => {
  it('are exact zeros for coefficients missing at the low end', () => {
    expect(polynomialRoots([0, 0, 6, 5, 1]).real).toEqual([0, 0, -2, -3]);
    expect(polynomialRoots([0, 4]).real).toEqual([0]);
  });

  it('are left out for coefficients missing at the high end', () => {
    expect(polynomialRoots([6, 5, 1, 0, 0]).real).toEqual([-2, -3]);
    expect(polynomialRoots([0, 6, 5, 1, 0]).real).toEqual([0, -2, -3]);
  });
});

describe('multiple roots', () => {
  it('are real and equal for a double pole', () => {
    const { real, pairs } = polynomialRoots(product([1, 1e-3], [1, 1e-3], [1, 2e-6], [1, 0.1]));
    expect(pairs).toEqual([]);
    // A double root is determined to the square root of the rounding of the coefficients.
    expect(largestError(real, [-10, -1e3, -1e3, -5e5])).toBeLessThan(1e-7);
    // Their sum is determined much better, and that is what sections are made of.
    expect((real[1]! + real[2]!) / -2e3).toBeCloseTo(1, 13);
  });

  it.each([
    ['1, whose binomial coefficients are exact', 1],
    ['1e-4, whose coefficients are rounded', 1e-4],
  ])('do not hang, and multiply out to the coefficients again, six-fold with time constant %s', (_, tau) => {
    const coefficients = product(...new Array<number[]>(6).fill([1, tau]));
    const { real, pairs } = polynomialRoots(coefficients);
    expect(real.length + 2 * pairs.length).toBe(6);
    const again = product(
      ...real.map((root) => [1, -1 / root]),
      ...pairs.map(({ re, im }) => {
        const square = re * re + im * im;
        return [1, (-2 * re) / square, 1 / square];
      }),
    );
    again.forEach((value, power) => {
      expect(Math.abs(value / coefficients[power]! - 1)).toBeLessThan(1e-12);
    });
  });
});

describe('roots of random networks', () => {
  it('are all real, and right to 1e-13, for random real time constants over seven decades', () => {
    fc.assert(
      fc.property(
        fc.array(fc.double({ min: -8, max: -1, noNaN: true }), { minLength: 3, maxLength: 12 }),
        (exponents) => {
          exponents.sort((a, b) => b - a);
          // Neighbours at least a factor of two apart: coefficients rounded once move the roots by
          // their condition, up to about 100 roundings for twelve of them side by side.
          for (let index = 1; index < exponents.length; index++) {
            exponents[index] = Math.min(exponents[index]!, exponents[index - 1]! - Math.log10(2));
          }
          const taus = exponents.map((exponent) => 10 ** exponent);
          const { real, pairs } = polynomialRoots(product(...taus.map((tau) => [1, tau])));
          return (
            pairs.length === 0 &&
            largestError(
              real,
              taus.map((tau) => -1 / tau),
            ) < 1e-13
          );
        },
      ),
      { numRuns: 500, seed: 5 },
    );
  });

  it('follow the unit of the variable exactly, by powers of two', () => {
    const random = seeded(31);
    const coefficients = Array.from({ length: 7 }, () => random() + 0.1);
    const plain = polynomialRoots(coefficients);
    const scaled = polynomialRoots(coefficients.map((value, power) => value * 2 ** (20 * power)));
    scaled.pairs.forEach(({ re, im }, index) => {
      expect(re * 2 ** 20).toBeCloseTo(plain.pairs[index]!.re, 13);
      expect(im * 2 ** 20).toBeCloseTo(plain.pairs[index]!.im, 13);
    });
  });

  it('do not depend on a common factor of the coefficients, however large or small', () => {
    const coefficients = product([1, 0.02], [1, 3e-4], [1, 1e-6], [1, 4e-5], [1, 1e-4, 2e-8]);
    const plain = polynomialRoots(coefficients);
    for (const factor of [2 ** 300, 2 ** -300, -1]) {
      expect(polynomialRoots(coefficients.map((value) => value * factor))).toEqual(plain);
    }
  });

  it('find both sides of the axis and pairs together, 1,000 times', () => {
    const random = seeded(32);
    for (let round = 0; round < 1000; round++) {
      const reals = Array.from(
        { length: 1 + Math.floor(3 * random()) },
        () => (random() < 0.3 ? 1 : -1) * 10 ** (6 * random()),
      );
      const factors = reals.map((root) => [1, -1 / root]);
      for (let count = Math.floor(3 * random()); count >= 0; count--) {
        const omega = 10 ** (1 + 5 * random());
        factors.push([1, (2 * random() - 0.4) / omega, 1 / omega ** 2]);
      }
      const coefficients = product(...factors);
      const found = polynomialRoots(coefficients);
      const again = product(
        ...found.real.map((root) => [1, -1 / root]),
        ...found.pairs.map(({ re, im }) => [1, (-2 * re) / (re * re + im * im), 1 / (re * re + im * im)]),
      );
      // Compared where all terms of the polynomial have their say: relative to the sum of their sizes.
      for (const omega of [1e2, 1e4, 1e6]) {
        const size = coefficients.reduce((sum, value, power) => sum + Math.abs(value) * omega ** power, 0);
        const difference = coefficients.reduce(
          (sum, value, power) => sum + Math.abs(value - again[power]!) * omega ** power,
          0,
        );
        expect(difference / size).toBeLessThan(1e-13);
      }
    }
  });
});
