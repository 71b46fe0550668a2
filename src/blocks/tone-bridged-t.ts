import { LINEAR } from '../parts/taper.ts';
import { rotation } from '../units.ts';
import type { Block } from './block.ts';
import { TONE_LOAD_CHOICES, TONE_LOAD_PARTS, toneLoad } from './tone-load.ts';

/**
 * A bridged-T scoop: two capacitors in series, bridged by a resistor, their middle to ground through
 * another; the dip is at `1/(2π·√(R1·R2·C1·C2))`. A variable resistor in the leg sets its depth.
 */
export const toneBridgedT: Block = {
  slot: 'tone',
  variant: 'bridged-t',
  title: 'Bridged-T scoop',
  summary: 'A scoop in the middle whose depth is turned, without touching bass or treble.',
  input: 'passive',
  parts: {
    bridge: {
      label: 'Bridging resistor',
      short: 'Bridge',
      designator: 'R1',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 220e3,
      range: [1e3, 10e6],
      help: 'Raise it and the scoop gets deeper and moves down.',
    },
    leg: {
      label: 'Resistor in the leg',
      short: 'Leg',
      designator: 'R2',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 10e3,
      range: [0, 1e6],
      help: 'Raise it and the scoop gets shallower and moves down.',
    },
    firstCap: {
      label: 'First capacitor',
      short: 'First cap',
      designator: 'C1',
      kind: 'capacitor',
      unit: 'F',
      fallback: 6.8e-9,
      range: [1e-11, 1e-5],
      help: 'Raise it and the scoop moves down.',
    },
    secondCap: {
      label: 'Second capacitor',
      short: 'Second cap',
      designator: 'C2',
      kind: 'capacitor',
      unit: 'F',
      fallback: 6.8e-9,
      range: [1e-11, 1e-5],
      help: 'Raise it and the scoop moves down.',
    },
    depthPot: {
      label: 'Scoop potentiometer',
      short: 'Scoop pot',
      designator: 'VR1',
      kind: 'potentiometer',
      unit: 'Ω',
      fallback: 250e3,
      range: [1e3, 10e6],
      help: 'Raise it and turned down the scoop goes away further.',
    },
    ...TONE_LOAD_PARTS,
  },
  knobs: {
    scoop: {
      label: 'Scoop',
      part: 'depthPot',
      fallback: rotation(0.8),
      taper: LINEAR,
      help: 'Up is a deeper scoop.',
    },
  },
  choices: TONE_LOAD_CHOICES,
  elements: (settings) => [
    { kind: 'resistor', name: 'bridge', nodes: ['in', 'out'], value: { part: 'bridge' } },
    { kind: 'capacitor', name: 'firstCap', nodes: ['in', 'middle'], value: { part: 'firstCap' } },
    { kind: 'capacitor', name: 'secondCap', nodes: ['middle', 'out'], value: { part: 'secondCap' } },
    { kind: 'resistor', name: 'leg', nodes: ['middle', 'foot'], value: { part: 'leg' } },
    { kind: 'resistor', name: 'depth', nodes: ['foot', '0'], value: { knob: 'scoop', side: 'upper' } },
    ...toneLoad(settings),
  ],
  describe: () => 'bridged-T scoop',
};
