import { describe, expect, it } from 'vitest';
import { curveOf, levelOf, magnitudeInto, phaseInto, responseAt } from '../../../src/response/curve.ts';
import { DEFAULT_GRID, gridOf, logGrid } from '../../../src/response/grid.ts';

const TAU = 1 / (2 * Math.PI * 1000);
const onePole = { numerator: [1], denominator: [1, TAU] };

describe('the magnitude on a grid', () => {
  it('is −3.01 dB at the corner of one pole, −10·log(1 + (f/fc)²) elsewhere', () => {
    const grid = gridOf([100, 1000, 10000]);
    const out = new Float64Array(3);
    magnitudeInto(out, onePole, grid);
    expect(out[1]).toBeCloseTo(-10 * Math.log10(2), 13);
    expect(out[0]).toBeCloseTo(-10 * Math.log10(1.01), 13);
    expect(out[2]).toBeCloseTo(-10 * Math.log10(101), 13);
  });

  it('falls by 20·n dB a decade far above a Butterworth corner, and is −3.01 dB there (S. Butterworth 1930)', () => {
    const omega = 2 * Math.PI * 50;
    // Order 3: 1 + 2s + 2s² + s³ (handbook).
    const butterworth = { numerator: [1], denominator: [1, 2 / omega, 2 / omega ** 2, 1 / omega ** 3] };
    const out = new Float64Array(3);
    magnitudeInto(out, butterworth, gridOf([50, 5000, 50000]));
    expect(out[0]).toBeCloseTo(-10 * Math.log10(2), 12);
    expect(out[2]! - out[1]!).toBeCloseTo(-60, 4);
  });

  it('fills every point of the plot’s grid with a finite number', () => {
    const out = new Float64Array(512).fill(Number.NaN);
    magnitudeInto(out, { numerator: [0, 1e-3, 1e-7], denominator: [1, 2e-2, 3e-6, 1e-11] }, DEFAULT_GRID);
    expect(out.every(Number.isFinite)).toBe(true);
  });
});

describe('a curve', () => {
  it('has a phase only where it is asked for', () => {
    expect(curveOf(onePole, DEFAULT_GRID).phase).toBeUndefined();
    const { phase, frequencies } = curveOf(onePole, DEFAULT_GRID, { phase: true });
    expect(frequencies).toBe(DEFAULT_GRID.frequencies);
    expect(phase![0]).toBeCloseTo((-180 / Math.PI) * Math.atan(0.01), 12);
  });

  it('equals the complex response point by point', () => {
    const transfer = { numerator: [0.2, -1e-4, 3e-8], denominator: [1, 1e-3, 2e-7, 1e-12] };
    const grid = logGrid(10, 40000, 50);
    const { magnitude, phase } = curveOf(transfer, grid, { phase: true });
    grid.frequencies.forEach((frequency, index) => {
      const { re, im } = responseAt(transfer, frequency);
      expect(magnitude[index]).toBeCloseTo(20 * Math.log10(Math.hypot(re, im)), 11);
      const turns = (phase![index]! - (Math.atan2(im, re) * 180) / Math.PI) / 360;
      expect(turns - Math.round(turns)).toBeCloseTo(0, 12);
    });
  });

  it('has the same phase on a coarse grid as on a fine one', () => {
    const transfer = { numerator: [1], denominator: [1, 1e-1, 2e-3, 1e-5, 1e-8, 1e-12, 1e-17] };
    const coarse = gridOf([10, 40000]);
    const fine = logGrid(10, 40000, 400);
    const [ends, all] = [new Float64Array(2), new Float64Array(400)];
    phaseInto(ends, transfer, coarse);
    phaseInto(all, transfer, fine);
    expect(ends[1]).toBeCloseTo(all[399]!, 9);
    expect(ends[0]).toBeCloseTo(all[0]!, 9);
  });
});

describe('the response at one frequency', () => {
  it('is (1 − j)/2 at the corner of one pole', () => {
    const { re, im } = responseAt(onePole, 1000);
    expect(re).toBeCloseTo(0.5, 15);
    expect(im).toBeCloseTo(-0.5, 15);
  });

  it('is (1 + j)/2 at the corner of one zero over one pole', () => {
    const { re, im } = responseAt({ numerator: [0, TAU], denominator: [1, TAU] }, 1000);
    expect(re).toBeCloseTo(0.5, 15);
    expect(im).toBeCloseTo(0.5, 15);
  });

  it('does not mind coefficients whose squares overflow or vanish', () => {
    for (const factor of [1e200, 1e-200]) {
      const scaled = { numerator: [factor], denominator: [factor, TAU * factor] };
      const { re, im } = responseAt(scaled, 1000);
      expect(re).toBeCloseTo(0.5, 14);
      expect(im).toBeCloseTo(-0.5, 14);
    }
  });

  it('is the level as a function of frequency, in decibels', () => {
    const level = levelOf({ numerator: [2], denominator: [1] });
    expect(level(123)).toBeCloseTo(20 * Math.log10(2), 14);
    expect(levelOf(onePole)(1000)).toBeCloseTo(-10 * Math.log10(2), 13);
    expect(levelOf({ numerator: [0], denominator: [1] })(1000)).toBe(Number.NEGATIVE_INFINITY);
  });
});
