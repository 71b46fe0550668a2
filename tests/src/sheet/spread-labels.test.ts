import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { spreadLabels } from '../../../src/sheet/spread-labels.ts';

describe('spreading labels', () => {
  it('leaves alone what does not touch', () => {
    expect(spreadLabels([30, 0, 100], 14)).toEqual([30, 0, 100]);
  });

  it('moves two that touch by the same amount', () => {
    expect(spreadLabels([50, 50], 14)).toEqual([43, 57]);
    expect(spreadLabels([52, 48], 14)).toEqual([57, 43]);
  });

  it('keeps within its bounds, closer together where there is no room', () => {
    expect(spreadLabels([2, 2, 2], 10, 0, 100)).toEqual([0, 10, 20]);
    expect(spreadLabels([99, 99], 10, 0, 100)).toEqual([90, 100]);
    expect(spreadLabels([5, 5, 5], 10, 0, 10)).toEqual([0, 5, 10]);
    expect(spreadLabels([], 10, 0, 10)).toEqual([]);
    expect(spreadLabels([7], 10, 0, 5)).toEqual([5]);
  });

  it('keeps order, distance and bounds for any labels', () => {
    const places = fc.array(fc.double({ min: 0, max: 300, noNaN: true }), { maxLength: 8 });
    fc.assert(
      fc.property(places, (wanted) => {
        const got = spreadLabels(wanted, 14, 0, 300);
        const order = wanted.map((_, index) => index).sort((a, b) => wanted[a]! - wanted[b]! || a - b);
        order.forEach((index, rank) => {
          expect(got[index]).toBeGreaterThanOrEqual(0);
          expect(got[index]).toBeLessThanOrEqual(300);
          // 1e-9: rounding of sums of at most eight numbers under 300.
          if (rank > 0) expect(got[index]! - got[order[rank - 1]!]!).toBeGreaterThan(14 - 1e-9);
        });
      }),
    );
  });

  it('moves no more than needed: no single label can go nearer to its wish', () => {
    const wanted = [10, 12, 15, 60];
    const got = spreadLabels(wanted, 10);
    // The least-squares answer by hand: the first three share one cluster with base (10 + 2 − 5)/3.
    const base = (10 + (12 - 10) + (15 - 20)) / 3;
    expect(got).toEqual([base, base + 10, base + 20, 60]);
  });
});
