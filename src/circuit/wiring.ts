/**
 * A wiring is a circuit without its values: which elements there are and which nodes they join.
 * It is compiled once; values are then put in on every move of a knob (see `compile.ts`).
 */

/** Name of a node. Ground is {@link GROUND}. */
export type NodeName = string;

/** The reference node, named as SPICE names it. */
export const GROUND: NodeName = '0';

/** Two nodes, the first counted positive. */
export type NodePair = readonly [positive: NodeName, negative: NodeName];

/** A branch that obeys Ohm's law in `s`: a resistor (Ω), capacitor (F) or inductor (H). */
export interface PassiveElement {
  readonly kind: 'resistor' | 'capacitor' | 'inductor';
  /** Unique within the wiring. */
  readonly name: string;
  readonly nodes: NodePair;
}

/**
 * A source controlled by the voltage `V(control[0]) − V(control[1])`, signs as in SPICE:
 * `transconductance` (G, siemens) drives its current from `nodes[0]` *through itself* to `nodes[1]`;
 * `voltage-gain` (E, ratio) holds `V(nodes[0]) − V(nodes[1])` at its value times the control voltage.
 */
export interface ControlledElement {
  readonly kind: 'transconductance' | 'voltage-gain';
  /** Unique within the wiring. */
  readonly name: string;
  readonly nodes: NodePair;
  readonly control: NodePair;
}

/** One branch of a wiring, without its value. */
export type Element = PassiveElement | ControlledElement;

/** What kind of element, and so the unit of its value: Ω, F, H, S or a plain ratio. */
export type ElementKind = Element['kind'];

/** Elements, the one independent voltage source that drives them, and the outputs to be read. */
export interface Wiring {
  readonly elements: readonly Element[];
  /** Terminals of the ideal voltage source that is the input. */
  readonly source: NodePair;
  /** Voltages to be read; every one gets a numerator over the one common denominator. */
  readonly outputs: readonly NodePair[];
}
