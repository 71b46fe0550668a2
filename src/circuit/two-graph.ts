import { NotchworkError } from '../errors.ts';
import { orderEdges } from './edge-order.ts';
import type { Edge, Inclusion, TreeEdge } from './tree-edge.ts';
import { type Element, GROUND, type NodeName, type NodePair, type Wiring } from './wiring.ts';

export type { Edge, Inclusion, TreeEdge } from './tree-edge.ts';

/**
 * The two graphs of a wiring. Every element is an edge in the current graph (where its current
 * flows) and an edge in the voltage graph (whose voltage drives it); for R, C and L they coincide.
 * The nodal determinant is `Σ ± Π weights` over the edge sets that are spanning trees of both graphs
 * (Kirchhoff 1847 for passive networks; W. Mayeda, Graph Theory, 1972, ch. 9, for active ones, from
 * memory).
 */

/** A wiring with its nodes numbered and its edges in the order in which they are decided. */
export interface TwoGraph {
  readonly nodeCount: number;
  /** The source's edge between its own nodes (denominator) and one for each output (numerators). */
  readonly source: readonly Inclusion[];
  readonly edges: readonly TreeEdge[];
}

function treeEdge(element: Element, index: number, edgeOf: (pair: NodePair) => Edge): TreeEdge {
  const own = edgeOf(element.nodes);
  switch (element.kind) {
    case 'transconductance':
      return {
        element: index,
        kind: element.kind,
        optional: true,
        inclusions: [{ current: own, voltage: edgeOf(element.control) }],
      };
    case 'voltage-gain':
      // The limit of a stiff current source: g·(V(nodes) − gain·V(control)) as g grows without bound,
      // so that only trees with this edge remain.
      return {
        element: index,
        kind: element.kind,
        optional: false,
        inclusions: [
          { current: own, voltage: own },
          { current: own, voltage: edgeOf(element.control) },
        ],
      };
    default:
      return {
        element: index,
        kind: element.kind,
        optional: true,
        inclusions: [{ current: own, voltage: own }],
      };
  }
}

/**
 * Numbers the nodes of a wiring and sets up both graphs.
 *
 * @throws NotchworkError `netlist-topology` for a name used twice.
 */
export function twoGraph(wiring: Wiring): TwoGraph {
  const numbers = new Map<NodeName, number>([[GROUND, 0]]);
  const numberOf = (node: NodeName): number => {
    let number = numbers.get(node);
    if (number === undefined) {
      number = numbers.size;
      numbers.set(node, number);
    }
    return number;
  };
  const edgeOf = ([from, to]: NodePair): Edge => ({ from: numberOf(from), to: numberOf(to) });
  const names = new Set<string>();
  for (const { name } of wiring.elements) {
    if (names.has(name)) {
      throw new NotchworkError('netlist-topology', `Two elements are called ${name}; give one another name.`);
    }
    names.add(name);
  }
  const current = edgeOf(wiring.source);
  const source = [wiring.source, ...wiring.outputs].map(
    (pair): Inclusion => ({ current, voltage: edgeOf(pair) }),
  );
  const edges = wiring.elements.map((element, index) => treeEdge(element, index, edgeOf));
  return { nodeCount: numbers.size, source, edges: orderEdges(edges, numbers.size, source) };
}
