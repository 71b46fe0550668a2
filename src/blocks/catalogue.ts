import { NotchworkError } from '../errors.ts';
import type { Block, BlockSettings, SlotName } from './block.ts';
import { driverCathodeFollower } from './driver-cathode-follower.ts';
import { driverPlainSource } from './driver-plain-source.ts';
import { driverPlate } from './driver-plate.ts';
import { inputGrid } from './input-grid.ts';
import { powerFeedback } from './power-feedback.ts';
import { speakerResistive } from './speaker-resistive.ts';
import { stageCommonCathode } from './stage-common-cathode.ts';
import { toneBaxandall } from './tone-baxandall.ts';
import { toneBridgedT } from './tone-bridged-t.ts';
import { toneFixedMiddle } from './tone-fixed-middle.ts';
import { toneJames } from './tone-james.ts';
import { toneThreeKnob } from './tone-three-knob.ts';
import { toneTrebleCut } from './tone-treble-cut.ts';
import { volumeBright } from './volume-bright.ts';

/** Every block there is, by slot; the first one of a slot is a new design's. */
const CATALOGUE: Readonly<Record<SlotName, readonly Block[]>> = {
  input: [inputGrid],
  stage: [stageCommonCathode],
  volume: [volumeBright],
  driver: [driverPlainSource, driverCathodeFollower, driverPlate],
  tone: [toneThreeKnob, toneFixedMiddle, toneJames, toneBaxandall, toneTrebleCut, toneBridgedT],
  power: [powerFeedback],
  speaker: [speakerResistive],
};

/** The blocks that a slot can hold. */
export function blocksOf(slot: SlotName): readonly Block[] {
  return CATALOGUE[slot];
}

/** The block that a slot of a new design holds. */
export function defaultVariant(slot: SlotName): Block {
  return CATALOGUE[slot][0]!;
}

/**
 * The block of a slot with a given variant name.
 *
 * @param settings its settings, for the variant whose parts depend on them (the user's own netlist).
 * @throws NotchworkError `design-invalid` for a variant that does not exist.
 */
export function blockOf(slot: SlotName, variant: string, _settings?: BlockSettings): Block {
  const block = CATALOGUE[slot].find((entry) => entry.variant === variant);
  if (block === undefined) {
    const known = CATALOGUE[slot].map((entry) => entry.variant).join(', ');
    throw new NotchworkError(
      'design-invalid',
      `There is no ${slot} block “${variant}”; this version has ${known}. Nothing was changed.`,
    );
  }
  return block;
}
