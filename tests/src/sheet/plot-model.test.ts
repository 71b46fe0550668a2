import { describe, expect, it } from 'vitest';
import {
  axisRange,
  axisTicks,
  frequencyText,
  type PlotCurve,
  plotNumber,
  valueAt,
} from '../../../src/sheet/plot-model.ts';

const curve = (values: number[], frequencies = values.map((_, index) => 10 * 2 ** index)): PlotCurve => ({
  id: 'x',
  letter: 'A',
  label: 'x',
  colour: 'a',
  dash: [],
  strength: 'strong',
  frequencies: Float64Array.from(frequencies),
  values: Float64Array.from(values),
});

describe('plot model', () => {
  it('rounds the axis to whole steps with air above, never shorter than its least', () => {
    expect(axisRange('magnitude', [curve([-3, -11.9])])).toEqual({ min: -24, max: 0 });
    expect(axisRange('magnitude', [curve([-6, -40])])).toEqual({ min: -42, max: 0 });
    expect(axisRange('phase', [curve([10, -20])])).toEqual({ min: -45, max: 45 });
    expect(axisRange('difference', [])).toEqual({ min: -3, max: 1 });
  });

  it('only grows while it is held', () => {
    const held = { min: -48, max: 12 };
    expect(axisRange('magnitude', [curve([-3, -10])], held)).toEqual(held);
    expect(axisRange('magnitude', [curve([14, -10])], held)).toEqual({ min: -48, max: 18 });
  });

  it('cuts what falls without end', () => {
    expect(axisRange('magnitude', [curve([0, -300, Number.NEGATIVE_INFINITY])]).min).toBe(-66);
  });

  it('numbers every step, or fewer where they would crowd', () => {
    expect(axisTicks('magnitude', { min: -24, max: 0 })).toEqual([-24, -18, -12, -6, 0]);
    expect(axisTicks('magnitude', { min: -66, max: 6 }).length).toBeLessThanOrEqual(9);
  });

  it('interpolates along the logarithmic axis and has nothing outside the curve', () => {
    const line = curve([0, -6], [100, 400]);
    expect(valueAt(line, 200)).toBeCloseTo(-3, 12);
    expect([valueAt(line, 100), valueAt(line, 400)]).toEqual([0, -6]);
    expect([valueAt(line, 99), valueAt(line, 401), valueAt(curve([]), 100)]).toEqual([
      Number.NaN,
      Number.NaN,
      Number.NaN,
    ]);
  });

  it('writes numbers with a real minus sign and no minus zero', () => {
    expect([
      plotNumber(-9.84, 'magnitude'),
      plotNumber(-0.01, 'magnitude'),
      plotNumber(4.66, 'magnitude', true),
    ]).toEqual(['−9.8', '0.0', '+4.7']);
    expect([plotNumber(Number.NaN, 'phase'), plotNumber(Number.NEGATIVE_INFINITY, 'magnitude')]).toEqual([
      '–',
      '−∞',
    ]);
    expect([frequencyText(560), frequencyText(1250), frequencyText(31.5)]).toEqual([
      '560\u202fHz',
      '1.25\u202fkHz',
      '31.5\u202fHz',
    ]);
  });
});
