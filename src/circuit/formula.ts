import { NotchworkError } from '../errors.ts';
import { type Branch, buildDiagram, type Diagram, END, type Step } from './diagram.ts';
import { checkSize, DEFAULT_LIMITS } from './limits.ts';
import { twoGraph } from './two-graph.ts';
import type { Wiring } from './wiring.ts';

/** Most products that are written out; beyond it nobody reads a formula. */
export const MOST_TERMS = 2000;

/** The coefficients of a wiring in letters. */
export interface Formula {
  /** `numerators[output][k]` is the coefficient of `s^k`, as text; '0' where it is nothing. */
  readonly numerators: readonly (readonly string[])[];
  readonly denominator: readonly string[];
}

/** One product of element values. */
interface Term {
  readonly sign: 1 | -1;
  readonly power: number;
  /** Indices of the elements whose values are multiplied. */
  readonly factors: readonly number[];
}

interface Way {
  readonly branch: Branch;
  readonly sign: 1 | -1;
  readonly factor: boolean;
  readonly power: number;
}

/** The ways to decide a step's edge: what each multiplies the sum behind it with (see `compile.ts`). */
function waysOf({ edge, without, including }: Step): readonly Way[] {
  const isOutside = edge.kind === 'resistor' || edge.kind === 'inductor';
  const ways: Way[] = [];
  if (without !== undefined) {
    ways.push({
      branch: without,
      sign: without.sign,
      factor: isOutside,
      power: edge.kind === 'inductor' ? 1 : 0,
    });
  }
  including.forEach((branch, way) => {
    if (branch === undefined) return;
    const isControl = way === 1; // a voltage gain's control side enters as −gain
    ways.push({
      branch,
      sign: isControl ? (-branch.sign as 1 | -1) : branch.sign,
      factor: isControl || edge.kind === 'capacitor' || edge.kind === 'transconductance',
      power: edge.kind === 'capacitor' ? 1 : 0,
    });
  });
  return ways;
}

function countTerms({ steps, roots }: Diagram): number {
  const counts: number[] = [];
  const count = (branch: Branch): number => (branch.next === END ? 1 : counts[branch.next]!);
  for (const step of steps) counts.push(waysOf(step).reduce((sum, { branch }) => sum + count(branch), 0));
  return roots.reduce((sum, root) => sum + (root === undefined ? 0 : count(root)), 0);
}

/** Every product under one root, in the order of the diagram. */
function expand(diagram: Diagram, root: Branch | undefined): readonly Term[] {
  const terms: Term[] = [];
  const walk = ({ next }: Branch, sign: 1 | -1, power: number, factors: readonly number[]): void => {
    if (next === END) {
      terms.push({ sign, power, factors });
      return;
    }
    const step = diagram.steps[next]!;
    for (const way of waysOf(step)) {
      const product = way.factor ? [...factors, step.edge.element] : factors;
      walk(way.branch, way.sign === sign ? 1 : -1, power + way.power, product);
    }
  };
  if (root !== undefined) walk(root, root.sign, 0, []);
  return terms;
}

/** Factors and powers of s that all terms share, on both sides of the fraction: they cancel. */
function common(terms: readonly Term[]): { factors: ReadonlySet<number>; power: number } {
  const [first, ...rest] = terms;
  const factors = new Set(first?.factors);
  for (const term of rest) {
    const own = new Set(term.factors);
    for (const factor of factors) if (!own.has(factor)) factors.delete(factor);
  }
  return { factors, power: Math.min(...terms.map((term) => term.power)) };
}

function joined(products: readonly { readonly sign: 1 | -1; readonly text: string }[]): string {
  if (products.length === 0) return '0';
  return products
    .map(({ sign, text }, index) => {
      if (index === 0) return sign === 1 ? text : `−${text}`;
      return sign === 1 ? ` + ${text}` : ` − ${text}`;
    })
    .join('');
}

/** Compares products by their factors in the wiring's order, so that a formula reads evenly. */
function inOrder(a: readonly number[], b: readonly number[]): number {
  const index = a.findIndex((factor, place) => factor !== b[place]);
  return index < 0 ? a.length - b.length : a[index]! - (b[index] ?? -1);
}

function texts(
  terms: readonly Term[],
  shared: ReturnType<typeof common>,
  names: readonly string[],
): readonly string[] {
  const length = Math.max(0, ...terms.map((term) => term.power - shared.power)) + 1;
  return Array.from({ length }, (_, power) => {
    const products = terms
      .filter((term) => term.power - shared.power === power)
      .map(({ sign, factors }) => ({
        sign,
        kept: factors.filter((factor) => !shared.factors.has(factor)).sort((a, b) => a - b),
      }))
      .sort((a, b) => b.sign - a.sign || inOrder(a.kept, b.kept))
      .map(({ sign, kept }) => ({ sign, text: kept.map((factor) => names[factor]).join('·') || '1' }));
    return joined(products);
  });
}

/**
 * The transfer function in letters: every coefficient as a sum of products of element names, such as
 * `C1·R1 + C2·R1`, read from the same trees that the numbers come from. Factors that every product on
 * both sides shares are cancelled; a product of nothing is `1`. Minus signs (U+2212) appear with
 * controlled sources alone.
 *
 * @param mostTerms most products in all, numerators and denominator together.
 * @throws NotchworkError `netlist-too-large` beyond that, and as the compiler does for what it refuses
 *   by size; `netlist-topology` where the denominator has no term at all.
 */
export function formulaOf(wiring: Wiring, mostTerms: number = MOST_TERMS): Formula {
  checkSize(wiring);
  const diagram = buildDiagram(twoGraph(wiring), DEFAULT_LIMITS);
  const count = countTerms(diagram);
  if (count > mostTerms) {
    throw new NotchworkError(
      'netlist-too-large',
      `The formula of this circuit has ${count} products; at most ${mostTerms} are written out. Leave out elements that do not matter.`,
    );
  }
  const [denominator, ...numerators] = diagram.roots.map((root) => expand(diagram, root));
  if (denominator!.length === 0) {
    throw new NotchworkError(
      'netlist-topology',
      'This circuit has no solution, so it has no formula. Look for a loop of voltage sources or a node without a path to ground.',
    );
  }
  const shared = common([...denominator!, ...numerators.flat()]);
  const names = wiring.elements.map((element) => element.name);
  return {
    numerators: numerators.map((terms) => texts(terms, shared, names)),
    denominator: texts(denominator!, shared, names),
  };
}
