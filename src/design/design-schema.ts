import * as v from 'valibot';
import { SLOTS } from '../blocks/block.ts';
import { VOICING_LETTERS } from './design.ts';

/** Longest text accepted in one field of a design; a file beyond it is not a design. */
const LONGEST_TEXT = 100_000;

const text = v.pipe(v.string(), v.maxLength(LONGEST_TEXT));
const position = v.pipe(v.number(), v.minValue(0), v.maxValue(1));
const taper = v.looseObject({
  law: v.picklist(['linear', 'audio', 'reverse-audio']),
  midpoint: v.pipe(v.number(), v.gtValue(0), v.ltValue(1)),
});

const blockSettings = v.looseObject({
  parts: v.record(v.string(), v.pipe(v.number(), v.finite())),
  knobs: v.record(v.string(), position),
  tapers: v.record(v.string(), taper),
  choices: v.record(v.string(), text),
  netlist: v.optional(text),
});

const slotSettings = v.looseObject({
  present: v.boolean(),
  variant: v.string(),
  variants: v.record(v.string(), blockSettings),
});

const line = v.looseObject(
  Object.fromEntries(SLOTS.map((slot) => [slot, v.optional(slotSettings)])) as {
    [Slot in (typeof SLOTS)[number]]: v.OptionalSchema<typeof slotSettings, undefined>;
  },
);

const voicing = v.looseObject({
  letter: v.picklist(VOICING_LETTERS),
  name: text,
  colour: v.optional(v.picklist(VOICING_LETTERS)),
  line,
});

/**
 * The shape of a design file, unknown fields kept. What depends on the catalogue (which parts a
 * block has, and their ranges) is checked afterwards in `read-design.ts`.
 */
export const designSchema = v.looseObject({
  format: v.literal('notchwork-design'),
  version: v.pipe(v.number(), v.integer(), v.minValue(1)),
  title: text,
  author: v.optional(text, ''),
  revision: v.optional(v.pipe(v.number(), v.integer(), v.minValue(1)), 1),
  notes: v.optional(text, ''),
  voicings: v.pipe(
    v.array(voicing),
    v.minLength(1),
    v.maxLength(VOICING_LETTERS.length),
    v.check(
      (voicings) => new Set(voicings.map((entry) => entry.letter)).size === voicings.length,
      'every letter may be used once only',
    ),
  ),
  active: v.picklist(VOICING_LETTERS),
});

/** A design file as it passes the schema, before the catalogue has completed it. */
export type DesignFile = v.InferOutput<typeof designSchema>;
