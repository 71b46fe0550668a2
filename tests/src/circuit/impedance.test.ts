import { describe, expect, it } from 'vitest';
import { impedance } from '../../../src/circuit/impedance.ts';
import type { Element, NodePair, Wiring } from '../../../src/circuit/wiring.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';
import { solveNodal } from './nodal-solver.ts';
import { randomCircuit } from './random-wiring.ts';

const two = (kind: 'resistor' | 'capacitor' | 'inductor', name: string, a: string, b: string): Element => ({
  kind,
  name,
  nodes: [a, b],
});
const circuit = (elements: Element[]): Wiring => ({ elements, source: ['in', '0'], outputs: [['out', '0']] });
const OUT: NodePair = ['out', '0'];

interface Complex {
  readonly re: number;
  readonly im: number;
}

function at(
  { numerator, denominator }: { numerator: readonly number[]; denominator: readonly number[] },
  omega: number,
): Complex {
  const value = (coefficients: readonly number[]): Complex =>
    coefficients.reduceRight(({ re, im }, c) => ({ re: c - omega * im, im: omega * re }), { re: 0, im: 0 });
  const [top, bottom] = [value(numerator), value(denominator)];
  const size = bottom.re ** 2 + bottom.im ** 2;
  return {
    re: (top.re * bottom.re + top.im * bottom.im) / size,
    im: (top.im * bottom.re - top.re * bottom.im) / size,
  };
}

describe('impedance', () => {
  it('of a divider is both resistors in parallel', () => {
    const divider = circuit([two('resistor', 'R1', 'in', 'out'), two('resistor', 'R2', 'out', '0')]);
    const { numerator, denominator } = impedance(divider, [3000, 6000], OUT);
    expect(numerator[0]! / denominator[0]!).toBeCloseTo(2000, 9);
    expect([numerator.length, denominator.length]).toEqual([1, 1]);
  });

  it('of a low pass is R/(1 + s·R·C)', () => {
    const lowPass = circuit([two('resistor', 'R', 'in', 'out'), two('capacitor', 'C', 'out', '0')]);
    expect(impedance(lowPass, [1000, 1e-6], OUT)).toEqual({ numerator: [1000], denominator: [1, 1e-3] });
  });

  it('as the source sees it is R + 1/(s·C)', () => {
    const lowPass = circuit([two('resistor', 'R', 'in', 'out'), two('capacitor', 'C', 'out', '0')]);
    expect(impedance(lowPass, [1000, 1e-6], ['in', '0'], 'removed')).toEqual({
      numerator: [1, 1e-3],
      denominator: [0, 1e-6],
    });
  });

  it('across the source at rest is nothing, and so is that of a node with itself', () => {
    const lowPass = circuit([two('resistor', 'R', 'in', 'out'), two('capacitor', 'C', 'out', '0')]);
    expect(impedance(lowPass, [1000, 1e-6], ['in', '0'])).toEqual({ numerator: [0], denominator: [1] });
    expect(impedance(lowPass, [1000, 1e-6], ['out', 'out'])).toEqual({ numerator: [0], denominator: [1] });
  });

  it('of an ideal amplifier output is nothing', () => {
    const amplifier = circuit([
      { kind: 'voltage-gain', name: 'E', nodes: ['out', '0'], control: ['in', '0'] },
      two('resistor', 'R', 'out', '0'),
    ]);
    const { numerator } = impedance(amplifier, [10, 1000], OUT);
    expect(numerator).toEqual([0]);
  });

  it('of a series resonance has its zeros at 1/√(L·C)', () => {
    const series = circuit([
      two('resistor', 'RS', 'in', '0'),
      two('inductor', 'L', 'out', 'a'),
      two('capacitor', 'C', 'a', '0'),
    ]);
    const { re, im } = at(impedance(series, [50, 0.1, 1e-7], OUT), 1e4);
    expect(Math.hypot(re, im)).toBeLessThan(1e-9); // 10⁴ rad/s; each side is 1 kΩ there
  });

  it('of a cathode follower is 1/gm beside its resistor (handbook formula, rp left out)', () => {
    const follower = circuit([
      { kind: 'transconductance', name: 'G', nodes: ['0', 'out'], control: ['in', 'out'] },
      two('resistor', 'RK', 'out', '0'),
    ]);
    const { numerator, denominator } = impedance(follower, [1.6e-3, 100e3], OUT);
    expect(numerator[0]! / denominator[0]!).toBeCloseTo(1 / (1.6e-3 + 1e-5), 9);
  });

  it('is lowered by feedback to Z/(1 + A·β) (H. S. Black, 1934)', () => {
    const amplifier = circuit([
      { kind: 'voltage-gain', name: 'A', nodes: ['plate', '0'], control: ['in', 'tail'] },
      two('resistor', 'RO', 'plate', 'out'),
      two('resistor', 'RF', 'out', 'tail'),
      two('resistor', 'RT', 'tail', '0'),
    ]);
    const [gain, own, feedback, tail] = [60, 40, 27e3, 4.7e3] as const;
    const { numerator, denominator } = impedance(amplifier, [gain, own, feedback, tail], OUT);
    const share = tail / (tail + feedback);
    const expected = 1 / ((1 + gain * share) / own + 1 / (tail + feedback));
    expect(numerator[0]! / denominator[0]!).toBeCloseTo(expected, 9);
  });

  it('takes a resistor of 0 Ω', () => {
    const divider = circuit([two('resistor', 'R1', 'in', 'out'), two('resistor', 'R2', 'out', '0')]);
    expect(impedance(divider, [0, 6000], OUT).numerator).toEqual([0]);
  });

  it('agrees with the nodal solver: a large resistor from a source of 1 V makes a current source', () => {
    const random = seededRandom(9);
    for (let index = 0; index < 40; index += 1) {
      const { wiring, values } = randomCircuit(random, 4 + Math.floor(random() * 4), {
        inductors: true,
        controlled: index % 2 === 0,
      });
      const probe = 1e4;
      // The source shorted is a resistor of 0 Ω between its nodes; the meter drives the output through 10 kΩ.
      const meter: Wiring = {
        elements: [
          ...wiring.elements,
          two('resistor', 'short', 'in', '0'),
          two('resistor', 'probe', 'meter', 'out'),
        ],
        source: ['meter', '0'],
        outputs: [
          ['out', '0'],
          ['meter', 'out'],
        ],
      };
      const omega = 2 * Math.PI * 700;
      const [across, drop] = solveNodal(meter, [...values, 0, probe], omega) as [Complex, Complex];
      const expected = at(impedance(wiring, values, OUT), omega);
      // Z = V/I, compared as V·R = Z·drop, so that nothing is divided.
      const right = {
        re: expected.re * drop.re - expected.im * drop.im,
        im: expected.re * drop.im + expected.im * drop.re,
      };
      const scale = probe * Math.hypot(across.re, across.im) + Math.hypot(right.re, right.im) + 1e-6;
      expect(Math.hypot(across.re * probe - right.re, across.im * probe - right.im) / scale).toBeLessThan(
        1e-7,
      ); // the elimination's rounding
    }
  });

  it('refuses unknown nodes, and a place that nothing is joined to once the source is out', () => {
    const lowPass = circuit([two('resistor', 'R', 'in', 'out'), two('capacitor', 'C', 'out', '0')]);
    expect(() => impedance(lowPass, [1, 1], ['far', '0'])).toThrow(/far/);
    const apart: Wiring = { ...lowPass, elements: [two('resistor', 'R', 'out', '0')], outputs: [] };
    expect(() => impedance(apart, [1], ['in', '0'], 'removed')).toThrow(
      expect.objectContaining({ code: 'circuit-unsolvable' }),
    );
  });
});
