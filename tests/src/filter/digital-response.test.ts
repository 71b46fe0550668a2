import { describe, expect, it } from 'vitest';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { digitalMagnitudeInto, digitalPhaseInto } from '../../../src/filter/digital-response.ts';
import { factor } from '../../../src/filter/factor.ts';
import type { DigitalSection } from '../../../src/filter/section.ts';
import { at, over, product, seeded, transferAt } from './polynomials.ts';

function magnitude(
  sections: readonly DigitalSection[],
  frequencies: readonly number[],
  rate: number,
): Float64Array {
  const out = new Float64Array(frequencies.length);
  digitalMagnitudeInto(out, sections, Float64Array.from(frequencies), rate);
  return out;
}

function phase(
  sections: readonly DigitalSection[],
  frequencies: readonly number[],
  rate: number,
): Float64Array {
  const out = new Float64Array(frequencies.length);
  digitalPhaseInto(out, sections, Float64Array.from(frequencies), rate);
  return out;
}

describe('the digital magnitude', () => {
  it('is |1 + z⁻¹|/2 = cos(ω/2) for the mean of two samples', () => {
    const rate = 48000;
    const frequencies = [10, 1000, 12000, 20000];
    magnitude([{ feedforward: [0.5, 0.5], feedback: [1, 0] }], frequencies, rate).forEach((level, index) => {
      expect(level).toBeCloseTo(20 * Math.log10(Math.cos((Math.PI * frequencies[index]!) / rate)), 12);
    });
  });

  it('is |1 − z⁻¹| = 2·sin(ω/2) for the difference of two samples, down to a millionth of the rate', () => {
    const rate = 192000;
    const frequencies = [0.01, 1, 20, 1000, 90000];
    magnitude([{ feedforward: [1, -1], feedback: [1, 0] }], frequencies, rate).forEach((level, index) => {
      // Relative: at 0.01 Hz a plain evaluation has lost seven of sixteen digits.
      expect(level / (20 * Math.log10(2 * Math.sin((Math.PI * frequencies[index]!) / rate)))).toBeCloseTo(
        1,
        14,
      );
    });
  });

  it('equals the definition at z = e^jω where that is well conditioned', () => {
    const random = seeded(111);
    for (let round = 0; round < 50; round++) {
      const section = {
        feedforward: [random(), random() - 0.5, random() - 0.5, random() - 0.5],
        feedback: product([1, 0.8 * random() - 0.4], [1, 0.3 * random(), 0.4 * random()]),
      };
      for (const frequency of [2000, 9000, 23000]) {
        const angle = (2 * Math.PI * frequency) / 48000;
        const delay = { re: Math.cos(angle), im: -Math.sin(angle) };
        const { re, im } = over(at(section.feedforward, delay), at(section.feedback, delay));
        expect(magnitude([section], [frequency], 48000)[0]).toBeCloseTo(
          20 * Math.log10(Math.hypot(re, im)),
          10,
        );
      }
    }
  });

  it('is that of the rounded coefficients near z = 1, which a plain evaluation cannot tell', () => {
    // A double pole at 1 − 2⁻²⁰: all coefficients are exact, so the response is known in closed form.
    const delta = 2 ** -20;
    const pole = 1 - delta;
    const section = { feedforward: [1, 0, 0], feedback: [1, -2 * pole, pole * pole] };
    const rate = 192000;
    for (const frequency of [0.001, 0.1, 20]) {
      const half = (Math.PI * frequency) / rate;
      const squared = delta * delta + 4 * pole * Math.sin(half) ** 2; // |1 − p·z⁻¹|² = (1 − p)² + 4p·sin²(ω/2)
      expect(magnitude([section], [frequency], rate)[0]).toBeCloseTo(-20 * Math.log10(squared), 10);
    }
  });

  it('adds up over a cascade', () => {
    const first = { feedforward: [1, 0.5], feedback: [1, -0.5] };
    const second = { feedforward: [0.2, 0.1, 0.3], feedback: [1, 0.1, 0.2] };
    const frequencies = [100, 5000, 20000];
    const both = magnitude([first, second], frequencies, 48000);
    const one = magnitude([first], frequencies, 48000);
    const other = magnitude([second], frequencies, 48000);
    both.forEach((level, index) => {
      expect(level).toBeCloseTo(one[index]! + other[index]!, 13);
    });
    expect([...magnitude([], frequencies, 48000)]).toEqual([0, 0, 0]);
  });

  it('is not a number above half the sample rate, and is one exactly there', () => {
    const levels = magnitude(
      [{ feedforward: [1, 0.5], feedback: [1, 0] }],
      [20000, 24000, 24001, 40000],
      48000,
    );
    expect(levels[1]).toBeCloseTo(20 * Math.log10(0.5), 12);
    expect([...levels.slice(2)]).toEqual([Number.NaN, Number.NaN]);
    expect(Number.isFinite(levels[0])).toBe(true);
  });

  it('is −Infinity where the cascade passes nothing', () => {
    expect(magnitude([{ feedforward: [0, 0], feedback: [1, 0] }], [1000], 48000)[0]).toBe(
      Number.NEGATIVE_INFINITY,
    );
  });
});

describe('the digital phase', () => {
  it('is −ω/2 for the mean of two samples: half a sample of delay', () => {
    const frequencies = [1, 1000, 12000, 23000];
    phase([{ feedforward: [0.5, 0.5], feedback: [1, 0] }], frequencies, 48000).forEach((angle, index) => {
      expect(angle).toBeCloseTo((-180 * frequencies[index]!) / 48000, 11);
    });
  });

  it('is −nω for a delay of n samples, unwrapped', () => {
    const frequencies = [1000, 10000, 23000];
    const delay = { feedforward: [0, 0, 0, 1], feedback: [1, 0, 0, 0] };
    phase([delay, delay], frequencies, 48000).forEach((angle, index) => {
      expect(angle).toBeCloseTo((-360 * 6 * frequencies[index]!) / 48000, 10);
    });
  });

  it('is the analogue phase at the mapped frequency', () => {
    const transfer = {
      numerator: [0, 1e-3, 1e-7],
      denominator: product([1, 1e-2], [1, 1e-3], [1, 1e-5], [1, 1e-4]),
    };
    const sections = factor(transfer).map((section) => bilinear(section, 48000));
    const frequencies = [50, 500, 5000, 20000];
    phase(sections, frequencies, 48000).forEach((angle, index) => {
      const { re, im } = transferAt(transfer, 2 * 48000 * Math.tan((Math.PI * frequencies[index]!) / 48000));
      const turns = (angle - (Math.atan2(im, re) * 180) / Math.PI) / 360;
      expect(Math.abs(turns - Math.round(turns))).toBeLessThan(1e-10);
    });
  });

  it('is not a number above half the sample rate or in silence', () => {
    expect(phase([{ feedforward: [1, 0.5], feedback: [1, 0] }], [30000], 48000)[0]).toBeNaN();
    expect(phase([{ feedforward: [0, 0], feedback: [1, 0] }], [1000], 48000)[0]).toBeNaN();
  });
});
