import { defaultSettings, withKnob } from '../../../src/blocks/settings.ts';
import { spansOf, spanTransfer } from '../../../src/blocks/span.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { factor } from '../../../src/filter/factor.ts';
import type { DigitalSection } from '../../../src/filter/section.ts';
import { rotation } from '../../../src/units.ts';

/** Knob positions of the three-knob network, 0 to 1. */
export type Knobs = Partial<Record<'treble' | 'bass' | 'middle', number>>;

/** Digital filters of the three-knob network with its usual parts. */
export function toneSections(knobs: Knobs, sampleRate = 48_000): readonly DigitalSection[] {
  let settings = defaultSettings(toneThreeKnob);
  for (const [knob, position] of Object.entries(knobs))
    settings = withKnob(settings, knob, rotation(position));
  const span = spansOf([{ block: toneThreeKnob, settings }])[0]!;
  return factor(spanTransfer(span).transfer).map((section) => bilinear(section, sampleRate));
}
