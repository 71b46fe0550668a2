import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { polynomialRoots } from '../../src/filter/roots.ts';

/**
 * Roots against mpmath with 400 digits (`make_roots.py` beside this file): the exact roots of the
 * very coefficients given, so that nothing but our own search is judged.
 */
interface Case {
  readonly kind: string;
  readonly coefficients: readonly number[];
  readonly roots: readonly (readonly [re: number, im: number])[];
}

const reference = JSON.parse(readFileSync(new URL('roots.json', import.meta.url), 'utf8')) as {
  readonly cases: readonly Case[];
};

/** Our roots in the file's order: ascending modulus, the conjugate below the axis first. */
function flat(coefficients: readonly number[]): [number, number][] {
  const { real, pairs } = polynomialRoots(coefficients);
  const all: [number, number][] = real.map((root) => [root, 0]);
  for (const { re, im } of pairs) all.push([re, -im], [re, im]);
  return all;
}

/** Largest distance from a reference root to the nearest of ours, relative to its modulus. */
function largestError({ coefficients, roots }: Case): number {
  const ours = flat(coefficients);
  expect(ours).toHaveLength(roots.length);
  return Math.max(
    ...roots.map(([re, im]) => {
      const nearest = Math.min(...ours.map(([x, y]) => Math.hypot(x - re, y - im)));
      return nearest / Math.hypot(re, im);
    }),
  );
}

const group = (kind: string) => reference.cases.filter((entry) => entry.kind === kind);

describe('roots against mpmath', () => {
  it('reads a reference with every kind of case', () => {
    const kinds = new Set(reference.cases.map((entry) => entry.kind));
    expect(kinds.size).toBe(5);
    expect(reference.cases.length).toBeGreaterThan(50);
  });

  it.each(group('real, apart').map((entry) => [entry.roots.length, entry] as const))(
    'finds %i real roots over seven decades to the last digits',
    (_, entry) => {
      // A few units in the last place: the polishing's own arithmetic rounds once or twice.
      expect(largestError(entry)).toBeLessThan(1e-15);
      expect(polynomialRoots(entry.coefficients).pairs).toEqual([]);
    },
  );

  it.each(group('real, two close').map((entry) => [entry.roots.length, entry] as const))(
    'parts two close ones among %i real roots',
    (_, entry) => {
      // Even 1e-7 apart: values in twice the precision leave only the last rounding.
      expect(largestError(entry)).toBeLessThan(1e-15);
      expect(polynomialRoots(entry.coefficients).pairs).toEqual([]);
    },
  );

  it.each(group('complex').map((entry) => [entry.roots.length, entry] as const))(
    'finds %i roots, some of them conjugate pairs',
    (_, entry) => {
      expect(largestError(entry)).toBeLessThan(1e-15);
      const expected = entry.roots.filter(([, im]) => im > 0).length;
      expect(polynomialRoots(entry.coefficients).pairs).toHaveLength(expected);
    },
  );

  it.each([...group('complex, almost real'), ...group('complex, to the right or near the axis')])(
    'finds roots that are $kind',
    (entry) => {
      expect(largestError(entry)).toBeLessThan(1e-15);
    },
  );
});
