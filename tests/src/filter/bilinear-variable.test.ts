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

  it('keeps the sum of coefficients that all but cancel: the value at z = 1', () => {
    // Coefficients on the grid of doubles whose sum is 2⁻⁵² exactly.
    const coefficients = [1, -3 + 2 ** -51, 3, -1 - 2 ** -52];
    expect(toBilinearVariable(coefficients)[0]).toBe(2 ** -52);
  });
});
