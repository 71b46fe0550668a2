import type { SlotName } from '../../src/blocks/block.ts';
import { blocksOf } from '../../src/blocks/catalogue.ts';
import { defaultSettings } from '../../src/blocks/settings.ts';
import type { PlacedBlock } from '../../src/blocks/span.ts';

/** A slot's first block with its defaults. */
export function sampleBlock(slot: SlotName): PlacedBlock {
  const [block] = blocksOf(slot);
  return { block: block!, settings: defaultSettings(block!) };
}

/** Everything of the named kinds that an element lets out, with its detail. */
export function recordEvents(
  element: EventTarget,
  types: readonly string[],
): { readonly type: string; readonly detail: unknown }[] {
  const told: { type: string; detail: unknown }[] = [];
  for (const type of types) {
    element.addEventListener(type, (event) =>
      told.push({ type, detail: (event as CustomEvent).detail ?? undefined }),
    );
  }
  return told;
}
