import { describe, expect, it } from 'vitest';
import { bilinear } from '../../../src/filter/bilinear.ts';
import type { AnalogueSection, DigitalSection } from '../../../src/filter/section.ts';
import { at, over, product, relativeError, seeded, transferAt } from './polynomials.ts';

/** The digital response at a frequency, straight from its definition. */
function digitalAt({ feedforward, feedback }: DigitalSection, frequency: number, sampleRate: number) {
  const angle = (2 * Math.PI * frequency) / sampleRate;
  const delay = { re: Math.cos(angle), im: -Math.sin(angle) };
  return over(at(feedforward, delay), at(feedback, delay));
}

describe('closed forms', () => {
  it('of one pole: b = ωT/(2 + ωT), a₁ = (ωT − 2)/(ωT + 2) (any handbook of digital filters)', () => {
    const [cutoff, rate] = [2 * Math.PI * 1000, 48000];
    const step = cutoff / rate;
    const { feedforward, feedback } = bilinear({ numerator: [1], denominator: [1, 1 / cutoff] }, rate);
    // Two or three roundings each.
    expect(feedforward[0]).toBeCloseTo(step / (2 + step), 15);
    expect(feedforward[1]).toBeCloseTo(step / (2 + step), 15);
    expect(feedback[0]).toBe(1);
    expect(feedback[1]).toBeCloseTo((step - 2) / (step + 2), 15);
  });

  it('of one zero at 0 over one pole: b = ±2/(2 + ωT), the pole as before', () => {
    const [cutoff, rate] = [2 * Math.PI * 80, 44100];
    const step = cutoff / rate;
    const { feedforward, feedback } = bilinear(
      { numerator: [0, 1 / cutoff], denominator: [1, 1 / cutoff] },
      rate,
    );
    expect(feedforward[0]).toBeCloseTo(2 / (2 + step), 15);
    expect(feedforward[1]).toBe(-feedforward[0]!);
    expect(feedback[1]).toBeCloseTo((step - 2) / (step + 2), 15);
  });

  it('of the Butterworth low-pass of order 2 at a quarter of the rate, pre-warped', () => {
    // tan(π/4) = 1, so b = (1, 2, 1)/(2 + √2) and a = (1, 0, (2 − √2)/(2 + √2)): handbook example.
    const omega = 2 * Math.PI * 12000;
    const section = { numerator: [1], denominator: [1, Math.SQRT2 / omega, 1 / omega ** 2] };
    const { feedforward, feedback } = bilinear(section, 48000, { prewarp: 12000 });
    const lead = 1 / (2 + Math.SQRT2);
    [lead, 2 * lead, lead].forEach((value, index) => {
      expect(feedforward[index]).toBeCloseTo(value, 15);
    });
    [1, 0, (2 - Math.SQRT2) * lead].forEach((value, index) => {
      expect(feedback[index]).toBeCloseTo(value, 15);
    });
  });

  it('of a gain is the gain', () => {
    expect(bilinear({ numerator: [3], denominator: [2] }, 44100)).toEqual({
      feedforward: [1.5],
      feedback: [1],
    });
  });

  it('of silence is silence', () => {
    expect(bilinear({ numerator: [0], denominator: [1] }, 44100)).toEqual({
      feedforward: [0],
      feedback: [1],
    });
  });

  it('drops coefficients that are exactly 0 at the high end', () => {
    const plain = bilinear({ numerator: [1], denominator: [1, 1e-3] }, 48000);
    expect(bilinear({ numerator: [1, 0, 0, 0], denominator: [1, 1e-3, 0, 0] }, 48000)).toEqual(plain);
  });
});

describe('properties', () => {
  const random = seeded(81);
  const randomSection = (order: number): AnalogueSection => ({
    numerator: Array.from({ length: order + 1 }, (_, power) => random() * 1e-4 ** power),
    denominator: product(...Array.from({ length: order }, () => [1, 10 ** (-3 - 3 * random())])),
  });

  it('keeps the gain at 0 Hz and puts the analogue gain at infinity at half the rate', () => {
    for (let order = 1; order <= 3; order++) {
      const section = randomSection(order);
      const { feedforward, feedback } = bilinear(section, 48000);
      const sum = (list: readonly number[], sign: number) =>
        list.reduce((total, value, index) => total + value * sign ** index, 0);
      expect(sum(feedforward, 1) / sum(feedback, 1)).toBeCloseTo(
        section.numerator[0]! / section.denominator[0]!,
        7,
      );
      expect(sum(feedforward, -1) / sum(feedback, -1)).toBeCloseTo(
        section.numerator[order]! / section.denominator[order]!,
        9,
      );
    }
  });

  it('maps frequencies: H_d(e^jω) = H(j·2fs·tan(ω/2fs)) to 1e-9', () => {
    for (const rate of [44100, 48000, 96000, 192000]) {
      for (let round = 0; round < 50; round++) {
        const section = randomSection(1 + (round % 3));
        const digital = bilinear(section, rate);
        for (const frequency of [500, 1000, 5000, 0.45 * rate]) {
          const mapped = transferAt(section, 2 * rate * Math.tan((Math.PI * frequency) / rate));
          expect(relativeError(digitalAt(digital, frequency, rate), mapped)).toBeLessThan(1e-9);
        }
      }
    }
  });

  it('meets the analogue response exactly at the pre-warp frequency, and not elsewhere', () => {
    for (let order = 1; order <= 3; order++) {
      const section = randomSection(order);
      const digital = bilinear(section, 48000, { prewarp: 9000 });
      const error = (frequency: number) =>
        relativeError(digitalAt(digital, frequency, 48000), transferAt(section, 2 * Math.PI * frequency));
      expect(error(9000)).toBeLessThan(1e-10);
      expect(error(15000)).toBeGreaterThan(1e-4);
    }
  });

  it('does not warp by default', () => {
    const section = randomSection(2);
    expect(bilinear(section, 48000, {})).toEqual(bilinear(section, 48000));
    expect(bilinear(section, 48000, { prewarp: 9000 })).not.toEqual(bilinear(section, 48000));
  });

  it('does not depend on a common factor of all coefficients', () => {
    const { numerator, denominator } = randomSection(3);
    const scaled = {
      numerator: numerator.map((c) => c * 2 ** 90),
      denominator: denominator.map((c) => c * 2 ** 90),
    };
    expect(bilinear(scaled, 48000)).toEqual(bilinear({ numerator, denominator }, 48000));
  });

  it('gives lists of equal length, the first feedback coefficient exactly 1', () => {
    for (let order = 0; order <= 3; order++) {
      const { feedforward, feedback } = bilinear(
        { numerator: [1], denominator: randomSection(order).denominator },
        48000,
      );
      expect(feedforward).toHaveLength(order + 1);
      expect(feedback).toHaveLength(order + 1);
      expect(feedback[0]).toBe(1);
    }
  });
});
