import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type BandColour, colourBands, readColourBands } from '../../../src/parts/colour-code.ts';
import { next } from '../../../src/parts/series.ts';

const FIGURES = [
  'black',
  'brown',
  'red',
  'orange',
  'yellow',
  'green',
  'blue',
  'violet',
  'grey',
  'white',
] as const;
const anyFigure = fc.constantFrom<BandColour>(...FIGURES);
const firstFigure = fc.constantFrom<BandColour>(...FIGURES.slice(1));
const anyMultiplier = fc.constantFrom<BandColour>(...FIGURES, 'gold', 'silver', 'pink');
const anyTolerance = fc.constantFrom<BandColour>(
  'brown',
  'red',
  'orange',
  'yellow',
  'green',
  'blue',
  'violet',
  'grey',
  'gold',
  'silver',
);

describe('colour bands', () => {
  it('that can be read are written back the same, four of them', () => {
    fc.assert(
      fc.property(fc.tuple(firstFigure, anyFigure, anyMultiplier, anyTolerance), (bands) => {
        const { value, tolerance } = readColourBands(bands);
        expect(colourBands(value, tolerance, 4)).toEqual(bands);
      }),
    );
  });

  it('that can be read are written back the same, five of them', () => {
    fc.assert(
      fc.property(fc.tuple(firstFigure, anyFigure, anyFigure, anyMultiplier, anyTolerance), (bands) => {
        const { value, tolerance } = readColourBands(bands);
        expect(colourBands(value, tolerance, 5)).toEqual(bands);
      }),
    );
  });

  it('that are three mean ±20 %', () => {
    fc.assert(
      fc.property(fc.tuple(firstFigure, anyFigure, anyMultiplier), (bands) => {
        const reading = readColourBands(bands);
        expect(reading.tolerance).toBe(20);
        expect(colourBands(reading.value, 20, 4)).toEqual(bands);
      }),
    );
  });

  it('exist for every value of E24 with four, of E96 with five, and are read back to the last bit', () => {
    for (const [series, bands, tolerance] of [
      ['E24', 4, 5],
      ['E96', 5, 1],
    ] as const) {
      for (let value = 0.1; value < 1e8; value = next(value, series, 1)) {
        expect(readColourBands(colourBands(value, tolerance, bands)!)).toEqual({ value, tolerance });
      }
    }
  });

  it('are one black band for 0 Ω', () => {
    expect(colourBands(0, 5, 4)).toEqual(['black']);
    expect(readColourBands(['black'])).toEqual({ value: 0, tolerance: 0 });
  });

  it.each([
    [475, 5, 4, 'three figures for two bands'],
    [4757, 1, 5, 'four figures for three bands'],
    [100, 3, 4, 'a tolerance without a colour'],
    [100, 20, 5, 'five bands without a tolerance'],
    [1e12, 5, 4, 'beyond the multipliers'],
    [0.001, 5, 4, 'below the multipliers'],
    [-10, 5, 4, 'a negative value'],
    [Number.NaN, 5, 4, 'no number'],
    [Number.POSITIVE_INFINITY, 5, 4, 'an infinite one'],
  ] as const)('do not exist for %s Ω ±%s %% in %s bands: %s', (value, tolerance, bands, _why) => {
    expect(colourBands(value, tolerance, bands)).toBeUndefined();
  });
});
