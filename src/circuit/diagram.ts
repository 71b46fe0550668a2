import { NotchworkError } from '../errors.ts';
import { type Blocks, CLOSED, close, contract, separateBlocks } from './contraction.ts';
import type { DiagramLimits } from './limits.ts';
import type { Inclusion, TreeEdge } from './tree-edge.ts';
import type { TwoGraph } from './two-graph.ts';

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

/** What has been decided so far, as far as it matters: one and the same object twice where the graphs agree. */
interface State {
  readonly current: Blocks;
  readonly voltage: Blocks;
}

/** A state as text: the labels of the open nodes, in one graph or, where they differ, in both. */
function keyOf({ current, voltage }: State): string {
  let key = labelsOf(current);
  if (current !== voltage) key += `|${labelsOf(voltage)}`;
  return key;
}

function labelsOf(blocks: Blocks): string {
  let labels = '';
  for (const label of blocks) if (label !== CLOSED) labels += String.fromCharCode(label);
  return labels;
}

function areEqual(first: Blocks, second: Blocks): boolean {
  for (let node = 0; node < first.length; node += 1) if (first[node] !== second[node]) return false;
  return true;
}

/** Which nodes edges yet to be decided touch, in either graph; one and the same object twice where they agree. */
interface OpenNodes {
  readonly current: Uint8Array;
  readonly voltage: Uint8Array;
}

/** Open nodes before each edge, and after the last. */
function openNodes({ edges, nodeCount }: TwoGraph): readonly OpenNodes[] {
  const levels: OpenNodes[] = [];
  const current = new Uint8Array(nodeCount);
  const voltage = new Uint8Array(nodeCount);
  current[0] = 1;
  voltage[0] = 1;
  for (let level = edges.length; level >= 0; level -= 1) {
    const own = current.slice();
    levels[level] = { current: own, voltage: areEqual(current, voltage) ? own : voltage.slice() };
    for (const inclusion of edges[level - 1]?.inclusions ?? []) {
      current[inclusion.current.from] = 1;
      current[inclusion.current.to] = 1;
      voltage[inclusion.voltage.from] = 1;
      voltage[inclusion.voltage.to] = 1;
    }
  }
  return levels;
}

class DiagramBuilder {
  readonly #graph: TwoGraph;
  readonly #limits: DiagramLimits;
  readonly #open: readonly OpenNodes[];
  /** By level and key: the step, or `undefined` for a state that leads nowhere. */
  readonly #known: readonly Map<string, number | undefined>[];
  #states = 0;
  readonly steps: Step[] = [];

  constructor(graph: TwoGraph, limits: DiagramLimits) {
    this.#graph = graph;
    this.#limits = limits;
    this.#open = openNodes(graph);
    this.#known = graph.edges.map(() => new Map());
  }

  /** The sum over all trees that start with one inclusion of the source. */
  root(inclusion: Inclusion): Branch | undefined {
    const separate = separateBlocks(this.#graph.nodeCount);
    return this.#include({ current: separate, voltage: separate }, inclusion, 0);
  }

  #include(state: State, inclusion: Inclusion, level: number): Branch | undefined {
    const current = contract(state.current, inclusion.current);
    if (current === undefined) return undefined;
    const isSame = state.voltage === state.current && inclusion.voltage === inclusion.current;
    const voltage = isSame ? current : contract(state.voltage, inclusion.voltage);
    if (voltage === undefined) return undefined;
    const sign = current.sign === voltage.sign ? 1 : -1;
    return this.#enter({ current: current.blocks, voltage: voltage.blocks }, sign, level);
  }

  /** Canonical form of a state before edge `level`, then the step that goes on from there. */
  #enter(state: State, sign: 1 | -1, level: number): Branch | undefined {
    const open = this.#open[level]!;
    const current = close(state.current, open.current);
    if (current === undefined) return undefined;
    const isSame = state.voltage === state.current && open.voltage === open.current;
    const voltage = isSame ? current : close(state.voltage, open.voltage);
    if (voltage === undefined) return undefined;
    const agree = isSame || areEqual(voltage.blocks, current.blocks);
    const next = this.#step(
      { current: current.blocks, voltage: agree ? current.blocks : voltage.blocks },
      level,
    );
    if (next === undefined) return undefined;
    return { next, sign: current.sign === voltage.sign ? sign : sign === 1 ? -1 : 1 };
  }

  #step(state: State, level: number): number | undefined {
    const edge = this.#graph.edges[level];
    if (edge === undefined) return END;
    const known = this.#known[level]!;
    const key = keyOf(state);
    const index = known.get(key);
    if (index !== undefined || known.has(key)) return index;
    const fresh = this.#expand(state, edge, level);
    known.set(key, fresh);
    return fresh;
  }

  #expand(state: State, edge: TreeEdge, level: number): number | undefined {
    this.#states += 1;
    if (this.#states > this.#limits.states) this.#refuse(this.#limits.states);
    const without = edge.optional ? this.#enter(state, 1, level + 1) : undefined;
    const including = edge.inclusions.map((inclusion) => this.#include(state, inclusion, level + 1));
    if (without === undefined && including.every((branch) => branch === undefined)) return undefined;
    if (this.steps.length >= this.#limits.steps) this.#refuse(this.#limits.steps);
    return this.steps.push({ edge, without, including }) - 1;
  }

  #refuse(count: number): never {
    throw new NotchworkError(
      'netlist-too-large',
      `This circuit is too tangled to solve exactly: more than ${count} partial sums for ${this.#graph.nodeCount} nodes and ${this.#graph.edges.length} elements. Split it, or leave out elements that do not matter.`,
    );
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
