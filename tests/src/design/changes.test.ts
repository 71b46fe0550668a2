import { describe, expect, it } from 'vitest';
import {
  setChoice,
  setKnob,
  setPart,
  setPresent,
  setTaper,
  setVariant,
  setWords,
} from '../../../src/design/changes.ts';
import { activeVoicing, type Design, defaultDesign } from '../../../src/design/design.ts';
import { placedLine } from '../../../src/design/placed-line.ts';
import { AUDIO } from '../../../src/parts/taper.ts';
import { rotation } from '../../../src/units.ts';

const first = defaultDesign();
const tone = (design: Design) => {
  const slot = activeVoicing(design).line.tone;
  return slot.variants[slot.variant]!;
};

/** Freezes a design through and through, so that a change that writes into it throws. */
function frozen<Value>(value: Value): Value {
  if (typeof value === 'object' && value !== null) {
    Object.freeze(value);
    for (const inner of Object.values(value)) frozen(inner);
  }
  return value;
}

describe('changes', () => {
  const start = frozen(structuredClone(first));

  it('turn a knob and leave the design before untouched', () => {
    const next = setKnob('tone', 'treble', rotation(0.25))(start);
    expect(tone(next).knobs['treble']).toBe(0.25);
    expect(tone(start).knobs['treble']).toBe(tone(first).knobs['treble']);
    expect(activeVoicing(next).line.power).toBe(activeVoicing(start).line.power);
  });

  it('return the same object when nothing changes', () => {
    expect(setKnob('tone', 'treble', tone(start).knobs['treble']!)(start)).toBe(start);
    expect(setPart('tone', 'slope', tone(start).parts['slope']!)(start)).toBe(start);
    expect(setChoice('tone', 'load', 'grid')(start)).toBe(start);
    expect(setPresent('tone', true)(start)).toBe(start);
    expect(setVariant('tone', 'three-knob')(start)).toBe(start);
  });

  it('change a part, a taper and a choice', () => {
    let next = setPart('tone', 'trebleCap', 330e-12)(start);
    next = setTaper('tone', 'treble', AUDIO)(next);
    next = setChoice('tone', 'middleWiring', 'rheostat')(next);
    expect(tone(next).parts['trebleCap']).toBe(330e-12);
    expect(tone(next).tapers['treble']).toEqual(AUDIO);
    expect(tone(next).choices['middleWiring']).toBe('rheostat');
  });

  it('take a block out of the line and put it back with its settings', () => {
    const out = setPresent('tone', false)(setPart('tone', 'slope', 33e3)(start));
    expect(placedLine(activeVoicing(out).line).map((entry) => entry.block.slot)).toEqual(['driver', 'power']);
    expect(tone(setPresent('tone', true)(out)).parts['slope']).toBe(33e3);
  });

  it('keep every setting of a variant that was switched away from', () => {
    const edited = setPart('tone', 'slope', 33e3)(start);
    const away = setVariant('tone', 'james')(edited);
    expect(activeVoicing(away).line.tone.variant).toBe('james');
    const back = setVariant('tone', 'three-knob')(away);
    expect(tone(back).parts['slope']).toBe(33e3);
  });

  it('change the words', () => {
    const next = setWords({ title: 'Attic amplifier', revision: 2 })(start);
    expect([next.title, next.revision, next.author]).toEqual(['Attic amplifier', 2, '']);
  });
});
