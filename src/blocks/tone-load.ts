import type { BlockElement, BlockSettings, ChoiceSpec, PartSpec } from './block.ts';

/** What the next grid puts across the output: parts that every passive tone network has. */
export const TONE_LOAD_PARTS: Readonly<Record<string, PartSpec>> = {
  loadResistance: {
    label: 'Load resistance',
    short: 'Load',
    designator: 'R9',
    kind: 'resistor',
    unit: 'Ω',
    fallback: 1e6,
    range: [1e3, 1e9],
    help: 'The grid leak that follows. Lower it and the network loses level, the bass most.',
  },
  loadCapacitance: {
    label: 'Load capacitance',
    short: 'Load stray',
    designator: 'C9',
    kind: 'quantity',
    unit: 'F',
    fallback: 47e-12,
    range: [0, 1e-6],
    help: 'Capacitance of the next grid and its wiring. Raise it and the extreme treble falls.',
  },
};

/** Whether the network is loaded at all. */
export const TONE_LOAD_CHOICES: Readonly<Record<string, ChoiceSpec>> = {
  load: {
    label: 'Load',
    options: [
      { value: 'grid', label: 'the next grid' },
      { value: 'none', label: 'nothing (ideal)' },
    ],
    fallback: 'grid',
    help: 'What the output feeds. Nothing is what textbooks assume; a real grid takes a little level and treble.',
  },
};

/** The load's elements, from `out` to ground; none for the ideal case. */
export function toneLoad(settings: BlockSettings): readonly BlockElement[] {
  if (settings.choices['load'] === 'none') return [];
  return [
    { kind: 'resistor', name: 'loadResistance', nodes: ['out', '0'], value: { part: 'loadResistance' } },
    { kind: 'capacitor', name: 'loadCapacitance', nodes: ['out', '0'], value: { part: 'loadCapacitance' } },
  ];
}
