import { commonCathodePoint, operatingPoint } from '../parts/operating-point.ts';
import type { Block } from './block.ts';
import { REST_CHOICE, REST_VOLTAGE_PART, restModel, SUPPLY_PART, typedRest } from './rest.ts';
import { FIGURES_CHOICE, type RestOf, TRIODE_CHOICE, TRIODE_PARTS, triode, valveWords } from './triode.ts';

const rest: RestOf = (values, model) =>
  commonCathodePoint(model, {
    supply: values.part('supply'),
    plateLoad: values.part('plateLoad'),
    cathodeResistor: values.part('cathodeResistor'),
  });

/**
 * A stage that drives the network from its plate; its cathode is bypassed for every frequency. The
 * source it makes is `ra ‖ Ra` (any textbook of valve amplifiers).
 */
export const driverPlate: Block = {
  slot: 'driver',
  variant: 'plate',
  title: 'From the plate',
  summary: 'The network hangs on a plate: a source of tens of kilohms, which it pulls down.',
  input: 'grid',
  parts: {
    ...TRIODE_PARTS,
    plateLoad: {
      label: 'Plate load',
      short: 'Plate load',
      designator: 'R7',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 100e3,
      range: [1e3, 1e6],
      help: 'Raise it and the source impedance rises towards the valve’s plate resistance.',
    },
    cathodeResistor: {
      label: 'Cathode resistor, bypassed',
      short: 'Cathode R',
      designator: 'R8',
      kind: 'resistor',
      unit: 'Ω',
      fallback: 1500,
      range: [10, 1e5],
      help: 'Raise it and the valve draws less: its plate rests nearer to the supply.',
    },
    couplingCap: {
      label: 'Coupling capacitor',
      short: 'Coupling',
      designator: 'C8',
      kind: 'capacitor',
      unit: 'F',
      fallback: 100e-9,
      range: [1e-10, 1e-4],
      help: 'Keeps the plate’s voltage off the network. Raise it and more bass passes.',
    },
    supply: SUPPLY_PART,
    restVoltage: REST_VOLTAGE_PART,
  },
  knobs: {},
  choices: {
    valve: TRIODE_CHOICE,
    figures: FIGURES_CHOICE,
    rest: REST_CHOICE,
    coupling: {
      label: 'Coupling',
      options: [
        { value: 'capacitor', label: 'through a capacitor' },
        { value: 'direct', label: 'direct' },
      ],
      fallback: 'capacitor',
      help: 'Direct leaves it to the network’s own capacitors to keep the plate’s voltage from the next grid.',
    },
  },
  referenceKnobs: {},
  elements({ choices }) {
    const plate = choices['coupling'] === 'direct' ? 'out' : 'plate';
    return [
      ...triode('in', plate, '0', rest),
      { kind: 'resistor', name: 'plateLoad', nodes: [plate, '0'], value: { part: 'plateLoad' } },
      ...(plate === 'out'
        ? []
        : [
            {
              kind: 'capacitor' as const,
              name: 'couplingCap',
              nodes: [plate, 'out'] as const,
              value: { part: 'couplingCap' },
            },
          ]),
    ];
  },
  /** Supply, plate load and the load's direct current as one source (Thévenin), so that the point is exact. */
  direct(values, load) {
    const supply = values.part('supply');
    const plateLoad = values.part('plateLoad');
    const cathodeResistor = values.part('cathodeResistor');
    const isDirect = values.choice('coupling') === 'direct';
    const share = isDirect ? 1 / (1 + plateLoad / load) : 1;
    const model = restModel(values);
    const voltage =
      model === undefined
        ? typedRest(values)
        : operatingPoint(model, {
            supply: supply * share,
            plateLoad: plateLoad * share,
            cathodeResistor,
            gridVoltage: 0,
          }).plateVoltage;
    const current = Math.max((supply - voltage) / plateLoad - (isDirect ? voltage / load : 0), 0);
    return {
      supply,
      voltage,
      couplingCap: isDirect ? undefined : 'couplingCap',
      resistors: {
        plateLoad: { running: supply - voltage, cold: 0 },
        cathodeResistor: { running: current * cathodeResistor, cold: 0 },
      },
    };
  },
  describe: (settings) => `plate of an ${valveWords(settings)}`,
};
