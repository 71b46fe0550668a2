import type { Block } from './block.ts';
import { TONE_LOAD_CHOICES, TONE_LOAD_PARTS, toneLoad } from './tone-load.ts';
import { toneThreeKnob } from './tone-three-knob.ts';

const { treblePot, bassPot, slope, trebleCap, bassCap, midCap } = toneThreeKnob.parts;
const { treble, bass } = toneThreeKnob.knobs;

/** The three-knob network with a fixed resistor in the place of its middle control. */
export const toneFixedMiddle: Block = {
  slot: 'tone',
  variant: 'fixed-middle',
  title: 'Two knobs, fixed middle',
  summary: 'Treble and bass; a resistor decides once how deep the dip is.',
  input: 'passive',
  parts: {
    treblePot: treblePot!,
    bassPot: bassPot!,
    slope: { ...slope!, fallback: 100e3 },
    trebleCap: { ...trebleCap!, fallback: 220e-12 },
    bassCap: { ...bassCap!, fallback: 100e-9 },
    midCap: { ...midCap!, fallback: 47e-9 },
    middleResistor: {
      label: 'Middle resistor',
      short: 'Mid R',
      designator: 'R2',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 6800,
      range: [0, 1e6],
      help: 'Raise it and the dip fills up.',
    },
    ...TONE_LOAD_PARTS,
  },
  knobs: { treble: treble!, bass: bass! },
  choices: TONE_LOAD_CHOICES,
  elements: (settings) => [
    { kind: 'capacitor', name: 'trebleCap', nodes: ['in', 'top'], value: { part: 'trebleCap' } },
    {
      kind: 'resistor',
      name: 'trebleUpper',
      nodes: ['top', 'out'],
      value: { knob: 'treble', side: 'upper' },
    },
    {
      kind: 'resistor',
      name: 'trebleLower',
      nodes: ['out', 'junction'],
      value: { knob: 'treble', side: 'lower' },
    },
    { kind: 'resistor', name: 'slope', nodes: ['in', 'slope'], value: { part: 'slope' } },
    { kind: 'capacitor', name: 'bassCap', nodes: ['slope', 'junction'], value: { part: 'bassCap' } },
    { kind: 'resistor', name: 'bass', nodes: ['junction', 'low'], value: { knob: 'bass', side: 'lower' } },
    { kind: 'capacitor', name: 'midCap', nodes: ['slope', 'low'], value: { part: 'midCap' } },
    { kind: 'resistor', name: 'middleResistor', nodes: ['low', '0'], value: { part: 'middleResistor' } },
    ...toneLoad(settings),
  ],
  describe: () => 'two knobs, fixed middle',
};
