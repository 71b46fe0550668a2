import { commonCathodePoint } from '../parts/operating-point.ts';
import type { Block, BlockElement } from './block.ts';
import { SUPPLY_PART } from './rest.ts';
import { FIGURES_CHOICE, type RestOf, TRIODE_CHOICE, TRIODE_PARTS, triode, valveWords } from './triode.ts';

/** Where the stage rests: the model of its valve on the load line of its parts. */
const rest: RestOf = (values, model) =>
  commonCathodePoint(model, {
    supply: values.part('supply'),
    plateLoad: values.part('plateLoad'),
    cathodeResistor: values.part('cathodeResistor'),
  });

/**
 * A common-cathode triode stage as a small-signal circuit: plate load, cathode resistor without, with
 * a partial or with a full bypass, coupling capacitor and the leak it feeds. Its level counts from its
 * own gain at 1 kHz, so that the curve shows what its capacitors do.
 */
export const stageCommonCathode: Block = {
  slot: 'stage',
  variant: 'common-cathode',
  title: 'Common cathode',
  summary: 'A gain stage; its cathode bypass and coupling capacitor shape the bass.',
  input: 'grid',
  parts: {
    ...TRIODE_PARTS,
    plateLoad: {
      label: 'Plate load',
      short: 'Plate load',
      designator: 'R3',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 100e3,
      range: [1e3, 1e6],
      help: 'Raise it and there is more gain from a higher source impedance.',
    },
    cathodeResistor: {
      label: 'Cathode resistor',
      short: 'Cathode R',
      designator: 'R4',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 1500,
      range: [10, 1e5],
      help: 'Raise it and the stage runs cooler; without a bypass it also has less gain.',
    },
    bypassCap: {
      label: 'Cathode bypass capacitor',
      short: 'Bypass',
      designator: 'C6',
      kind: 'capacitor',
      unit: 'F',
      fallback: 1e-6,
      range: [1e-9, 1e-3],
      help: 'Raise it and the gain stays up to lower frequencies.',
    },
    bypassResistor: {
      label: 'Resistor in series with the bypass',
      short: 'Series R',
      designator: 'R5',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 1000,
      range: [0, 1e5],
      help: 'Raise it and the bypass lifts the gain by less.',
    },
    couplingCap: {
      label: 'Coupling capacitor',
      short: 'Coupling',
      designator: 'C7',
      kind: 'capacitor',
      unit: 'F',
      fallback: 22e-9,
      range: [1e-10, 1e-4],
      help: 'Raise it and more bass passes.',
    },
    nextLeak: {
      label: 'Leak it feeds',
      short: 'Next leak',
      designator: 'R6',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 1e6,
      range: [1e3, 22e6],
      help: 'Raise it and the stage keeps more gain and more bass.',
    },
    supply: {
      ...SUPPLY_PART,
      help: 'Raise it and the valve rests at more current, with more gain. Used for figures at the point of rest.',
    },
  },
  knobs: {},
  choices: {
    valve: TRIODE_CHOICE,
    figures: FIGURES_CHOICE,
    bypass: {
      label: 'Cathode bypass',
      options: [
        { value: 'full', label: 'capacitor' },
        { value: 'partial', label: 'capacitor with a resistor in series' },
        { value: 'none', label: 'none' },
      ],
      fallback: 'full',
      help: 'The capacitor takes the cathode’s feedback away above its corner: a shelf that lifts what lies above.',
    },
  },
  referenceKnobs: {},
  elements(settings) {
    const bypass = settings.choices['bypass'];
    const across: readonly BlockElement[] =
      bypass === 'none'
        ? []
        : bypass === 'partial'
          ? [
              {
                kind: 'capacitor',
                name: 'bypassCap',
                nodes: ['cathode', 'series'],
                value: { part: 'bypassCap' },
              },
              {
                kind: 'resistor',
                name: 'bypassResistor',
                nodes: ['series', '0'],
                value: { part: 'bypassResistor' },
              },
            ]
          : [{ kind: 'capacitor', name: 'bypassCap', nodes: ['cathode', '0'], value: { part: 'bypassCap' } }];
    return [
      ...triode('in', 'plate', 'cathode', rest),
      { kind: 'resistor', name: 'plateLoad', nodes: ['plate', '0'], value: { part: 'plateLoad' } },
      {
        kind: 'resistor',
        name: 'cathodeResistor',
        nodes: ['cathode', '0'],
        value: { part: 'cathodeResistor' },
      },
      ...across,
      { kind: 'capacitor', name: 'couplingCap', nodes: ['plate', 'out'], value: { part: 'couplingCap' } },
      { kind: 'resistor', name: 'nextLeak', nodes: ['out', '0'], value: { part: 'nextLeak' } },
    ];
  },
  describe(settings) {
    const bypass = { full: 'bypassed', partial: 'partly bypassed', none: 'no bypass' }[
      settings.choices['bypass'] ?? ''
    ];
    return `${valveWords(settings)}, ${bypass ?? ''}`;
  },
};
