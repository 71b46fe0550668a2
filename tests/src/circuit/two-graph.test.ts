import { describe, expect, it } from 'vitest';
import { twoGraph } from '../../../src/circuit/two-graph.ts';
import type { Wiring } from '../../../src/circuit/wiring.ts';

const WIRING: Wiring = {
  elements: [
    { kind: 'resistor', name: 'R', nodes: ['in', 'a'] },
    { kind: 'transconductance', name: 'G', nodes: ['out', '0'], control: ['a', 'b'] },
    { kind: 'voltage-gain', name: 'E', nodes: ['b', '0'], control: ['out', 'in'] },
    { kind: 'capacitor', name: 'C', nodes: ['out', '0'] },
  ],
  source: ['in', '0'],
  outputs: [
    ['out', '0'],
    ['a', 'b'],
  ],
};

describe('twoGraph', () => {
  const graph = twoGraph(WIRING);
  const edgeOf = (element: number) => graph.edges.find((edge) => edge.element === element)!;

  it('numbers every node once, ground 0', () => {
    expect(graph.nodeCount).toBe(5);
    const [own] = graph.source;
    expect(own!.current.to).toBe(0);
    expect(own!.voltage).toEqual(own!.current);
  });

  it('has every element once', () => {
    expect(graph.edges.map((edge) => edge.element).sort()).toEqual([0, 1, 2, 3]);
  });

  it('puts a passive element in the same place of both graphs', () => {
    for (const element of [0, 3]) {
      const { inclusions, optional } = edgeOf(element);
      expect(optional).toBe(true);
      expect(inclusions).toHaveLength(1);
      expect(inclusions[0]!.voltage).toEqual(inclusions[0]!.current);
    }
  });

  it('puts a transconductance between its nodes in one graph, between its controls in the other', () => {
    const [only] = edgeOf(1).inclusions;
    const capacitor = edgeOf(3).inclusions[0]!;
    expect(only!.current).toEqual(capacitor.current);
    expect(only!.voltage.from).toBe(edgeOf(0).inclusions[0]!.current.to); // node a
    expect(only!.voltage.to).toBe(edgeOf(2).inclusions[0]!.current.from); // node b
  });

  it('takes a voltage gain into every tree, as itself or by its control', () => {
    const { optional, inclusions } = edgeOf(2);
    expect(optional).toBe(false);
    const [itself, controlled] = inclusions;
    expect(itself!.voltage).toEqual(itself!.current);
    expect(controlled!.current).toEqual(itself!.current);
    expect(controlled!.voltage.from).toBe(edgeOf(3).inclusions[0]!.current.from); // node out
  });

  it('starts a numerator for every output with the source in the current graph', () => {
    expect(graph.source).toHaveLength(3);
    for (const { current } of graph.source) expect(current).toEqual(graph.source[0]!.current);
    expect(graph.source[2]!.voltage).toEqual(edgeOf(1).inclusions[0]!.voltage);
  });

  it('refuses a name that is used twice', () => {
    const twice = { ...WIRING, elements: [...WIRING.elements, WIRING.elements[0]!] };
    expect(() => twoGraph(twice)).toThrow(
      expect.objectContaining({ code: 'netlist-topology', message: expect.stringContaining('R') }),
    );
  });
});
