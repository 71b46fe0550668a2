import type { Block } from './block.ts';

/** The loudspeaker as a plain resistance: what amplifiers are measured with. */
export const speakerResistive: Block = {
  slot: 'speaker',
  variant: 'resistive',
  title: 'Resistor',
  summary: 'A resistor in place of the loudspeaker, as on the test bench.',
  input: 'passive',
  parts: {
    loadResistance: {
      label: 'Load resistance',
      short: 'Load',
      designator: 'RL',
      kind: 'quantity',
      unit: 'Ω',
      fallback: 8,
      range: [0.1, 1e6],
      help: 'Raise it and the power stage has more gain, and so more feedback.',
    },
  },
  knobs: {},
  choices: {},
  elements: () => [
    { kind: 'resistor', name: 'loadResistance', nodes: ['in', '0'], value: { part: 'loadResistance' } },
    { kind: 'resistor', name: 'wire', nodes: ['in', 'out'], value: { compute: () => 0, text: 'a wire' } },
  ],
  describe: (settings) => `resistive ${settings.parts['loadResistance']} Ω`,
};
