import { cathodeFollowerPoint } from '../parts/operating-point.ts';
import type { Block } from './block.ts';
import { REST_CHOICE, REST_VOLTAGE_PART, restModel, SUPPLY_PART, typedRest } from './rest.ts';
import { FIGURES_CHOICE, type RestOf, TRIODE_CHOICE, TRIODE_PARTS, triode, valveWords } from './triode.ts';

const rest: RestOf = (values, model) =>
  cathodeFollowerPoint(model, {
    supply: values.part('supply'),
    cathodeResistor: values.part('cathodeLoad'),
    gridVoltage: values.part('gridVoltage'),
  });

/**
 * A cathode follower: a source of `ra/(µ + 1) ‖ Rk`, about 1/gm, for the network (any textbook of
 * valve amplifiers).
 */
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
    couplingCap: {
      label: 'Coupling capacitor',
      short: 'Coupling',
      designator: 'C8',
      kind: 'capacitor',
      unit: 'F',
      fallback: 100e-9,
      range: [1e-10, 1e-4],
      help: 'Keeps the cathode’s voltage off the network. Raise it and more bass passes.',
    },
    supply: SUPPLY_PART,
    gridVoltage: {
      label: 'Grid voltage',
      short: 'Grid V',
      designator: 'VG',
      kind: 'quantity',
      unit: 'V',
      fallback: 180,
      range: [0, 1000],
      help: 'Direct voltage of the plate that the grid is joined to. Raise it and the cathode follows.',
    },
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
        { value: 'direct', label: 'direct' },
        { value: 'capacitor', label: 'through a capacitor' },
      ],
      fallback: 'direct',
      help: 'Direct leaves it to the network’s own capacitors to keep the cathode’s voltage from the next grid.',
    },
  },
  referenceKnobs: {},
  elements({ choices }) {
    const cathode = choices['coupling'] === 'capacitor' ? 'cathode' : 'out';
    return [
      ...triode('in', '0', cathode, rest),
      { kind: 'resistor', name: 'cathodeLoad', nodes: [cathode, '0'], value: { part: 'cathodeLoad' } },
      ...(cathode === 'out'
        ? []
        : [
            {
              kind: 'capacitor' as const,
              name: 'couplingCap',
              nodes: [cathode, 'out'] as const,
              value: { part: 'couplingCap' },
            },
          ]),
    ];
  },
  /**
   * While the valve before is still cold it holds the grid at the supply, and the cathode goes there too:
   * the follower's own resistor then stands all of it.
   */
  direct(values, load) {
    const supply = values.part('supply');
    const cathodeLoad = values.part('cathodeLoad');
    const gridVoltage = values.part('gridVoltage');
    const isDirect = values.choice('coupling') !== 'capacitor';
    const cathodeResistor = isDirect ? cathodeLoad / (1 + cathodeLoad / load) : cathodeLoad;
    const model = restModel(values);
    const voltage =
      model === undefined
        ? typedRest(values)
        : cathodeFollowerPoint(model, { supply, cathodeResistor, gridVoltage }).cathodeVoltage;
    return {
      supply,
      voltage,
      couplingCap: isDirect ? undefined : 'couplingCap',
      resistors: { cathodeLoad: { running: voltage, cold: supply } },
    };
  },
  describe: (settings) => `follower, ${valveWords(settings)}`,
};
