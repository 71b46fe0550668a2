import { NotchworkError } from '../errors.ts';
import type { TransferFunction } from '../transfer-function.ts';
import { buildDiagram, type Diagram, type DiagramLimits } from './diagram.ts';
import { Evaluator } from './evaluator.ts';
import type { Network, NetworkResponse } from './network.ts';
import { twoGraph } from './two-graph.ts';
import type { Wiring } from './wiring.ts';

/** Most nodes and elements in one wiring. */
export const MOST_NODES = 60;
export const MOST_ELEMENTS = 150;

/** Partial sums that are compiled at the most: a few hundred milliseconds of work. */
export const DEFAULT_LIMITS: DiagramLimits = { steps: 60_000 };

function countTrees(diagram: Diagram): number {
  const counts: number[] = [];
  const count = (next: number | undefined): number => (next === undefined ? 0 : next < 0 ? 1 : counts[next]!);
  for (const { without, including } of diagram.steps) {
    counts.push(including.reduce((sum, branch) => sum + count(branch?.next), count(without?.next)));
  }
  return count(diagram.roots[0]?.next);
}

function checkSize(wiring: Wiring, nodeCount: number): void {
  if (nodeCount > MOST_NODES || wiring.elements.length > MOST_ELEMENTS) {
    throw new NotchworkError(
      'netlist-too-large',
      `This circuit has ${nodeCount} nodes and ${wiring.elements.length} elements; at most ${MOST_NODES} and ${MOST_ELEMENTS} can be solved exactly.`,
    );
  }
}

/** Names nodes that no path of elements joins to ground, for the message when nothing can be solved. */
function floatingNodes(wiring: Wiring): readonly string[] {
  const joined = new Set(['0']);
  const pairs = [wiring.source, ...wiring.elements.map((element) => element.nodes)];
  for (let changed = true; changed; ) {
    changed = false;
    for (const [from, to] of pairs) {
      if (joined.has(from) !== joined.has(to)) {
        joined.add(from).add(to);
        changed = true;
      }
    }
  }
  const all = new Set(
    [
      ...pairs,
      ...wiring.elements.flatMap((e) => ('control' in e ? [e.control] : [])),
      ...wiring.outputs,
    ].flat(),
  );
  return [...all].filter((node) => !joined.has(node));
}

function checkTopology(wiring: Wiring, diagram: Diagram): void {
  if (wiring.source[0] === wiring.source[1]) {
    throw new NotchworkError(
      'netlist-topology',
      `The source has both ends at node ${wiring.source[0]}; join it to two nodes.`,
    );
  }
  const floating = floatingNodes(wiring);
  if (floating.length > 0) {
    throw new NotchworkError(
      'netlist-topology',
      `Node ${floating.join(', ')} has no path to ground (node 0), so its voltage is undefined. Join it, for instance by a large resistor.`,
    );
  }
  if (diagram.roots[0] === undefined) {
    throw new NotchworkError(
      'netlist-topology',
      'This circuit has no solution: a loop of ideal voltage sources, or a node that only current sources and controls touch. Put a resistor in.',
    );
  }
}

/** Drops common zeros at s = 0 and zero leading coefficients, so that the order is what it looks like. */
function trimmed(numerator: readonly number[], denominator: readonly number[]): TransferFunction {
  let start = 0;
  while (start < denominator.length - 1 && denominator[start] === 0 && (numerator[start] ?? 0) === 0)
    start += 1;
  const cut = (coefficients: readonly number[]): number[] => {
    let end = coefficients.length;
    while (end > start + 1 && coefficients[end - 1] === 0) end -= 1;
    return coefficients.slice(start, Math.max(end, start + 1));
  };
  const top = cut(numerator);
  return { numerator: top.length === 0 ? [0] : top, denominator: cut(denominator) };
}

class CompiledNetwork implements Network {
  readonly wiring: Wiring;
  readonly treeCount: number;
  readonly #evaluator: Evaluator;

  constructor(wiring: Wiring, diagram: Diagram) {
    this.wiring = wiring;
    this.treeCount = countTrees(diagram);
    this.#evaluator = new Evaluator(diagram, wiring.elements.length);
  }

  evaluate(values: ArrayLike<number>): NetworkResponse {
    const [denominator, ...numerators] = this.#evaluator.evaluate(values);
    if (!denominator!.some((coefficient) => coefficient !== 0)) {
      throw new NotchworkError(
        'circuit-unsolvable',
        'These values leave the circuit without a solution: a short across the source, or a part of it cut off. Change the value set last.',
      );
    }
    return { denominator: denominator!, numerators };
  }

  transfer(values: ArrayLike<number>, output = 0): TransferFunction {
    const { numerators, denominator } = this.evaluate(values);
    const numerator = numerators[output];
    if (numerator === undefined) {
      throw new NotchworkError(
        'value-out-of-range',
        `Output ${output} was asked for; there are ${numerators.length}.`,
      );
    }
    return trimmed(numerator, denominator);
  }
}

/**
 * Compiles a wiring: finds every common spanning tree once, so that each set of values then costs a
 * run of multiplications and additions. For R, C and L alone nothing is ever subtracted, and every
 * coefficient keeps full relative precision; a resistor of 0 Ω is nothing special.
 *
 * With `C` in the tree contributing `sC`, and `R` or `sL` contributing when *not* in the tree, all
 * coefficients come out multiplied by `ΠR·ΠsL`, which cancels in the quotient.
 *
 * @throws NotchworkError `netlist-topology` where no values could give a solution,
 *   `netlist-too-large` beyond {@link MOST_NODES}, {@link MOST_ELEMENTS} or the step limit.
 */
export function compile(wiring: Wiring, limits: DiagramLimits = DEFAULT_LIMITS): Network {
  const graph = twoGraph(wiring);
  checkSize(wiring, graph.nodeCount);
  const diagram = buildDiagram(graph, limits);
  checkTopology(wiring, diagram);
  return new CompiledNetwork(wiring, diagram);
}
