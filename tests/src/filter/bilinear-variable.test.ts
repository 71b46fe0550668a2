import { describe, expect, it } from 'vitest';
import { bilinearTable, toBilinearVariable } from '../../../src/filter/bilinear-variable.ts';
import { at, over, product, relativeError, times } from './polynomials.ts';

describe('the table of the substitution', () => {
  it('holds the products (1 − w)^j (1 + w)^(n − j)', () => {
    for (const order of [0, 1, 2, 3, 7]) {
      const table = bilinearTable(order);
      for (let minus = 0; minus <= order; minus++) {
        const factors = Array.from({ length: order }, (_, index) => (index < minus ? [1, -1] : [1, 1]));
        expect(table.map((row) => row[minus]! + 0)).toEqual(product(...factors));
      }
    }
  });

  it('is its own inverse but for 2^n', () => {
    const table = bilinearTable(3);
    const square = table.map((row) =>
      row.map((_, column) => row.reduce((sum, value, index) => sum + value * table[index]![column]!, 0)),
    );
    square.forEach((row, index) => {
      row.forEach((value, column) => {
        expect(value).toBe(index === column ? 8 : 0);
      });
    });
  });
});

describe('a polynomial in the bilinear variable', () => {
  it('has the value of the polynomial in z⁻¹ times (1 + w)^n', () => {
    const coefficients = [1, -1.7, 0.9, -0.1];
    const transformed = toBilinearVariable(coefficients);
    for (const w of [
      { re: 0.3, im: 0.2 },
      { re: -0.5, im: 4 },
      { re: 0, im: 0.01 },
    ]) {
      const onePlus = { re: 1 + w.re, im: w.im };
      const delay = over({ re: 1 - w.re, im: -w.im }, onePlus);
      const expected = times(at(coefficients, delay), times(onePlus, times(onePlus, onePlus)));
      expect(relativeError(at(transformed, w), expected)).toBeLessThan(1e-14); // some ten roundings
    }
  });

  it('keeps its digits when nearly everything cancels, as with three poles near z = 1', () => {
    const coefficients = product([1, -0.9999], [1, -0.9997], [1, -0.9991]);
    const unit = 2 ** 60; // all these doubles are whole multiples of 2⁻⁶⁰
    const exact = bilinearTable(3).map((row) => {
      const sum = row.reduce(
        (total, weight, index) => total + BigInt(weight) * BigInt(coefficients[index]! * unit),
        0n,
      );
      return Number(sum) / unit;
    });
    toBilinearVariable(coefficients).forEach((value, power) => {
      expect(value).toBe(exact[power]);
    });
    // The value at z = 1 is 2.7e-11: of the plain sum's digits five would be left.
    expect(exact[0]).toBeGreaterThan(2e-11);
    expect(exact[0]).toBeLessThan(4e-11);
  });
});
