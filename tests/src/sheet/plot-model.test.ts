import { describe, expect, it } from 'vitest';
import {
  DASHES,
  frequencyText,
  type PlotCurve,
  plotNumber,
  plotValue,
  valueAt,
} from '../../../src/sheet/plot-model.ts';

const curve = (values: number[], frequencies: number[]): Pick<PlotCurve, 'frequencies' | 'values'> => ({
  frequencies: Float64Array.from(frequencies),
  values: Float64Array.from(values),
});

describe('value of a curve', () => {
  it('lies on a straight line along the logarithmic axis', () => {
    const line = curve([0, -6, -12], [100, 400, 1600]);
    expect(valueAt(line, 200)).toBeCloseTo(-3, 12); // an octave of two
    expect(valueAt(line, 800)).toBeCloseTo(-9, 12);
  });

  it('is the point itself at a point', () => {
    const line = curve([0.1, -6.7, Number.NEGATIVE_INFINITY], [100, 400, 1600]);
    expect([valueAt(line, 100), valueAt(line, 400), valueAt(line, 1600)]).toEqual([
      0.1,
      -6.7,
      Number.NEGATIVE_INFINITY,
    ]);
  });

  it('is not a number outside the curve, or without one', () => {
    const line = curve([0, -6], [100, 400]);
    expect([valueAt(line, 99), valueAt(line, 401), valueAt(curve([], []), 100)]).toEqual([
      Number.NaN,
      Number.NaN,
      Number.NaN,
    ]);
    expect(valueAt(curve([3], [100]), 100)).toBe(3);
  });
});

describe('numbers as they are read', () => {
  it('have a real minus sign and no minus zero', () => {
    expect([plotNumber(-9.84, 'magnitude'), plotNumber(-0.01, 'magnitude')]).toEqual(['−9.8', '0.0']);
    expect([plotNumber(4.66, 'magnitude', true), plotNumber(0.01, 'magnitude', true)]).toEqual([
      '+4.7',
      '0.0',
    ]);
  });

  it('say what is no number', () => {
    expect([
      plotNumber(Number.NaN, 'phase'),
      plotNumber(Number.NEGATIVE_INFINITY, 'magnitude'),
      plotNumber(Number.POSITIVE_INFINITY, 'impedance'),
    ]).toEqual(['–', '−∞', '∞']);
  });

  it('keep a thin space before a unit, but none before a degree sign', () => {
    expect([plotValue(-9.84, 'magnitude'), plotValue(-44.6, 'phase'), plotValue(8, 'impedance')]).toEqual([
      '−9.8\u202fdB',
      '−45°',
      '8.0\u202fΩ',
    ]);
    expect(plotValue(0.456, 'difference', true)).toBe('+0.46\u202fdB');
  });

  it('name frequencies as people do', () => {
    expect([31.5, 560, 999.6, 1250, 12_340].map(frequencyText)).toEqual([
      '31.5\u202fHz',
      '560\u202fHz',
      '1\u202fkHz',
      '1.25\u202fkHz',
      '12.3\u202fkHz',
    ]);
  });
});

describe('dashes', () => {
  it('differ for every voicing', () => {
    const letters = ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'] as const;
    expect(new Set(letters.map((letter) => DASHES[letter].join())).size).toBe(letters.length);
  });
});
