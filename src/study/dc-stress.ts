import type { Block, BlockSettings, BlockValues, SlotName } from '../blocks/block.ts';
import { valuesOf } from '../blocks/settings.ts';
import { elementValues, type PlacedBlock, type Span, spansOf } from '../blocks/span.ts';
import { GROUND, type NodeName } from '../circuit/wiring.ts';
import { leastRating, leastResistorRating, type RatedKind, USUAL_MARGIN } from '../parts/rating.ts';
import { type Rotation, rotation, type Volts, type Watts } from '../units.ts';
import { DirectCase, type DirectElement } from './direct-case.ts';

/** What one part stands at rest, without signal. */
export interface PartStress {
  readonly slot: SlotName;
  /** Name of the part within its block. */
  readonly part: string;
  readonly kind: RatedKind;
  /** Direct voltage across it with the amplifier warm, sign taken off. */
  readonly running: Volts;
  /** The same with the valves cold: the whole supply stands on the network's input. */
  readonly cold: Volts;
  /** Of a resistor, warm or cold, whichever is more; of a potentiometer, as if all its track carried the most current. */
  readonly dissipation: Watts;
  /** Whether leakage alone decides how the voltage divides; it then stands for the worst. */
  readonly byLeakage: boolean;
  /** Share of the stress that the rating keeps in hand. */
  readonly margin: number;
  /** Smallest usual rating that covers it: volts of a capacitor, watts otherwise; `undefined` for none. */
  readonly rating: number | undefined;
}

/** Direct voltages at the two ends of the network, against ground. */
export interface NetworkEnds {
  readonly input: Volts;
  /** Anything but 0 goes on to the next grid unless a capacitor follows. */
  readonly output: Volts;
}

/** What the parts of a driver and its network have to stand. */
export interface DcStress {
  readonly supply: Volts;
  readonly running: NetworkEnds;
  readonly cold: NetworkEnds;
  /** Parts in the order of their blocks. */
  readonly parts: readonly PartStress[];
  /** Whether the network holds a stage of its own, whose plate voltage and coupling are not in here. */
  readonly hasOwnStage: boolean;
}

/** Below this a capacitor is usually ceramic or mica, above it film (common practice, no source). */
const FILM_FROM = 1e-9;

/** The valve's electrode before a coupling capacitor. */
const ELECTRODE: NodeName = '(electrode)';

type Mutable<T> = { -readonly [Key in keyof T]: T[Key] };

/** Knobs as set, and at every combination of their stops (of the first six). */
function knobPositions(block: Block, settings: BlockSettings): readonly BlockSettings[] {
  const stops = Object.keys(block.knobs)
    .slice(0, 6)
    .reduce<readonly Readonly<Record<string, Rotation>>[]>(
      (all, knob) => all.flatMap((knobs) => [0, 1].map((turn) => ({ ...knobs, [knob]: rotation(turn) }))),
      [settings.knobs],
    );
  return [settings, ...stops.map((knobs) => ({ ...settings, knobs }))];
}

/** A part's kind for rating, and nothing for what nobody buys. */
function ratedKind(block: Block, part: string, settings: BlockSettings): RatedKind | undefined {
  const kind = block.parts[part]?.kind;
  if (kind === 'capacitor') return settings.parts[part]! < FILM_FROM ? 'ceramic-capacitor' : 'film-capacitor';
  return kind === 'resistor' || kind === 'potentiometer' ? kind : undefined;
}

function rated(stress: PartStress): PartStress {
  const { kind, running, cold, dissipation } = stress;
  const volts = Math.max(running, cold);
  const rating =
    kind === 'resistor'
      ? leastResistorRating(dissipation, volts)
      : leastRating(kind, kind === 'potentiometer' ? dissipation : volts);
  return { ...stress, rating };
}

/** Gathers what each part stands over all cases. */
class Stresses {
  readonly #parts = new Map<string, Mutable<PartStress>>();

  add(
    { block, settings }: PlacedBlock,
    part: string,
    found: Partial<Pick<PartStress, 'running' | 'cold' | 'dissipation' | 'byLeakage'>>,
  ): void {
    const kind = ratedKind(block, part, settings);
    if (kind === undefined) return;
    const key = `${block.slot}.${part}`;
    const known = this.#parts.get(key) ?? {
      slot: block.slot,
      part,
      kind,
      running: 0,
      cold: 0,
      dissipation: 0,
      byLeakage: false,
      margin: USUAL_MARGIN[kind],
      rating: undefined,
    };
    known.running = Math.max(known.running, found.running ?? 0);
    known.cold = Math.max(known.cold, found.cold ?? 0);
    known.dissipation = Math.max(known.dissipation, found.dissipation ?? 0);
    known.byLeakage ||= found.byLeakage ?? false;
    this.#parts.set(key, known);
  }

  all(): readonly PartStress[] {
    return [...this.#parts.values()].map(rated);
  }
}

/** Elements behind the driver with the values of one set of settings; stages of their own left out. */
function networkElements(span: Span, settings: readonly BlockSettings[]): readonly DirectElement[] {
  const circuit = span.circuits.at(-1)!;
  const values = elementValues(circuit, span.blocks, settings);
  return circuit.elements.flatMap(({ element, owner }, index): readonly DirectElement[] =>
    owner === 0 || 'control' in element ? [] : [{ ...element, value: values[index]! }],
  );
}

/** The part that an element of the network is, or is half of. */
function partOf(
  span: Span,
  name: string,
): { readonly owner: PlacedBlock; readonly part: string } | undefined {
  const entry = span.circuits.at(-1)!.elements.find(({ element }) => element.name === name)!;
  const owner = span.blocks[entry.owner]!;
  const { value } = entry.source;
  if ('part' in value) return { owner, part: value.part };
  if ('knob' in value) return { owner, part: owner.block.knobs[value.knob]!.part };
  return undefined;
}

function dissipationOf(element: DirectElement, volts: Volts, total: number | undefined): Watts {
  if (element.kind !== 'resistor' || element.value === 0) return 0;
  const current = volts / element.value;
  return current * current * (total ?? element.value);
}

/** Settings of a span's blocks: the driver's as set, all others with their knobs at every position that counts. */
function everyPosition({ blocks }: Span): readonly (readonly BlockSettings[])[] {
  const [driver, ...behind] = blocks;
  return behind.reduce<readonly (readonly BlockSettings[])[]>(
    (all, { block, settings }) =>
      all.flatMap((before) => knobPositions(block, settings).map((entry) => [...before, entry])),
    [[driver!.settings]],
  );
}

/** The coupling capacitor as an element from the driver's electrode, where there is one. */
function couplingOf(
  name: string | undefined,
  reader: BlockValues,
  input: NodeName,
): readonly DirectElement[] {
  return name === undefined
    ? []
    : [{ kind: 'capacitor', name, nodes: [ELECTRODE, input], value: reader.part(name) }];
}

/** Direct voltages for one position of the knobs; what the parts stand is added to `stresses`. */
function survey(
  span: Span,
  settings: readonly BlockSettings[],
  stresses: Stresses,
): Pick<DcStress, 'supply' | 'running' | 'cold'> {
  const driver = span.blocks[0]!;
  const reader = valuesOf(driver.settings);
  const input = `${driver.block.slot}.out`;
  const output = `${span.blocks.at(-1)!.block.slot}.out`;
  const elements = networkElements(span, settings);
  const state = driver.block.direct!(reader, DirectCase.resistance(elements, input));
  for (const [part, voltage] of Object.entries(state.resistors)) {
    const worst = Math.max(Math.abs(voltage.running), Math.abs(voltage.cold));
    stresses.add(driver, part, { ...voltage, dissipation: worst ** 2 / reader.part(part) });
  }
  const coupling = couplingOf(state.couplingCap, reader, input);
  const held = coupling.length > 0 ? ELECTRODE : input;
  const at = (when: 'running' | 'cold', volts: Volts): NetworkEnds => {
    const direct = new DirectCase([...coupling, ...elements], [{ nodes: [held, GROUND], volts }]);
    for (const element of coupling) {
      const { volts: across, byLeakage } = direct.across(element);
      stresses.add(driver, element.name, { [when]: across, byLeakage });
    }
    for (const element of elements) {
      const place = partOf(span, element.name);
      if (place === undefined) continue;
      const { volts: across, byLeakage } = direct.across(element);
      const isTrack = place.owner.block.parts[place.part]?.kind === 'potentiometer';
      const track = isTrack ? place.owner.settings.parts[place.part] : undefined;
      const dissipation = dissipationOf(element, across, track);
      stresses.add(place.owner, place.part, { [when]: across, dissipation, byLeakage });
    }
    return { input: direct.at(input), output: direct.at(output) };
  };
  return { supply: state.supply, running: at('running', state.voltage), cold: at('cold', state.supply) };
}

function worstEnds(all: readonly NetworkEnds[]): NetworkEnds {
  return all.reduce((worst, ends) => (Math.abs(ends.output) > Math.abs(worst.output) ? ends : worst));
}

/**
 * Direct voltages on the parts of the driver and of the network behind it, in normal running and with
 * the valves cold, with the dissipation of resistors and the smallest usual rating that covers each.
 * Knobs count as set and at all their stops, whichever is worst. Signals are not counted.
 *
 * Cold, the full supply stands on the network's input: valves that do not conduct yet drop nothing
 * (common practice, no source). Controlled sources within the network are left out.
 *
 * @param placed the blocks in the line.
 * @returns `undefined` where no driver is in the line: nothing then says what the network stands.
 * @throws NotchworkError where the driver's values give no state of rest, or too large a circuit.
 */
export function dcStress(placed: readonly PlacedBlock[]): DcStress | undefined {
  const span = spansOf(placed).find(({ blocks }) => blocks[0]!.block.direct !== undefined);
  if (span === undefined) return undefined;
  const stresses = new Stresses();
  const found = everyPosition(span).map((settings) => survey(span, settings, stresses));
  return {
    supply: found[0]!.supply,
    running: worstEnds(found.map(({ running }) => running)),
    cold: worstEnds(found.map(({ cold }) => cold)),
    parts: stresses.all(),
    hasOwnStage: span.circuits
      .at(-1)!
      .elements.some(({ element, owner }) => owner > 0 && 'control' in element),
  };
}
