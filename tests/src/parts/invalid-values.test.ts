import { describe, expect, it } from 'vitest';
import { NotchworkError } from '../../../src/errors.ts';
import { readColourBands } from '../../../src/parts/colour-code.ts';
import { leastRating, leastResistorRating } from '../../../src/parts/rating.ts';
import { parseValue, type ValueRange } from '../../../src/parts/read-value.ts';
import { nearest, neighbours, next } from '../../../src/parts/series.ts';
import { readToleranceLetter } from '../../../src/parts/tolerance-code.ts';
import { readFigureCode, readLetterCode } from '../../../src/parts/value-code.ts';
import { formatValue } from '../../../src/parts/value-text.ts';
import type { UnitSymbol } from '../../../src/units.ts';

/** The typed error that an action throws; the test fails where it throws none, or another. */
function errorOf(action: () => unknown): NotchworkError {
  try {
    action();
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

const refusal = (text: string, unit: UnitSymbol, range?: ValueRange): NotchworkError =>
  errorOf(() => parseValue(text, unit, range));

describe('a value that is not guessed', () => {
  it.each([
    ['223', 'F', /picofarads.*223 is 22 nF/],
    ['1000', 'F', /not guessed/],
    ['1,000', 'Ω', /could mean 1000 or 1\.000/],
    ['22,000', 'Ω', /could mean 22000 or 22\.000/],
    ['470,000', 'Ω', /could mean 470000 or 470\.000/],
    ['-1,000', 'V', /could mean -1000 or -1\.000/],
    ['1,000k', 'Ω', /could mean 1000k or 1\.000k/],
    ['1,000,000', 'Ω', /more than one decimal mark/],
    ['1.000,5', 'Ω', /more than one decimal mark/],
    ['22M', 'F', /megafarads; for microfarads write u or µ/],
    ['22 MF', 'F', /megafarads/],
    ['2M2', 'F', /megafarads/],
    ['1Meg', 'F', /megafarads/],
    ['10M', 'H', /megahenries; for thousandths write a small m/],
    ['1.6M', 'S', /megasiemens/],
    ['1m', 'Ω', /milliohms or megohms; write mΩ or M/],
    ['4m7', 'Ω', /milliohms or megohms/],
    ['4 7', 'Ω', /space inside/],
    ['10²', 'Ω', /raised/],
    ['½', 'W', /fraction/],
  ] as const)('%s %s', (text, unit, why) => {
    const error = refusal(text, unit);
    expect(error.code).toBe('value-unreadable');
    expect(error.message).toMatch(why);
    expect(error.message).toMatch(/Write, for instance, /);
  });
});

describe('a value that cannot be read', () => {
  const RANGE: ValueRange = { min: 10e-12, max: 1e-6 };

  it.each([
    '',
    '   ',
    '\u200b',
    'abc',
    'NaN',
    'Infinity',
    '∞',
    '--1',
    '+-1',
    '4k7k',
    '4k7n',
    '1.2.3',
    '22x',
    '22kΩ',
    '<b>22n</b>',
    '1e999',
    '1e',
    '0x10',
    'n',
    '.',
    '22n 50V',
    '__proto__',
    '1constructor',
  ])('“%s” says what is accepted', (text) => {
    const error = refusal(text, 'F', RANGE);
    expect(error.code).toBe('value-unreadable');
    expect(error.message).toMatch(/22n, 0\.022u or 470p/);
    expect(error.message).toContain('10\u202fpF to 1\u202fµF is accepted');
  });

  it('is repeated only in part where somebody pasted a page', () => {
    const error = refusal(`22n ${'and so on '.repeat(10_000)}`, 'F');
    expect(error.message).toMatch(/too long/);
    expect(error.message.length).toBeLessThan(200);
  });

  it.each([
    ['0', /^0\u202fF is out of range/],
    ['-5n', /^\u22125\u202fnF is out of range/],
    ['\u22125n', /^\u22125\u202fnF is out of range/],
    ['1e30', /^1e30\u202fF is out of range/],
    ['9.99p', /^9\.99\u202fpF is out of range/],
    ['1.0001u', /^1\.0001\u202fµF is out of range/],
  ])('“%s” is out of range, and the message names both', (text, start) => {
    const error = refusal(text, 'F', RANGE);
    expect(error.code).toBe('value-out-of-range');
    expect(error.message).toMatch(start);
    expect(error.message).toContain('10\u202fpF to 1\u202fµF is accepted');
  });

  it('is told that it was whole farads, where no prefix was written', () => {
    expect(refusal('0.022', 'F', RANGE).message).toMatch(/without p, n or µ it is whole farads/i);
    expect(refusal('47', 'F', RANGE).message).toMatch(/whole farads/);
    expect(refusal('1p', 'F', RANGE).message).not.toMatch(/whole farads/);
  });

  it('is told an open range as such', () => {
    expect(refusal('-1', 'Ω', { min: 0, max: Number.POSITIVE_INFINITY }).message).toMatch(/0\u202fΩ or more/);
  });

  it.each([0, -1, 16, Number.NaN])('%s digits cannot be written', (digits) => {
    expect(errorOf(() => formatValue(1, 'Ω', { digits })).code).toBe('value-out-of-range');
  });
});

describe('a printed code that cannot be read', () => {
  it.each([
    ['', 'Ω'],
    ['K', 'Ω'],
    ['4700', 'Ω'],
    ['4K7K', 'Ω'],
    ['4n7', 'Ω'],
    ['4K7', 'F'],
    ['4P7', 'F'],
    ['1M0', 'F'],
    ['-4K7', 'Ω'],
    ['123K456', 'Ω'],
    ['4.7K', 'Ω'],
  ] as const)('letter code “%s” for %s', (code, unit) => {
    const error = errorOf(() => readLetterCode(code, unit));
    expect(error.code).toBe('value-unreadable');
    expect(error.message).toMatch(unit === 'Ω' ? /4K7/ : /4n7/);
  });

  it.each(['', '4', '47', '47000', '4K7', 'R', '4RR', '4r7', 'R4700', '-47', '4 7'])(
    'figure code “%s”',
    (code) => {
      const error = errorOf(() => readFigureCode(code, 'Ω'));
      expect(error.code).toBe('value-unreadable');
      expect(error.message).toMatch(/223, 4R7 or 4751/);
    },
  );

  it.each(['', 'j', 'X', 'JJ', 'constructor'])('tolerance letter “%s”', (letter) => {
    const error = errorOf(() => readToleranceLetter(letter));
    expect(error.code).toBe('value-unreadable');
    expect(error.message).toMatch(/E, L, P/);
  });

  it.each([
    [[], /0 bands/],
    [['brown', 'black'], /2 bands/],
    [['red'], /1 bands/],
    [['red', 'red', 'red', 'red', 'red', 'red'], /6 bands/],
    [['black', 'red', 'red', 'gold'], /Band 1 \(black\) cannot be the first figure/],
    [['gold', 'red', 'red', 'gold'], /Band 1 \(gold\)/],
    [['red', 'silver', 'red', 'gold'], /Band 2 \(silver\) cannot be a figure/],
    [['red', 'red', 'red', 'black'], /Band 4 \(black\) cannot be a tolerance/],
    [['red', 'red', 'pink', 'red', 'red'], /Band 3 \(pink\) cannot be a figure/],
    [['red', 'red', 'red', 'red', 'white'], /Band 5 \(white\) cannot be a tolerance/],
  ] as const)('bands %j', (bands, why) => {
    const error = errorOf(() => readColourBands(bands));
    expect(error.code).toBe('value-unreadable');
    expect(error.message).toMatch(why);
  });
});

describe('a preferred value that does not exist', () => {
  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY, Number.MAX_VALUE, 5e-324, 1e61])(
    'near %s',
    (value) => {
      for (const ask of [
        () => nearest(value, 'E12'),
        () => next(value, 'E12', 1),
        () => neighbours(value, 'E12', 1),
        () => neighbours(value, 'E12', 0),
      ]) {
        const error = errorOf(ask);
        expect(error.code).toBe('value-out-of-range');
        expect(error.message).toMatch(/above 0/);
      }
    },
  );

  it.each([0.5, Number.NaN, Number.POSITIVE_INFINITY, 1e20])('%s steps on', (steps) => {
    expect(errorOf(() => next(1, 'E12', steps)).message).toMatch(/whole number/);
  });

  it('beyond the values served', () => {
    expect(errorOf(() => next(1, 'E12', 1000)).code).toBe('value-out-of-range');
    expect(errorOf(() => next(1, 'E12', -1e9)).code).toBe('value-out-of-range');
  });

  it.each([-1, 0.5, Number.NaN, 1e6])('with %s neighbours', (count) => {
    expect(errorOf(() => neighbours(1, 'E12', count)).code).toBe('value-out-of-range');
  });
});

describe('a stress that no rating can answer', () => {
  it.each([-1, Number.NaN, Number.POSITIVE_INFINITY])('%s', (bad) => {
    for (const ask of [
      () => leastRating('film-capacitor', bad),
      () => leastRating('film-capacitor', 100, bad),
      () => leastResistorRating(bad, 100),
      () => leastResistorRating(0.1, bad),
    ]) {
      expect(errorOf(ask).code).toBe('value-out-of-range');
    }
  });
});
