import type { Block } from './block.ts';
import { TRIODE_CHOICE, TRIODE_PARTS, triode } from './triode.ts';

/** A cathode follower: a source of about 1/gm for the network. */
export const driverCathodeFollower: Block = {
  slot: 'driver',
  variant: 'cathode-follower',
  title: 'Cathode follower',
  summary: 'A source of well under a kilohm: the network loses least from it.',
  input: 'grid',
  parts: {
    ...TRIODE_PARTS,
    cathodeLoad: {
      label: 'Cathode resistor',
      short: 'Cathode R',
      designator: 'R7',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 100e3,
      range: [1e3, 1e6],
      help: 'Raise it and the follower loses a little less; its source impedance hardly changes.',
    },
  },
  knobs: {},
  choices: { valve: TRIODE_CHOICE },
  referenceKnobs: {},
  elements: () => [
    ...triode('in', '0', 'out'),
    { kind: 'resistor', name: 'cathodeLoad', nodes: ['out', '0'], value: { part: 'cathodeLoad' } },
  ],
  describe: (settings) =>
    `follower, ${settings.choices['valve'] === 'typed' ? 'own valve' : settings.choices['valve']}`,
};
