import { describe, expect, it } from 'vitest';
import { NotchworkError } from '../../../src/errors.ts';
import {
  DEFAULT_GRID,
  type FrequencyGrid,
  gridOf,
  logGrid,
  perDecadeGrid,
} from '../../../src/response/grid.ts';

function expectConsistent(grid: FrequencyGrid): void {
  expect(grid.omega).toHaveLength(grid.frequencies.length);
  expect(grid.omegaSquared).toHaveLength(grid.frequencies.length);
  grid.frequencies.forEach((frequency, index) => {
    expect(grid.omega[index]).toBe(2 * Math.PI * frequency);
    expect(grid.omegaSquared[index]).toBe(grid.omega[index]! ** 2);
    if (index > 0) expect(frequency).toBeGreaterThan(grid.frequencies[index - 1]!);
  });
}

describe('the grid of the plot', () => {
  it('has 512 points from 10 Hz to 40 kHz', () => {
    expect(DEFAULT_GRID.frequencies).toHaveLength(512);
    expect(DEFAULT_GRID.frequencies[0]).toBe(10);
    expect(DEFAULT_GRID.frequencies[511]).toBe(40000);
    expectConsistent(DEFAULT_GRID);
  });
});

describe('a logarithmic grid', () => {
  it('has both ends exactly and a constant ratio between neighbours', () => {
    const { frequencies } = logGrid(20, 20000, 301);
    expect(frequencies[0]).toBe(20);
    expect(frequencies[300]).toBe(20000);
    expect(frequencies[100]).toBeCloseTo(200, 10);
    const ratio = 1000 ** (1 / 300);
    for (let index = 1; index <= 300; index++) {
      expect(frequencies[index]! / frequencies[index - 1]!).toBeCloseTo(ratio, 12);
    }
  });

  it('may have two points only', () => {
    expect([...logGrid(1, 3, 2).frequencies]).toEqual([1, 3]);
  });
});

describe('a grid by the decade', () => {
  it('gives the exact frequencies of ISO 266’s third-octaves for ten a decade', () => {
    const { frequencies } = perDecadeGrid(10, 40000, 10);
    // Exact values 10^(n/10) as the standard tabulates them behind its rounded names (from memory).
    const exact = [10, 12.589, 15.849, 19.953, 25.119, 31.623, 39.811, 50.119, 63.096, 79.433, 100];
    exact.forEach((value, index) => {
      expect(frequencies[index]! / value).toBeCloseTo(1, 4);
    });
    expect(frequencies.at(-1)).toBe(40000);
    expect(frequencies.at(-2)! / 39810.717).toBeCloseTo(1, 7);
  });

  it('holds every power of ten exactly, once', () => {
    for (const perDecade of [1, 3, 7, 24, 100]) {
      const frequencies = [...perDecadeGrid(1, 1e6, perDecade).frequencies];
      for (const power of [1, 10, 100, 1000, 1e4, 1e5, 1e6]) {
        expect(frequencies.filter((value) => Math.abs(value / power - 1) < 1e-6)).toEqual([power]);
      }
      expect(frequencies).toHaveLength(6 * perDecade + 1);
      expectConsistent(gridOf(frequencies));
    }
  });

  it('adds the ends of the band where they are not among them', () => {
    expect([...perDecadeGrid(15, 2500, 1).frequencies]).toEqual([15, 100, 1000, 2500]);
    expect([...perDecadeGrid(0.02, 0.3, 1).frequencies]).toEqual([0.02, 0.1, 0.3]);
  });

  it('shares its inner points with the grid of another band', () => {
    const wide = new Set(perDecadeGrid(1, 1e5, 12).frequencies);
    const narrow = [...perDecadeGrid(90, 7000, 12).frequencies].slice(1, -1);
    expect(narrow.length).toBeGreaterThan(20);
    for (const frequency of narrow) expect(wide.has(frequency)).toBe(true);
  });
});

describe('a grid is refused', () => {
  it.each([
    ['from 0 Hz', () => logGrid(0, 100, 10), /lowest frequency/],
    ['from a negative frequency', () => logGrid(-5, 100, 10), /lowest frequency/],
    ['from NaN', () => perDecadeGrid(Number.NaN, 100, 10), /lowest frequency/],
    ['to infinity', () => logGrid(10, Number.POSITIVE_INFINITY, 10), /highest frequency/],
    ['downwards', () => logGrid(100, 10, 10), /first must be the lower/],
    ['from and to the same frequency', () => perDecadeGrid(100, 100, 10), /first must be the lower/],
    ['with one point', () => logGrid(10, 100, 1), /number of points/],
    ['with no points a decade', () => perDecadeGrid(10, 100, 0), /per decade/],
    ['with more points than memory', () => logGrid(10, 100, 1e9), /number of points/],
  ])('%s', (_, action, words) => {
    expect(action).toThrow(NotchworkError);
    expect(action).toThrow(words);
  });
});
