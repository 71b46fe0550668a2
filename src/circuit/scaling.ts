import type { ElementKind } from './wiring.ts';

/** Circuits of up to this many elements need no scaling: 20 factors of 1e±15 stay within a double. */
const SMALL_CIRCUIT = 20;

/** Frequency that the values are related to, in rad/s: 2^16 is about 10 kHz. */
const SCALE_EXPONENT = 16;

/** Values in handy units: impedances near 1, and `s` counted in {@link Scaling.omega}. */
export interface Scaling {
  readonly values: ArrayLike<number>;
  /** Unit of resistance, in ohms. */
  readonly ohms: number;
  /** Unit of `s`, in rad/s. */
  readonly omega: number;
}

/** Size of an element's impedance at the reference frequency, as a power of two. */
function impedanceExponent(kind: ElementKind, value: number): number {
  const exponent = Math.log2(Math.abs(value));
  switch (kind) {
    case 'resistor':
      return exponent;
    case 'inductor':
      return exponent + SCALE_EXPONENT;
    case 'capacitor':
      return -exponent - SCALE_EXPONENT;
    default:
      return -exponent;
  }
}

/**
 * Keeps the sums of products of a large circuit within the range of a double: the product of sixty
 * resistances of a megohm, or of sixty picofarads, is not. All impedances are divided by one power of
 * two near their geometric mean and `s` by 2^16 rad/s, which changes no digit of any value; the
 * quotient is that of the circuit itself (impedance and frequency scaling, textbook matter). Circuits
 * of up to 20 elements are left as they are.
 *
 * @param kinds of the elements, `values` their values; zeros have no say in the mean.
 */
export function scaled(kinds: readonly ElementKind[], values: ArrayLike<number>): Scaling {
  if (kinds.length <= SMALL_CIRCUIT) return { values, ohms: 1, omega: 1 };
  let sum = 0;
  let count = 0;
  kinds.forEach((kind, index) => {
    if (kind === 'voltage-gain' || values[index] === 0) return;
    sum += impedanceExponent(kind, values[index]!);
    count += 1;
  });
  const ohms = count === 0 || !Number.isFinite(sum) ? 1 : 2 ** Math.round(sum / count);
  const omega = 2 ** SCALE_EXPONENT;
  const units: Readonly<Record<ElementKind, number>> = {
    resistor: 1 / ohms,
    inductor: omega / ohms,
    capacitor: omega * ohms,
    transconductance: ohms,
    'voltage-gain': 1,
  };
  return { values: Float64Array.from(kinds, (kind, index) => values[index]! * units[kind]), ohms, omega };
}

/**
 * Turns coefficients of `(s/omega)^k` into those of `s^k`, in place, but for a factor that all share:
 * `omega^lowest`, where the lowest power that matters is the first that is not zero.
 */
export function unscale(coefficients: number[], omega: number, lowest: number): void {
  if (omega === 1) return;
  for (let power = 0; power < coefficients.length; power += 1) {
    coefficients[power] = coefficients[power]! * omega ** (lowest - power);
  }
}
