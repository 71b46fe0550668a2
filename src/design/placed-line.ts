import { type Block, SLOTS, type SlotName } from '../blocks/block.ts';
import { blockOf } from '../blocks/catalogue.ts';
import type { LineSettings, SlotSettings } from '../blocks/line.ts';
import { defaultSettings } from '../blocks/settings.ts';
import type { PlacedBlock } from '../blocks/span.ts';

/** The block in a slot and its settings, whether it is in the line or not. */
export function placedBlock(slot: SlotName, settings: SlotSettings): PlacedBlock {
  const own = settings.variants[settings.variant];
  const block: Block = blockOf(slot, settings.variant, own);
  return { block, settings: own ?? defaultSettings(block) };
}

/** The blocks in the signal path, in its order. */
export function placedLine(line: LineSettings): readonly PlacedBlock[] {
  return SLOTS.filter((slot) => line[slot].present).map((slot) => placedBlock(slot, line[slot]));
}
