import { describe, expect, it } from 'vitest';
import {
  compensatedComplex,
  compensatedDot,
  compensatedReal,
  differenceOfProducts,
  productError,
  sumError,
} from '../../../src/filter/compensated.ts';
import { seeded } from './polynomials.ts';

/** A double as an exact fraction `mantissa · 2^exponent`. */
function exact(value: number): { mantissa: bigint; exponent: number } {
  let exponent = 0;
  let scaled = value;
  while (!Number.isInteger(scaled)) {
    scaled *= 2;
    exponent -= 1;
  }
  return { mantissa: BigInt(scaled), exponent };
}

/** Sum of products of doubles, exactly, then rounded (the numbers here fit a shift by 2^600). */
function exactSum(terms: readonly (readonly number[])[]): number {
  const shift = 600;
  let total = 0n;
  for (const factors of terms) {
    let mantissa = 1n;
    let exponent = shift;
    for (const factor of factors) {
      const parts = exact(factor);
      mantissa *= parts.mantissa;
      exponent += parts.exponent;
    }
    total += mantissa << BigInt(exponent);
  }
  // Keep 80 leading bits: more than a double holds, so the division below rounds correctly.
  const negative = total < 0n;
  const size = negative ? -total : total;
  const surplus = Math.max(0, size.toString(2).length - 80);
  const value = Number(size >> BigInt(surplus)) * 2 ** (surplus - shift);
  return negative ? -value : value;
}

describe('error-free transformations', () => {
  const random = seeded(11);
  const draw = () => (random() - 0.5) * 10 ** (8 * random() - 4);

  it('give the rounding error of a product and of a sum exactly', () => {
    for (let round = 0; round < 200; round++) {
      const [a, b] = [draw(), draw()];
      expect(productError(a, b, a * b)).toBe(
        exactSum([
          [a, b],
          [-1, a * b],
        ]),
      );
      expect(sumError(a, b, a + b)).toBe(exactSum([[a], [b], [-1, a + b]]));
    }
  });

  it('give nothing where nothing was lost', () => {
    expect(productError(3, 0.5, 1.5)).toBe(0);
    expect(sumError(1, 2, 3)).toBe(0);
  });
});

describe('the difference of two products', () => {
  it('keeps its digits when nearly everything cancels', () => {
    const random = seeded(12);
    for (let round = 0; round < 200; round++) {
      const [a, b, c] = [1 + random(), 1 + random(), 1 + random()];
      const d = (a * b) / c; // a·b − c·d is then a rounding error
      const expected = exactSum([
        [a, b],
        [-1, c, d],
      ]);
      // Two units in the last place (Jeannerod, Louvet and Muller 2013).
      expect(Math.abs(differenceOfProducts(a, b, c, d) - expected)).toBeLessThanOrEqual(
        2 * Number.EPSILON * Math.abs(expected),
      );
    }
  });
});

describe('the compensated sum of products', () => {
  it('survives a cancellation that ruins the plain sum', () => {
    const first = [1e8, 1, -1e8];
    const second = [1e8, 1, 1e8];
    expect(compensatedDot(first, second)).toBe(1);
    expect(first.reduce((sum, value, index) => sum + value * second[index]!, 0)).toBe(0);
  });

  it('is the exact sum rounded, over random terms that cancel', () => {
    const random = seeded(13);
    for (let round = 0; round < 100; round++) {
      const first = Array.from({ length: 8 }, () => random() - 0.5);
      const second = Array.from({ length: 8 }, () => random() - 0.5);
      const expected = exactSum(first.map((value, index) => [value, second[index]!]));
      // One rounding, plus the square of it times the length: nothing for eight terms of this size.
      expect(Math.abs(compensatedDot(first, second) - expected)).toBeLessThanOrEqual(
        Number.EPSILON * Math.abs(expected),
      );
    }
  });
});

describe('compensated values of polynomials', () => {
  /** (x − 1)^7, which plain evaluation cannot tell from noise beside 1. */
  const sevenfold = [-1, 7, -21, 35, -35, 21, -7, 1];

  it('are right beside a multiple root', () => {
    const point = 1 + 2 ** -9;
    const plain = sevenfold.reduceRight((sum, value) => sum * point + value, 0);
    const expected = (2 ** -9) ** 7;
    // The condition number is about 1e21: 1e-32 of it is left, against all of it in plain doubles.
    expect(Math.abs(compensatedReal(sevenfold, 7, point) / expected - 1)).toBeLessThan(1e-9);
    expect(Math.abs(plain / expected - 1)).toBeGreaterThan(0.5);
  });

  it('equal the exact value at random points', () => {
    const random = seeded(14);
    for (let round = 0; round < 100; round++) {
      const coefficients = Array.from({ length: 5 }, () => random() - 0.5);
      const point = 2 * random() - 1;
      const expected = exactSum(
        coefficients.map((value, power) => [value, ...new Array<number>(power).fill(point)]),
      );
      const tolerance = Number.EPSILON * Math.abs(expected) + 1e-29; // 1e-29: (2n·eps)² times the sum of sizes
      expect(Math.abs(compensatedReal(coefficients, 4, point) - expected)).toBeLessThanOrEqual(tolerance);
    }
  });

  it('read no coefficient above the degree', () => {
    expect(compensatedReal([1, 2, 99], 1, 10)).toBe(21);
  });

  it('agree on the real line between the real and the complex form', () => {
    const out = new Float64Array(2);
    for (const point of [-3.7, -1, 0.999, 1.001, 4]) {
      compensatedComplex(sevenfold, 7, point, 0, out);
      expect(out[0]).toBe(compensatedReal(sevenfold, 7, point));
      expect(out[1]).toBe(0);
    }
  });

  it('are right beside a complex root', () => {
    // (1 + x²)·(3 + 4x), the point a hair off j: P = (2jδ − δ²)(3 + 4j(1 + δ)) with x = j(1 + δ).
    const delta = 2 ** -40;
    const out = new Float64Array(2);
    compensatedComplex([3, 4, 3, 4], 3, 0, 1 + delta, out);
    const scale = -2 * delta - delta * delta; // 1 + x² = 1 − (1 + δ)²
    expect(Math.abs(out[0]! / (3 * scale) - 1)).toBeLessThan(1e-15);
    expect(Math.abs(out[1]! / (4 * (1 + delta) * scale) - 1)).toBeLessThan(1e-15);
  });
});
