import { describe, expect, it } from 'vitest';
import { driverPlainSource } from '../../../src/blocks/driver-plain-source.ts';
import { LineTransfer } from '../../../src/blocks/line-transfer.ts';
import { powerFeedback } from '../../../src/blocks/power-feedback.ts';
import { withKnob } from '../../../src/blocks/settings.ts';
import { spansOf, spanTransfer } from '../../../src/blocks/span.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { rotation } from '../../../src/units.ts';
import { placed } from './placed.ts';

const LINE = [placed(driverPlainSource), placed(toneThreeKnob), placed(powerFeedback)] as const;
const turned = (turn: number) => {
  const [driver, tone, power] = LINE;
  return [driver, { ...tone, settings: withKnob(tone.settings, 'treble', rotation(turn)) }, power];
};

describe('transfer functions of a line', () => {
  it('are those of its spans', () => {
    const found = new LineTransfer().of(LINE);
    expect(found.map(({ transfer }) => transfer)).toEqual(
      spansOf(LINE).map((span) => spanTransfer(span).transfer),
    );
  });

  it('are kept where nothing changed, and made anew where something did', () => {
    const line = new LineTransfer();
    const first = line.of(LINE);
    expect(line.of(LINE)[0]).toBe(first[0]);
    const moved = line.of(turned(0.9));
    expect(moved[0]).not.toBe(first[0]);
    expect(moved[0]!.transfer).not.toEqual(first[0]!.transfer);
    expect(moved[1]).toBe(first[1]);
    expect(moved[0]!.transfer).toEqual(new LineTransfer().of(turned(0.9))[0]!.transfer);
  });

  it('go back with the settings', () => {
    const line = new LineTransfer();
    const first = line.of(LINE)[0]!.transfer;
    line.of(turned(0.1));
    expect(line.of(LINE)[0]!.transfer).toEqual(first);
  });

  it('of no blocks are none', () => {
    expect(new LineTransfer().of([])).toEqual([]);
  });
});
