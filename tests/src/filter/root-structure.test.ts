import { describe, expect, it } from 'vitest';
import { structureOf } from '../../../src/filter/root-structure.ts';

const rough = (...roots: readonly (readonly [number, number])[]) => ({
  re: Float64Array.from(roots, ([re]) => re),
  im: Float64Array.from(roots, ([, im]) => im),
});

describe('the structure of rough roots', () => {
  it('takes roots far from the others’ mirror images as real', () => {
    const { singles, couples } = structureOf(rough([-1, 1e-12], [-5, -3e-13], [2, 0]));
    expect(singles).toEqual([-5, -1, 2]);
    expect(couples).toEqual([]);
  });

  it('joins conjugates exactly, whatever their rounding', () => {
    const { singles, couples } = structureOf(rough([-3, 4 + 1e-12], [-7, 0], [-3 + 1e-12, -4]));
    expect(singles).toEqual([-7]);
    expect(couples).toHaveLength(1);
    expect(couples[0]!.middle).toBeCloseTo(-3, 11);
    expect(couples[0]!.spread).toBeCloseTo(-16, 10);
  });

  it('joins two real roots too close to be refined apart', () => {
    const { singles, couples } = structureOf(rough([-1, 0], [-1.0001, 0], [-2, 0]));
    expect(singles).toEqual([-2]);
    expect(couples[0]!.middle).toBeCloseTo(-1.00005, 12);
    expect(couples[0]!.spread).toBeCloseTo(0.00005 ** 2, 15);
  });

  it('keeps several pairs apart', () => {
    const { couples } = structureOf(rough([1, 2], [1, 3], [1, -3], [1, -2]));
    expect(couples.map(({ spread }) => spread).sort((a, b) => a - b)).toEqual([-9, -4]);
  });

  it('leaves the odd one of three near-real roots single', () => {
    const { singles, couples } = structureOf(rough([-1, 1e-6], [-1.000001, -1e-6], [-0.99, 1e-15]));
    expect(singles.length + 2 * couples.length).toBe(3);
    expect(singles).toEqual([-0.99]);
  });
});
