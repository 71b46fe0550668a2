import type { TextPlace } from '../../errors.ts';
import type { Taper } from '../../parts/taper.ts';
import type { ElementKind, NodePair } from '../wiring.ts';
import type { Expression } from './expression.ts';

/** A card R, C, L, G or E. Node names are in lower case, ground is `0`. */
export interface NetlistCard {
  readonly kind: ElementKind;
  /** As written; no two cards differ by case alone. */
  readonly name: string;
  readonly nodes: NodePair;
  /** Controlling nodes, for G and E. */
  readonly control?: NodePair;
  readonly value: Expression;
  readonly place: TextPlace;
  readonly label?: string;
}

/** One parameter of a `.param` line. */
export interface NetlistParam {
  /** As written; no two differ by case alone. */
  readonly name: string;
  /**
   * Its value in the file. For a knob this is what the expressions use, the share of the track, so
   * that the file means the same to every SPICE program; the position follows by the inverse taper.
   */
  readonly value: number;
  readonly expression: Expression;
  readonly isKnob: boolean;
  readonly place: TextPlace;
  readonly label?: string;
  /** Taper of a knob; linear where it is left out. */
  readonly taper?: Taper;
}

/** The one independent source, `V… a b AC 1`. */
export interface NetlistSource {
  readonly name: string;
  readonly nodes: NodePair;
  readonly place: TextPlace;
}

/** A netlist as read: parts, parameters and source, values not yet put in. */
export interface SpiceNetlist {
  /** '' where there is none. */
  readonly title: string;
  readonly cards: readonly NetlistCard[];
  readonly params: readonly NetlistParam[];
  readonly source: NetlistSource;
}
