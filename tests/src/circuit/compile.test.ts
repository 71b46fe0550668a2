import { describe, expect, it } from 'vitest';
import { compile } from '../../../src/circuit/compile.ts';
import { MOST_ELEMENTS } from '../../../src/circuit/limits.ts';
import type { Element, Wiring } from '../../../src/circuit/wiring.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';
import { solveNodal } from './nodal-solver.ts';
import { randomCircuit } from './random-wiring.ts';

const resistor = (name: string, a: string, b: string): Element => ({ kind: 'resistor', name, nodes: [a, b] });
const capacitor = (name: string, a: string, b: string): Element => ({
  kind: 'capacitor',
  name,
  nodes: [a, b],
});
const inductor = (name: string, a: string, b: string): Element => ({ kind: 'inductor', name, nodes: [a, b] });
const circuit = (elements: Element[], outputs: Wiring['outputs'] = [['out', '0']]): Wiring => ({
  elements,
  source: ['in', '0'],
  outputs,
});

function errorOf(action: () => unknown): NotchworkError {
  try {
    action();
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error('nothing was thrown');
}

describe('compile', () => {
  it('solves the one-pole low pass', () => {
    const network = compile(circuit([resistor('R', 'in', 'out'), capacitor('C', 'out', '0')]));
    expect(network.treeCount).toBe(2);
    expect(network.transfer([1000, 1e-6])).toEqual({ numerator: [1], denominator: [1, 1e-3] });
  });

  it('solves the series resonant circuit, two outputs over one denominator', () => {
    const network = compile(
      circuit(
        [resistor('R', 'in', 'a'), inductor('L', 'a', 'out'), capacitor('C', 'out', '0')],
        [
          ['out', '0'],
          ['in', 'out'],
        ],
      ),
    );
    const { numerators, denominator } = network.evaluate([1000, 2, 1e-6]);
    expect(denominator).toEqual([1, 1e-3, 2e-6]);
    expect(numerators).toEqual([[1], [0, 1e-3, 2e-6]]);
  });

  it('counts the trees of a complete graph of resistors: n^(n−2) (Cayley 1889)', () => {
    for (const nodes of [4, 5, 6, 7]) {
      const elements: Element[] = [];
      const name = (node: number) => (node === 0 ? '0' : node === 1 ? 'in' : node === 2 ? 'out' : `n${node}`);
      for (let a = 0; a < nodes; a += 1) {
        for (let b = a + 1; b < nodes; b += 1) elements.push(resistor(`R${a}${b}`, name(a), name(b)));
      }
      // The source's edge is in every tree: of n^(n−2) trees, the share (n−1)/(n(n−1)/2) holds a given edge.
      expect(compile(circuit(elements)).treeCount).toBe((nodes ** (nodes - 2) * 2) / nodes);
    }
  });

  it('has the signs of SPICE for controlled sources', () => {
    const stage = compile(
      circuit([
        { kind: 'transconductance', name: 'G', nodes: ['out', '0'], control: ['in', '0'] },
        resistor('R', 'out', '0'),
      ]),
    );
    expect(stage.transfer([2e-3, 1000])).toEqual({ numerator: [-2], denominator: [1] });
    const amplifier = compile(
      circuit([
        { kind: 'voltage-gain', name: 'E', nodes: ['out', '0'], control: ['in', 'fb'] },
        resistor('R1', 'out', 'fb'),
        resistor('R2', 'fb', '0'),
      ]),
    );
    const { numerator, denominator } = amplifier.transfer([1000, 90, 10]);
    expect(numerator[0]! / denominator[0]!).toBeCloseTo(1000 / (1 + 1000 / 10), 12);
  });

  it('needs no special case for a resistor of 0 Ω', () => {
    const network = compile(
      circuit([resistor('R1', 'in', 'out'), resistor('R2', 'out', '0'), capacitor('C', 'out', '0')]),
    );
    expect(network.transfer([0, 1000, 1e-6])).toEqual({ numerator: [1000], denominator: [1000] });
    expect(network.transfer([1000, 0, 1e-6])).toEqual({ numerator: [0], denominator: [1000] });
  });

  it.each([
    ['RC', { inductors: false, controlled: false }],
    ['RLC', { inductors: true, controlled: false }],
    ['RC with controlled sources', { inductors: false, controlled: true }],
    ['RLC with controlled sources', { inductors: true, controlled: true }],
  ])('agrees with modified nodal analysis on random %s circuits', (_, kinds) => {
    const random = seededRandom(11);
    for (let index = 0; index < 120; index += 1) {
      const { wiring, values } = randomCircuit(random, 3 + Math.floor(random() * 7), kinds);
      const { numerators, denominator } = compile(wiring).evaluate(values);
      for (const frequency of [15, 440, 9000]) {
        const omega = 2 * Math.PI * frequency;
        const expected = solveNodal(wiring, values, omega);
        const at = (coefficients: readonly number[]) => {
          let re = 0;
          let im = 0;
          for (let k = coefficients.length - 1; k >= 0; k -= 1) {
            [re, im] = [coefficients[k]! - omega * im, omega * re];
          }
          return { re, im };
        };
        const bottom = at(denominator);
        expected.forEach((voltage, output) => {
          const top = at(numerators[output]!);
          // Compared as N − H·D, relative to the larger side: 1e-7 allows for the elimination's own rounding.
          const right = {
            re: voltage.re * bottom.re - voltage.im * bottom.im,
            im: voltage.re * bottom.im + voltage.im * bottom.re,
          };
          const scale = Math.hypot(bottom.re, bottom.im) * Math.max(1e-3, Math.hypot(voltage.re, voltage.im));
          expect(Math.hypot(top.re - right.re, top.im - right.im) / scale).toBeLessThan(1e-7);
        });
      }
    }
  });

  it('keeps every passive coefficient positive: nothing is subtracted', () => {
    const random = seededRandom(5);
    for (let index = 0; index < 50; index += 1) {
      const { wiring, values } = randomCircuit(random, 8, { inductors: true, controlled: false });
      for (const coefficient of compile(wiring).evaluate(values).denominator)
        expect(coefficient).toBeGreaterThanOrEqual(0);
    }
  });
});

describe('compile refuses', () => {
  it('a name used twice', () => {
    const error = errorOf(() => compile(circuit([resistor('R', 'in', 'out'), resistor('R', 'out', '0')])));
    expect([error.code, error.message]).toEqual(['netlist-topology', expect.stringContaining('R')]);
  });

  it('a source with both ends at one node', () => {
    const error = errorOf(() =>
      compile({ elements: [resistor('R', 'in', '0')], source: ['in', 'in'], outputs: [['in', '0']] }),
    );
    expect(error.code).toBe('netlist-topology');
  });

  it('a node without a path to ground, by name', () => {
    const error = errorOf(() =>
      compile(
        circuit([resistor('R', 'in', 'out'), resistor('R2', 'out', '0'), resistor('R3', 'lost', 'also')]),
      ),
    );
    expect(error.code).toBe('netlist-topology');
    expect(error.message).toMatch(/lost/);
  });

  it('a loop of ideal voltage sources', () => {
    const error = errorOf(() =>
      compile(
        circuit([
          { kind: 'voltage-gain', name: 'E1', nodes: ['out', '0'], control: ['in', '0'] },
          { kind: 'voltage-gain', name: 'E2', nodes: ['out', '0'], control: ['in', '0'] },
          resistor('R', 'in', 'out'),
        ]),
      ),
    );
    expect(error.code).toBe('netlist-topology');
  });

  it('more elements than it takes', () => {
    const elements = Array.from({ length: MOST_ELEMENTS + 1 }, (_, index) =>
      resistor(`R${index}`, 'in', index === 0 ? 'out' : '0'),
    );
    expect(errorOf(() => compile(circuit(elements))).code).toBe('netlist-too-large');
  });

  it('a tangle with more partial sums than it takes, without hanging', () => {
    const elements: Element[] = [];
    for (let a = 0; a < 14; a += 1) {
      for (let b = a + 1; b < 14; b += 1)
        elements.push(
          resistor(`R${a}_${b}`, a === 0 ? '0' : a === 1 ? 'in' : `n${a}`, b === 1 ? 'in' : `n${b}`),
        );
    }
    const start = Date.now();
    const error = errorOf(() => compile({ elements, source: ['in', '0'], outputs: [['n2', '0']] }));
    expect(error.code).toBe('netlist-too-large');
    expect(Date.now() - start).toBeLessThan(10_000); // a bound on "never hangs", far above what it takes
  });

  it('values that leave nothing to solve', () => {
    const network = compile(circuit([resistor('R1', 'in', 'out'), resistor('R2', 'out', '0')]));
    expect(errorOf(() => network.transfer([0, 0])).code).toBe('circuit-unsolvable');
  });

  it('an output that is not there', () => {
    const network = compile(circuit([resistor('R1', 'in', 'out'), resistor('R2', 'out', '0')]));
    expect(errorOf(() => network.transfer([1, 1], 3)).code).toBe('value-out-of-range');
  });
});
