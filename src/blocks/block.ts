import type { NodePair } from '../circuit/wiring.ts';
import type { Taper } from '../parts/taper.ts';
import type { Ohms, Rotation, TrackRatio, UnitSymbol, Volts } from '../units.ts';

/** The places of a line, in the order in which the signal passes them. */
export const SLOTS = ['input', 'stage', 'volume', 'driver', 'tone', 'power', 'speaker'] as const;

/** One place of the line. */
export type SlotName = (typeof SLOTS)[number];

/** Something with a value that a block is made of. */
export interface PartSpec {
  /** Full name as spoken: "Treble capacitor". */
  readonly label: string;
  /** Name on the chip: "Treble cap". */
  readonly short: string;
  /** Designator within the block, as on a schematic: "C1". */
  readonly designator: string;
  /** `quantity` is a figure that nobody buys: a gain, a stray capacitance, a neighbour's impedance. */
  readonly kind: 'resistor' | 'capacitor' | 'inductor' | 'potentiometer' | 'quantity';
  readonly unit: UnitSymbol;
  /** Value of a new design. */
  readonly fallback: number;
  /** Smallest and largest value accepted. */
  readonly range: readonly [min: number, max: number];
  /** Plain help: "Raise it and …". */
  readonly help: string;
}

/** A control that the player turns. */
export interface KnobSpec {
  readonly label: string;
  /** The part (a potentiometer) that it turns. */
  readonly part: string;
  /** Position of a new design. */
  readonly fallback: Rotation;
  readonly taper: Taper;
  readonly help: string;
}

/** A decision between wirings or data that is not a value. */
export interface ChoiceSpec {
  readonly label: string;
  readonly options: readonly { readonly value: string; readonly label: string }[];
  readonly fallback: string;
  readonly help: string;
}

/** Everything the user decided about one block; complete (no field left to a default). */
export interface BlockSettings {
  /** Value of every part, in its unit. */
  readonly parts: Readonly<Record<string, number>>;
  /** Position of every knob. */
  readonly knobs: Readonly<Record<string, Rotation>>;
  /** Taper of every knob's potentiometer. */
  readonly tapers: Readonly<Record<string, Taper>>;
  /** Option taken for every choice. */
  readonly choices: Readonly<Record<string, string>>;
  /** Text of the user's own netlist, for the one block that has it. */
  readonly netlist?: string;
}

/** What an element's value is taken from. */
export type ValueSource =
  /** A part's value as it stands. */
  | { readonly part: string }
  /**
   * One side of a potentiometer: `lower` is between the anticlockwise end and the wiper
   * (track ratio × value), `upper` between wiper and clockwise end.
   */
  | { readonly knob: string; readonly side: 'lower' | 'upper' }
  /** Computed from the settings; `text` says how, for the netlist writer's comment. */
  | { readonly compute: (values: BlockValues) => number; readonly text: string };

/** Reads one block's settings while its elements are given their values. */
export interface BlockValues {
  part(name: string): number;
  /** Track ratio of a knob, its taper applied. */
  ratio(knob: string): TrackRatio;
  choice(name: string): string;
}

/**
 * One element of a block's netlist. Node names are private to the block, except `in` (what the
 * block before drives), `out` (what it hands on) and `0` (ground).
 */
export interface BlockElement {
  readonly kind: 'resistor' | 'capacitor' | 'inductor' | 'transconductance' | 'voltage-gain';
  /** Unique within the block; starts with a letter. */
  readonly name: string;
  readonly nodes: NodePair;
  /** Controlling nodes, for the two controlled kinds only. */
  readonly control?: NodePair;
  readonly value: ValueSource;
}

/** What stands next to a block in its line; `undefined` where nothing does. */
export interface Neighbours {
  readonly before: Block | undefined;
  readonly after: Block | undefined;
}

/** What direct voltages a driver puts on its parts and on whatever it feeds. */
export interface DirectOutput {
  /** Supply voltage: what the output's electrode reaches while valves are still cold. */
  readonly supply: Volts;
  /** Voltage at rest of the electrode that feeds the output, valves warm, the load given attached. */
  readonly voltage: Volts;
  /** The coupling capacitor between that electrode and `out`, by part; `undefined` where they are joined. */
  readonly couplingCap: string | undefined;
  /** The block's own resistors that carry direct current, by part, with the voltage across each. */
  readonly resistors: Readonly<Record<string, { readonly running: Volts; readonly cold: Volts }>>;
}

/** A control block as the catalogue declares it: a netlist with its parts, knobs and usual values. */
export interface Block {
  readonly slot: SlotName;
  /** Unique within the slot; part of the file format, never renamed. */
  readonly variant: string;
  /** Name of the variant: "three knobs". */
  readonly title: string;
  /** One line: what it does to the sound. */
  readonly summary: string;
  /**
   * How its input meets the block before: a `grid` draws no current, so the circuit is cut there
   * exactly and a new span begins; a `passive` input loads what drives it.
   */
  readonly input: 'grid' | 'passive';
  readonly parts: Readonly<Record<string, PartSpec>>;
  readonly knobs: Readonly<Record<string, KnobSpec>>;
  readonly choices: Readonly<Record<string, ChoiceSpec>>;
  /**
   * The block's netlist. Depends on choices and neighbours only, never on values, so that a wiring
   * is compiled once and kept.
   */
  elements(settings: BlockSettings, neighbours: Neighbours): readonly BlockElement[];
  /**
   * Set where the block's gain would swamp the curve (a power stage): its response is divided by its
   * own magnitude at 1 kHz with these knobs at these positions, all else as set.
   */
  readonly referenceKnobs?: Readonly<Record<string, Rotation>>;
  /**
   * Direct voltages of a driver, feeding a direct-current load to ground (Infinity for none).
   *
   * @throws NotchworkError `circuit-unsolvable` or `value-out-of-range` where the values give no
   *   sensible state of rest; every part it depends on has been read by then.
   */
  direct?(values: BlockValues, load: Ohms): DirectOutput;
  /** What the block is doing now, in a few words, for the line under its name. */
  describe(settings: BlockSettings): string;
}

/** Resistances of the two halves of a knob's potentiometer, for its readout. */
export interface PotentiometerHalves {
  readonly lower: Ohms;
  readonly upper: Ohms;
}
