import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  leastRating,
  leastResistorRating,
  type RatedKind,
  USUAL_MARGIN,
  USUAL_RATINGS,
} from '../../../src/parts/rating.ts';

const KINDS = Object.keys(USUAL_RATINGS) as RatedKind[];

describe('usual ratings', () => {
  it.each(KINDS)('of a %s ascend', (kind) => {
    const ratings = USUAL_RATINGS[kind];
    expect(ratings).toEqual([...ratings].sort((a, b) => a - b));
    expect(new Set(ratings).size).toBe(ratings.length);
    expect(USUAL_MARGIN[kind]).toBeGreaterThan(0);
  });

  it('the least that covers a stress is covered by it, and the one below is not', () => {
    const stress = fc.double({ min: 0, max: 5000, noNaN: true });
    const margin = fc.double({ min: 0, max: 2, noNaN: true });
    fc.assert(
      fc.property(fc.constantFrom(...KINDS), stress, margin, (kind, volts, share) => {
        const rating = leastRating(kind, volts, share);
        const needed = volts * (1 + share);
        // A billionth is given away to rounding; see the function.
        for (const other of USUAL_RATINGS[kind]) {
          if (rating === undefined || other < rating) expect(other).toBeLessThan(needed);
        }
        if (rating !== undefined) expect(rating).toBeGreaterThanOrEqual(needed * (1 - 2e-9));
      }),
    );
  });

  it.each([
    ['film-capacitor', 200, undefined, 250],
    ['film-capacitor', 201, undefined, 400],
    ['film-capacitor', 320, undefined, 400],
    ['film-capacitor', 400, 0, 400],
    ['film-capacitor', 0, undefined, 63],
    ['electrolytic-capacitor', 1.5, undefined, 6.3],
    ['electrolytic-capacitor', 409, undefined, 450],
    ['resistor', 0.09, undefined, 0.25],
    ['resistor', 0.25, undefined, 0.5],
  ] as const)('a %s at %s with margin %s needs %s', (kind, stress, margin, rating) => {
    expect(leastRating(kind, stress, margin)).toBe(rating);
  });

  it('nothing on sale covers some stresses', () => {
    expect(leastRating('electrolytic-capacitor', 600)).toBeUndefined();
    expect(leastRating('resistor', 1000)).toBeUndefined();
  });

  it('a resistor can need a bigger body for its voltage alone', () => {
    // 1 MΩ at 300 V: 0.09 W, but 300 V is more than a quarter-watt body takes.
    expect(leastRating('resistor', 0.09)).toBe(0.25);
    expect(leastResistorRating(0.09, 300)).toBe(0.5);
    expect(leastResistorRating(0.09, 100)).toBe(0.25);
    expect(leastResistorRating(3, 100)).toBe(7);
    expect(leastResistorRating(0.01, 5000)).toBeUndefined();
    expect(leastResistorRating(0.3, 0, 0)).toBe(0.5);
  });
});
