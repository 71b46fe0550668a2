import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compile } from '../../../src/circuit/compile.ts';
import { polynomialRoots } from '../../../src/filter/roots.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';
import { randomCircuit } from './random-wiring.ts';

const seeds = fc.integer({ min: 1, max: 1_000_000 });

describe('laws that every circuit keeps', () => {
  it('RC networks have real negative poles (W. Cauer 1926; E. A. Guillemin, Synthesis of Passive Networks, 1957; from memory)', () => {
    let poles = 0;
    fc.assert(
      fc.property(seeds, fc.integer({ min: 3, max: 8 }), (seed, nodes) => {
        const { wiring, values } = randomCircuit(seededRandom(seed), nodes, {
          inductors: false,
          controlled: false,
        });
        const { denominator } = compile(wiring).evaluate(values);
        if (denominator.filter((coefficient) => coefficient !== 0).length < 2) return; // no capacitor that matters
        const { real, pairs } = polynomialRoots(denominator);
        expect(pairs).toEqual([]);
        for (const root of real) expect(root).toBeLessThan(0);
        poles += real.length;
      }),
      { seed: 26, numRuns: 150 },
    );
    expect(poles).toBeGreaterThan(300); // that there was something to see
  });

  it('all impedances times k leave H as it is (impedance scaling)', () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: 1e-3, max: 1e3, noNaN: true }), (seed, k) => {
        const { wiring, values } = randomCircuit(seededRandom(seed), 7, {
          inductors: true,
          controlled: false,
        });
        const scaled = values.map((value, index) =>
          wiring.elements[index]!.kind === 'capacitor' ? value / k : value * k,
        );
        const network = compile(wiring);
        const [plain, other] = [network.transfer(values), network.transfer(scaled)];
        const first = (coefficients: readonly number[]) =>
          coefficients.find((coefficient) => coefficient !== 0)!;
        for (const side of ['numerator', 'denominator'] as const) {
          expect(other[side].length).toBe(plain[side].length);
          other[side].forEach((coefficient, power) => {
            const expected = plain[side][power]! / first(plain.denominator);
            const got = coefficient / first(other.denominator);
            // Sums of positive products of some 20 factors: each rounds by 1e-16.
            expect(Math.abs(got - expected)).toBeLessThanOrEqual(1e-13 * Math.abs(expected));
          });
        }
      }),
      { seed: 27, numRuns: 100 },
    );
  });

  it('times divided by k: capacitors and inductors times k move the response down by k (frequency scaling)', () => {
    fc.assert(
      fc.property(seeds, fc.double({ min: 1e-2, max: 1e2, noNaN: true }), (seed, k) => {
        const { wiring, values } = randomCircuit(seededRandom(seed), 6, {
          inductors: true,
          controlled: false,
        });
        const slowed = values.map((value, index) =>
          wiring.elements[index]!.kind === 'resistor' ? value : value * k,
        );
        const network = compile(wiring);
        const [plain, other] = [network.evaluate(values), network.evaluate(slowed)];
        plain.denominator.forEach((coefficient, power) => {
          const expected = coefficient * k ** power;
          expect(Math.abs(other.denominator[power]! - expected)).toBeLessThanOrEqual(1e-13 * expected);
        });
      }),
      { seed: 28, numRuns: 100 },
    );
  });

  it('a passive network of resistors never gives more than its source', () => {
    fc.assert(
      fc.property(seeds, (seed) => {
        const { wiring, values } = randomCircuit(seededRandom(seed), 8, {
          inductors: false,
          controlled: false,
        });
        const resistive = wiring.elements
          .map((element, index) => ({ element, value: values[index]! }))
          .filter(({ element }) => element.kind === 'resistor');
        const { numerator, denominator } = compile({
          ...wiring,
          elements: resistive.map(({ element }) => element),
        }).transfer(resistive.map(({ value }) => value));
        expect(numerator[0]! / denominator[0]!).toBeGreaterThanOrEqual(0);
        expect(numerator[0]! / denominator[0]!).toBeLessThanOrEqual(1 + 1e-14); // rounding of sums that are equal
      }),
      { seed: 29, numRuns: 100 },
    );
  });
});
