import { describe, expect, it } from 'vitest';
import { checkTopology } from '../../../src/circuit/topology.ts';
import type { Element, Wiring } from '../../../src/circuit/wiring.ts';
import { NotchworkError } from '../../../src/errors.ts';

const R = (name: string, a: string, b: string): Element => ({ kind: 'resistor', name, nodes: [a, b] });
const G = (name: string, a: string, b: string, c: string, d: string): Element => ({
  kind: 'transconductance',
  name,
  nodes: [a, b],
  control: [c, d],
});
const E = (name: string, a: string, b: string, c: string, d: string): Element => ({
  kind: 'voltage-gain',
  name,
  nodes: [a, b],
  control: [c, d],
});
const circuit = (elements: Element[], outputs: Wiring['outputs'] = [['out', '0']]): Wiring => ({
  elements: [R('R1', 'in', 'out'), R('R2', 'out', '0'), ...elements],
  source: ['in', '0'],
  outputs,
});

function messageFor(wiring: Wiring): string {
  try {
    checkTopology(wiring);
  } catch (error) {
    if (!(error instanceof NotchworkError)) throw error;
    expect(error.code).toBe('netlist-topology');
    return error.message;
  }
  return '';
}

describe('checkTopology', () => {
  it.each<[string, Wiring, RegExp]>([
    ['a source with both ends at one node', { ...circuit([]), source: ['in', 'in'] }, /source.*node in\b/],
    [
      'a source that floats',
      { ...circuit([R('R3', 'a', 'b')]), source: ['a', 'b'] },
      /Nodes a and b have no path/,
    ],
    [
      'a node without a path',
      circuit([R('R3', 'lost', 'also')]),
      /Nodes lost and also have no path to ground/,
    ],
    ['an output that nothing is joined to', circuit([], [['nowhere', '0']]), /Node nowhere has no path/],
    [
      'a controlling node that nothing is joined to',
      circuit([G('G1', 'out', '0', 'grid', '0')]),
      /Node grid has no path/,
    ],
    [
      'a voltage source across the source',
      circuit([E('E1', 'in', '0', 'out', '0')]),
      /E1 closes a loop.*in to 0/,
    ],
    [
      'two voltage sources side by side',
      circuit([E('E1', 'out', '0', 'in', '0'), E('E2', '0', 'out', 'in', '0')]),
      /E2 closes a loop/,
    ],
    [
      'a ring of three',
      circuit([
        E('E1', 'a', '0', 'in', '0'),
        E('E2', 'b', 'a', 'in', '0'),
        E('E3', 'b', '0', 'in', '0'),
        R('R3', 'a', 'b'),
      ]),
      /E3 closes a loop/,
    ],
    [
      'a voltage source with both ends at one node',
      circuit([E('E1', 'out', 'out', 'in', '0')]),
      /E1 closes a loop/,
    ],
    [
      'a node that a current source feeds alone',
      circuit([G('G1', 'plate', '0', 'in', '0')]),
      /Node plate is joined.*current sources alone \(G1\)/,
    ],
    [
      'two nodes that current sources feed alone',
      circuit([G('G1', 'a', '0', 'in', '0'), G('G2', '0', 'b', 'in', '0'), R('R3', 'a', 'b')]),
      /Nodes a and b are joined.*\(G1, G2 and R3\)/,
    ],
  ])('refuses %s, by name', (_, wiring, message) => {
    expect(messageFor(wiring)).toMatch(message);
  });

  it.each<[string, Wiring]>([
    [
      'a current source that its own voltage controls: it is a conductance',
      circuit([G('G1', 'a', '0', 'a', '0')]),
    ],
    ['a stage with its load', circuit([G('G1', 'plate', '0', 'in', '0'), R('R3', 'plate', '0')])],
    ['a follower whose output controls it', circuit([E('E1', 'a', '0', 'in', 'a')])],
    ['stacked voltage sources', circuit([E('E1', 'a', '0', 'in', '0'), E('E2', 'b', 'a', 'in', '0')])],
  ])('takes %s', (_, wiring) => {
    expect(messageFor(wiring)).toBe('');
  });

  it('says what to do', () => {
    expect(messageFor(circuit([R('R3', 'lost', 'also')]))).toMatch(/large resistor/);
    expect(messageFor(circuit([E('E1', 'in', '0', 'out', '0')]))).toMatch(/Put a resistor in series/);
  });
});
