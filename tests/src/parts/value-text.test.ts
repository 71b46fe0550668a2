import { describe, expect, it } from 'vitest';
import { NotchworkError } from '../../../src/errors.ts';
import { formatShort, formatValue, parseValue, speakValue } from '../../../src/parts/value-text.ts';

function errorOf(
  text: string,
  ...rest: [Parameters<typeof parseValue>[1], Parameters<typeof parseValue>[2]?]
): NotchworkError {
  try {
    parseValue(text, ...rest);
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error(`“${text}” was accepted`);
}

describe('reading a value', () => {
  it.each([
    ['22n', 22e-9],
    ['0.022u', 22e-9],
    ['22nF', 22e-9],
    ['22 nF', 22e-9],
    ['22\u202fnF', 22e-9],
    ['22\u00a0nF', 22e-9],
    ['470p', 470e-12],
    ['470pF', 470e-12],
    ['0,022µ', 22e-9],
    ['0.022\u03bcF', 22e-9],
    ['0.022\u00b5F', 22e-9],
    ['4n7', 4.7e-9],
    ['2u2', 2.2e-6],
    ['1e-9', 1e-9],
    ['+22n', 22e-9],
    ['\u200b22n\ufeff', 22e-9],
    ['.022u', 22e-9],
    ['22N', 22e-9],
  ])('%s farads', (text, value) => {
    expect(parseValue(text, 'F')).toBe(value);
  });

  it.each([
    ['4k7', 4700],
    ['4.7k', 4700],
    ['4,7k', 4700],
    ['4K7', 4700],
    ['1M', 1e6],
    ['1Meg', 1e6],
    ['1meg', 1e6],
    ['2M2', 2.2e6],
    ['47', 47],
    ['4R7', 4.7],
    ['470R', 470],
    ['223', 223],
    ['47 kΩ', 47e3],
    ['47k\u2126', 47e3],
    ['47kohm', 47e3],
    ['470ohms', 470],
    ['0', 0],
    ['1e30', 1e30],
  ])('%s ohms', (text, value) => {
    expect(parseValue(text, 'Ω')).toBe(value);
  });

  it('reads henries, siemens and plain numbers', () => {
    expect([
      parseValue('250m', 'H'),
      parseValue('4H5', 'H'),
      parseValue('1.6m', 'S'),
      parseValue('60', 'ratio'),
    ]).toEqual([0.25, 4.5, 1.6e-3, 60]);
  });

  it('does not guess 223 farads, and says why', () => {
    expect(errorOf('223', 'F').message).toMatch(/picofarads.*22 nF/);
  });

  it('does not guess what a comma before three digits is', () => {
    expect(errorOf('1,000', 'Ω').message).toMatch(/1000.*1\.000/);
    expect(parseValue('0,022u', 'F')).toBe(22e-9);
  });

  it('refuses megafarads', () => {
    expect(errorOf('22M', 'F').message).toMatch(/megafarads/);
  });

  it.each(['', '   ', 'abc', 'NaN', 'Infinity', '--1', '4k7k', '1.2.3', '22x', '<b>22n</b>', '1e999'])(
    'refuses “%s” and says what is accepted',
    (text) => {
      const error = errorOf(text, 'F');
      expect(error.code).toBe('value-unreadable');
      expect(error.message).toMatch(/22n/);
    },
  );

  it.each(['0', '-5n', '\u22125n', '1e30', '1p'])('refuses %s out of range and names the range', (text) => {
    const error = errorOf(text, 'F', { min: 10e-12, max: 1e-6 });
    expect(error.code).toBe('value-out-of-range');
    expect(error.message).toContain(`${formatValue(10e-12, 'F')} to ${formatValue(1e-6, 'F')}`);
  });
});

describe('writing a value', () => {
  it.each([
    [390e-12, 'F', '390\u202fpF'],
    [22e-9, 'F', '22\u202fnF'],
    [4700e-6, 'F', '4700\u202fµF'],
    [0.5e-12, 'F', '0.5\u202fpF'],
    [4700, 'Ω', '4.7\u202fkΩ'],
    [1e6, 'Ω', '1\u202fMΩ'],
    [0, 'Ω', '0\u202fΩ'],
    [999.96, 'Ω', '1\u202fkΩ'],
    [-5, 'Ω', '\u22125\u202fΩ'],
    [1.6e-3, 'S', '1.6\u202fmS'],
    [60, 'ratio', '60'],
    [0.25, 'H', '250\u202fmH'],
  ] as const)('%s %s', (value, unit, text) => {
    expect(formatValue(value, unit)).toBe(text);
  });

  it('is read back as the same value', () => {
    for (let exponent = -12; exponent < 7; exponent += 1) {
      for (const digits of ['1', '2.2', '4.75', '9.76']) {
        const value = Number(`${digits}e${exponent}`);
        if (exponent < 3) expect(parseValue(formatValue(value, 'F'), 'F')).toBe(value); // no one writes kilofarads
        expect(parseValue(formatValue(value, 'Ω'), 'Ω')).toBe(value);
      }
    }
  });

  it('is short under a knob', () => {
    expect([150e3, 12.5e3, 0, 147.2e3, 1e6, 820].map(formatShort)).toEqual([
      '150k',
      '12k5',
      '0',
      '147k',
      '1M',
      '820',
    ]);
  });

  it('is spoken in words', () => {
    expect([speakValue(390e-12, 'F'), speakValue(47e3, 'Ω'), speakValue(60, 'ratio')]).toEqual([
      '390 picofarads',
      '47 kilohms',
      '60',
    ]);
  });
});
