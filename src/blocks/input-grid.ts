import { TRIODES } from '../parts/valve.ts';
import type { Block, BlockValues } from './block.ts';
import { knownTriode, TRIODE_CHOICE, valveWords } from './triode.ts';

/** Capacitances of a valve typed in: those of the ECC83, which its figures usually resemble. */
function gridCapacitance(values: BlockValues): number {
  const { gridPlate, gridCathode } = (knownTriode(values) ?? TRIODES.ECC83).capacitance;
  return gridCathode + gridPlate * (1 + values.part('stageGain')) + values.part('wiringCapacitance');
}

/**
 * From the instrument to the first grid: source, cable, grid leak, grid stopper and the stage's input
 * capacitance, `Cgk + Cgp·(1 + A)` (J. M. Miller, Scientific Papers of the Bureau of Standards 351, 1920).
 */
export const inputGrid: Block = {
  slot: 'input',
  variant: 'grid',
  title: 'Jack to grid',
  summary: 'What cable, leak and stopper do to the treble before the first valve.',
  input: 'passive',
  parts: {
    sourceResistance: {
      label: 'Source resistance',
      short: 'Source',
      designator: 'RS',
      kind: 'quantity',
      unit: 'Ω',
      fallback: 10e3,
      range: [0, 1e6],
      help: 'Of the instrument with its controls. Raise it and the cable takes more of the treble.',
    },
    cableCapacitance: {
      label: 'Cable capacitance',
      short: 'Cable',
      designator: 'CC',
      kind: 'quantity',
      unit: 'F',
      fallback: 470e-12,
      range: [0, 1e-7],
      help: 'About 100 pF a metre (common practice, no source). Raise it and the treble falls.',
    },
    leak: {
      label: 'Grid leak',
      short: 'Leak',
      designator: 'R1',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 1e6,
      range: [1e3, 22e6],
      help: 'Raise it and the instrument is loaded less: a little more level and treble.',
    },
    stopper: {
      label: 'Grid stopper',
      short: 'Stopper',
      designator: 'R2',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 68e3,
      range: [0, 1e6],
      help: 'Raise it and radio frequencies are kept out better, at the price of the topmost treble.',
    },
    stageGain: {
      label: 'Gain of the stage',
      short: 'Stage gain',
      designator: 'A',
      kind: 'quantity',
      unit: 'ratio',
      fallback: 55,
      range: [0, 1000],
      help: 'Raise it and the input capacitance grows, and with the stopper takes more treble.',
    },
    wiringCapacitance: {
      label: 'Wiring capacitance',
      short: 'Wiring',
      designator: 'CW',
      kind: 'quantity',
      unit: 'F',
      fallback: 5e-12,
      range: [0, 1e-9],
      help: 'Strays at the grid. Raise it and the topmost treble falls.',
    },
  },
  knobs: {},
  choices: { valve: TRIODE_CHOICE },
  elements: () => [
    {
      kind: 'resistor',
      name: 'sourceResistance',
      nodes: ['in', 'jack'],
      value: { part: 'sourceResistance' },
    },
    {
      kind: 'capacitor',
      name: 'cableCapacitance',
      nodes: ['jack', '0'],
      value: { part: 'cableCapacitance' },
    },
    { kind: 'resistor', name: 'leak', nodes: ['jack', '0'], value: { part: 'leak' } },
    { kind: 'resistor', name: 'stopper', nodes: ['jack', 'out'], value: { part: 'stopper' } },
    {
      kind: 'capacitor',
      name: 'inputCapacitance',
      nodes: ['out', '0'],
      value: { compute: gridCapacitance, text: 'Cgk + Cgp·(1 + gain) + wiring' },
    },
  ],
  describe: (settings) => `into an ${valveWords(settings)}`,
};
