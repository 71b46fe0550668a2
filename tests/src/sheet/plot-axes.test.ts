import { describe, expect, it } from 'vitest';
import {
  axisNumber,
  axisRange,
  axisTicks,
  GRID_FREQUENCIES,
  labelledFrequencies,
} from '../../../src/sheet/plot-axes.ts';
import type { PlotCurve } from '../../../src/sheet/plot-model.ts';

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

describe('frequency axis', () => {
  it('numbers 20, 50, 100 … 20k where there is room', () => {
    expect(labelledFrequencies(800).map(({ text }) => text)).toEqual([
      '20',
      '50',
      '100',
      '200',
      '500',
      '1k',
      '2k',
      '5k',
      '10k',
      '20k',
    ]);
  });

  it('keeps the most useful numbers on a phone, and none touch', () => {
    expect(labelledFrequencies(220).map(({ text }) => text)).toEqual(['20', '100', '1k', '10k']);
    expect(labelledFrequencies(340).map(({ text }) => text)).toEqual([
      '20',
      '50',
      '100',
      '500',
      '1k',
      '5k',
      '10k',
    ]);
    for (let width = 40; width < 900; width += 7) {
      const places = labelledFrequencies(width).map(({ frequency, text }) => ({
        centre: (Math.log10(frequency / 10) / Math.log10(4000)) * width,
        half: (text.length * 7) / 2,
      }));
      for (let index = 1; index < places.length; index += 1) {
        const [left, right] = [places[index - 1]!, places[index]!];
        expect(right.centre - right.half - (left.centre + left.half)).toBeGreaterThan(7.9); // eight pixels of air
      }
      expect(labelledFrequencies(width).length).toBeGreaterThan(0);
    }
  });

  it('has a line at 1 to 9 of every decade, 10 Hz to 40 kHz', () => {
    expect(GRID_FREQUENCIES.length).toBe(9 + 9 + 9 + 4);
    expect([GRID_FREQUENCIES[0], GRID_FREQUENCIES.at(-1)]).toEqual([10, 40_000]);
  });
});

describe('value axis', () => {
  it('ends on whole steps with air, never shorter than its least', () => {
    expect(axisRange('magnitude', [curve([-3, -11.9])])).toEqual({ min: -24, max: 0 });
    expect(axisRange('magnitude', [curve([-6, -40])])).toEqual({ min: -42, max: 0 });
    expect(axisRange('phase', [curve([10, -20])])).toEqual({ min: -45, max: 45 });
    expect(axisRange('difference', [curve([0.01, -0.02])])).toEqual({ min: -1, max: 1 });
  });

  it('has a range without curves, and without finite values', () => {
    expect(axisRange('magnitude', [])).toEqual({ min: -30, max: 6 });
    expect(axisRange('impedance', [curve([Number.NaN])])).toEqual({ min: 1, max: 100 });
  });

  it('only grows while it is held', () => {
    const held = { min: -48, max: 12 };
    expect(axisRange('magnitude', [curve([-3, -10])], held)).toEqual(held);
    expect(axisRange('magnitude', [curve([14, -10])], held)).toEqual({ min: -48, max: 18 });
  });

  it('cuts what falls without end, and does not look beyond the frequency axis', () => {
    expect(axisRange('magnitude', [curve([0, -300, Number.NEGATIVE_INFINITY])]).min).toBe(-66);
    expect(axisRange('magnitude', [curve([50, -3, 50], [5, 1000, 90_000])])).toEqual({ min: -24, max: 0 });
  });

  it('numbers every step, or fewer where they would crowd', () => {
    expect(axisTicks('magnitude', { min: -24, max: 0 })).toEqual([-24, -18, -12, -6, 0]);
    expect(axisTicks('magnitude', { min: -66, max: 6 })).toEqual([-60, -48, -36, -24, -12, 0]);
  });

  it('runs in 1, 2, 5 for ohms, at least a decade', () => {
    expect(axisRange('impedance', [curve([6.4, 58])])).toEqual({ min: 5, max: 100 });
    expect(axisRange('impedance', [curve([8, 8.2])])).toEqual({ min: 5, max: 50 });
    expect(axisRange('impedance', [curve([0, -1, 100, 1000])])).toEqual({ min: 100, max: 1000 });
    expect(axisTicks('impedance', { min: 5, max: 100 })).toEqual([5, 10, 20, 50, 100]);
    expect(axisTicks('impedance', { min: 1, max: 1e5 })).toEqual([1, 10, 100, 1000, 10_000, 100_000]);
  });

  it('writes short numbers', () => {
    expect([-12, 0, 0.5, 2000, 1e6].map(axisNumber)).toEqual(['−12', '0', '0.5', '2k', '1M']);
  });
});
