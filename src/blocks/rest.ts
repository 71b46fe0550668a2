import { NotchworkError } from '../errors.ts';
import type { TriodeParameters } from '../parts/triode-model.ts';
import type { BlockValues, ChoiceSpec, PartSpec } from './block.ts';
import { knownTriode } from './triode.ts';

/** Supply voltage of a stage. */
export const SUPPLY_PART: PartSpec = {
  label: 'Supply voltage',
  short: 'Supply',
  designator: 'VB',
  kind: 'quantity',
  unit: 'V',
  fallback: 300,
  range: [20, 1000],
  help: 'Measured with the amplifier warm. Raise it and all capacitors that keep it off the signal stand more.',
};

/** Voltage of a driver's output electrode at rest, where it is measured instead of computed. */
export const REST_VOLTAGE_PART: PartSpec = {
  label: 'Voltage at rest',
  short: 'At rest',
  designator: 'V0',
  kind: 'quantity',
  unit: 'V',
  fallback: 180,
  range: [0, 1000],
  help: 'Direct voltage of what feeds the network. Raise it and the network’s capacitors stand more.',
};

/** Whether the voltage at rest is computed or typed in. */
export const REST_CHOICE: ChoiceSpec = {
  label: 'Voltage at rest',
  options: [
    { value: 'model', label: 'from the valve model' },
    { value: 'typed', label: 'typed in' },
  ],
  fallback: 'model',
  help: 'The model gives it for valves whose data are known; a voltage measured at the socket is better.',
};

/** Model of the valve where the voltage at rest is to be computed; `undefined` where it is typed in. */
export function restModel(values: BlockValues): TriodeParameters | undefined {
  return values.choice('rest') === 'typed' ? undefined : knownTriode(values)?.model;
}

/** The voltage at rest typed in, which cannot be above the supply (`value-out-of-range`). */
export function typedRest(values: BlockValues): number {
  const [voltage, supply] = [values.part('restVoltage'), values.part('supply')];
  if (voltage > supply) {
    throw new NotchworkError(
      'value-out-of-range',
      `The voltage at rest, ${voltage} V, is above the supply of ${supply} V; check the two.`,
    );
  }
  return voltage;
}
