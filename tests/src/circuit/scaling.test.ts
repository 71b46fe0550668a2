import { describe, expect, it } from 'vitest';
import { compile } from '../../../src/circuit/compile.ts';
import { impedance } from '../../../src/circuit/impedance.ts';
import { scaled, unscale } from '../../../src/circuit/scaling.ts';
import type { Element, ElementKind, Wiring } from '../../../src/circuit/wiring.ts';

const SECTIONS = 50;

/** A ladder: `series` from node to node, `shunt` from each new node to ground. */
function ladder(series: ElementKind, shunt: ElementKind, sections = SECTIONS): Wiring {
  const name = (node: number): string => (node === 0 ? 'in' : node === sections ? 'out' : `n${node}`);
  const elements = Array.from({ length: sections }, (_, index): Element[] => [
    { kind: series as 'resistor', name: `A${index}`, nodes: [name(index), name(index + 1)] },
    { kind: shunt as 'capacitor', name: `B${index}`, nodes: [name(index + 1), '0'] },
  ]).flat();
  return { elements, source: ['in', '0'], outputs: [['out', '0']] };
}

/** Binomial coefficient, exact. */
function choose(n: number, k: number): bigint {
  let value = 1n;
  for (let index = 1; index <= k; index += 1) value = (value * BigInt(n - k + index)) / BigInt(index);
  return value;
}

const alternating = (wiring: Wiring, first: number, second: number): number[] =>
  wiring.elements.map((_, index) => (index % 2 === 0 ? first : second));

describe('large circuits stay within the range of a double', () => {
  // 1/H of n equal sections Z, Y is the sum of C(n + k, 2k)·(Z·Y)^k (handbook formula, from memory; at
  // Z·Y = 1 it gives every second Fibonacci number, as it should).
  it.each([
    [1e6, 100e-12],
    [10e6, 10e-12],
    [1, 1e-4],
    [1e-3, 0.1],
  ])('50 RC sections of %s Ω and %s F have the coefficients C(n + k, 2k)·(R·C)^k', (R, C) => {
    const wiring = ladder('resistor', 'capacitor');
    const { numerator, denominator } = compile(wiring).transfer(alternating(wiring, R, C));
    expect(numerator).toHaveLength(1);
    expect(denominator).toHaveLength(SECTIONS + 1);
    denominator.forEach((coefficient, power) => {
      const expected = Number(choose(SECTIONS + power, 2 * power)) * (R * C) ** power;
      // Some 100 factors and sums of positive terms, each rounded: 1e-14 at the worst.
      expect(Math.abs(coefficient / numerator[0]! / expected - 1)).toBeLessThan(1e-13);
    });
  });

  it.each<[ElementKind, number]>([
    ['resistor', 1e6],
    ['resistor', 1e9],
    ['resistor', 1e-6],
    ['capacitor', 1e-12],
    ['capacitor', 1],
    ['inductor', 1e-6],
    ['inductor', 1e3],
  ])('50 sections of %ss of %s alone divide by a Fibonacci number', (kind, value) => {
    const wiring = ladder(kind, kind);
    const { numerator, denominator } = compile(wiring).transfer(alternating(wiring, value, value));
    let [previous, fibonacci] = [0n, 1n];
    for (let index = 1; index < 2 * SECTIONS + 1; index += 1)
      [previous, fibonacci] = [fibonacci, previous + fibonacci];
    expect([numerator.length, denominator.length]).toEqual([1, 1]);
    expect(Math.abs(denominator[0]! / numerator[0]! / Number(fibonacci) - 1)).toBeLessThan(1e-13);
  });

  it('leaves the impedance in ohms: an endless ladder of R and R looks like R·(1 + √5)/2', () => {
    const wiring = ladder('resistor', 'resistor');
    const { numerator, denominator } = impedance(
      wiring,
      alternating(wiring, 1e6, 1e6),
      ['in', '0'],
      'removed',
    );
    expect(Math.abs(numerator[0]! / denominator[0]! / (1e6 * ((1 + Math.sqrt(5)) / 2)) - 1)).toBeLessThan(
      1e-13,
    );
  });

  it('leaves the impedance in ohms and seconds: 30 RC sections are 30·C at the bottom and R at the top', () => {
    const wiring = ladder('resistor', 'capacitor', 30);
    const { numerator, denominator } = impedance(
      wiring,
      alternating(wiring, 1e4, 1e-9),
      ['in', '0'],
      'removed',
    );
    // Looking in: 1/(s·30·C) at the bottom, R at the top; 60 factors round by 1e-14 or so.
    expect(Math.abs((numerator[0]! / denominator[1]!) * 30 * 1e-9 - 1)).toBeLessThan(1e-13);
    expect(denominator[0]).toBe(0);
    expect(Math.abs(numerator.at(-1)! / denominator.at(-1)! / 1e4 - 1)).toBeLessThan(1e-13);
  });

  it('says so where values are beyond all numbers, instead of giving NaN', () => {
    const wiring = ladder('resistor', 'capacitor');
    const unsolvable = expect.objectContaining({ code: 'circuit-unsolvable' });
    expect(() => compile(wiring).transfer(alternating(wiring, Number.NaN, 1e-9))).toThrow(unsolvable);
    expect(() => compile(wiring).transfer(alternating(wiring, Number.POSITIVE_INFINITY, 1e-9))).toThrow(
      unsolvable,
    );
    const small = ladder('resistor', 'resistor', 2);
    expect(() => compile(small).transfer([1e200, 1e200, 1e200, 1e200])).toThrow(unsolvable);
  });
});

describe('scaled', () => {
  const kinds: ElementKind[] = Array.from({ length: 24 }, (_, index) =>
    index % 4 === 0
      ? 'resistor'
      : index % 4 === 1
        ? 'capacitor'
        : index % 4 === 2
          ? 'inductor'
          : 'transconductance',
  );
  const values = kinds.map(
    (kind) =>
      ({ resistor: 47e3, capacitor: 22e-9, inductor: 3.3, transconductance: 1.6e-3, 'voltage-gain': 60 })[
        kind
      ],
  );

  it('leaves small circuits alone', () => {
    const few = values.slice(0, 20);
    expect(scaled(kinds.slice(0, 20), few)).toEqual({ values: few, ohms: 1, omega: 1 });
  });

  it('changes no digit: all factors are powers of two', () => {
    const { values: handy, ohms, omega } = scaled(kinds, values);
    expect(Number.isInteger(Math.log2(ohms))).toBe(true);
    expect(Number.isInteger(Math.log2(omega))).toBe(true);
    kinds.forEach((kind, index) => {
      const ratio = handy[index]! / values[index]!;
      expect(Number.isInteger(Math.log2(ratio)), kind).toBe(true);
    });
  });

  it('keeps every product of time and ratio that matters: R·C, L/R and G·R', () => {
    const { values: handy, omega } = scaled(kinds, values);
    const [R, C, L, G] = handy as unknown as [number, number, number, number];
    expect(R * C).toBe(47e3 * 22e-9 * omega);
    expect(L / R).toBe((3.3 / 47e3) * omega);
    expect(G * R).toBe(1.6e-3 * 47e3);
  });

  it('takes zeros, a gain alone and values of nothing', () => {
    expect([
      ...(scaled(
        kinds,
        kinds.map(() => 0),
      ).values as Float64Array),
    ]).toEqual(kinds.map(() => 0));
    const gains = Array.from({ length: 21 }, (): ElementKind => 'voltage-gain');
    expect(
      scaled(
        gains,
        gains.map(() => 60),
      ).ohms,
    ).toBe(1);
  });

  it('is undone by unscale but for a common factor', () => {
    const coefficients = [0, 3, 5 * 65536, 7 * 65536 ** 2];
    unscale(coefficients, 65536, 1);
    expect(coefficients).toEqual([0, 3, 5, 7]);
    const untouched = [1, 2];
    unscale(untouched, 1, 0);
    expect(untouched).toEqual([1, 2]);
  });
});
