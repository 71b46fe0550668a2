import type { Inclusion, TreeEdge } from './tree-edge.ts';

/** Most starts that are tried. */
const MOST_STARTS = 12;

interface Candidate {
  readonly edge: TreeEdge;
  /** Ends in the current graph, and in the voltage graph behind them. */
  readonly ends: readonly number[];
}

/** Ends of inclusions: a node of the voltage graph is counted apart from its namesake in the current graph. */
function endsOf(inclusions: readonly Inclusion[], nodeCount: number): readonly number[] {
  const ends = inclusions.flatMap(({ current, voltage }) => [
    current.from,
    current.to,
    nodeCount + voltage.from,
    nodeCount + voltage.to,
  ]);
  return [...new Set(ends)].filter((end) => end % nodeCount !== 0); // ground is always open
}

interface Order {
  readonly edges: TreeEdge[];
  readonly cost: number;
}

/** Takes, from a given first edge on, the edge that leaves the fewest nodes open. */
function greedy(
  candidates: readonly Candidate[],
  opened: readonly number[],
  nodeCount: number,
  first: number,
): Order {
  const uses = new Uint16Array(2 * nodeCount);
  for (const { ends } of candidates) for (const end of ends) uses[end] = uses[end]! + 1;
  const open = new Uint8Array(2 * nodeCount);
  let width = 0;
  for (const end of opened) {
    if (uses[end] === 0) continue;
    open[end] = 1;
    width += 1;
  }
  const change = ({ ends }: Candidate): number => {
    let sum = 0;
    for (const end of ends) sum += (open[end] === 1 ? 0 : 1) - (uses[end] === 1 ? 1 : 0);
    return sum;
  };
  const remaining = [...candidates];
  const edges: TreeEdge[] = [];
  let cost = 0;
  for (let next = first; remaining.length > 0; ) {
    const chosen = remaining[next]!;
    remaining.splice(next, 1);
    width += change(chosen);
    for (const end of chosen.ends) {
      uses[end] = uses[end]! - 1;
      open[end] = uses[end] === 0 ? 0 : 1;
    }
    edges.push(chosen.edge);
    cost += 2 ** width; // the number of states grows about so, or faster, with the open nodes
    next = 0;
    let least = Number.POSITIVE_INFINITY;
    for (let index = 0; index < remaining.length; index += 1) {
      const own = change(remaining[index]!);
      if (own < least) {
        least = own;
        next = index;
      }
    }
  }
  return { edges, cost };
}

/**
 * Orders edges so that few nodes are open (touched by edges decided and by edges undecided) at any
 * time, which keeps the diagram small: greedily, from several first edges, the best of them.
 *
 * @param source inclusions that are decided before all edges.
 */
export function orderEdges(
  edges: readonly TreeEdge[],
  nodeCount: number,
  source: readonly Inclusion[],
): readonly TreeEdge[] {
  const candidates = edges.map((edge) => ({ edge, ends: endsOf(edge.inclusions, nodeCount) }));
  const opened = endsOf(source, nodeCount);
  let best: Order | undefined;
  const starts = Math.min(edges.length, MOST_STARTS);
  for (let start = 0; start < starts; start += 1) {
    const order = greedy(candidates, opened, nodeCount, Math.floor((start * edges.length) / starts));
    if (best === undefined || order.cost < best.cost) best = order;
  }
  return best?.edges ?? [];
}
