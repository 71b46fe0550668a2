import { NotchworkError } from '../errors.ts';
import { type Blocks, close, contract, separateBlocks } from './contraction.ts';
import type { Inclusion, TreeEdge, TwoGraph } from './two-graph.ts';

/** A branch of a step: the sum that follows if its edge is taken in one particular way. */
export interface Branch {
  /** Index of the step that follows; {@link END} when the tree is complete. */
  readonly next: number;
  readonly sign: 1 | -1;
}

/** One step: a sum over the ways to decide one edge, everything before it being decided. */
export interface Step {
  readonly edge: TreeEdge;
  /** Value if the edge is left out; `undefined` where that leads nowhere. */
  readonly without: Branch | undefined;
  /** One for each of the edge's inclusions; `undefined` where it would close a loop or lead nowhere. */
  readonly including: readonly (Branch | undefined)[];
}

/** Stands for the empty product, 1. */
export const END = -1;

/** All common trees of a wiring, shared parts kept once: a program of sums and products. */
export interface Diagram {
  /** Every step comes after the steps it refers to. */
  readonly steps: readonly Step[];
  /** Where the denominator starts, then every output's numerator; `undefined` is a sum of no trees. */
  readonly roots: readonly (Branch | undefined)[];
}

/** How much work a wiring may take to compile. */
export interface DiagramLimits {
  /** Most steps in the diagram; the default keeps compiling well under a second. */
  readonly steps: number;
}

interface State {
  readonly current: Blocks;
  readonly voltage: Blocks;
}

function keyOf(level: number, { current, voltage }: State): string {
  return `${String.fromCharCode(level, ...current)}${String.fromCharCode(...voltage)}`;
}

/** After deciding edge k (and at −1, before the first), which nodes do later edges touch? */
function openNodes(graph: TwoGraph): readonly Uint8Array[] {
  const levels: Uint8Array[] = [];
  const open = new Uint8Array(graph.nodeCount);
  open[0] = 1;
  for (let index = graph.edges.length; index >= 0; index -= 1) {
    levels[index] = Uint8Array.from(open);
    const edge = graph.edges[index - 1];
    for (const { current, voltage } of edge?.inclusions ?? []) {
      open[current.from] = 1;
      open[current.to] = 1;
      open[voltage.from] = 1;
      open[voltage.to] = 1;
    }
  }
  return levels;
}

class DiagramBuilder {
  readonly #graph: TwoGraph;
  readonly #limits: DiagramLimits;
  readonly #open: readonly Uint8Array[];
  readonly #known = new Map<string, number | undefined>();
  readonly steps: Step[] = [];

  constructor(graph: TwoGraph, limits: DiagramLimits) {
    this.#graph = graph;
    this.#limits = limits;
    this.#open = openNodes(graph);
  }

  /** The sum over all trees that start with one inclusion of the source. */
  root(inclusion: Inclusion): Branch | undefined {
    const separate = separateBlocks(this.#graph.nodeCount);
    return this.#include({ current: separate, voltage: separate }, inclusion, 0);
  }

  #include(state: State, inclusion: Inclusion, level: number): Branch | undefined {
    const current = contract(state.current, inclusion.current);
    const voltage = contract(state.voltage, inclusion.voltage);
    if (current === undefined || voltage === undefined) return undefined;
    const sign = current.sign === voltage.sign ? 1 : -1;
    return this.#enter({ current: current.blocks, voltage: voltage.blocks }, sign, level);
  }

  /** Canonical form of a state before edge `level`, then the step that goes on from there. */
  #enter(state: State, sign: 1 | -1, level: number): Branch | undefined {
    const open = this.#open[level]!;
    const current = close(state.current, (node) => open[node] === 1);
    const voltage = close(state.voltage, (node) => open[node] === 1);
    if (current === undefined || voltage === undefined) return undefined;
    const next = this.#step({ current: current.blocks, voltage: voltage.blocks }, level);
    if (next === undefined) return undefined;
    return { next, sign: current.sign === voltage.sign ? sign : sign === 1 ? -1 : 1 };
  }

  #step(state: State, level: number): number | undefined {
    const edge = this.#graph.edges[level];
    if (edge === undefined) return END;
    const key = keyOf(level, state);
    if (this.#known.has(key)) return this.#known.get(key);
    const without = edge.optional ? this.#enter(state, 1, level + 1) : undefined;
    const including = edge.inclusions.map((inclusion) => this.#include(state, inclusion, level + 1));
    let index: number | undefined;
    if (without !== undefined || including.some((branch) => branch !== undefined)) {
      if (this.steps.length >= this.#limits.steps) {
        throw new NotchworkError(
          'netlist-too-large',
          `This circuit is too tangled to solve exactly: more than ${this.#limits.steps} partial sums for ${this.#graph.nodeCount} nodes and ${this.#graph.edges.length} elements. Split it, or leave out elements that do not matter.`,
        );
      }
      index = this.steps.length;
      this.steps.push({ edge, without, including });
    }
    this.#known.set(key, index);
    return index;
  }
}

/**
 * Finds all common spanning trees of a wiring's two graphs, keeping equal remainders once: the
 * memoised expansion of the nodal determinant over merged nodes (a decision diagram over the edges,
 * states kept for open nodes only; the idea is K. Sekine, H. Imai, S. Tani, ISAAC 1995, from memory).
 *
 * @throws NotchworkError `netlist-too-large` beyond the limits.
 */
export function buildDiagram(graph: TwoGraph, limits: DiagramLimits): Diagram {
  const builder = new DiagramBuilder(graph, limits);
  const roots = graph.source.map((inclusion) => builder.root(inclusion));
  return { steps: builder.steps, roots };
}
