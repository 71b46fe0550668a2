import { describe, expect, it } from 'vitest';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { Cascade } from '../../../src/filter/cascade.ts';
import { digitalMagnitudeInto } from '../../../src/filter/digital-response.ts';
import { factor } from '../../../src/filter/factor.ts';
import type { DigitalSection } from '../../../src/filter/section.ts';
import { product, seeded } from './polynomials.ts';

function impulse(sections: readonly DigitalSection[], length: number): Float64Array {
  const block = new Float64Array(length);
  block[0] = 1;
  new Cascade(sections).process(block);
  return block;
}

function noise(length: number, seed: number): Float64Array {
  const random = seeded(seed);
  return Float64Array.from({ length }, () => 2 * random() - 1);
}

describe('impulse responses in closed form', () => {
  it('one zero: the coefficients themselves', () => {
    expect([...impulse([{ feedforward: [0.5, -0.25], feedback: [1, 0] }], 4)]).toEqual([0.5, -0.25, 0, 0]);
  });

  it('one pole: b·pⁿ', () => {
    const response = impulse([{ feedforward: [0.1, 0], feedback: [1, -0.9] }], 200);
    response.forEach((value, index) => {
      expect(value / (0.1 * 0.9 ** index)).toBeCloseTo(1, 12); // a rounding a step
    });
  });

  it('a pair of poles: rⁿ·sin((n + 1)θ)/sin θ', () => {
    const [radius, angle] = [0.98, 0.3];
    const section = { feedforward: [1, 0, 0], feedback: [1, -2 * radius * Math.cos(angle), radius * radius] };
    impulse([section], 300).forEach((value, index) => {
      const expected = (radius ** index * Math.sin((index + 1) * angle)) / Math.sin(angle);
      expect(Math.abs(value - expected)).toBeLessThan(1e-12);
    });
  });

  it('three poles: Σ pᵢⁿ⁺² / Π(pᵢ − pⱼ), by partial fractions', () => {
    const poles = [0.95, 0.6, -0.4];
    const section = { feedforward: [1, 0, 0, 0], feedback: product(...poles.map((pole) => [1, -pole])) };
    impulse([section], 200).forEach((value, sample) => {
      const expected = poles.reduce((sum, pole) => {
        const others = poles.filter((other) => other !== pole);
        return sum + pole ** (sample + 2) / others.reduce((whole, other) => whole * (pole - other), 1);
      }, 0);
      expect(Math.abs(value - expected)).toBeLessThan(1e-13); // some hundred roundings of values up to 3
    });
  });

  it('order 3 without poles: four coefficients, then nothing', () => {
    expect([...impulse([{ feedforward: [1, 2, 3, 4], feedback: [1, 0, 0, 0] }], 6)]).toEqual([
      1, 2, 3, 4, 0, 0,
    ]);
  });

  it('two sections: the convolution of theirs', () => {
    const response = impulse(
      [
        { feedforward: [1, 1], feedback: [1, 0] },
        { feedforward: [2, 0, -2], feedback: [1, 0, 0] },
      ],
      5,
    );
    expect([...response]).toEqual([2, 2, -2, -2, 0]);
  });

  it('no section: the signal as it is', () => {
    expect([...impulse([], 3)]).toEqual([1, 0, 0]);
  });
});

describe('running block by block', () => {
  const transfer = {
    numerator: [0, 1e-3, 2e-7],
    denominator: product([1, 1e-2], [1, 1e-3], [1, 2e-5], [1, 1e-6]),
  };
  const sections = factor(transfer).map((section) => bilinear(section, 48000));

  it('gives bit for bit what one run gives, whatever the blocks', () => {
    const whole = noise(5000, 1);
    const pieces = whole.slice();
    new Cascade(sections).process(whole);
    const cascade = new Cascade(sections);
    for (let start = 0, length = 1; start < pieces.length; start += length, length = (length * 7) % 311) {
      cascade.process(pieces.subarray(start, start + length));
    }
    expect(pieces).toEqual(whole);
  });

  it('keeps channels apart', () => {
    const [left, right] = [noise(2000, 2), noise(2000, 3)];
    const [alone, other] = [left.slice(), right.slice()];
    const cascade = new Cascade(sections, 2);
    for (let start = 0; start < 2000; start += 500) {
      cascade.process(left.subarray(start, start + 500), 0);
      cascade.process(right.subarray(start, start + 500), 1);
    }
    new Cascade(sections).process(alone);
    new Cascade(sections).process(other);
    expect(left).toEqual(alone);
    expect(right).toEqual(other);
  });

  it('starts anew after a reset', () => {
    const cascade = new Cascade(sections);
    cascade.process(noise(100, 4));
    cascade.reset();
    const again = noise(100, 5);
    const fresh = again.slice();
    cascade.process(again);
    new Cascade(sections).process(fresh);
    expect(again).toEqual(fresh);
  });

  it('falls to exact silence, not into numbers that slow the processor', () => {
    const cascade = new Cascade([{ feedforward: [1, 0], feedback: [1, -0.9] }]);
    const block = new Float64Array(6000); // 0.9^6000 is 1e-275, still a number
    block[0] = 1;
    cascade.process(block);
    expect(block[5999]).toBeGreaterThan(0);
    const after = new Float64Array(10);
    cascade.process(after);
    expect([...after]).toEqual(new Array(10).fill(0));
  });

  it('takes an empty block', () => {
    expect(() => new Cascade(sections).process(new Float64Array(0))).not.toThrow();
  });

  it('scales: twice the input is twice the output, exactly', () => {
    const single = noise(500, 6);
    const double = single.map((value) => 2 * value);
    new Cascade(sections).process(single);
    new Cascade(sections).process(double);
    expect(double).toEqual(single.map((value) => 2 * value));
  });

  it('has the magnitude that the digital response tells, measured on the impulse response', () => {
    const response = impulse(sections, 1 << 16);
    const frequencies = Float64Array.of(50, 440, 3000, 15000);
    const expected = new Float64Array(4);
    digitalMagnitudeInto(expected, sections, frequencies, 48000);
    frequencies.forEach((frequency, index) => {
      let [re, im] = [0, 0];
      response.forEach((value, sample) => {
        const angle = (2 * Math.PI * frequency * sample) / 48000;
        re += value * Math.cos(angle);
        im -= value * Math.sin(angle);
      });
      // 65,536 terms of rounding 1e-16 each, against levels down to −40 dB.
      expect(20 * Math.log10(Math.hypot(re, im))).toBeCloseTo(expected[index]!, 8);
    });
  });
});
