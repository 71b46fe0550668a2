import { NotchworkError } from '../errors.ts';
import type { TransferFunction } from '../transfer-function.ts';
import { compile } from './compile.ts';
import { buildDiagram } from './diagram.ts';
import { Evaluator } from './evaluator.ts';
import { JoinedNodes } from './joined-nodes.ts';
import { DEFAULT_LIMITS } from './limits.ts';
import { scaled, unscale } from './scaling.ts';
import { twoGraph } from './two-graph.ts';
import { type Element, GROUND, type NodeName, type NodePair, type Wiring } from './wiring.ts';

/** A node that no element touches: it carries the source that the tree search wants to see. */
const ASIDE: NodeName = '(aside)';

/** What becomes of the wiring's own source while the impedance is taken. */
export type SourceState = 'shorted' | 'removed';

/** The elements after pairs of nodes have been joined, ground keeping its name. */
function merged(elements: readonly Element[], pairs: readonly NodePair[]): readonly Element[] {
  const nodes = new JoinedNodes();
  for (const pair of pairs) nodes.join(...pair);
  const join = ([first, second]: NodePair): NodePair => [nodes.rootOf(first), nodes.rootOf(second)];
  return elements.map((element) =>
    'control' in element
      ? { ...element, nodes: join(element.nodes), control: join(element.control) }
      : { ...element, nodes: join(element.nodes) },
  );
}

/** The nodal determinant, times all resistances and `sL`; empty of nonzero terms where it vanishes. */
function determinant(elements: readonly Element[], values: ArrayLike<number>): number[] {
  const graph = twoGraph({ elements, source: [ASIDE, GROUND], outputs: [] });
  const diagram = buildDiagram(graph, DEFAULT_LIMITS);
  return new Evaluator(diagram, elements.length).evaluate(values)[0]!;
}

function withoutCommonZeros(numerator: readonly number[], denominator: readonly number[]): TransferFunction {
  let start = 0;
  while (start < denominator.length - 1 && denominator[start] === 0 && (numerator[start] ?? 0) === 0)
    start += 1;
  const trim = (coefficients: readonly number[]): readonly number[] => {
    const end = coefficients.findLastIndex((value) => value !== 0) + 1;
    return end > start ? coefficients.slice(start, end) : [0];
  };
  return { numerator: trim(numerator), denominator: trim(denominator) };
}

function assertKnown(wiring: Wiring, nodes: NodePair): void {
  const known = new Set([GROUND, ...wiring.source, ...wiring.elements.flatMap((element) => element.nodes)]);
  for (const node of nodes) {
    if (!known.has(node)) {
      throw new NotchworkError(
        'netlist-topology',
        `There is no node “${node}” to measure at; the nodes are ${[...known].join(', ')}.`,
      );
    }
  }
}

/**
 * Driving-point impedance between two nodes, in ohms, as a function of `s`: what a meter would find
 * there. It is the determinant with the two nodes joined over the determinant as it stands (both times
 * the same resistances), so that for passive circuits nothing is subtracted and a resistor of 0 Ω is
 * nothing special. (The quotient of two-trees and trees: Kirchhoff 1847; W. Mayeda, Graph Theory,
 * 1972, from memory.)
 *
 * @param values one per element, as for `Network.evaluate`.
 * @param source `shorted` (default): the wiring's source is an ideal one at rest, as for an output
 *   impedance; `removed`: it is taken out, for the impedance that the source itself sees.
 * @returns 0 where the two nodes are one, or are held together by an ideal source.
 * @throws NotchworkError `netlist-topology` for unknown nodes and as `compile` does;
 *   `circuit-unsolvable` where nothing but the meter would fix the voltage there.
 */
export function impedance(
  wiring: Wiring,
  values: ArrayLike<number>,
  nodes: NodePair,
  source: SourceState = 'shorted',
): TransferFunction {
  assertKnown(wiring, nodes);
  compile({ ...wiring, outputs: [] }); // refuses what is too large or has no solution, in plain words
  const rest = source === 'shorted' ? [wiring.source] : [];
  const [meter] = merged([{ kind: 'resistor', name: 'meter', nodes }], rest);
  const [positive, negative] = meter!.nodes;
  if (positive === negative) return { numerator: [0], denominator: [1] };
  const scaling = scaled(
    wiring.elements.map((element) => element.kind),
    values,
  );
  const resting = merged(wiring.elements, rest);
  const touched = new Set([GROUND, ...resting.flatMap((element) => element.nodes)]);
  const open = touched.has(positive) && touched.has(negative) ? determinant(resting, scaling.values) : [0];
  const lowest = open.findIndex((coefficient) => coefficient !== 0);
  if (lowest < 0) {
    throw new NotchworkError(
      'circuit-unsolvable',
      `Between ${nodes[0]} and ${nodes[1]} the impedance is infinite at every frequency: nothing joins them. Add the load that would be there.`,
    );
  }
  const joined = determinant(merged(wiring.elements, [...rest, nodes]), scaling.values);
  for (const coefficients of [joined, open]) unscale(coefficients, scaling.omega, lowest);
  return withoutCommonZeros(
    joined.map((coefficient) => coefficient * scaling.ohms),
    open,
  );
}
