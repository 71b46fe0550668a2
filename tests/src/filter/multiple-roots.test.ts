import { describe, expect, it } from 'vitest';
import { factor } from '../../../src/filter/factor.ts';
import { mergeMultipleRoots } from '../../../src/filter/multiple-roots.ts';
import { polynomialRoots } from '../../../src/filter/roots.ts';
import { audibleOmegas, cascadeAt, product, relativeError, transferAt } from './polynomials.ts';

const equal = (count: number, tau: number) => new Array<number[]>(count).fill([1, tau]);

describe('multiple roots', () => {
  it.each([3, 4, 5, 6, 8])('of multiplicity %i come out real and right to the last digits', (count) => {
    const tau = 3.3e-4;
    const { real, pairs } = polynomialRoots(product(...equal(count, tau), [1, 1e-6], [1, 0.1]));
    expect(pairs).toEqual([]);
    for (const root of real.slice(1, 1 + count)) expect(Math.abs(root * tau + 1)).toBeLessThan(1e-14);
  });

  it.each([4, 6, 8])('of multiplicity %i: equal stages in a row factor to 1e-12', (count) => {
    const transfer = {
      numerator: product(...new Array<number[]>(count).fill([0, 1e-3])),
      denominator: product(...equal(count, 1e-3)),
    };
    const sections = factor(transfer);
    for (const omega of audibleOmegas(30)) {
      expect(relativeError(cascadeAt(sections, omega), transferAt(transfer, omega))).toBeLessThan(1e-12);
    }
  });

  it('are told from close ones', () => {
    // Neighbours 0.1 % apart: merging them would change the coefficients by 1e-6.
    const taus = [1, 1.001, 1.002];
    const { real } = polynomialRoots(product(...taus.map((tau) => [1, tau]), [1, 50]));
    const close = real
      .filter((root) => root < -0.9)
      .map((root) => -1 / root)
      .sort((a, b) => a - b);
    // Coefficients rounded once determine such roots to about 1e-16 divided by 1e-3 squared.
    close.forEach((tau, index) => {
      expect(Math.abs(tau - taus[index]!)).toBeLessThan(1e-8);
    });
    expect(new Set(close).size).toBe(3);
  });

  it('leave a structure without clusters as it is', () => {
    const structure = { singles: [-1, -4], couples: [{ middle: -2, spread: -9 }] };
    const coefficients = Float64Array.from(product([1, 1], [4, 1], [13, 4, 1]));
    expect(mergeMultipleRoots(coefficients, structure)).toBe(structure);
  });

  it('are not made of a cluster that does not multiply out to the polynomial', () => {
    const structure = { singles: [-1, -1.01, -1.02], couples: [] };
    const coefficients = Float64Array.from(product([1, 1], [1.01, 1], [1.02, 1]));
    expect(mergeMultipleRoots(coefficients, structure)).toBe(structure);
  });

  it('are made of one that does', () => {
    const structure = { singles: [-0.99], couples: [{ middle: -1.005, spread: -1e-4 }] };
    expect(mergeMultipleRoots(Float64Array.from([1, 3, 3, 1]), structure)).toEqual({
      singles: [-1, -1, -1],
      couples: [],
    });
  });
});
