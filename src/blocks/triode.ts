import type { NodeName } from '../circuit/wiring.ts';
import { NotchworkError } from '../errors.ts';
import type { OperatingPoint } from '../parts/operating-point.ts';
import type { TriodeParameters } from '../parts/triode-model.ts';
import { TRIODE_NAMES, TRIODES, type Triode } from '../parts/valve.ts';
import type { Ohms, Siemens } from '../units.ts';
import type { BlockElement, BlockSettings, BlockValues, ChoiceSpec, PartSpec } from './block.ts';

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

/** Where the figures of a known valve are taken from. */
export const FIGURES_CHOICE: ChoiceSpec = {
  label: 'Valve figures',
  options: [
    { value: 'published', label: 'as published' },
    { value: 'rest', label: 'at this point of rest' },
  ],
  fallback: 'published',
  help: 'At this point of rest, gm and plate resistance come from the valve model at the voltages that these parts give.',
};

/** The known valve chosen; `undefined` where its figures are typed in. */
export function knownTriode(values: BlockValues): Triode | undefined {
  const name = TRIODE_NAMES.find((entry) => entry === values.choice('valve'));
  return name === undefined ? undefined : TRIODES[name];
}

/** Words for the valve chosen: "ECC83", or "own valve". */
export function valveWords(settings: BlockSettings): string {
  const valve = settings.choices['valve'];
  return valve === undefined || valve === 'typed' ? 'own valve' : valve;
}

/** Where a stage rests with the model of its valve. */
export type RestOf = (values: BlockValues, model: TriodeParameters) => OperatingPoint;

/** Small-signal figures of a triode. */
export interface TriodeFigures {
  readonly gm: Siemens;
  readonly plateResistance: Ohms;
  readonly mu: number;
}

/**
 * Small-signal figures of the valve chosen: typed in, published, or at the point of rest.
 *
 * @throws NotchworkError `circuit-unsolvable` where the valve draws no current at its point of rest.
 */
export function triodeFigures(values: BlockValues, rest: RestOf): TriodeFigures {
  const known = knownTriode(values);
  if (known === undefined) {
    const mu = values.part('mu');
    return { gm: values.part('gm'), plateResistance: mu / values.part('gm'), mu };
  }
  if (values.choice('figures') !== 'rest') {
    const { gm, plateResistance } = known.published;
    return { gm, plateResistance, mu: gm * plateResistance };
  }
  const { gm, plateResistance, mu } = rest(values, known.model);
  if (!Number.isFinite(plateResistance)) {
    throw new NotchworkError(
      'circuit-unsolvable',
      'At these voltages the valve draws no current and passes no signal. Raise the supply or lower the cathode resistor.',
    );
  }
  return { gm, plateResistance, mu };
}

/** The small-signal triode: a transconductance and its plate resistance, between plate and cathode. */
export function triode(
  grid: NodeName,
  plate: NodeName,
  cathode: NodeName,
  rest: RestOf,
): readonly BlockElement[] {
  return [
    {
      kind: 'transconductance',
      name: 'transconductance',
      nodes: [plate, cathode],
      control: [grid, cathode],
      value: { compute: (values) => triodeFigures(values, rest).gm, text: 'gm of the valve' },
    },
    {
      kind: 'resistor',
      name: 'plateResistance',
      nodes: [plate, cathode],
      value: { compute: (values) => triodeFigures(values, rest).plateResistance, text: 'ra of the valve' },
    },
  ];
}
