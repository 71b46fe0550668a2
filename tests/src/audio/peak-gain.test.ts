import { describe, expect, it } from 'vitest';
import { peakGain } from '../../../src/audio/peak-gain.ts';
import { bilinear } from '../../../src/filter/bilinear.ts';
import type { DigitalSection } from '../../../src/filter/section.ts';
import { toneSections } from './line-sections.ts';

/** One pole at r: h[n] = rⁿ, and Σ|h| = 1/(1 − |r|), the sum of the geometric series. */
const onePole = (pole: number): DigitalSection => ({ feedforward: [1, 0], feedback: [1, -pole] });

/** The promised 0.1 %. */
const CLOSE = 1e-3;

describe('peakGain', () => {
  it('is 1 without sections', () => {
    expect(peakGain([])).toBe(1);
  });

  it('is the size of a plain gain, whatever its sign', () => {
    expect(peakGain([{ feedforward: [-0.25], feedback: [1] }])).toBeCloseTo(0.25, 12);
  });

  for (const pole of [0.5, -0.9, 0.999, 0.99999]) {
    it(`is the sum of the geometric series for a pole at ${pole}`, () => {
      const expected = 1 / (1 - Math.abs(pole));
      expect(Math.abs(peakGain([onePole(pole)]) / expected - 1)).toBeLessThan(CLOSE);
    });
  }

  it('is 2 for a coupling capacitor at 1 Hz: what it blocks comes back with the other sign', () => {
    // h = δ − p·e^(−pt) in continuous time: 1 + 1. The bilinear transform keeps it to a few 1e-5.
    const corner = 2 * Math.PI;
    const section = bilinear({ numerator: [0, 1 / corner], denominator: [1, 1 / corner] }, 48_000);
    expect(Math.abs(peakGain([section]) / 2 - 1)).toBeLessThan(CLOSE);
  });

  it('is 0 for a filter that passes nothing', () => {
    expect(peakGain([{ feedforward: [0, 0], feedback: [1, -0.5] }])).toBe(0);
  });

  it('bounds the worst signal of the tone network, and that signal reaches it', () => {
    const sections = toneSections({ treble: 1, bass: 1, middle: 1 });
    const response = new Float64Array(48_000);
    response[0] = 1;
    const [section] = sections;
    const { feedforward, feedback } = section!;
    const input = response.slice();
    for (let index = 0; index < input.length; index += 1) {
      let sum = 0;
      for (let delay = 0; delay < feedforward.length; delay += 1) {
        sum += feedforward[delay]! * (input[index - delay] ?? 0);
        if (delay > 0) sum -= feedback[delay]! * (response[index - delay] ?? 0);
      }
      response[index] = sum;
    }
    // The worst signal has the response's signs, played backwards: its peak is Σ|h|.
    const worst = response.reduce((sum, value) => sum + value * Math.sign(value), 0);
    expect(sections).toHaveLength(1);
    expect(Math.abs(peakGain(sections) / worst - 1)).toBeLessThan(CLOSE);
  });
});
