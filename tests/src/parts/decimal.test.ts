import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { decimalOf, fromDigits } from '../../../src/parts/decimal.ts';

describe('decimal digits', () => {
  it.each([
    [4.7e-9, '47', -9],
    [1, '1', 0],
    [1e6, '1', 6],
    [5904, '5904', 3],
    [0.1 + 0.2, '30000000000000004', -1],
  ])('of %s are %s', (value, digits, exponent) => {
    expect(decimalOf(value)).toEqual({ digits, exponent });
  });

  it('give the number back to the last bit', () => {
    fc.assert(
      fc.property(fc.double({ min: Number.MIN_VALUE, max: Number.MAX_VALUE, noNaN: true }), (value) => {
        const { digits, exponent } = decimalOf(value);
        expect(fromDigits(digits, exponent - digits.length + 1)).toBe(value);
        expect(digits).toMatch(/^[1-9]\d*$/);
      }),
    );
  });

  it('are worth exactly what somebody would type', () => {
    expect([fromDigits('47', -10), fromDigits('22', -9), fromDigits('100', -12)]).toEqual([
      4.7e-9, 22e-9, 1e-10,
    ]);
  });
});
