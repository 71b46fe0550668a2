import { describe, expect, it } from 'vitest';
import { CLOSED, close, contract, separateBlocks } from '../../../src/circuit/contraction.ts';
import type { Edge } from '../../../src/circuit/two-graph.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';

const ALL_OPEN = new Uint8Array(8).fill(1);

/** Determinant by expansion along the first column: another road than contraction, and exact for integers. */
function determinant(matrix: readonly (readonly number[])[]): number {
  if (matrix.length === 0) return 1;
  return matrix.reduce((sum, row, index) => {
    if (row[0] === 0) return sum;
    const minor = matrix.filter((_, other) => other !== index).map((entries) => entries.slice(1));
    return sum + (index % 2 === 0 ? 1 : -1) * row[0]! * determinant(minor);
  }, 0);
}

/** The incidence matrix without ground's row: +1 where an edge starts, −1 where it ends. */
function incidence(edges: readonly Edge[], nodeCount: number): number[][] {
  return Array.from({ length: nodeCount - 1 }, (_, row) =>
    edges.map(({ from, to }) => (from === row + 1 ? 1 : 0) - (to === row + 1 ? 1 : 0)),
  );
}

/** The determinant by contracting one edge after the other, closing nodes as soon as nothing touches them. */
function contracted(edges: readonly Edge[], nodeCount: number, closing: boolean): number {
  let blocks = separateBlocks(nodeCount);
  let sign = 1;
  for (const [index, edge] of edges.entries()) {
    const step = contract(blocks, edge);
    if (step === undefined) return 0;
    sign *= step.sign;
    blocks = step.blocks;
    if (!closing) continue;
    const open = new Uint8Array(nodeCount);
    open[0] = 1;
    for (const { from, to } of edges.slice(index + 1)) {
      open[from] = 1;
      open[to] = 1;
    }
    const closed = close(blocks, open);
    if (closed === undefined) return 0;
    sign *= closed.sign;
    blocks = closed.blocks;
  }
  return sign;
}

describe('contract and close', () => {
  it('merges two blocks into the one with the smaller label', () => {
    const merged = contract(separateBlocks(4), { from: 3, to: 1 })!;
    expect([...merged.blocks]).toEqual([0, 1, 2, 1]);
    // Row 3 of the rows 1, 2, 3 goes, and the edge starts there: +1 at an even position.
    expect(merged.sign).toBe(1);
    expect(contract(separateBlocks(4), { from: 1, to: 3 })!.sign).toBe(-1);
  });

  it('refuses an edge that would close a loop', () => {
    const { blocks } = contract(separateBlocks(3), { from: 1, to: 2 })!;
    expect(contract(blocks, { from: 2, to: 1 })).toBeUndefined();
  });

  it('leaves the blocks it was given as they were', () => {
    const before = separateBlocks(4);
    contract(before, { from: 2, to: 1 });
    close(before, ALL_OPEN.slice(0, 4));
    expect([...before]).toEqual([0, 1, 2, 3]);
  });

  it('renames a block after its smallest open node, and counts how the rows change places', () => {
    const { blocks } = contract(separateBlocks(4), { from: 3, to: 1 })!;
    const closed = close(blocks, Uint8Array.of(1, 0, 1, 1))!; // block 1 becomes block 3, behind block 2
    expect([...closed.blocks]).toEqual([0, CLOSED, 2, 3]);
    expect(closed.sign).toBe(-1);
  });

  it('gives up where a block without ground is cut off', () => {
    expect(close(separateBlocks(3), Uint8Array.of(1, 0, 1))).toBeUndefined();
  });

  it.each([
    ['all nodes open', false],
    ['nodes closed as early as possible', true],
  ])('gives the determinant of the incidence matrix, %s', (_, closing) => {
    const random = seededRandom(41);
    const seen = { plus: 0, minus: 0, zero: 0 };
    for (let trial = 0; trial < 2000; trial += 1) {
      const nodeCount = 3 + Math.floor(random() * 5);
      const pick = () => Math.floor(random() * nodeCount);
      const edges = Array.from({ length: nodeCount - 1 }, () => ({ from: pick(), to: pick() }));
      const expected = determinant(incidence(edges, nodeCount));
      expect(contracted(edges, nodeCount, closing) + 0).toBe(expected + 0);
      seen[expected > 0 ? 'plus' : expected < 0 ? 'minus' : 'zero'] += 1;
    }
    expect(Math.min(seen.plus, seen.minus, seen.zero)).toBeGreaterThan(100); // that all three were met
  });
});
