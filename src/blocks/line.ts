import type { BlockSettings, SlotName } from './block.ts';

/** One slot of a line: whether its block is in the signal path, which variant, and every variant's settings. */
export interface SlotSettings {
  /** False takes the block out of the line; its settings stay. */
  readonly present: boolean;
  /** The variant in use, a key of `variants`. */
  readonly variant: string;
  /** Settings of every variant that was ever used here, so that switching back restores them. */
  readonly variants: Readonly<Record<string, BlockSettings>>;
}

/** The whole line: what one voicing decides. */
export type LineSettings = Readonly<Record<SlotName, SlotSettings>>;
