import { describe, expect, it } from 'vitest';
import { preferredFrequencies } from '../../../src/sheet/preferred-frequencies.ts';

describe('preferred frequencies', () => {
  it('are the third-octaves of ISO 266', () => {
    // ISO 266, table of preferred frequencies (from memory).
    expect(preferredFrequencies(20, 20_000)).toEqual([
      20, 25, 31.5, 40, 50, 63, 80, 100, 125, 160, 200, 250, 315, 400, 500, 630, 800, 1000, 1250, 1600, 2000,
      2500, 3150, 4000, 5000, 6300, 8000, 10_000, 12_500, 16_000, 20_000,
    ]);
  });

  it('lie within 1 % of tenths of a decade, from which the standard rounds them', () => {
    preferredFrequencies(10, 80_000).forEach((frequency, index) => {
      // ISO 266 rounds 10^(n/10) to two or three digits; the largest step it takes is 0.95 % (at 63).
      expect(Math.abs(frequency / 10 ** (1 + index / 10) - 1)).toBeLessThan(0.01);
    });
  });

  it('keep within the band', () => {
    expect(preferredFrequencies(90, 170)).toEqual([100, 125, 160]);
    expect(preferredFrequencies(101, 110)).toEqual([]);
  });
});
