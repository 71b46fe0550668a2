import { describe, expect, it } from 'vitest';
import { orderEdges } from '../../../src/circuit/edge-order.ts';
import type { Inclusion, TreeEdge } from '../../../src/circuit/two-graph.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';

function inclusion(from: number, to: number): Inclusion {
  return { current: { from, to }, voltage: { from, to } };
}

function resistor(element: number, from: number, to: number): TreeEdge {
  return { element, kind: 'resistor', optional: true, inclusions: [inclusion(from, to)] };
}

/** A ladder from node 1 to node `sections + 1`, its edges in a random order. */
function shuffledLadder(sections: number, seed: number): TreeEdge[] {
  const random = seededRandom(seed);
  const pairs = Array.from({ length: sections }, (_, index) => [
    [index + 1, index + 2],
    [index + 2, 0],
  ]).flat();
  return pairs
    .map(([from, to], index) => ({ edge: resistor(index, from!, to!), at: random() }))
    .sort((a, b) => a.at - b.at)
    .map(({ edge }) => edge);
}

/** Most nodes but ground that are touched by edges before and by edges behind any place in the order. */
function widest(edges: readonly TreeEdge[], opened: readonly number[]): number {
  const nodesOf = (list: readonly TreeEdge[]) =>
    new Set(
      list.flatMap(({ inclusions }) => inclusions.flatMap(({ current }) => [current.from, current.to])),
    );
  let most = 0;
  for (let index = 0; index <= edges.length; index += 1) {
    const before = nodesOf(edges.slice(0, index));
    for (const node of opened) before.add(node);
    const behind = nodesOf(edges.slice(index));
    const both = [...before].filter((node) => node !== 0 && behind.has(node));
    most = Math.max(most, both.length);
  }
  return most;
}

describe('orderEdges', () => {
  it('keeps every edge, once', () => {
    const edges = shuffledLadder(12, 3);
    const ordered = orderEdges(edges, 14, [inclusion(1, 0)]);
    expect(ordered.map((edge) => edge.element).sort((a, b) => a - b)).toEqual(edges.map((_, index) => index));
  });

  it('goes along a ladder, whatever order it is given in', () => {
    for (let seed = 1; seed <= 20; seed += 1) {
      const edges = shuffledLadder(25, seed);
      const ordered = orderEdges(edges, 27, [inclusion(1, 0)]);
      // From one end there is one open node, and a second for a moment; from the middle, one more.
      expect(widest(ordered, [1])).toBeLessThanOrEqual(3);
      expect(widest(edges, [1])).toBeGreaterThan(6); // as given
    }
  });

  it('is the same for the same edges', () => {
    const edges = shuffledLadder(9, 8);
    expect(orderEdges(edges, 11, [inclusion(1, 0)])).toEqual(orderEdges(edges, 11, [inclusion(1, 0)]));
  });

  it('takes an empty list', () => {
    expect(orderEdges([], 2, [inclusion(1, 0)])).toEqual([]);
  });
});
