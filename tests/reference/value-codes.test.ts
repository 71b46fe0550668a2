import { describe, expect, it } from 'vitest';
import { type BandColour, colourBands, readColourBands } from '../../src/parts/colour-code.ts';
import { readToleranceLetter, toleranceLetter } from '../../src/parts/tolerance-code.ts';
import { figureCode, letterCode, readFigureCode, readLetterCode } from '../../src/parts/value-code.ts';

/**
 * Examples of IEC 60062 (Marking codes for resistors and capacitors), typed from memory of the
 * standard's own example tables.
 */
const RESISTORS: readonly (readonly [value: number, code: string])[] = [
  [0.1, 'R10'],
  [0.15, 'R15'],
  [0.332, 'R332'],
  [0.59, 'R59'],
  [1, '1R0'],
  [1.5, '1R5'],
  [3.32, '3R32'],
  [10, '10R'],
  [15, '15R'],
  [33.2, '33R2'],
  [100, '100R'],
  [150, '150R'],
  [332, '332R'],
  [590.4, '590R4'],
  [1000, '1K0'],
  [1500, '1K5'],
  [3320, '3K32'],
  [5904, '5K904'],
  [10_000, '10K'],
  [33_200, '33K2'],
  [59_040, '59K04'],
  [100_000, '100K'],
  [332_000, '332K'],
  [1e6, '1M0'],
  [1.5e6, '1M5'],
  [3.32e6, '3M32'],
  [10e6, '10M'],
  [33.2e6, '33M2'],
  [100e6, '100M'],
  [1e9, '1G0'],
  [10e9, '10G'],
  [1e12, '1T0'],
];

const CAPACITORS: readonly (readonly [value: number, code: string])[] = [
  [0.1e-12, 'p10'],
  [0.15e-12, 'p15'],
  [0.332e-12, 'p332'],
  [0.59e-12, 'p59'],
  [1e-12, '1p0'],
  [1.5e-12, '1p5'],
  [3.32e-12, '3p32'],
  [10e-12, '10p'],
  [33.2e-12, '33p2'],
  [100e-12, '100p'],
  [332e-12, '332p'],
  [1e-9, '1n0'],
  [3.32e-9, '3n32'],
  [33.2e-9, '33n2'],
  [100e-9, '100n'],
  [1e-6, '1µ0'],
  [3.32e-6, '3µ32'],
  [33.2e-6, '33µ2'],
  [100e-6, '100µ'],
  [1e-3, '1m0'],
  [10e-3, '10m'],
];

describe('marking codes against the examples of IEC 60062', () => {
  it.each(RESISTORS)('%s Ω is %s', (value, code) => {
    expect(letterCode(value, 'Ω')).toBe(code);
    expect(readLetterCode(code, 'Ω')).toBe(value);
  });

  it.each(CAPACITORS)('%s F is %s', (value, code) => {
    expect(letterCode(value, 'F')).toBe(code);
    expect(readLetterCode(code, 'F')).toBe(value);
  });

  // Significant figures and number of noughts; picofarads for capacitors (from memory).
  it.each([
    [10e-12, 'F', 3, '100'],
    [100e-12, 'F', 3, '101'],
    [1e-9, 'F', 3, '102'],
    [22e-9, 'F', 3, '223'],
    [100e-9, 'F', 3, '104'],
    [4.7e-12, 'F', 3, '4R7'],
    [47, 'Ω', 3, '470'],
    [100, 'Ω', 3, '101'],
    [47_000, 'Ω', 3, '473'],
    [4.7, 'Ω', 3, '4R7'],
    [0.47, 'Ω', 3, 'R47'],
    [4750, 'Ω', 4, '4751'],
    [100_000, 'Ω', 4, '1003'],
    [47.5, 'Ω', 4, '47R5'],
  ] as const)('%s %s in %s characters is %s', (value, unit, length, code) => {
    expect(figureCode(value, unit, length)).toBe(code);
    expect(readFigureCode(code, unit)).toBe(value);
  });

  // Colours as any table of the standard's figure 1 has them (from memory).
  it.each([
    [27_000, 5, 4, 'red violet orange gold'],
    [4700, 10, 4, 'yellow violet red silver'],
    [1e6, 5, 4, 'brown black green gold'],
    [100, 20, 4, 'brown black brown'],
    [249_000, 1, 5, 'red yellow white orange brown'],
    [4.99, 0.5, 5, 'yellow white white silver green'],
    [0.22, 5, 4, 'red red silver gold'],
    [680_000, 2, 5, 'blue grey black orange red'],
  ] as const)('%s Ω ±%s %% in %s bands', (value, tolerance, bands, colours) => {
    const named = colours.split(' ') as BandColour[];
    expect(colourBands(value, tolerance, bands)).toEqual(named);
    expect(readColourBands(named)).toEqual({ value, tolerance });
  });

  // Letters of the standard's tolerance tables (from memory).
  it.each([
    ['B', 0.1, 0.1],
    ['C', 0.25, 0.25],
    ['D', 0.5, 0.5],
    ['F', 1, 1],
    ['G', 2, 2],
    ['J', 5, 5],
    ['K', 10, 10],
    ['M', 20, 20],
    ['N', 30, 30],
    ['Q', 10, 30],
    ['T', 10, 50],
    ['S', 20, 50],
    ['Z', 20, 80],
  ])('%s means −%s % +%s %', (letter, minus, plus) => {
    expect(readToleranceLetter(letter)).toEqual({ minus, plus });
    expect(toleranceLetter({ minus, plus })).toBe(letter);
  });
});
