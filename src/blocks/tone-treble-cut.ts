import { REVERSE_AUDIO } from '../parts/taper.ts';
import { rotation } from '../units.ts';
import type { Block } from './block.ts';
import { TONE_LOAD_CHOICES, TONE_LOAD_PARTS, toneLoad } from './tone-load.ts';

/** One knob: a capacitor to ground through a variable resistor takes the treble away. */
export const toneTrebleCut: Block = {
  slot: 'tone',
  variant: 'treble-cut',
  title: 'Treble cut',
  summary: 'One knob that rolls the treble off; fully up it does next to nothing.',
  input: 'passive',
  parts: {
    seriesResistor: {
      label: 'Series resistor',
      short: 'Series R',
      designator: 'R1',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 100e3,
      range: [100, 10e6],
      help: 'Raise it and the cut begins lower; the load takes more level.',
    },
    cutCap: {
      label: 'Cut capacitor',
      short: 'Cut cap',
      designator: 'C1',
      kind: 'capacitor',
      unit: 'F',
      fallback: 4.7e-9,
      range: [1e-11, 1e-5],
      help: 'Raise it and the cut begins at a lower frequency.',
    },
    cutPot: {
      label: 'Tone potentiometer',
      short: 'Tone pot',
      designator: 'VR1',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 1e6,
      range: [1e3, 10e6],
      help: 'Raise it and turned up the control gets further out of the way.',
    },
    ...TONE_LOAD_PARTS,
  },
  knobs: {
    tone: {
      label: 'Tone',
      part: 'cutPot',
      fallback: rotation(0.5),
      taper: REVERSE_AUDIO,
      help: 'Up is brighter.',
    },
  },
  choices: TONE_LOAD_CHOICES,
  elements: (settings) => [
    { kind: 'resistor', name: 'seriesResistor', nodes: ['in', 'out'], value: { part: 'seriesResistor' } },
    { kind: 'capacitor', name: 'cutCap', nodes: ['out', 'cut'], value: { part: 'cutCap' } },
    { kind: 'resistor', name: 'cut', nodes: ['cut', '0'], value: { knob: 'tone', side: 'lower' } },
    ...toneLoad(settings),
  ],
  describe: () => 'single treble cut',
};
