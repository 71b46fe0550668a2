import { assertRange, NotchworkError } from '../errors.ts';
import type { Amperes, Ohms, Volts, Watts } from '../units.ts';
import { bracketedRoot } from './bracketed-root.ts';
import { type TriodeParameters, type TriodePoint, triodePoint } from './triode-model.ts';

/** The DC circuit around a triode: supply, plate load, plate, cathode, cathode resistor, ground. */
export interface TriodeSurroundings {
  /** Supply voltage against ground, 1 mV to 10 kV. */
  readonly supply: Volts;
  /** Between supply and plate, from 0 to 1 GΩ. */
  readonly plateLoad: Ohms;
  /** Between cathode and ground, from 0 to 1 GΩ. */
  readonly cathodeResistor: Ohms;
  /** DC voltage of the grid against ground; −10 kV to 10 kV. */
  readonly gridVoltage: Volts;
}

/** Where a triode stage rests. Voltages are against ground unless they say otherwise. */
export interface OperatingPoint extends TriodePoint {
  readonly plateVoltage: Volts;
  readonly cathodeVoltage: Volts;
  /** Grid against cathode; 0 or below, or the model would not hold. */
  readonly bias: Volts;
  /** Plate against cathode. */
  readonly acrossValve: Volts;
  readonly plateDissipation: Watts;
  readonly plateLoadDissipation: Watts;
  readonly cathodeResistorDissipation: Watts;
}

/** Grid voltage above the cathode that rounding can leave in place of 0. */
const ROUNDING = 1e-9;

/**
 * DC operating point of a triode: the current at which the valve's curve meets the load line,
 * `I = Ip(supply − I·(Ra + Rk), Vg − I·Rk)`. The right side falls as I grows, so there is one
 * solution; it is found within rounding by {@link bracketedRoot} and obeys Kirchhoff's laws to that.
 *
 * Special cases: no resistors at all, the model's current at those voltages; a grid so low that
 * nothing flows, all zero with an infinite plate resistance.
 *
 * @throws NotchworkError `value-out-of-range` for surroundings outside the limits stated there,
 * `circuit-unsolvable` where the grid would be above the cathode: it would draw current, which the
 * model does not know.
 */
export function operatingPoint(model: TriodeParameters, surroundings: TriodeSurroundings): OperatingPoint {
  assertSurroundings(surroundings);
  const { supply, plateLoad, cathodeResistor, gridVoltage } = surroundings;
  const total = plateLoad + cathodeResistor;
  const at = (current: Amperes): TriodePoint =>
    triodePoint(model, supply - current * total, gridVoltage - current * cathodeResistor);
  const current =
    total === 0 ? at(0).current : bracketedRoot((trial) => at(trial).current - trial, 0, supply / total);
  const cathodeVoltage = current * cathodeResistor;
  const plateVoltage = supply - current * plateLoad;
  const bias = gridVoltage - cathodeVoltage;
  if (bias > ROUNDING) {
    throw new NotchworkError(
      'circuit-unsolvable',
      `The grid would stand ${bias.toPrecision(3)} V above the cathode and draw current; lower the grid voltage (${gridVoltage} V) or raise the cathode resistor or the supply (${supply} V).`,
    );
  }
  return {
    ...triodePoint(model, plateVoltage - cathodeVoltage, bias),
    current,
    plateVoltage,
    cathodeVoltage,
    bias,
    acrossValve: plateVoltage - cathodeVoltage,
    plateDissipation: (plateVoltage - cathodeVoltage) * current,
    plateLoadDissipation: current * current * plateLoad,
    cathodeResistorDissipation: current * current * cathodeResistor,
  };
}

/** {@link operatingPoint} of a common-cathode stage that biases itself: its grid is at 0 V through the leak. */
export function commonCathodePoint(
  model: TriodeParameters,
  stage: Omit<TriodeSurroundings, 'gridVoltage'>,
): OperatingPoint {
  return operatingPoint(model, { ...stage, gridVoltage: 0 });
}

/**
 * {@link operatingPoint} of a cathode follower: plate at the supply, grid held at a given voltage (that
 * of the plate before it, where the two are coupled directly).
 */
export function cathodeFollowerPoint(
  model: TriodeParameters,
  follower: Omit<TriodeSurroundings, 'plateLoad'>,
): OperatingPoint {
  return operatingPoint(model, { ...follower, plateLoad: 0 });
}

function assertSurroundings({ supply, plateLoad, cathodeResistor, gridVoltage }: TriodeSurroundings): void {
  assertRange('Supply voltage', supply, 1e-3, 1e4);
  assertRange('Plate load', plateLoad, 0, 1e9);
  assertRange('Cathode resistor', cathodeResistor, 0, 1e9);
  assertRange('Grid voltage', gridVoltage, -1e4, 1e4);
}
