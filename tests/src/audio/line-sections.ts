import type { Block } from '../../../src/blocks/block.ts';
import { powerFeedback } from '../../../src/blocks/power-feedback.ts';
import { defaultSettings, withKnob } from '../../../src/blocks/settings.ts';
import { spansOf, spanTransfer } from '../../../src/blocks/span.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { factor } from '../../../src/filter/factor.ts';
import type { DigitalSection } from '../../../src/filter/section.ts';
import type { TransferFunction } from '../../../src/transfer-function.ts';
import { rotation } from '../../../src/units.ts';

/** Knob positions, 0 to 1. */
export type Knobs = Readonly<Record<string, number>>;

function transferOf(block: Block, knobs: Knobs): TransferFunction {
  let settings = defaultSettings(block);
  for (const [knob, position] of Object.entries(knobs))
    settings = withKnob(settings, knob, rotation(position));
  return spanTransfer(spansOf([{ block, settings }])[0]!).transfer;
}

/** Transfer function of the three-knob network (`treble`, `bass`, `middle`) with its usual parts. */
export function toneTransfer(knobs: Knobs): TransferFunction {
  return transferOf(toneThreeKnob, knobs);
}

/** Transfer function of the power stage with feedback and `presence`, with its usual parts. */
export function presenceTransfer(presence: number): TransferFunction {
  return transferOf(powerFeedback, { presence });
}

/** The digital filters of a transfer function. */
export function sectionsOf(transfer: TransferFunction, sampleRate: number): readonly DigitalSection[] {
  return factor(transfer).map((section) => bilinear(section, sampleRate));
}

/** Digital filters of the three-knob network with its usual parts. */
export function toneSections(knobs: Knobs, sampleRate = 48_000): readonly DigitalSection[] {
  return sectionsOf(toneTransfer(knobs), sampleRate);
}
