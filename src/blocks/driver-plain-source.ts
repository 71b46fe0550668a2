import type { Block } from './block.ts';
import { REST_VOLTAGE_PART, SUPPLY_PART, typedRest } from './rest.ts';

/** What feeds the tone network, reduced to its source resistance; its unloaded output is 0 dB. */
export const driverPlainSource: Block = {
  slot: 'driver',
  variant: 'plain-source',
  title: 'Plain source',
  summary: 'A source with one resistance and no gain: what the network before it looks like from outside.',
  input: 'grid',
  parts: {
    sourceResistance: {
      label: 'Source resistance',
      short: 'Source',
      designator: 'RS',
      kind: 'quantity',
      unit: 'Ω',
      fallback: 1300,
      range: [0, 1e6],
      help: 'Output resistance of whatever drives the network. Raise it and the treble and the whole level fall.',
    },
    supply: SUPPLY_PART,
    restVoltage: REST_VOLTAGE_PART,
  },
  knobs: {},
  choices: {},
  elements: () => [
    { kind: 'resistor', name: 'sourceResistance', nodes: ['in', 'out'], value: { part: 'sourceResistance' } },
  ],
  direct(values) {
    const supply = values.part('supply');
    return { supply, voltage: typedRest(values), couplingCap: undefined, resistors: {} };
  },
  describe: () => 'plain source',
};
