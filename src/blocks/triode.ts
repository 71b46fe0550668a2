import type { NodeName } from '../circuit/wiring.ts';
import { TRIODE_NAMES, TRIODES } from '../parts/valve.ts';
import type { BlockElement, BlockValues, ChoiceSpec, PartSpec } from './block.ts';

/** Which valve a stage has: one with published data, or figures typed in. */
export const TRIODE_CHOICE: ChoiceSpec = {
  label: 'Valve',
  options: [
    ...TRIODE_NAMES.map((name) => ({ value: name, label: `${name} / ${TRIODES[name].otherName}` })),
    { value: 'typed', label: 'figures typed in' },
  ],
  fallback: 'ECC83',
  help: 'Data are the published ones at the usual operating point, from memory; real valves scatter by a third.',
};

/** Small-signal figures for a valve that is typed in. */
export const TRIODE_PARTS: Readonly<Record<string, PartSpec>> = {
  mu: {
    label: 'Amplification factor µ',
    short: 'µ',
    designator: 'µ',
    kind: 'quantity',
    unit: 'ratio',
    fallback: 100,
    range: [1, 1000],
    help: 'Raise it and the stage has more gain. Used where the valve’s figures are typed in.',
  },
  gm: {
    label: 'Transconductance',
    short: 'gm',
    designator: 'gm',
    kind: 'quantity',
    unit: 'S',
    fallback: 1.6e-3,
    range: [1e-5, 1],
    help: 'Raise it and the plate resistance, µ/gm, falls. Used where the valve’s figures are typed in.',
  },
};

/** Transconductance in siemens and plate resistance in ohms of the valve chosen. */
export function triodeFigures(values: BlockValues): {
  readonly gm: number;
  readonly plateResistance: number;
  readonly mu: number;
} {
  const name = TRIODE_NAMES.find((entry) => entry === values.choice('valve'));
  if (name !== undefined) {
    const { gm, plateResistance } = TRIODES[name].published;
    return { gm, plateResistance, mu: gm * plateResistance };
  }
  const mu = values.part('mu');
  return { gm: values.part('gm'), plateResistance: mu / values.part('gm'), mu };
}

/** The small-signal triode: a transconductance and its plate resistance, between plate and cathode. */
export function triode(grid: NodeName, plate: NodeName, cathode: NodeName): readonly BlockElement[] {
  return [
    {
      kind: 'transconductance',
      name: 'transconductance',
      nodes: [plate, cathode],
      control: [grid, cathode],
      value: { compute: (values) => triodeFigures(values).gm, text: 'gm of the valve' },
    },
    {
      kind: 'resistor',
      name: 'plateResistance',
      nodes: [plate, cathode],
      value: { compute: (values) => triodeFigures(values).plateResistance, text: 'ra of the valve' },
    },
  ];
}
