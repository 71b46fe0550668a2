import type { Edge } from './two-graph.ts';

/**
 * The state of one graph while edges are taken into a tree: which nodes have been merged. `blocks[node]`
 * is the label of the node's block, the smallest open node in it; a block with ground has label 0.
 * {@link CLOSED} marks nodes that no undecided edge touches.
 *
 * It stands for a determinant with one row for each block but ground's, in ascending order of label.
 */
export type Blocks = Uint8Array;

/** Label of a node that is no longer of interest. */
export const CLOSED = 255;

/** Every node in a block of its own. */
export function separateBlocks(nodeCount: number): Blocks {
  return Uint8Array.from({ length: nodeCount }, (_, node) => node);
}

/** Number of a label's row: how many smaller labels there are, ground's not counted. */
function rowOf(blocks: Blocks, label: number): number {
  let row = 0;
  for (let node = 1; node < label; node += 1) if (blocks[node] === node) row += 1;
  return row;
}

/** What taking an edge does to one graph. */
export interface Contracted {
  readonly blocks: Blocks;
  readonly sign: 1 | -1;
}

/**
 * Expands the determinant along the edge's column, after adding the row of one end's block to the
 * other's: the two blocks become one, and the sign is that of the entry and of its row.
 * `undefined` where both ends are in one block already (the edge would close a loop).
 */
export function contract(blocks: Blocks, edge: Edge): Contracted | undefined {
  const from = blocks[edge.from]!;
  const to = blocks[edge.to]!;
  if (from === to) return undefined;
  const gone = Math.max(from, to);
  const kept = Math.min(from, to);
  const entry = gone === from ? 1 : -1;
  const sign = rowOf(blocks, gone) % 2 === 0 ? entry : -entry;
  return { blocks: blocks.map((label) => (label === gone ? kept : label)), sign: sign as 1 | -1 };
}

/**
 * Closes the nodes that no undecided edge touches and gives every block its smallest open node as
 * label. Renaming blocks may change the order of the rows, hence the sign. `undefined` where a block
 * without ground has no open node left: it can never be joined, and the determinant vanishes.
 */
export function close(blocks: Blocks, isOpen: (node: number) => boolean): Contracted | undefined {
  const renamed = new Uint8Array(blocks.length).fill(CLOSED);
  const labels = new Map<number, number>([[0, 0]]);
  for (let node = 0; node < blocks.length; node += 1) {
    const label = blocks[node]!;
    if (label !== CLOSED && isOpen(node) && !labels.has(label)) labels.set(label, node);
  }
  let sign: 1 | -1 = 1;
  const order: number[] = [];
  for (let node = 0; node < blocks.length; node += 1) {
    const label = blocks[node]!;
    if (label === CLOSED) continue;
    const fresh = labels.get(label);
    if (fresh === undefined) return undefined;
    if (isOpen(node) || node === 0) renamed[node] = fresh;
    if (label === node && label !== 0) order.push(fresh);
  }
  for (let first = 0; first < order.length; first += 1) {
    for (let second = first + 1; second < order.length; second += 1) {
      if (order[first]! > order[second]!) sign = sign === 1 ? -1 : 1;
    }
  }
  return { blocks: renamed, sign };
}
