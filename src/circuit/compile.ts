import { NotchworkError } from '../errors.ts';
import type { TransferFunction } from '../transfer-function.ts';
import { buildDiagram, type Diagram } from './diagram.ts';
import { Evaluator } from './evaluator.ts';
import { checkSize, DEFAULT_LIMITS, type DiagramLimits } from './limits.ts';
import type { Network, NetworkResponse } from './network.ts';
import { scaled, unscale } from './scaling.ts';
import { checkTopology } from './topology.ts';
import { twoGraph } from './two-graph.ts';
import type { ElementKind, Wiring } from './wiring.ts';

function countTrees(diagram: Diagram): number {
  const counts: number[] = [];
  const count = (next: number | undefined): number => (next === undefined ? 0 : next < 0 ? 1 : counts[next]!);
  for (const { without, including } of diagram.steps) {
    counts.push(including.reduce((sum, branch) => sum + count(branch?.next), count(without?.next)));
  }
  return count(diagram.roots[0]?.next);
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
  readonly #kinds: readonly ElementKind[];

  constructor(wiring: Wiring, diagram: Diagram) {
    this.wiring = wiring;
    this.treeCount = countTrees(diagram);
    this.#evaluator = new Evaluator(diagram, wiring.elements.length);
    this.#kinds = wiring.elements.map((element) => element.kind);
  }

  evaluate(values: ArrayLike<number>): NetworkResponse {
    const scaling = scaled(this.#kinds, values);
    const [denominator, ...numerators] = this.#evaluator.evaluate(scaling.values);
    const lowest = denominator!.findIndex((coefficient) => coefficient !== 0);
    if (lowest < 0) {
      throw new NotchworkError(
        'circuit-unsolvable',
        'These values leave the circuit without a solution: a short across the source, or a part of it cut off. Change the value set last.',
      );
    }
    for (const coefficients of [denominator!, ...numerators]) {
      unscale(coefficients, scaling.omega, lowest);
      if (!coefficients.every(Number.isFinite)) {
        throw new NotchworkError(
          'circuit-unsolvable',
          'These values are too large or too far apart to calculate with, or not numbers. Change the value set last.',
        );
      }
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
 * coefficients come out multiplied by `ΠR·ΠsL` (and, in a large circuit, by a power of two: see
 * `scaling.ts`), which cancels in the quotient.
 *
 * @throws NotchworkError `netlist-topology` where no values could give a solution, naming the nodes
 *   or elements; `netlist-too-large` beyond the limits of `limits.ts`.
 */
export function compile(wiring: Wiring, limits: DiagramLimits = DEFAULT_LIMITS): Network {
  checkSize(wiring);
  checkTopology(wiring);
  const diagram = buildDiagram(twoGraph(wiring), limits);
  if (diagram.roots[0] === undefined) {
    throw new NotchworkError(
      'netlist-topology',
      'This circuit has no solution whatever its values: some controlled source leaves no other way for its current, or nothing fixes the voltage that controls it. Put a resistor in.',
    );
  }
  return new CompiledNetwork(wiring, diagram);
}
