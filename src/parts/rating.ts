import { NotchworkError } from '../errors.ts';
import type { Volts, Watts } from '../units.ts';

/** Kinds of part with a rating that builders look for. */
export type RatedKind =
  | 'film-capacitor'
  | 'ceramic-capacitor'
  | 'electrolytic-capacitor'
  | 'resistor'
  | 'potentiometer';

/**
 * Ratings usually on sale, ascending: DC working voltages of capacitors in volts, dissipations of
 * resistors and of whole potentiometer tracks in watts at the maker's stated ambient. Common practice, no source.
 */
export const USUAL_RATINGS: Readonly<Record<RatedKind, readonly number[]>> = {
  'film-capacitor': [63, 100, 160, 250, 400, 630, 1000, 1600, 2000],
  'ceramic-capacitor': [50, 100, 200, 500, 1000, 2000, 3000],
  'electrolytic-capacitor': [6.3, 10, 16, 25, 35, 50, 63, 100, 160, 200, 250, 350, 400, 450, 500],
  resistor: [0.125, 0.25, 0.5, 1, 2, 3, 5, 7, 10, 15, 25, 50],
  potentiometer: [0.1, 0.25, 0.5, 1, 2],
};

/**
 * Margin kept above the stress unless somebody decides otherwise, as a share of the stress: a quarter
 * on a capacitor's voltage, a resistor at half its power or less. Common practice, no source.
 */
export const USUAL_MARGIN: Readonly<Record<RatedKind, number>> = {
  'film-capacitor': 0.25,
  'ceramic-capacitor': 0.25,
  'electrolytic-capacitor': 0.1,
  resistor: 1,
  potentiometer: 1,
};

/** Largest continuous voltage across a resistor body, by its power rating in watts. Common practice, no source. */
const BODY_VOLTAGE: readonly (readonly [power: Watts, voltage: Volts])[] = [
  [0.125, 150],
  [0.25, 250],
  [0.5, 350],
  [1, 500],
  [2, 700],
];

function assertStress(name: string, value: number): void {
  if (!(value >= 0 && Number.isFinite(value))) {
    throw new NotchworkError('value-out-of-range', `${name} is ${value}; it must be a finite number from 0.`);
  }
}

/**
 * The smallest usual rating that covers a stress with a margin: `rating ≥ stress · (1 + margin)`.
 *
 * @param stress working DC voltage (volts) of a capacitor or dissipation (watts) of a resistor, from 0,
 * at its worst: the sign of a voltage taken off, valves cold included.
 * @param margin share of the stress kept in hand, from 0. @default the kind's {@link USUAL_MARGIN}
 * @returns `undefined` where nothing usual covers it: the part has to be made of several.
 * @throws NotchworkError `value-out-of-range` for a stress or margin that is negative or not finite.
 */
export function leastRating(
  kind: RatedKind,
  stress: number,
  margin: number = USUAL_MARGIN[kind],
): number | undefined {
  assertStress('Stress', stress);
  assertStress('Margin', margin);
  // A billionth less, lest the rounding of 200 V · 1.25 ask for more than 250 V.
  return USUAL_RATINGS[kind].find((rating) => rating >= stress * (1 + margin) * (1 - 1e-9));
}

/**
 * The smallest usual power rating of a resistor that covers both its dissipation, with a margin, and
 * the voltage across its body; a large resistor can need a bigger body for the voltage alone.
 *
 * @param dissipation watts, from 0. @param voltage DC across it in volts, sign taken off.
 * @param margin share of the dissipation kept in hand. @default {@link USUAL_MARGIN}
 * @returns watts, or `undefined` where nothing usual covers it: use several in series.
 * @throws NotchworkError `value-out-of-range` as {@link leastRating} does.
 */
export function leastResistorRating(dissipation: Watts, voltage: Volts, margin?: number): Watts | undefined {
  assertStress('Voltage', voltage);
  const forPower = leastRating('resistor', dissipation, margin);
  const forVoltage = BODY_VOLTAGE.find(([, most]) => most >= voltage)?.[0];
  if (forPower === undefined || forVoltage === undefined) return undefined;
  return Math.max(forPower, forVoltage);
}
