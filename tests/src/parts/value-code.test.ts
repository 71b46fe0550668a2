import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { next, SERIES_NAMES } from '../../../src/parts/series.ts';
import { figureCode, letterCode, readFigureCode, readLetterCode } from '../../../src/parts/value-code.ts';

/** A preferred value of any series, 1 pF to 10 mF or 0.1 Ω to 100 GΩ. */
const anyCapacitance = fc
  .tuple(fc.constantFrom(...SERIES_NAMES), fc.double({ min: -11.9, max: -2.1, noNaN: true }))
  .map(([series, power]) => next(10 ** power, series, 0));
const anyResistance = fc
  .tuple(fc.constantFrom(...SERIES_NAMES), fc.double({ min: -0.9, max: 10.9, noNaN: true }))
  .map(([series, power]) => next(10 ** power, series, 0));

describe('letter codes', () => {
  it('of every preferred value are read back as the same value', () => {
    fc.assert(fc.property(anyCapacitance, (value) => readLetterCode(letterCode(value, 'F')!, 'F') === value));
    fc.assert(fc.property(anyResistance, (value) => readLetterCode(letterCode(value, 'Ω')!, 'Ω') === value));
  });

  it('have three to five characters and one letter', () => {
    fc.assert(
      fc.property(anyResistance, (value) => {
        expect(letterCode(value, 'Ω')).toMatch(/^(?=.{3,5}$)\d*[RKMGT]\d*$/);
      }),
    );
  });

  it('any code that can be read is written back with the same value', () => {
    const digit = fc.constantFrom(...'0123456789');
    const code = fc
      .tuple(
        fc.string({ unit: digit, maxLength: 3 }),
        fc.constantFrom('p', 'n', 'µ', 'm'),
        fc.string({ unit: digit, maxLength: 2 }),
      )
      .filter(([whole, , rest]) => Number(whole + rest) > 0 && whole.length + rest.length < 5)
      .map((parts) => parts.join(''));
    fc.assert(
      fc.property(code, (text) => {
        const value = readLetterCode(text, 'F');
        // Codes longer than the shortest (000p1) have a shorter one, or none that fits (p001 fits).
        const again = letterCode(value, 'F');
        if (again !== undefined) expect(readLetterCode(again, 'F')).toBe(value);
        else expect(value).toBeLessThan(1e-12);
      }),
    );
  });

  it.each([
    ['4k7', 'Ω', 4700],
    ['4r7', 'Ω', 4.7],
    ['1u0', 'F', 1e-6],
    ['1\u03bc0', 'F', 1e-6],
    ['0R0', 'Ω', 0],
    ['0R', 'Ω', 0],
  ] as const)('%s is read as people also type it', (code, unit, value) => {
    expect(readLetterCode(code, unit)).toBe(value);
  });

  it('of small values keep their noughts', () => {
    expect([letterCode(0.022, 'Ω'), letterCode(0.01, 'Ω'), letterCode(0.05e-12, 'F')]).toEqual([
      'R022',
      'R01',
      'p05',
    ]);
  });

  it('have a link for 0 Ω, and nothing for 0 F', () => {
    expect([letterCode(0, 'Ω'), letterCode(0, 'F')]).toEqual(['0R0', undefined]);
  });

  it.each([-1, Number.NaN, Number.POSITIVE_INFINITY, 12345, 4.70001, 1e-7, 1e18])(
    'do not exist for %s Ω',
    (value) => {
      expect(letterCode(value, 'Ω')).toBeUndefined();
    },
  );
});

describe('figure codes', () => {
  it('are read back as the same value wherever there is one', () => {
    let written = 0;
    const check = (value: number, unit: 'Ω' | 'F'): void => {
      for (const length of [3, 4] as const) {
        const code = figureCode(value, unit, length);
        if (code === undefined) continue;
        written += 1;
        expect(code).toHaveLength(length);
        expect(readFigureCode(code, unit)).toBe(value);
      }
    };
    fc.assert(fc.property(anyCapacitance, (value) => check(value, 'F')));
    fc.assert(fc.property(anyResistance, (value) => check(value, 'Ω')));
    expect(written).toBeGreaterThan(100);
  });

  it('exist with three characters for every value of E24, with four for every one of E192', () => {
    for (let value = 1; value < 1e9; value = next(value, 'E24', 1))
      expect(figureCode(value, 'Ω', 3)).toBeDefined();
    for (let value = 1; value < 1e9; value = next(value, 'E192', 1))
      expect(figureCode(value, 'Ω', 4)).toBeDefined();
  });

  it('of any three figures are read and written alike', () => {
    for (let number = 100; number < 1000; number += 1) {
      const value = readFigureCode(String(number), 'Ω');
      // 470 is 47 Ω; below 10 Ω nothing begins with a figure other than 0.
      expect(figureCode(value, 'Ω', 3)).toBe(String(number));
    }
  });

  it('read 8 and 9 on a capacitor as hundredths and tenths (common practice, no source)', () => {
    expect([readFigureCode('479', 'F'), readFigureCode('108', 'F')]).toEqual([4.7e-12, 0.1e-12]);
    expect(readFigureCode('108', 'Ω')).toBe(1e9);
    expect(figureCode(1e-3, 'F', 3)).toBeUndefined();
  });

  it('have a link for 0 Ω', () => {
    expect([figureCode(0, 'Ω', 3), figureCode(0, 'Ω', 4), figureCode(0, 'F', 3)]).toEqual([
      '000',
      '0000',
      undefined,
    ]);
    expect(readFigureCode('000', 'Ω')).toBe(0);
  });

  it.each([
    [475, 3],
    [4757, 4],
    [0.475, 3],
    [1e12, 3],
    [-47, 3],
    [Number.NaN, 4],
    [Number.POSITIVE_INFINITY, 4],
  ] as const)('do not exist for %s Ω with %s characters', (value, length) => {
    expect(figureCode(value, 'Ω', length)).toBeUndefined();
  });
});
