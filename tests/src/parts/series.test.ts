import { describe, expect, it } from 'vitest';
import { nearest, neighbours, next, SERIES_NAMES, seriesValues } from '../../../src/parts/series.ts';

describe('preferred values', () => {
  it('have as many members as the name says, ascending, from 1', () => {
    for (const name of SERIES_NAMES) {
      const values = seriesValues(name);
      expect(values).toHaveLength(Number(name.slice(1)));
      expect(values[0]).toBe(1);
      for (let index = 1; index < values.length; index += 1)
        expect(values[index]!).toBeGreaterThan(values[index - 1]!);
      expect(values.at(-1)!).toBeLessThan(10);
    }
  });

  it('step to the neighbour, exactly as somebody would type it, across decades', () => {
    expect([next(390e-12, 'E12', 1), next(390e-12, 'E12', -1)]).toEqual([470e-12, 330e-12]);
    expect([next(8.2e-9, 'E12', 1), next(1e-8, 'E12', -1)]).toEqual([1e-8, 8.2e-9]);
    expect(next(10e3, 'E24', 24)).toBe(100e3);
    expect(next(4.7e-9, 'E3', -3)).toBe(4.7e-10);
  });

  it('step from between two members to the nearer side only', () => {
    expect([next(4.6e3, 'E12', 1), next(4.6e3, 'E12', -1), next(4.6e3, 'E12', 0)]).toEqual([
      4.7e3, 3.9e3, 3.9e3,
    ]);
  });

  it('walk every decade of every series without a gap', () => {
    for (const name of SERIES_NAMES) {
      let value = 1e-12;
      const count = Number(name.slice(1));
      for (let step = 0; step < 18 * count; step += 1) value = next(value, name, 1);
      expect(value).toBe(1e6);
      for (let step = 0; step < 18 * count; step += 1) value = next(value, name, -1);
      expect(value).toBe(1e-12);
    }
  });

  it('are nearest in ratio', () => {
    expect([nearest(4.2e3, 'E12'), nearest(4.3e3, 'E12'), nearest(9.4, 'E24'), nearest(9.6, 'E24')]).toEqual([
      3.9e3, 4.7e3, 9.1, 10,
    ]);
  });

  it('have neighbours on both sides, the value itself in the middle', () => {
    expect(neighbours(390e-12, 'E12', 2)).toEqual([270e-12, 330e-12, 390e-12, 470e-12, 560e-12]);
    expect(neighbours(400e-12, 'E12', 1)).toEqual([390e-12, 400e-12, 470e-12]);
  });

  it.each([0, -1, Number.NaN, Number.POSITIVE_INFINITY])('refuse %s', (value) => {
    expect(() => nearest(value, 'E12')).toThrow(/above 0/);
    expect(() => next(value, 'E12', 1)).toThrow(/above 0/);
  });
});
