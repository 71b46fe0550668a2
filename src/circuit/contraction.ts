import type { Edge } from './tree-edge.ts';

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
  const isPositive = (gone === from) === (rowOf(blocks, gone) % 2 === 0);
  const merged = blocks.slice();
  for (let node = 0; node < merged.length; node += 1) if (merged[node] === gone) merged[node] = kept;
  return { blocks: merged, sign: isPositive ? 1 : -1 };
}

/**
 * Closes the nodes that no undecided edge touches (`open[node]` is 0; ground is always open) and gives
 * every block its smallest open node as label. Renaming blocks may change the order of the rows, hence
 * the sign. `undefined` where a block without ground has no open node left: it can never be joined,
 * and the determinant vanishes.
 */
export function close(blocks: Blocks, open: Uint8Array): Contracted | undefined {
  const count = blocks.length;
  const renamed = new Uint8Array(count).fill(CLOSED);
  const fresh = new Uint8Array(count).fill(CLOSED); // by old label
  for (let node = 0; node < count; node += 1) {
    const label = blocks[node]!;
    if (label === CLOSED || open[node] === 0) continue;
    if (fresh[label] === CLOSED) fresh[label] = node;
    renamed[node] = fresh[label]!;
  }
  let sign: 1 | -1 = 1;
  for (let label = 1; label < count; label += 1) {
    if (blocks[label] !== label) continue;
    const own = fresh[label]!;
    if (own === CLOSED) return undefined;
    if (own === label) continue; // a name kept is the least of all that are left, so no row passes it
    for (let other = label + 1; other < count; other += 1) {
      if (blocks[other] === other && fresh[other]! < own) sign = sign === 1 ? -1 : 1;
    }
  }
  return { blocks: renamed, sign };
}
