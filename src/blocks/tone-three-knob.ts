import { AUDIO, LINEAR } from '../parts/taper.ts';
import { rotation } from '../units.ts';
import type { Block, BlockElement } from './block.ts';
import { TONE_LOAD_CHOICES, TONE_LOAD_PARTS, toneLoad } from './tone-load.ts';

/**
 * The passive three-knob tone network: treble, bass and middle in one loop.
 *
 * Wiring (mid capacitor to the wiper): input → treble capacitor → top of the treble potentiometer;
 * input → slope resistor → bass and mid capacitors; the bass capacitor feeds the junction of the
 * treble and bass potentiometers; the mid capacitor feeds the wiper of the middle potentiometer;
 * the bass control is a variable resistor between that junction and the top of the middle control.
 * The output is the treble wiper. The circuit is the one analysed by D. T. Yeh and J. O. Smith,
 * DAFx-06, Montreal, 2006 (from memory), extended by source and load.
 */
export const toneThreeKnob: Block = {
  slot: 'tone',
  variant: 'three-knob',
  title: 'Three knobs',
  summary: 'Treble, bass and middle in one passive network with a dip between them.',
  input: 'passive',
  parts: {
    treblePot: {
      label: 'Treble potentiometer',
      short: 'Treble pot',
      designator: 'VR1',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 250e3,
      range: [1e3, 10e6],
      help: 'Raise it and the network loads its driver less; the treble control works from a little lower down.',
    },
    bassPot: {
      label: 'Bass potentiometer',
      short: 'Bass pot',
      designator: 'VR2',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 500e3,
      range: [1e3, 10e6],
      help: 'Raise it and the bass control reaches lower; most of its effect then sits in the first part of the turn.',
    },
    middlePot: {
      label: 'Middle potentiometer',
      short: 'Mid pot',
      designator: 'VR3',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 25e3,
      range: [100, 10e6],
      help: 'Raise it and the middle control can fill the dip further, at the price of less cut.',
    },
    slope: {
      label: 'Slope resistor',
      short: 'Slope',
      designator: 'R1',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 47e3,
      range: [1e3, 10e6],
      help: 'Raise it and the middle is cut more, the dip moves down and the network takes more signal.',
    },
    trebleCap: {
      label: 'Treble capacitor',
      short: 'Treble cap',
      designator: 'C1',
      kind: 'capacitor',
      unit: 'F',
      fallback: 390e-12,
      range: [1e-12, 1e-6],
      help: 'Raise it and the treble control reaches further down into the upper middle.',
    },
    bassCap: {
      label: 'Bass capacitor',
      short: 'Bass cap',
      designator: 'C2',
      kind: 'capacitor',
      unit: 'F',
      fallback: 33e-9,
      range: [1e-10, 100e-6],
      help: 'Raise it and the bass reaches lower and the dip widens downwards.',
    },
    midCap: {
      label: 'Mid capacitor',
      short: 'Mid cap',
      designator: 'C3',
      kind: 'capacitor',
      unit: 'F',
      fallback: 22e-9,
      range: [1e-10, 100e-6],
      help: 'Raise it and the dip moves down and deepens.',
    },
    ...TONE_LOAD_PARTS,
  },
  knobs: {
    treble: {
      label: 'Treble',
      part: 'treblePot',
      fallback: rotation(0.6),
      taper: LINEAR,
      help: 'Mixes the treble path in.',
    },
    bass: {
      label: 'Bass',
      part: 'bassPot',
      fallback: rotation(0.5),
      taper: AUDIO,
      help: 'Lets the low end past the middle control.',
    },
    middle: {
      label: 'Middle',
      part: 'middlePot',
      fallback: rotation(0.5),
      taper: LINEAR,
      help: 'Lifts the whole network off ground and fills the dip.',
    },
  },
  choices: {
    middleWiring: {
      label: 'Middle control',
      options: [
        { value: 'wiper', label: 'mid capacitor to the wiper' },
        { value: 'rheostat', label: 'variable resistor to ground' },
      ],
      fallback: 'wiper',
      help: 'To the wiper, the control moves the mid capacitor along the track; as a variable resistor it only lifts the bottom of the network.',
    },
    ...TONE_LOAD_CHOICES,
  },
  elements(settings) {
    const toWiper = settings.choices['middleWiring'] !== 'rheostat';
    const middle: readonly BlockElement[] = toWiper
      ? [
          {
            kind: 'resistor',
            name: 'middleUpper',
            nodes: ['low', 'midWiper'],
            value: { knob: 'middle', side: 'upper' },
          },
          {
            kind: 'resistor',
            name: 'middleLower',
            nodes: ['midWiper', '0'],
            value: { knob: 'middle', side: 'lower' },
          },
        ]
      : [
          {
            kind: 'resistor',
            name: 'middleLower',
            nodes: ['low', '0'],
            value: { knob: 'middle', side: 'lower' },
          },
        ];
    return [
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
      {
        kind: 'capacitor',
        name: 'midCap',
        nodes: ['slope', toWiper ? 'midWiper' : 'low'],
        value: { part: 'midCap' },
      },
      ...middle,
      ...toneLoad(settings),
    ];
  },
  describe: (settings) =>
    settings.choices['middleWiring'] === 'rheostat'
      ? 'three knobs, middle as variable resistor'
      : 'three knobs, mid to wiper',
};
