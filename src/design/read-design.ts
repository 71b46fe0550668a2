import * as v from 'valibot';
import { type Block, type BlockSettings, SLOTS, type SlotName } from '../blocks/block.ts';
import { blockOf } from '../blocks/catalogue.ts';
import type { LineSettings, SlotSettings } from '../blocks/line.ts';
import { defaultSettings } from '../blocks/settings.ts';
import { NotchworkError } from '../errors.ts';
import { DESIGN_VERSION, type Design, defaultLine, type Voicing } from './design.ts';
import { designSchema } from './design-schema.ts';

function invalid(where: string, what: string): NotchworkError {
  return new NotchworkError(
    'design-invalid',
    `This design cannot be read: ${where} ${what}. Nothing was changed.`,
  );
}

function parseJson(text: string): unknown {
  try {
    return JSON.parse(text);
  } catch (cause) {
    throw new NotchworkError(
      'design-invalid',
      `This is not a design: the text is not JSON (${cause instanceof Error ? cause.message : cause}). Nothing was changed.`,
      { cause },
    );
  }
}

function checkVersion(value: unknown): void {
  if (typeof value !== 'object' || value === null || Array.isArray(value)) {
    throw invalid('the file', 'holds no object');
  }
  const { format, version } = value as { format?: unknown; version?: unknown };
  if (format !== 'notchwork-design') {
    throw invalid('“format”', `is ${JSON.stringify(format) ?? 'missing'}, not "notchwork-design"`);
  }
  if (typeof version === 'number' && version > DESIGN_VERSION) {
    throw new NotchworkError(
      'design-too-new',
      `This design was written by a newer Notchwork (file version ${version}; this one reads up to ${DESIGN_VERSION}). Update Notchwork to open it; nothing was changed.`,
    );
  }
}

/** Completes one block's settings from the catalogue and checks every value's range. */
function completeSettings(where: string, block: Block, given: BlockSettings): BlockSettings {
  for (const [name, value] of Object.entries(given.parts)) {
    const range = Object.hasOwn(block.parts, name) ? block.parts[name]?.range : undefined;
    if (range !== undefined && !(value >= range[0] && value <= range[1])) {
      throw invalid(`${where}.parts.${name}`, `is ${value}; it must be from ${range[0]} to ${range[1]}`);
    }
  }
  for (const [name, value] of Object.entries(given.choices)) {
    const options = Object.hasOwn(block.choices, name) ? block.choices[name]?.options : undefined;
    if (options !== undefined && !options.some((option) => option.value === value)) {
      throw invalid(
        `${where}.choices.${name}`,
        `is “${value}”; it must be one of ${options.map((option) => option.value).join(', ')}`,
      );
    }
  }
  const fallback = defaultSettings(block);
  return {
    ...given,
    parts: { ...fallback.parts, ...given.parts },
    knobs: { ...fallback.knobs, ...given.knobs },
    tapers: { ...fallback.tapers, ...given.tapers },
    choices: { ...fallback.choices, ...given.choices },
  };
}

function completeSlot(where: string, slot: SlotName, given: SlotSettings): SlotSettings {
  const variants = Object.fromEntries(
    Object.entries(given.variants).map(([variant, settings]) => {
      const block = blockOf(slot, variant, settings);
      return [variant, completeSettings(`${where}.variants.${variant}`, block, settings)];
    }),
  );
  if (!Object.hasOwn(variants, given.variant)) {
    variants[given.variant] = defaultSettings(blockOf(slot, given.variant));
  }
  return { ...given, variants };
}

/**
 * Reads a design from the text of a file or a link.
 *
 * Missing slots, parts, knobs and choices take the catalogue's values; fields that this version does
 * not know are kept and written again.
 *
 * @throws NotchworkError `design-invalid` naming the field, or `design-too-new`; never anything else.
 */
export function readDesign(text: string): Design {
  const value = parseJson(text);
  checkVersion(value);
  const result = v.safeParse(designSchema, value);
  if (!result.success) {
    const issue = result.issues[0];
    throw invalid(`“${v.getDotPath(issue) ?? 'the file'}”`, `is wrong: ${issue.message}`);
  }
  const file = result.output;
  if (!file.voicings.some((voicing) => voicing.letter === file.active)) {
    throw invalid('“active”', `names voicing ${file.active}, which the design does not have`);
  }
  const fallback = defaultLine();
  const voicings = file.voicings.map((voicing, index): Voicing => {
    const line = Object.fromEntries(
      SLOTS.map((slot) => {
        const given = voicing.line[slot] as SlotSettings | undefined;
        return [
          slot,
          given
            ? completeSlot(`voicings.${index}.line.${slot}`, slot, given)
            : { ...fallback[slot], present: false },
        ];
      }),
    ) as LineSettings;
    return { ...voicing, colour: voicing.colour ?? voicing.letter, line: { ...voicing.line, ...line } };
  });
  return { ...file, version: DESIGN_VERSION, voicings };
}

/** The text of a design file: JSON with two spaces, ending in a line feed. */
export function writeDesign(design: Design): string {
  return `${JSON.stringify(design, undefined, 2)}\n`;
}
