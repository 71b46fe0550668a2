import { AUDIO } from '../parts/taper.ts';
import { rotation } from '../units.ts';
import type { Block, BlockElement } from './block.ts';

/**
 * A volume control, with a capacitor from its top to its wiper by choice: turned down, the treble
 * then passes it (common practice, no source).
 */
export const volumeBright: Block = {
  slot: 'volume',
  variant: 'bright',
  title: 'Volume',
  summary: 'A volume control that may let the treble pass when it is turned down.',
  input: 'passive',
  parts: {
    volumePot: {
      label: 'Volume potentiometer',
      short: 'Volume pot',
      designator: 'VR5',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 1e6,
      range: [1e3, 10e6],
      help: 'Raise it and it loads the stage before less, but strays take more of the treble.',
    },
    brightCap: {
      label: 'Bright capacitor',
      short: 'Bright cap',
      designator: 'C5',
      kind: 'capacitor',
      unit: 'F',
      fallback: 120e-12,
      range: [1e-12, 1e-6],
      help: 'Raise it and more of the upper middle passes too when the volume is turned down.',
    },
    strayCapacitance: {
      label: 'Stray capacitance',
      short: 'Stray',
      designator: 'CS',
      kind: 'quantity',
      unit: 'F',
      fallback: 100e-12,
      range: [0, 1e-6],
      help: 'Of the next grid and the wiring. Raise it and the treble falls at middle settings.',
    },
  },
  knobs: {
    volume: {
      label: 'Volume',
      part: 'volumePot',
      fallback: rotation(0.5),
      taper: AUDIO,
      help: 'How much goes on to the next stage.',
    },
  },
  choices: {
    bright: {
      label: 'Bright capacitor',
      options: [
        { value: 'none', label: 'none' },
        { value: 'fitted', label: 'fitted' },
      ],
      fallback: 'fitted',
      help: 'Fitted, it makes low volume settings brighter; at full volume it does nothing.',
    },
  },
  elements(settings) {
    const bright: readonly BlockElement[] =
      settings.choices['bright'] === 'none'
        ? []
        : [{ kind: 'capacitor', name: 'brightCap', nodes: ['in', 'out'], value: { part: 'brightCap' } }];
    return [
      {
        kind: 'resistor',
        name: 'volumeUpper',
        nodes: ['in', 'out'],
        value: { knob: 'volume', side: 'upper' },
      },
      {
        kind: 'resistor',
        name: 'volumeLower',
        nodes: ['out', '0'],
        value: { knob: 'volume', side: 'lower' },
      },
      {
        kind: 'capacitor',
        name: 'strayCapacitance',
        nodes: ['out', '0'],
        value: { part: 'strayCapacitance' },
      },
      ...bright,
    ];
  },
  describe: (settings) => (settings.choices['bright'] === 'none' ? 'plain' : 'with bright capacitor'),
};
