/** An exact rational number. */
export interface Fraction {
  readonly top: bigint;
  readonly bottom: bigint;
}

function common(a: bigint, b: bigint): bigint {
  let [x, y] = [a < 0n ? -a : a, b < 0n ? -b : b];
  while (y !== 0n) [x, y] = [y, x % y];
  return x;
}

/** A fraction in lowest terms with a positive bottom. */
export function fraction(top: bigint, bottom = 1n): Fraction {
  const divisor = common(top, bottom) || 1n;
  const sign = bottom < 0n ? -1n : 1n;
  return { top: (sign * top) / divisor, bottom: (sign * bottom) / divisor };
}

/** The exact value of a double. */
export function exactly(value: number): Fraction {
  if (value === 0) return fraction(0n);
  let exponent = 0;
  let scaled = value;
  while (!Number.isInteger(scaled)) {
    scaled *= 2;
    exponent += 1;
  }
  return fraction(BigInt(scaled), 1n << BigInt(exponent));
}

export const plus = (a: Fraction, b: Fraction): Fraction =>
  fraction(a.top * b.bottom + b.top * a.bottom, a.bottom * b.bottom);
export const times = (a: Fraction, b: Fraction): Fraction => fraction(a.top * b.top, a.bottom * b.bottom);
export const minus = (a: Fraction): Fraction => ({ top: -a.top, bottom: a.bottom });
export const over = (a: Fraction, b: Fraction): Fraction => fraction(a.top * b.bottom, a.bottom * b.top);

/** The nearest double, to all digits that one has. */
export function toNumber({ top, bottom }: Fraction): number {
  if (top === 0n) return 0;
  const size = top < 0n ? -top : top;
  const shift = BigInt(bottom.toString(2).length - size.toString(2).length + 80);
  const quotient = shift >= 0n ? (size << shift) / bottom : size / (bottom << -shift);
  const digits = quotient.toString(2).length - 64;
  const value = digits > 0 ? Number(quotient >> BigInt(digits)) * 2 ** digits : Number(quotient);
  const exponent = Number(shift);
  const half = Math.trunc(exponent / 2);
  const result = value * 2 ** -half * 2 ** -(exponent - half); // in two steps, so that neither overflows
  return top < 0n ? -result : result;
}
