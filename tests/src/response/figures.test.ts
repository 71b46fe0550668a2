import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { levelOf } from '../../../src/response/curve.ts';
import { readFigures } from '../../../src/response/figures.ts';
import type { TransferFunction } from '../../../src/transfer-function.ts';

/** A symmetric dip in closed form: at `frequency` the gain is `zeroDamping/poleDamping` exactly, and least there. */
function dipAt(frequency: number, zeroDamping: number, poleDamping: number): TransferFunction {
  const omega = 2 * Math.PI * frequency;
  return {
    numerator: [1, zeroDamping / omega, 1 / omega ** 2],
    denominator: [1, poleDamping / omega, 1 / omega ** 2],
  };
}

const decibels = (ratio: number) => 20 * Math.log10(ratio);

describe('levels and lifts', () => {
  it('are read at 1 kHz, 100 Hz and 5 kHz', () => {
    const tau = 1 / (2 * Math.PI * 500);
    const level = levelOf({ numerator: [0.5], denominator: [1, tau] });
    const { levelAt1k, liftAt100, liftAt5k } = readFigures(level);
    expect(levelAt1k).toBeCloseTo(decibels(0.5) - 10 * Math.log10(1 + 4), 12);
    expect(liftAt100).toBeCloseTo(10 * Math.log10(5) - 10 * Math.log10(1 + 0.04), 12);
    expect(liftAt5k).toBeCloseTo(10 * Math.log10(5) - 10 * Math.log10(1 + 100), 12);
  });
});

describe('the mid dip', () => {
  it.each([
    [412.7, 0.3, 3],
    [550, 0.05, 2],
    [101, 0.2, 2],
    [4900, 0.4, 1.5],
    [1000, 1.9, 2],
  ])('of a symmetric dip at %d Hz is found exactly', (frequency, zeroDamping, poleDamping) => {
    const transfer = dipAt(frequency, zeroDamping, poleDamping);
    const level = levelOf(transfer);
    const { midDip } = readFigures(level);
    // The level is flat to second order, so its place is determined to the root of its precision;
    // the shallow dip (0.4 dB) is flatter still.
    expect(midDip!.frequency / frequency).toBeCloseTo(1, 6);
    expect(midDip!.level).toBeCloseTo(decibels(zeroDamping / poleDamping), 11);
    // The shoulders are the ends of what is heard, where this response is highest.
    expect(midDip!.depth).toBeCloseTo(Math.min(level(20), level(20000)) - midDip!.level, 11);
  });

  it('is found for any frequency and depth, whatever the grid underneath', () => {
    fc.assert(
      fc.property(
        fc.double({ min: Math.log(110), max: Math.log(4500), noNaN: true }),
        fc.double({ min: 0.01, max: 1, noNaN: true }),
        (place, zeroDamping) => {
          const frequency = Math.exp(place);
          const { midDip } = readFigures(levelOf(dipAt(frequency, zeroDamping, 2)));
          return (
            midDip !== undefined &&
            Math.abs(midDip.frequency / frequency - 1) < 1e-6 &&
            Math.abs(midDip.level - decibels(zeroDamping / 2)) < 1e-9
          );
        },
      ),
      { numRuns: 200, seed: 7 },
    );
  });

  it('is counted from the lower shoulder', () => {
    // The dip at 500 Hz on a slope that drops 6 dB towards the treble.
    const slope = (frequency: number) => -3 * Math.log10(frequency / 500);
    const dip = levelOf(dipAt(500, 0.1, 1));
    const { midDip } = readFigures((frequency) => dip(frequency) + slope(frequency));
    expect(midDip!.frequency).toBeGreaterThan(495);
    expect(midDip!.frequency).toBeLessThan(505);
    const fine = Array.from({ length: 4000 }, (_, index) => 500 * 40 ** (index / 3999));
    const shoulder = Math.max(...fine.map((frequency) => dip(frequency) + slope(frequency)));
    expect(midDip!.depth).toBeCloseTo(shoulder - midDip!.level, 4); // the sampled shoulder is the coarser one
    expect(midDip!.depth).toBeGreaterThanOrEqual(shoulder - midDip!.level);
  });

  it('is the deeper one of two', () => {
    const [shallow, deep] = [levelOf(dipAt(250, 0.5, 1)), levelOf(dipAt(2500, 0.1, 1))];
    const { midDip } = readFigures((frequency) => shallow(frequency) + deep(frequency));
    expect(midDip!.frequency / 2500).toBeCloseTo(1, 1);
  });

  it('is infinitely deep for a perfect notch on a sampled point or between', () => {
    for (const frequency of [20 * 2 ** (120 / 24), 777]) {
      const omega = 2 * Math.PI * frequency;
      const notch = levelOf({ numerator: [omega ** 2, 0, 1], denominator: [omega ** 2, omega, 1] });
      const { midDip } = readFigures(notch);
      expect(midDip!.frequency / frequency).toBeCloseTo(1, 8);
      expect(midDip!.level).toBeLessThan(-150);
      expect(midDip!.depth).toBeGreaterThan(150);
    }
  });

  it.each([
    ['a flat response', { numerator: [0.3], denominator: [1] }],
    ['a low-pass', { numerator: [1], denominator: [1, 1e-4] }],
    ['a high-pass', { numerator: [0, 1e-4], denominator: [1, 1e-4] }],
    ['a peak', dipAt(600, 3, 0.3)],
    ['a dip below 100 Hz', dipAt(60, 0.1, 1)],
    ['a dip above 5 kHz', dipAt(7000, 0.1, 1)],
    ['a dip of less than 0.01 dB', dipAt(600, 1.999, 2)],
    ['silence', { numerator: [0], denominator: [1] }],
  ])('is none in %s', (_, transfer) => {
    expect(readFigures(levelOf(transfer)).midDip).toBeUndefined();
  });

  it('is none where rounding makes ripples', () => {
    const { midDip } = readFigures((frequency) => 1e-13 * Math.sin(frequency));
    expect(midDip).toBeUndefined();
  });

  it('takes a product of blocks: levels that add', () => {
    const dip = levelOf(dipAt(800, 0.2, 2));
    const gain = levelOf({ numerator: [0.1], denominator: [1] });
    const { midDip } = readFigures((frequency) => dip(frequency) + gain(frequency));
    expect(midDip!.level).toBeCloseTo(-40, 11);
  });
});
