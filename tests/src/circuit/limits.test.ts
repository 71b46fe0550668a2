import { describe, expect, it } from 'vitest';
import { compile } from '../../../src/circuit/compile.ts';
import { formulaOf } from '../../../src/circuit/formula.ts';
import { impedance } from '../../../src/circuit/impedance.ts';
import { checkSize, MOST_ELEMENTS, MOST_NODES } from '../../../src/circuit/limits.ts';
import type { Element, Wiring } from '../../../src/circuit/wiring.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';

const resistor = (name: string, a: string, b: string): Element => ({ kind: 'resistor', name, nodes: [a, b] });
const nodeName = (node: number): string => (node === 0 ? '0' : node === 1 ? 'in' : `n${node}`);

/** Resistors in a chain from the source to ground over so many nodes, ground among them. */
function chain(nodes: number): Wiring {
  const elements = Array.from({ length: nodes - 1 }, (_, index) =>
    resistor(`R${index}`, nodeName(index + 1), nodeName((index + 2) % nodes)),
  );
  return { elements, source: ['in', '0'], outputs: [['n2', '0']] };
}

const tooLarge = expect.objectContaining({ code: 'netlist-too-large' });

describe('checkSize', () => {
  it(`takes ${MOST_NODES} nodes and no more, and says how many there are`, () => {
    expect(() => checkSize(chain(MOST_NODES))).not.toThrow();
    expect(() => checkSize(chain(MOST_NODES + 1))).toThrow(
      expect.objectContaining({
        code: 'netlist-too-large',
        message: expect.stringContaining(`${MOST_NODES + 1} nodes`),
      }),
    );
  });

  it('counts nodes that only control or are only read', () => {
    const { elements, source } = chain(MOST_NODES);
    expect(() => checkSize({ elements, source, outputs: [['far', '0']] })).toThrow(tooLarge);
    const control: Element = {
      kind: 'transconductance',
      name: 'G',
      nodes: ['in', '0'],
      control: ['far', '0'],
    };
    expect(() => checkSize({ elements: [...elements, control], source, outputs: [] })).toThrow(tooLarge);
  });

  it(`takes ${MOST_ELEMENTS} elements and no more`, () => {
    const across = (count: number): Wiring => ({
      elements: Array.from({ length: count }, (_, index) => resistor(`R${index}`, 'in', '0')),
      source: ['in', '0'],
      outputs: [['in', '0']],
    });
    expect(() => checkSize(across(MOST_ELEMENTS))).not.toThrow();
    expect(() => checkSize(across(MOST_ELEMENTS + 1))).toThrow(tooLarge);
  });

  it.each([
    ['compile', (wiring: Wiring) => compile(wiring)],
    ['formulaOf', (wiring: Wiring) => formulaOf(wiring)],
    [
      'impedance',
      (wiring: Wiring) =>
        impedance(
          wiring,
          wiring.elements.map(() => 1),
          ['n2', '0'],
        ),
    ],
  ])('is asked by %s before any work: 2,000 nodes are refused at once', (_, action) => {
    const wiring = chain(2000);
    const start = Date.now();
    expect(() => action(wiring)).toThrow(tooLarge);
    expect(Date.now() - start).toBeLessThan(500); // ordering so many edges alone would take far longer
  });
});

describe('the limits of work', () => {
  /** Circuits full of stiff controlled sources: most ways to start a tree lead nowhere, but take time to find out. */
  function tangle(seed: number): Wiring {
    const random = seededRandom(seed);
    const count = 45;
    const pick = () => Math.floor(random() * count);
    const two = (): [string, string] => {
      const first = pick();
      return [nodeName(first), nodeName((first + 1 + Math.floor(random() * (count - 1))) % count)];
    };
    const elements: Element[] = [];
    for (let node = 2; node < count; node += 1) {
      elements.push(resistor(`R${node}`, nodeName(node), nodeName(Math.floor(random() * node))));
    }
    for (let index = 0; index < 25; index += 1) {
      elements.push({
        kind: 'voltage-gain',
        name: `E${index}`,
        nodes: [nodeName(count - 1 - index), '0'],
        control: two(),
      });
      elements.push({ kind: 'transconductance', name: `G${index}`, nodes: two(), control: two() });
      elements.push(resistor(`RX${index}`, ...two()));
    }
    return { elements, source: ['in', '0'], outputs: [['n2', '0']] };
  }

  it('count the states that lead nowhere too: a tangle is refused within seconds, not after minutes', () => {
    let refused = 0;
    for (let seed = 1; seed <= 4; seed += 1) {
      const start = Date.now();
      try {
        compile(tangle(seed));
      } catch (error) {
        if (!(error instanceof NotchworkError)) throw error;
        expect(error.code).toBe('netlist-too-large');
        expect(error.message).toMatch(/tangled.*45 nodes and 118 elements/);
        refused += 1;
      }
      // Half a second on an idle machine; without the count the first of them ran for six minutes.
      expect(Date.now() - start).toBeLessThan(10_000);
    }
    expect(refused).toBeGreaterThan(2);
  });

  it('may be set by the caller', () => {
    const wiring = chain(20);
    expect(() => compile(wiring, { steps: 10_000, states: 10 })).toThrow(tooLarge);
    expect(() => compile(wiring, { steps: 10, states: 10_000 })).toThrow(tooLarge);
    expect(() => compile(wiring, { steps: 10_000, states: 10_000 })).not.toThrow();
  });

  it('let a chain of twelve active filter sections pass: large, but not tangled', () => {
    const elements: Element[] = [];
    for (let section = 0; section < 12; section += 1) {
      const [from, a, b, to] = [
        section === 0 ? 'in' : `o${section - 1}`,
        `a${section}`,
        `b${section}`,
        `o${section}`,
      ];
      elements.push(
        resistor(`R${section}`, from, a),
        resistor(`Q${section}`, a, b),
        { kind: 'capacitor', name: `C${section}`, nodes: [a, to] },
        { kind: 'capacitor', name: `D${section}`, nodes: [b, '0'] },
        { kind: 'voltage-gain', name: `E${section}`, nodes: [to, '0'], control: [b, to] },
      );
    }
    const network = compile({ elements, source: ['in', '0'], outputs: [['o11', '0']] });
    const values = { resistor: 1e4, capacitor: 1e-9, 'voltage-gain': 1e5, inductor: 0, transconductance: 0 };
    const { numerator, denominator } = network.transfer(elements.map(({ kind }) => values[kind]));
    expect(denominator).toHaveLength(25);
    // Each section follows with gain µ/(1 + µ) at direct current; 60 factors round by 1e-14.
    expect(numerator[0]! / denominator[0]!).toBeCloseTo((1e5 / (1e5 + 1)) ** 12, 12);
  });
});
