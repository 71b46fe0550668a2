import { NotchworkError } from '../errors.ts';
import { trackRatio } from '../parts/taper.ts';
import type { Rotation, TrackRatio } from '../units.ts';
import type { Block, BlockSettings, BlockValues, Neighbours, PotentiometerHalves } from './block.ts';

function mapValues<In, Out>(
  record: Readonly<Record<string, In>>,
  change: (value: In) => Out,
): Record<string, Out> {
  return Object.fromEntries(Object.entries(record).map(([name, value]) => [name, change(value)]));
}

/** A new block's settings: every part, knob, taper and choice at the catalogue's value. */
export function defaultSettings(block: Block): BlockSettings {
  return {
    parts: mapValues(block.parts, (part) => part.fallback),
    knobs: mapValues(block.knobs, (knob) => knob.fallback),
    tapers: mapValues(block.knobs, (knob) => knob.taper),
    choices: mapValues(block.choices, (choice) => choice.fallback),
  };
}

function need<Value>(record: Readonly<Record<string, Value>>, name: string, what: string): Value {
  const value = record[name];
  if (value === undefined) {
    throw new NotchworkError(
      'design-invalid',
      `There is no ${what} “${name}” here; there are ${Object.keys(record).join(', ') || 'none'}.`,
    );
  }
  return value;
}

/** Reads settings by name; an unknown name is a `design-invalid` error that lists the known ones. */
export function valuesOf(settings: BlockSettings): BlockValues {
  return {
    part: (name) => need(settings.parts, name, 'part'),
    ratio: (knob) => trackRatio(need(settings.tapers, knob, 'knob'), need(settings.knobs, knob, 'knob')),
    choice: (name) => need(settings.choices, name, 'choice'),
  };
}

/** Resistances between the wiper and either end of the potentiometer that a knob turns, in ohms. */
export function potentiometerHalves(
  block: Block,
  settings: BlockSettings,
  knob: string,
): PotentiometerHalves {
  const values = valuesOf(settings);
  const total = values.part(need(block.knobs, knob, 'knob').part);
  const ratio: TrackRatio = values.ratio(knob);
  return { lower: total * ratio, upper: total * (1 - ratio) };
}

/** The same settings with one knob moved. */
export function withKnob(settings: BlockSettings, knob: string, position: Rotation): BlockSettings {
  return { ...settings, knobs: { ...settings.knobs, [knob]: position } };
}

/** The same settings with one part's value changed. */
export function withPart(settings: BlockSettings, part: string, value: number): BlockSettings {
  return { ...settings, parts: { ...settings.parts, [part]: value } };
}

/** No neighbours: enough to see which parts a block's choices use. */
const ALONE: Neighbours = { before: undefined, after: undefined };

/** Parts whose values a block's present wiring and direct voltages take in, by name. */
function usedParts(block: Block, settings: BlockSettings): ReadonlySet<string> {
  const used = new Set<string>();
  const reader = valuesOf(settings);
  const spy: BlockValues = {
    part: (name) => {
      used.add(name);
      return reader.part(name);
    },
    ratio: (knob) => {
      used.add(need(block.knobs, knob, 'knob').part);
      return reader.ratio(knob);
    },
    choice: reader.choice,
  };
  for (const { value } of block.elements(settings, ALONE)) {
    if ('part' in value) used.add(value.part);
    else if ('knob' in value) used.add(need(block.knobs, value.knob, 'knob').part);
    else value.compute(spy);
  }
  try {
    block.direct?.(spy, Number.POSITIVE_INFINITY);
  } catch (error) {
    // Values without a state of rest; the parts it would depend on have been read all the same.
    if (!(error instanceof NotchworkError)) throw error;
  }
  return used;
}

const usedByChoices = new WeakMap<Block, WeakMap<object, ReadonlySet<string>>>();

/** Whether a part does anything, to the signal or to direct voltages, in the wiring that the block's choices give. */
export function isUsedPart(block: Block, settings: BlockSettings, part: string): boolean {
  let byChoices = usedByChoices.get(block);
  if (byChoices === undefined) {
    byChoices = new WeakMap();
    usedByChoices.set(block, byChoices);
  }
  let used = byChoices.get(settings.choices);
  if (used === undefined) {
    used = usedParts(block, settings);
    byChoices.set(settings.choices, used);
  }
  return used.has(part);
}
