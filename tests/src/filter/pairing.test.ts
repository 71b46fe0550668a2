import { describe, expect, it } from 'vitest';
import { pairRoots } from '../../../src/filter/pairing.ts';

const NONE = { real: [], pairs: [] };
const real = (...roots: number[]) => ({ real: roots, pairs: [] });

describe('pairing poles and zeros', () => {
  it('gives each zero to the group of its nearest pole', () => {
    const groups = pairRoots(real(-10, -100, -1e4, -1e5), real(-110, 9e3));
    expect(groups.map(({ poles }) => poles.real)).toEqual([
      [-10, -1e4],
      [-100, -1e5],
    ]);
    expect(groups.map(({ zeros }) => zeros.real)).toEqual([[9e3], [-110]]);
  });

  it('gives a zero at 0 to the lowest pole', () => {
    const groups = pairRoots(real(-10, -100, -1e4, -1e5), real(0));
    expect(groups[0]!.zeros.real).toEqual([0]);
    expect(groups[1]!.zeros.real).toEqual([]);
  });

  it('keeps a conjugate pair of zeros in one group', () => {
    const pair = { re: -1, im: 1e5 };
    const groups = pairRoots(real(-10, -100, -1e4, -1e5), { real: [0, 0], pairs: [pair] });
    expect(groups.map(({ zeros }) => zeros.pairs.length)).toEqual([0, 1]);
    expect(groups.map(({ zeros }) => zeros.real.length)).toEqual([2, 0]);
  });

  it('gives every conjugate pair of poles a group, real poles filling up', () => {
    const poles = {
      real: [-1, -2, -3],
      pairs: [
        { re: -1, im: 10 },
        { re: -1, im: 1e3 },
      ],
    };
    const groups = pairRoots(poles, NONE);
    expect(groups.map((group) => group.poles.pairs.length)).toEqual([1, 1, 0]);
    expect(groups.map((group) => group.poles.real.length)).toEqual([1, 0, 2]); // each to the emptiest
  });

  it('never puts more zeros than poles into a group', () => {
    const zeros = {
      real: [-5, 0, 7],
      pairs: [
        { re: -2, im: 3 },
        { re: 0, im: 40 },
      ],
    };
    const poles = real(-1, -3, -9, -30, -90, -300, -900);
    for (const group of pairRoots(poles, zeros)) {
      expect(group.zeros.real.length + 2 * group.zeros.pairs.length).toBeLessThanOrEqual(
        group.poles.real.length,
      );
      expect(group.poles.real.length).toBeLessThanOrEqual(3);
      expect(group.room).toBeGreaterThanOrEqual(0);
    }
  });

  it('finds room for as many pairs of zeros as there can be, for every mix of poles up to 12', () => {
    for (let pairs = 0; pairs <= 6; pairs++) {
      for (let reals = 0; reals + 2 * pairs <= 12; reals++) {
        const order = reals + 2 * pairs;
        if (order === 0) continue;
        const poles = {
          real: Array.from({ length: reals }, (_, index) => -(3 ** index)),
          pairs: Array.from({ length: pairs }, (_, index) => ({ re: -1, im: 5 ** index })),
        };
        const zeros = {
          real: order % 2 ? [-2] : [],
          pairs: Array.from({ length: Math.floor(order / 2) }, (_, index) => ({ re: -1, im: 7 ** index })),
        };
        const groups = pairRoots(poles, zeros);
        const placed = groups.reduce((sum, group) => sum + group.zeros.pairs.length, 0);
        expect(placed).toBe(zeros.pairs.length);
        for (const group of groups) expect(group.room).toBeGreaterThanOrEqual(0);
      }
    }
  });
});
