/**
 * A positive number as the decimal digits somebody would type: `digits` without leading or trailing
 * zeros ("47"), the first of them worth `10^exponent`. 4.7e-9 is `{ digits: '47', exponent: -9 }`.
 */
export interface Decimal {
  readonly digits: string;
  readonly exponent: number;
}

/**
 * The shortest digits that mean exactly this number (ECMAScript's `toExponential` without argument).
 *
 * @param value finite and above 0.
 */
export function decimalOf(value: number): Decimal {
  const [mantissa, exponent] = value.toExponential().split('e');
  return { digits: mantissa!.replace('.', ''), exponent: Number(exponent) };
}

/**
 * The number that whole digits stand for, the last of them worth `10^power`. It goes through the
 * decimal literal, not through a multiplication, so that `('47', -10)` is 4.7e-9 to the last bit.
 */
export function fromDigits(digits: string, power: number): number {
  return Number(`${digits}e${power}`);
}
