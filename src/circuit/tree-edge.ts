import type { Element } from './wiring.ts';

/** An edge between two node numbers; ground is number 0. */
export interface Edge {
  readonly from: number;
  readonly to: number;
}

/** One way of putting an element into a tree. */
export interface Inclusion {
  readonly current: Edge;
  readonly voltage: Edge;
}

/** An element (or the source) as the tree search sees it. */
export interface TreeEdge {
  /** Index into the wiring's elements; −1 for the source. */
  readonly element: number;
  readonly kind: Element['kind'] | 'source';
  /** Whether it may be left out of a tree. */
  readonly optional: boolean;
  /** Ways to include it; the second one of a `voltage-gain` carries the factor `−gain`. */
  readonly inclusions: readonly Inclusion[];
}
