import { describe, expect, it } from 'vitest';
import { directVoltages } from '../../../src/circuit/dc.ts';
import type { Element } from '../../../src/circuit/wiring.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';
import { solveNodal } from './nodal-solver.ts';
import { randomCircuit } from './random-wiring.ts';

const two = (kind: 'resistor' | 'capacitor' | 'inductor', name: string, a: string, b: string): Element => ({
  kind,
  name,
  nodes: [a, b],
});
const supply = (volts: number, node = 'supply') => ({ nodes: [node, '0'] as const, volts });

describe('directVoltages', () => {
  it('divides a supply', () => {
    const voltages = directVoltages(
      [two('resistor', 'R1', 'supply', 'plate'), two('resistor', 'R2', 'plate', '0')],
      [100e3, 50e3],
      [supply(300)],
    );
    expect(voltages.get('plate')).toBeCloseTo(100, 10);
    expect(voltages.get('supply')).toBeCloseTo(300, 10);
    expect(voltages.get('0')).toBe(0);
  });

  it('opens capacitors and shorts inductors', () => {
    const voltages = directVoltages(
      [
        two('inductor', 'choke', 'supply', 'a'),
        two('inductor', 'second', 'supply', 'a'), // a ring of wires is no problem
        two('resistor', 'R1', 'a', 'b'),
        two('capacitor', 'C', 'b', '0'),
        two('resistor', 'leak', 'b', '0'),
      ],
      [10, 10, 1000, 1e-6, 1e6],
      [supply(250)],
    );
    expect(voltages.get('a')).toBeCloseTo(250, 10);
    expect(voltages.get('b')).toBeCloseTo((250 * 1e6) / 1.001e6, 9);
  });

  it('takes a resistor of 0 Ω as a wire, also to ground', () => {
    const voltages = directVoltages(
      [
        two('resistor', 'R1', 'supply', 'a'),
        two('resistor', 'R2', 'a', 'b'),
        two('resistor', 'R3', 'b', '0'),
      ],
      [1000, 0, 0],
      [supply(9)],
    );
    expect([voltages.get('a'), voltages.get('b')]).toEqual([0, 0]);
  });

  it('has the signs of SPICE for controlled sources', () => {
    const voltages = directVoltages(
      [
        { kind: 'transconductance', name: 'G', nodes: ['plate', '0'], control: ['grid', '0'] },
        two('resistor', 'RL', 'plate', 'supply'),
        { kind: 'voltage-gain', name: 'E', nodes: ['copy', '0'], control: ['plate', 'supply'] },
        two('resistor', 'R', 'copy', '0'),
      ],
      [2e-3, 10e3, 3, 1],
      [supply(100), supply(1, 'grid')],
    );
    expect(voltages.get('plate')).toBeCloseTo(80, 10); // 2 mA through 10 kΩ
    expect(voltages.get('copy')).toBeCloseTo(-60, 10);
  });

  it('superposes sources', () => {
    const star = [
      two('resistor', 'R1', 'a', 'x'),
      two('resistor', 'R2', 'b', 'x'),
      two('resistor', 'R3', 'x', '0'),
    ];
    const at = (a: number, b: number) =>
      directVoltages(star, [1000, 2000, 3000], [supply(a, 'a'), supply(b, 'b')]).get('x')!;
    expect(at(5, 7)).toBeCloseTo(at(5, 0) + at(0, 7), 12);
    // Millman's theorem: Σ V/R over Σ 1/R.
    expect(at(5, 7)).toBeCloseTo((5 / 1000 + 7 / 2000) / (1 / 1000 + 1 / 2000 + 1 / 3000), 12);
  });

  it('agrees with modified nodal analysis at frequency 0 on random circuits', () => {
    const random = seededRandom(44);
    for (let index = 0; index < 60; index += 1) {
      const { wiring, values } = randomCircuit(random, 3 + Math.floor(random() * 7), {
        inductors: false,
        controlled: index % 2 === 0,
      });
      const expected = solveNodal(wiring, values, 0)[0]!.re;
      const got = directVoltages(wiring.elements, values, [{ nodes: wiring.source, volts: 1 }]).get('out')!;
      // Both eliminate in double precision; a few digits go where controlled sources nearly cancel.
      expect(Math.abs(got - expected)).toBeLessThan(1e-8 * Math.max(1, Math.abs(expected)));
    }
  });

  it('refuses a node behind a capacitor, by name', () => {
    const elements = [two('capacitor', 'C', 'supply', 'grid'), two('resistor', 'R', 'supply', '0')];
    expect(() => directVoltages(elements, [1e-6, 1e6], [supply(300)])).toThrow(
      expect.objectContaining({ code: 'netlist-topology', message: expect.stringContaining('grid') }),
    );
  });

  it('refuses sources that contradict each other', () => {
    const elements = [two('resistor', 'R', 'supply', '0')];
    expect(() => directVoltages(elements, [1], [supply(1), supply(2)])).toThrow(
      expect.objectContaining({ code: 'circuit-unsolvable' }),
    );
    expect(() => directVoltages([two('inductor', 'L', 'supply', '0')], [1], [supply(1)])).toThrow(
      expect.objectContaining({ code: 'circuit-unsolvable' }),
    );
  });
});
