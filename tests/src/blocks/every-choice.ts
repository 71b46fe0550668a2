import { type Block, type BlockSettings, SLOTS } from '../../../src/blocks/block.ts';
import { blocksOf } from '../../../src/blocks/catalogue.ts';
import { defaultSettings } from '../../../src/blocks/settings.ts';

/** Every block of the catalogue with a name for the report. */
export const EVERY_BLOCK: readonly (readonly [name: string, block: Block])[] = SLOTS.flatMap((slot) =>
  blocksOf(slot).map((block) => [`${slot}/${block.variant}`, block] as const),
);

/** A block's settings once for every combination of its choices, all else as in a new design. */
export function everyChoice(block: Block): readonly BlockSettings[] {
  return Object.entries(block.choices).reduce<readonly BlockSettings[]>(
    (all, [name, { options }]) =>
      all.flatMap((settings) =>
        options.map(({ value }) => ({ ...settings, choices: { ...settings.choices, [name]: value } })),
      ),
    [defaultSettings(block)],
  );
}
