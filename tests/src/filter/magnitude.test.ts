import { describe, expect, it } from 'vitest';
import { magnitudeAtSquares } from '../../../src/filter/magnitude.ts';
import { audibleOmegas, product, seeded, transferAt } from './polynomials.ts';

const OMEGAS = audibleOmegas(97);
const SQUARES = Float64Array.from(OMEGAS, (omega) => omega * omega);

function decibelsOf(numerator: readonly number[], denominator: readonly number[]): Float64Array {
  const out = new Float64Array(SQUARES.length);
  magnitudeAtSquares(out, { numerator, denominator }, SQUARES);
  return out;
}

describe('magnitude in decibels', () => {
  it('is 10·log(1/(1 + (ωτ)²)) for one pole', () => {
    const tau = 1e-4;
    decibelsOf([1], [1, tau]).forEach((level, index) => {
      expect(level).toBeCloseTo(-10 * Math.log10(1 + (OMEGAS[index]! * tau) ** 2), 12);
    });
  });

  it('equals the complex evaluation for every order from 0 to 16, numerators shorter and longer', () => {
    const random = seeded(91);
    for (let order = 0; order <= 16; order++) {
      for (const above of [order, Math.floor(order / 2), 0]) {
        const taus = (count: number) => Array.from({ length: count }, () => [1, 10 ** (-1 - 5 * random())]);
        const numerator = product([0.3], ...taus(above));
        const denominator = product(...taus(order));
        decibelsOf(numerator, denominator).forEach((level, index) => {
          const { re, im } = transferAt({ numerator, denominator }, OMEGAS[index]!);
          // Some thirty roundings at order 16, 1e-15 each, are 1e-13 dB.
          expect(Math.abs(level - 20 * Math.log10(Math.hypot(re, im)))).toBeLessThan(3e-12);
        });
      }
    }
  });

  it('keeps its digits at the bottom of a dip', () => {
    // A notch at 1 kHz, 120 dB deep: (1 + s²/ω₀² + ε·s/ω₀) over (1 + s/ω₀)².
    const omega = OMEGAS[48]!;
    const depth = 1e-6;
    const levels = decibelsOf([1, depth / omega, 1 / omega ** 2], [1, 2 / omega, 1 / omega ** 2]);
    // At ω₀ numerator and denominator are jε and 2j; 1 − ω²/ω₀² is left with one rounding, 1e-16 of ε's 1e-6.
    expect(levels[48]).toBeCloseTo(20 * Math.log10(depth / 2), 8);
  });

  it('is −Infinity where nothing passes, and +Infinity on a pole', () => {
    expect([...decibelsOf([0, 0], [1, 1])].every((level) => level === Number.NEGATIVE_INFINITY)).toBe(true);
    const omega = 1000;
    const out = new Float64Array(1);
    magnitudeAtSquares(
      out,
      { numerator: [1], denominator: [omega * omega, 0, 1] },
      Float64Array.of(omega * omega),
    );
    expect(out[0]).toBe(Number.POSITIVE_INFINITY);
  });

  it('does not mind coefficients whose squares overflow or vanish', () => {
    const numerator = [0, 1e-3, 1e-8];
    const denominator = [1, 2e-3, 1e-7, 1e-13];
    const plain = decibelsOf(numerator, denominator);
    for (const factor of [2 ** 600, 2 ** -600]) {
      const scaled = decibelsOf(
        numerator.map((c) => c * factor),
        denominator.map((c) => c * factor),
      );
      expect(scaled).toEqual(plain);
    }
  });

  it('does not depend on zeros appended at the high end', () => {
    const plain = decibelsOf([1, 1e-3], [1, 1e-2, 1e-6]);
    for (const more of [2, 4, 9, 14]) {
      const padding = new Array<number>(more).fill(0);
      // Another length takes another path through the code; the arithmetic stays the same but for 0 terms.
      const padded = decibelsOf([1, 1e-3, ...padding], [1, 1e-2, 1e-6, ...padding]);
      padded.forEach((level, index) => {
        expect(level).toBeCloseTo(plain[index]!, 13);
      });
    }
  });
});
