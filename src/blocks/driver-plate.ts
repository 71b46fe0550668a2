import type { Block } from './block.ts';
import { TRIODE_CHOICE, TRIODE_PARTS, triode } from './triode.ts';

/** Parts of a stage that drives the network from its plate, cathode fully bypassed. */
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
  },
  knobs: {},
  choices: { valve: TRIODE_CHOICE },
  referenceKnobs: {},
  elements: () => [
    ...triode('in', 'plate', '0'),
    { kind: 'resistor', name: 'plateLoad', nodes: ['plate', '0'], value: { part: 'plateLoad' } },
    { kind: 'capacitor', name: 'couplingCap', nodes: ['plate', 'out'], value: { part: 'couplingCap' } },
  ],
  describe: (settings) =>
    `plate of an ${settings.choices['valve'] === 'typed' ? 'own valve' : settings.choices['valve']}`,
};
