import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { factor } from '../../../src/filter/factor.ts';
import { degreeOf } from '../../../src/filter/roots.ts';
import type { TransferFunction } from '../../../src/transfer-function.ts';
import { audibleOmegas, cascadeAt, product, relativeError, seeded, transferAt } from './polynomials.ts';

const OMEGAS = audibleOmegas(60);

/** Largest relative difference between a transfer function and its sections, 10 Hz to 40 kHz. */
function largestError(transfer: TransferFunction): number {
  const sections = factor(transfer);
  return Math.max(
    ...OMEGAS.map((omega) => relativeError(cascadeAt(sections, omega), transferAt(transfer, omega))),
  );
}

/** An RC-like function: real poles anywhere, zeros real, at 0, paired or at infinity. */
function randomNetwork(random: () => number, order: number): TransferFunction {
  const tau = () => 10 ** (-7 + 6 * random());
  const denominator = product(...Array.from({ length: order }, () => [1, tau()]));
  const factors: number[][] = [];
  for (let left = order; left > 0; ) {
    const dice = random();
    if (dice < 0.3 && left > 1) {
      const omega = 1 / tau();
      factors.push([1, (0.3 + 2 * random()) / omega, 1 / omega ** 2]);
      left -= 2;
    } else {
      if (dice < 0.4) factors.push([0, tau()]);
      else if (dice < 0.8) factors.push([1, tau()]);
      left -= 1;
    }
  }
  const gain = (random() < 0.3 ? -1 : 1) * 10 ** (3 * random() - 3);
  return {
    numerator: product([gain], ...factors),
    denominator: product([1e12 ** (random() - 0.5)], denominator),
  };
}

describe('short functions', () => {
  it('are one section straight from their coefficients', () => {
    const transfer = { numerator: [0, 1e-3, 2e-6, 1e-10], denominator: [3, 4e-3, 5e-6, 2e-10] };
    expect(factor(transfer)).toEqual([transfer]);
  });

  it('lose exact zeros at the high end and common powers of s', () => {
    expect(factor({ numerator: [0, 2, 0, 0], denominator: [0, 1, 4, 0, 0, 0] })).toEqual([
      { numerator: [2], denominator: [1, 4] },
    ]);
  });

  it('of order 4 by their coefficients only need no roots either', () => {
    expect(factor({ numerator: [0, 1, 1], denominator: [0, 1, 3, 3, 1] })).toEqual([
      { numerator: [1, 1], denominator: [1, 3, 3, 1] },
    ]);
  });

  it('that pass nothing are one silent section', () => {
    expect(factor({ numerator: [0, 0], denominator: [1, 1] })).toEqual([
      { numerator: [0], denominator: [1] },
    ]);
    expect(factor({ numerator: [0], denominator: [1, 4, 6, 4, 1] })).toEqual([
      { numerator: [0], denominator: [1] },
    ]);
  });

  it('are a gain alone', () => {
    expect(factor({ numerator: [-3], denominator: [2] })).toEqual([{ numerator: [-3], denominator: [2] }]);
  });
});

describe('long functions', () => {
  it('equal the product of their sections to 1e-12, random networks of order 4 to 16', () => {
    const random = seeded(51);
    for (let round = 0; round < 600; round++) {
      const order = 4 + (round % 13);
      expect(largestError(randomNetwork(random, order))).toBeLessThan(1e-12);
    }
  });

  it('equal it with complex poles too, as a power stage has them', () => {
    const random = seeded(52);
    for (let round = 0; round < 300; round++) {
      const pairs = Array.from({ length: 1 + (round % 4) }, () => {
        const omega = 10 ** (1.5 + 5 * random());
        return [1, (0.2 + 1.6 * random()) / omega, 1 / omega ** 2];
      });
      const reals = Array.from({ length: 2 + (round % 5) }, () => [1, 10 ** (-7 * random())]);
      const denominator = product(...pairs, ...reals);
      const numerator = denominator.map((value) => value * random());
      expect(largestError({ numerator, denominator })).toBeLessThan(1e-12);
    }
  });

  it('equal it where poles coincide two and three at a time', () => {
    const denominator = product([1, 1e-3], [1, 1e-3], [1, 1e-3], [1, 2e-5], [1, 2e-5]);
    expect(largestError({ numerator: [0, 1e-3, 0, 1e-12], denominator })).toBeLessThan(1e-12);
  });

  it('equal it for Butterworth filters, order 4 to 10 (pole angles of the handbooks)', () => {
    for (let order = 4; order <= 10; order++) {
      const omega = 2 * Math.PI * 1000;
      const factors: number[][] = order % 2 ? [[1, 1 / omega]] : [];
      for (let index = 0; index < Math.floor(order / 2); index++) {
        const angle = (Math.PI * (2 * index + 1)) / (2 * order);
        factors.push([1, (2 * Math.sin(angle)) / omega, 1 / omega ** 2]);
      }
      const transfer = { numerator: [1], denominator: product(...factors) };
      const sections = factor(transfer);
      expect(sections).toHaveLength(Math.floor(order / 2));
      // |H|² = 1/(1 + (ω/ω₀)^2n), S. Butterworth 1930: independent of our own polynomial arithmetic.
      for (const ratio of [0.1, 0.5, 1, 2, 5]) {
        const { re, im } = cascadeAt(sections, ratio * omega);
        expect((re * re + im * im) * (1 + ratio ** (2 * order))).toBeCloseTo(1, 11);
      }
    }
  });

  it('are as few sections as possible: three real poles in each', () => {
    const random = seeded(53);
    for (let order = 4; order <= 16; order++) {
      const denominator = product(...Array.from({ length: order }, () => [1, 10 ** (-7 * random())]));
      expect(factor({ numerator: [1], denominator })).toHaveLength(Math.ceil(order / 3));
    }
  });

  it('spend one section more where pairs of zeros would not fit otherwise', () => {
    const denominator = product(...[1e-1, 1e-2, 1e-3, 1e-4, 1e-5, 1e-6].map((tau) => [1, tau]));
    const pair = (omega: number) => [1, 0.1 / omega, 1 / omega ** 2];
    const sections = factor({ numerator: product(pair(50), pair(3e3), pair(2e5)), denominator });
    expect(sections).toHaveLength(3);
    for (const section of sections) expect(degreeOf(section.numerator)).toBe(2);
  });

  it('have sections of order 3 at most whose numerators are no higher, each with its denominator from 1', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: 4, max: 16 }), (seed, order) => {
        const sections = factor(randomNetwork(seeded(seed), order));
        return sections.every(({ numerator, denominator }) => {
          const below = degreeOf(denominator);
          return below <= 3 && degreeOf(numerator) <= below && denominator[0] === 1;
        });
      }),
      { numRuns: 300, seed: 6 },
    );
  });

  it('let no signal between sections swing wildly: every section peaks at about the same level', () => {
    const random = seeded(54);
    const everywhere = Array.from({ length: 200 }, (_, index) => 10 ** (-1 + index / 20)); // 0.1 to 1e9 rad/s
    const size = (section: TransferFunction, omega: number) => {
      const { re, im } = transferAt(section, omega);
      return Math.hypot(re, im);
    };
    for (let round = 0; round < 200; round++) {
      const sections = factor(randomNetwork(random, 4 + (round % 9)));
      const peaks = sections.map((section) => Math.max(...everywhere.map((omega) => size(section, omega))));
      // Levelled at the moduli of the poles; between them a section with real poles rises little more.
      expect(Math.max(...peaks) / Math.min(...peaks)).toBeLessThan(1.5);
    }
  });

  it('put neighbouring poles into different sections', () => {
    const taus = [1.6e-2, 1.5e-2, 1e-5, 0.9e-5];
    const sections = factor({
      numerator: [0, 0, 1e-5],
      denominator: product(...taus.map((tau) => [1, tau])),
    });
    expect(sections).toHaveLength(2);
    for (const { denominator } of sections) {
      // One slow and one fast pole: the linear term is the slow time constant, the square their product.
      expect(denominator[1]! ** 2 / denominator[2]!).toBeGreaterThan(1000);
    }
  });
});
