import { describe, expect, it } from 'vitest';
import { phaseAtOmegas } from '../../../src/filter/phase.ts';
import { audibleOmegas, product, seeded, transferAt } from './polynomials.ts';

const DEGREES = 180 / Math.PI;

function degreesOf(
  numerator: readonly number[],
  denominator: readonly number[],
  omegas: readonly number[],
): number[] {
  const out = new Float64Array(omegas.length);
  phaseAtOmegas(out, { numerator, denominator }, Float64Array.from(omegas));
  return [...out];
}

describe('phase in degrees', () => {
  it('is −atan(ωτ) for one pole and 90° less that for a high-pass', () => {
    const omegas = audibleOmegas(20);
    const tau = 1e-4;
    degreesOf([1], [1, tau], omegas).forEach((phase, index) => {
      expect(phase).toBeCloseTo(-Math.atan(omegas[index]! * tau) * DEGREES, 12);
    });
    degreesOf([0, tau], [1, tau], omegas).forEach((phase, index) => {
      expect(phase).toBeCloseTo(90 - Math.atan(omegas[index]! * tau) * DEGREES, 12);
    });
  });

  it('is −45° per pole at a common corner, however many there are: no wrapping', () => {
    for (const order of [1, 3, 6, 9]) {
      const denominator = product(...new Array<number[]>(order).fill([1, 1]));
      // A root of multiplicity 9 is found to about 1e-2; the angle comes from the polynomial itself.
      expect(degreesOf([1], denominator, [1])[0]).toBeCloseTo(-45 * order, 10);
    }
  });

  it('goes on past −180° although the points are a decade apart', () => {
    const denominator = product([1, 1e-2], [1, 1e-3], [1, 1e-4], [1, 1e-5], [1, 1e-6]);
    const phases = degreesOf([1], denominator, [1, 1e4, 1e9]);
    expect(phases[0]).toBeCloseTo(-DEGREES * (1e-2 + 1e-3 + 1e-4 + 1e-5 + 1e-6), 2);
    expect(phases[2]).toBeCloseTo(-450, 0);
  });

  it('starts at 180° for a negative gain and falls from there', () => {
    const [low, high] = degreesOf([-5], [1, 1e-3], [1e-3, 1e9]);
    expect(low).toBeCloseTo(180 - 1e-6 * DEGREES, 10);
    expect(high).toBeCloseTo(90 + 1e-6 * DEGREES, 10);
  });

  it('falls by 180° over an all-pass of order 1: −2·atan(ωτ)', () => {
    const omegas = [1, 1e3, 1e6];
    degreesOf([1, -1e-3], [1, 1e-3], omegas).forEach((phase, index) => {
      expect(phase).toBeCloseTo(-2 * Math.atan(omegas[index]! * 1e-3) * DEGREES, 12);
    });
  });

  it('passes −90° at the corner of a damped pair and steps by +180° over a perfect notch', () => {
    expect(degreesOf([1], [1, 0.1, 1], [1])[0]).toBeCloseTo(-90, 12);
    const [before, after] = degreesOf([1, 0, 1], [1, 2, 1], [0.999999, 1.000001]);
    expect(after! - before!).toBeCloseTo(180, 3);
  });

  it('agrees with the complex response but for whole turns, random functions of order 1 to 12', () => {
    const random = seeded(101);
    const omegas = audibleOmegas(30);
    for (let order = 1; order <= 12; order++) {
      const factors = (count: number) =>
        Array.from({ length: count }, () => [1, (random() - 0.2) * 10 ** (-1 - 4 * random())]);
      const transfer = {
        numerator: product([random() - 0.5], ...factors(order)),
        denominator: product(...factors(order)),
      };
      degreesOf(transfer.numerator, transfer.denominator, omegas).forEach((phase, index) => {
        const { re, im } = transferAt(transfer, omegas[index]!);
        const turns = (phase - Math.atan2(im, re) * DEGREES) / 360;
        expect(Math.abs(turns - Math.round(turns))).toBeLessThan(1e-11);
      });
    }
  });

  it('does not jump: neighbouring points of a fine grid differ by little', () => {
    const omegas = audibleOmegas(2000);
    const denominator = product([1, 1e-2], [1, 1e-3, 1e-6], [1, 1e-4, 3e-8], [1, 1e-5]);
    const phases = degreesOf([0, 1, 1e-4, 1e-7], denominator, omegas);
    for (let index = 1; index < phases.length; index++) {
      expect(Math.abs(phases[index]! - phases[index - 1]!)).toBeLessThan(2);
    }
  });

  it('is not a number where nothing passes', () => {
    expect(degreesOf([0, 0], [1, 1], [1, 2])).toEqual([Number.NaN, Number.NaN]);
  });
});
