import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { bracketedRoot } from '../../../src/parts/bracketed-root.ts';

/** Calls that a search made. */
function counted(evaluate: (place: number) => number): {
  evaluate: (place: number) => number;
  calls: () => number;
} {
  let calls = 0;
  return {
    evaluate: (place) => {
      calls += 1;
      return evaluate(place);
    },
    calls: () => calls,
  };
}

describe('a bracketed root', () => {
  it.each([
    ['√2', (x: number) => x * x - 2, 0, 2, Math.SQRT2],
    ['the fixed point of the cosine', (x: number) => Math.cos(x) - x, 0, 1, 0.7390851332151607], // Kaplan 2007
    ['Wallis’s cubic', (x: number) => x ** 3 - 2 * x - 5, 2, 3, 2.0945514815423265], // Wallis 1685
    ['ln 2', (x: number) => Math.exp(x) - 2, -10, 10, Math.LN2],
    ['a root with the bracket turned round', (x: number) => x - 0.3, 1, 0, 0.3],
  ])('%s', (_, evaluate, from, to, root) => {
    // The tolerance stated, 4 ε of the root.
    expect(Math.abs(bracketedRoot(evaluate, from, to) - root)).toBeLessThanOrEqual(4 * Number.EPSILON * root);
  });

  it('lies where the sign changes, for any cubic that crosses once', () => {
    fc.assert(
      fc.property(
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: 1e-6, max: 1e6, noNaN: true }),
        (root, slope) => {
          const found = bracketedRoot((x) => (x - root) * (slope + (x - root) ** 2), -2e6, 2e6);
          // Where (x − root) underflows against the cube the function is exact; 8 ε leaves its rounding.
          expect(Math.abs(found - root)).toBeLessThanOrEqual(
            8 * Number.EPSILON * Math.max(Math.abs(root), 1e-300),
          );
        },
      ),
    );
  });

  it('is found of a step and of a wall, where interpolation is of no use', () => {
    expect(bracketedRoot((x) => (x < 0.3 ? -1 : 1), 0, 1)).toBeCloseTo(0.3, 15);
    expect(bracketedRoot((x) => (x < 1e-200 ? -1 : 1e300), 0, 1e300) / 1e-200).toBeCloseTo(1, 12);
    expect(bracketedRoot((x) => x ** 9, -1, 1.5)).toBeCloseTo(0, 5);
  });

  it('is found across three hundred decades in fewer calls than there are bits', () => {
    const { evaluate, calls } = counted((x) => Math.log(x) - Math.log(1e-3));
    expect(bracketedRoot(evaluate, 1e-10, 1e10)).toBeCloseTo(1e-3, 15);
    expect(calls()).toBeLessThan(120);
  });

  it('takes few steps on a smooth curve', () => {
    const { evaluate, calls } = counted((x) => Math.exp(x) - 2);
    bracketedRoot(evaluate, 0, 1);
    // Bisection needs 52; Brent's book has such curves at about ten.
    expect(calls()).toBeLessThan(13);
  });

  it('that is an end is returned as it stands', () => {
    expect([bracketedRoot((x) => x, 0, 5), bracketedRoot((x) => x - 5, 0, 5)]).toEqual([0, 5]);
  });
});
