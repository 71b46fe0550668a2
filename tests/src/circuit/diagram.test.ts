import { describe, expect, it } from 'vitest';
import { type Branch, buildDiagram, type Diagram, END } from '../../../src/circuit/diagram.ts';
import { DEFAULT_LIMITS } from '../../../src/circuit/limits.ts';
import { twoGraph } from '../../../src/circuit/two-graph.ts';
import type { Element, Wiring } from '../../../src/circuit/wiring.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';

const resistor = (name: string, a: string, b: string): Element => ({ kind: 'resistor', name, nodes: [a, b] });
const nodeName = (node: number): string => (node === 0 ? '0' : node === 1 ? 'in' : `n${node}`);

function diagramOf(wiring: Wiring): Diagram {
  return buildDiagram(twoGraph(wiring), DEFAULT_LIMITS);
}

/** Sum over all trees of their signs: what a determinant with unit weights comes to. */
function signedCount({ steps, roots }: Diagram, root = 0): number {
  const sums: number[] = [];
  const value = (branch: Branch | undefined): number =>
    branch === undefined ? 0 : branch.sign * (branch.next === END ? 1 : sums[branch.next]!);
  for (const { edge, without, including } of steps) {
    const [itself, controlled] = including;
    // The control side of a voltage gain enters with −gain, here −1.
    sums.push(value(without) + value(itself) - (edge.kind === 'voltage-gain' ? value(controlled) : 0));
  }
  return value(roots[root]);
}

/** Determinant by elimination with partial pivoting. */
function determinant(matrix: number[][]): number {
  let product = 1;
  for (let column = 0; column < matrix.length; column += 1) {
    const below = matrix.slice(column).map((row) => Math.abs(row[column]!));
    const pivot = column + below.indexOf(Math.max(...below));
    if (matrix[pivot]![column] === 0) return 0;
    if (pivot !== column) {
      [matrix[column], matrix[pivot]] = [matrix[pivot]!, matrix[column]!];
      product = -product;
    }
    product *= matrix[column]![column]!;
    for (let row = column + 1; row < matrix.length; row += 1) {
      const factor = matrix[row]![column]! / matrix[column]![column]!;
      for (let k = column; k < matrix.length; k += 1) matrix[row]![k]! -= factor * matrix[column]![k]!;
    }
  }
  return product;
}

/** Nodal matrix with unit weights after `in` has been joined to ground: R as 1 S, G as 1 S. */
function nodalMatrix(elements: readonly Element[], nodeCount: number): number[][] {
  const matrix = Array.from({ length: nodeCount }, () => new Array<number>(nodeCount).fill(0));
  const number = (name: string): number => (name === '0' || name === 'in' ? 0 : Number(name.slice(1)));
  for (const element of elements) {
    const [a, b] = element.nodes.map(number) as [number, number];
    const [c, d] = ('control' in element ? element.control : element.nodes).map(number) as [number, number];
    matrix[a]![c]! += 1;
    matrix[b]![d]! += 1;
    matrix[a]![d]! -= 1;
    matrix[b]![c]! -= 1;
  }
  return matrix.slice(2).map((row) => row.slice(2)); // without ground and in
}

describe('buildDiagram', () => {
  it('counts trees as the matrix-tree theorem does (Kirchhoff 1847), on random graphs', () => {
    const random = seededRandom(12);
    let [several, none] = [0, 0];
    for (let trial = 0; trial < 200; trial += 1) {
      const nodeCount = 4 + Math.floor(random() * 5);
      const pick = () => Math.floor(random() * nodeCount);
      const elements = Array.from({ length: nodeCount + Math.floor(random() * nodeCount) }, (_, index) =>
        resistor(`R${index}`, nodeName(pick()), nodeName(pick())),
      );
      const wiring: Wiring = { elements, source: ['in', '0'], outputs: [[nodeName(nodeCount - 1), '0']] };
      // Nodes that no resistor drew are unknown to the wiring; a test circuit must have them all.
      if (new Set(elements.flatMap(({ nodes }) => nodes)).size < nodeCount) continue;
      const expected = Math.round(determinant(nodalMatrix(elements, nodeCount)));
      expect(signedCount(diagramOf(wiring))).toBe(expected);
      if (expected > 0) several += 1;
      else none += 1;
    }
    expect(several).toBeGreaterThan(50);
    expect(none).toBeGreaterThan(0);
  });

  it('has the signs of the nodal determinant with transconductances, on random graphs', () => {
    const random = seededRandom(13);
    const seen = { plus: 0, minus: 0, zero: 0 };
    for (let trial = 0; trial < 300; trial += 1) {
      const nodeCount = 4 + Math.floor(random() * 4);
      const pick = () => nodeName(Math.floor(random() * nodeCount));
      const elements = Array.from(
        { length: 2 * nodeCount },
        (_, index): Element =>
          random() < 0.6
            ? {
                kind: 'transconductance',
                name: `G${index}`,
                nodes: [pick(), pick()],
                control: [pick(), pick()],
              }
            : resistor(`R${index}`, pick(), pick()),
      );
      for (let node = 0; node < nodeCount; node += 1)
        elements.push(resistor(`S${node}`, nodeName(node), '0'));
      const wiring: Wiring = { elements, source: ['in', '0'], outputs: [] };
      const expected = Math.round(determinant(nodalMatrix(elements, nodeCount)));
      expect(signedCount(diagramOf(wiring)) + 0).toBe(expected + 0);
      seen[expected > 0 ? 'plus' : expected < 0 ? 'minus' : 'zero'] += 1;
    }
    expect(Math.min(seen.plus, seen.minus)).toBeGreaterThan(20);
  });

  it('refers only to steps that come before, and ends everywhere', () => {
    const elements = [
      resistor('A', 'in', 'n2'),
      resistor('B', 'n2', 'n3'),
      resistor('C', 'n3', '0'),
      resistor('D', 'n2', '0'),
    ];
    const { steps, roots } = diagramOf({ elements, source: ['in', '0'], outputs: [['n3', '0']] });
    steps.forEach(({ without, including }, index) => {
      const branches = [without, ...including].filter((branch) => branch !== undefined);
      expect(branches.length).toBeGreaterThan(0);
      for (const { next } of branches) expect(next === END || next < index).toBe(true);
    });
    expect(roots).toHaveLength(2);
  });

  it('keeps what is equal once: a ladder grows by as many steps a section as the last', () => {
    const stepsOf = (sections: number): number => {
      const elements = Array.from({ length: sections }, (_, index) => [
        resistor(`A${index}`, nodeName(index + 1), nodeName(index + 2)),
        resistor(`B${index}`, nodeName(index + 2), '0'),
      ]).flat();
      return diagramOf({ elements, source: ['in', '0'], outputs: [[nodeName(sections + 1), '0']] }).steps
        .length;
    };
    const [ten, twenty, thirty] = [stepsOf(10), stepsOf(20), stepsOf(30)];
    expect(thirty - twenty).toBe(twenty - ten); // while the trees multiply by 2.6 with each section
    expect(thirty).toBeLessThan(30 * 10);
  });

  it('gives no root where there is no tree', () => {
    const { roots } = diagramOf({
      elements: [resistor('A', 'in', '0'), resistor('B', 'n2', 'n3')],
      source: ['in', '0'],
      outputs: [['n2', '0']],
    });
    expect(roots).toEqual([undefined, undefined]);
  });
});
