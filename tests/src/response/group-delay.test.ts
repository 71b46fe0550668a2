import { describe, expect, it } from 'vitest';
import { curveOf } from '../../../src/response/curve.ts';
import { gridOf, logGrid } from '../../../src/response/grid.ts';
import { groupDelayInto } from '../../../src/response/group-delay.ts';
import type { TransferFunction } from '../../../src/transfer-function.ts';

function delays(transfer: TransferFunction, frequencies: readonly number[]): Float64Array {
  const out = new Float64Array(frequencies.length);
  groupDelayInto(out, transfer, gridOf(frequencies));
  return out;
}

describe('the group delay', () => {
  const frequencies = [1, 100, 1000, 20000];
  const omega = (frequency: number) => 2 * Math.PI * frequency;

  it('is τ/(1 + (ωτ)²) for one pole', () => {
    const tau = 2e-4;
    delays({ numerator: [1], denominator: [1, tau] }, frequencies).forEach((delay, index) => {
      expect(delay / (tau / (1 + (omega(frequencies[index]!) * tau) ** 2))).toBeCloseTo(1, 13);
    });
  });

  it('is twice that for an all-pass of order 1', () => {
    const tau = 2e-4;
    delays({ numerator: [1, -tau], denominator: [1, tau] }, frequencies).forEach((delay, index) => {
      expect(delay / ((2 * tau) / (1 + (omega(frequencies[index]!) * tau) ** 2))).toBeCloseTo(1, 13);
    });
  });

  it('is negative where a zero leads', () => {
    expect(delays({ numerator: [1, 1e-3], denominator: [1, 1e-5] }, [10])[0]).toBeLessThan(0);
  });

  it('is maximally flat for the Bessel polynomial of order 3 (W. E. Thomson 1949; any filter handbook)', () => {
    // Normalised to a delay of 1 s: 15/(15 + 15s + 6s² + s³).
    const [low, more] = delays({ numerator: [15], denominator: [15, 15, 6, 1] }, [1e-4, 0.05]);
    expect(low).toBeCloseTo(1, 12);
    expect(more).toBeCloseTo(1, 5);
  });

  it('is nothing for a gain, and not a number in silence', () => {
    expect(delays({ numerator: [3], denominator: [2] }, [1000])[0]).toBe(0);
    expect(delays({ numerator: [0], denominator: [1, 1] }, [1000])[0]).toBeNaN();
  });

  it('is the slope of the phase, against differences of a fine grid', () => {
    const transfer = { numerator: [0, 1e-3, 2e-7], denominator: [1, 2e-2, 3e-6, 1e-10, 1e-16] };
    const grid = logGrid(99, 101, 3);
    const { phase } = curveOf(transfer, grid, { phase: true });
    const out = new Float64Array(3);
    groupDelayInto(out, transfer, grid);
    const slope = ((phase![2]! - phase![0]!) * Math.PI) / 180 / (grid.omega[2]! - grid.omega[0]!);
    expect(out[1]! / -slope).toBeCloseTo(1, 3); // the difference's own error, (1 %)² of a curvature near 1
  });

  it('does not mind coefficients whose squares overflow', () => {
    const tau = 1e-3;
    const plain = delays({ numerator: [1], denominator: [1, tau] }, [50])[0]!;
    expect(delays({ numerator: [1e200], denominator: [1e200, tau * 1e200] }, [50])[0]! / plain).toBeCloseTo(
      1,
      13,
    );
  });
});
