import { NotchworkError } from '../../errors.ts';
import { LINEAR, rotationOf, trackRatio } from '../../parts/taper.ts';
import { type Rotation, rotation, type TrackRatio } from '../../units.ts';
import { type Element, GROUND, type NodeName, type Wiring } from '../wiring.ts';
import { evaluateExpression } from './expression.ts';
import type { NetlistCard, NetlistParam, SpiceNetlist } from './netlist.ts';
import { nodeName } from './read-card.ts';
import { parameterLookup } from './resolve-params.ts';

/** Positions of knobs by name, 0 to 1; case does not count. */
export type KnobPositions = ReadonlyMap<string, number> | Readonly<Record<string, number>>;

/** A netlist with its knobs set: what `compile` takes, and the values for the network it gives. */
export interface NetlistInstance {
  readonly wiring: Wiring;
  /** One value per element of the wiring. */
  readonly values: Float64Array;
}

/** Nodes of a netlist but ground, in order of appearance. */
export function netlistNodes(netlist: SpiceNetlist): readonly NodeName[] {
  const pairs = [netlist.source.nodes, ...netlist.cards.flatMap((card) => [card.nodes, card.control ?? []])];
  return [...new Set(pairs.flat())].filter((node) => node !== GROUND);
}

/** Position of a knob that gives the value written in the file: the inverse of its taper. */
export function writtenPosition(param: NetlistParam): Rotation {
  return rotationOf(param.taper ?? LINEAR, param.value as TrackRatio);
}

function elementOf({ kind, name, nodes, control }: NetlistCard): Element {
  return kind === 'transconductance' || kind === 'voltage-gain'
    ? { kind, name, nodes, control: control! }
    : { kind, name, nodes };
}

/**
 * The netlist's wiring, its output read against ground. It does not depend on the knobs.
 *
 * @param output a node's name, in any case.
 * @throws NotchworkError `netlist-topology` where the netlist has no such node, listing those it has.
 */
export function netlistWiring(netlist: SpiceNetlist, output = 'out'): Wiring {
  const node = nodeName(output);
  const nodes = netlistNodes(netlist);
  if (!nodes.includes(node)) {
    throw new NotchworkError(
      'netlist-topology',
      `There is no node “${output}” to read the output from; the nodes are ${nodes.join(', ')}. Rename one, or name another output.`,
    );
  }
  return {
    elements: netlist.cards.map(elementOf),
    source: netlist.source.nodes,
    outputs: [[node, GROUND]],
  };
}

function givenRatios(netlist: SpiceNetlist, knobs: KnobPositions): ReadonlyMap<string, number> {
  const entries = knobs instanceof Map ? [...knobs] : Object.entries(knobs);
  const known = new Map(
    netlist.params.filter((param) => param.isKnob).map((param) => [param.name.toLowerCase(), param]),
  );
  const ratios = new Map<string, number>();
  for (const [name, position] of entries as [string, number][]) {
    const param = known.get(name.toLowerCase());
    if (param === undefined) {
      const names = [...known.values()].map((knob) => knob.name).join(', ');
      throw new NotchworkError(
        'usage',
        `There is no knob “${name}” in this netlist; ${names === '' ? 'it has none' : `there are ${names}`}. A knob is a .param with a value from 0 to 1.`,
      );
    }
    if (!(position >= 0 && position <= 1)) {
      throw new NotchworkError(
        'value-out-of-range',
        `Knob ${param.name} is at ${position}; it turns from 0 to 1.`,
      );
    }
    ratios.set(name.toLowerCase(), trackRatio(param.taper ?? LINEAR, rotation(position)));
  }
  return ratios;
}

const KIND_WORDS: Readonly<Record<string, string>> = {
  resistor: 'a resistance',
  capacitor: 'a capacitance',
  inductor: 'an inductance',
};

/**
 * Values of all cards for given knob positions. A position goes through the knob's taper; a knob that
 * is not given keeps the value written in the file. Zero is allowed everywhere (a potentiometer at its
 * stop); G and E may be negative, as in SPICE.
 *
 * @throws NotchworkError `usage` for an unknown knob; `value-out-of-range` for a position outside 0 to
 *   1 and for a value that is negative, not finite or divided by zero, naming the card.
 */
export function netlistValues(netlist: SpiceNetlist, knobs: KnobPositions = {}): Float64Array {
  const lookUp = parameterLookup(netlist.params, givenRatios(netlist, knobs));
  return Float64Array.from(netlist.cards, (card) => {
    const value = evaluateExpression(card.value, lookUp, card.name);
    const passive = KIND_WORDS[card.kind];
    if (passive !== undefined && value < 0) {
      throw new NotchworkError(
        'value-out-of-range',
        `line ${card.place.line}: ${card.name} comes out as ${value}; ${passive} is zero or more.`,
        { place: card.place },
      );
    }
    return value;
  });
}

/**
 * A netlist with its knobs set, ready for `compile(wiring).transfer(values)`.
 *
 * @param output the output node, read against ground.
 * @throws NotchworkError as {@link netlistWiring} and {@link netlistValues} do.
 */
export function instantiate(
  netlist: SpiceNetlist,
  knobs: KnobPositions = {},
  output = 'out',
): NetlistInstance {
  return { wiring: netlistWiring(netlist, output), values: netlistValues(netlist, knobs) };
}
