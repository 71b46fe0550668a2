import { describe, expect, it } from 'vitest';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { Cascade } from '../../../src/filter/cascade.ts';
import { factor } from '../../../src/filter/factor.ts';
import { impulseTail } from '../../../src/filter/impulse-tail.ts';
import { product, seeded } from './polynomials.ts';

describe('the length of an impulse response', () => {
  it('is ln(floor)/ln(p) for one pole, and its one delay', () => {
    for (const pole of [0.5, -0.9, 0.999, 1 - 1e-6]) {
      const expected = Math.log(1e-6) / Math.log(Math.abs(pole)) + 1;
      const tail = impulseTail([{ feedforward: [1, 0], feedback: [1, -pole] }], 1e6, 1e-6);
      expect(tail).toBe(Math.ceil(Math.min(expected, 60e6)));
    }
  });

  it('is one decay time for each of a pair of poles, from their radius', () => {
    const radius = 0.99;
    const section = { feedforward: [1, 0, 0], feedback: [1, -2 * radius * Math.cos(1), radius * radius] };
    const one = Math.log(1e-4) / Math.log(radius);
    expect(impulseTail([section], 48000, 1e-4)).toBe(Math.ceil(2 * one + 2));
  });

  it('is the delays alone where there are no poles', () => {
    expect(impulseTail([{ feedforward: [1, 2, 3], feedback: [1, 0, 0] }], 48000, 1e-6)).toBe(2);
    expect(impulseTail([{ feedforward: [1], feedback: [1] }], 48000, 1e-6)).toBe(0);
    expect(impulseTail([], 48000, 1e-6)).toBe(0);
  });

  it('ends at a minute', () => {
    const section = { feedforward: [1, 0], feedback: [1, -(1 - 2 ** -50)] };
    expect(impulseTail([section], 48000, 1e-6)).toBe(60 * 48000);
    expect(impulseTail([{ feedforward: [1, 0], feedback: [1, -1] }], 48000, 1e-6)).toBe(60 * 48000);
  });

  it('is never too short: nothing above the floor is left after it, random networks', () => {
    const random = seeded(121);
    for (let round = 0; round < 25; round++) {
      const taus = Array.from({ length: 2 + (round % 4) }, () => 10 ** (-2 - 3 * random()));
      if (round % 3 === 0) taus.push(taus[0]!); // coinciding poles decay more slowly at first
      const transfer = {
        numerator: [1, 1e-5 * random()],
        denominator: product(...taus.map((tau) => [1, tau])),
      };
      const sections = factor(transfer).map((section) => bilinear(section, 48000));
      const tail = impulseTail(sections, 48000, 1e-6);
      const response = new Float64Array(tail + 2000);
      response[0] = 1;
      new Cascade(sections).process(response);
      const peak = Math.max(...response.map(Math.abs));
      expect(Math.max(...response.slice(tail).map(Math.abs))).toBeLessThanOrEqual(1e-6 * peak);
      // Nor wastefully long: at most one decay of the slowest pole for each pole there is.
      const slowest = Math.log(1e6) * Math.max(...taus) * 48000;
      expect(tail).toBeLessThanOrEqual(slowest * taus.length * 1.01 + 12);
    }
  });
});
