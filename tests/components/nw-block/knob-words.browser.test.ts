import { expect } from '@open-wc/testing';
import { knobWords } from '../../../components/nw-block/knob-words.ts';
import { defaultSettings, withKnob, withPart } from '../../../src/blocks/settings.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { rotation } from '../../../src/units.ts';

describe('knobWords', () => {
  const settings = defaultSettings(toneThreeKnob);

  it('tells both halves of a potentiometer, the lower one first', () => {
    // 250 kΩ, linear, at 6 of 10: 0.6 × 250 and 0.4 × 250.
    const { readout, spoken } = knobWords(toneThreeKnob, settings, 'treble');
    expect(readout).to.equal('150k · 100k');
    expect(spoken).to.equal('150 kilohms below the wiper, 100 kilohms above');
  });

  it('tells of a variable resistor how much of the whole is in use', () => {
    // 500 kΩ, audio taper with 15 % of the track at half turn.
    const { readout, spoken } = knobWords(toneThreeKnob, settings, 'bass');
    expect(readout).to.equal('75k of 500k');
    expect(spoken).to.equal('75 kilohms of 500 kilohms');
  });

  it('follows the wiring: a middle control may be either', () => {
    const rheostat = { ...settings, choices: { ...settings.choices, middleWiring: 'rheostat' } };
    expect(knobWords(toneThreeKnob, settings, 'middle').readout).to.equal('12k5 · 12k5');
    expect(knobWords(toneThreeKnob, rheostat, 'middle').readout).to.equal('12k5 of 25k');
  });

  it('follows position and value, to the stops', () => {
    const up = withKnob(withPart(settings, 'treblePot', 1e6), 'treble', rotation(1));
    expect(knobWords(toneThreeKnob, up, 'treble').readout).to.equal('1M · 0');
    expect(knobWords(toneThreeKnob, withKnob(settings, 'bass', rotation(0)), 'bass').readout).to.equal(
      '0 of 500k',
    );
  });

  it('says which knobs there are where one is not', () => {
    expect(() => knobWords(toneThreeKnob, settings, 'depth'))
      .to.throw(NotchworkError, /treble, bass, middle/)
      .with.property('code', 'design-invalid');
  });
});
