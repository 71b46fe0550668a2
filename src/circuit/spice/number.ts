/** Decimal exponents of SPICE's scale suffixes; `t` is not listed in most summaries, but every SPICE has it. */
const EXPONENTS: Readonly<Record<string, number>> = {
  f: -15,
  p: -12,
  n: -9,
  u: -6,
  m: -3,
  k: 3,
  g: 9,
  t: 12,
};

/** A number as it stands in the text: digits, exponent, letters, and what must not follow. */
export const NUMBER = /((?:\d+\.?\d*|\.\d+)(?:e[+-]?\d+)?)(\p{L}*)/iuy;

/** A number read from a netlist. */
export interface SpiceNumber {
  readonly value: number;
  /** Whether a scale suffix was written, which marks a part's value rather than a knob's position. */
  readonly isScaled: boolean;
}

/** Why a number is refused; the text ends a sentence that starts with what was found. */
export interface RefusedNumber {
  readonly expected: string;
}

function exponentOf(letters: string): number | RefusedNumber {
  const lower = letters.toLowerCase().replace(/^[µμ]/, 'u');
  if (lower.startsWith('meg')) return 6;
  if (lower.startsWith('mil'))
    return { expected: 'a number without “mil” (a length); for milli write m alone' };
  if (lower.startsWith('a')) {
    return {
      expected: 'a number without the letter a, which some SPICE programs take for atto and others ignore',
    };
  }
  return EXPONENTS[lower.charAt(0)] ?? 0;
}

/**
 * Value of a number with its letters as SPICE reads them, case ignored: the suffixes f p n u m k meg g
 * (and t), then unit letters that mean nothing. So `1M` is a thousandth, `1F` is 1e-15, `22nF` is
 * 22e-9. Both micro signs are taken for u. The scale goes through the decimal literal, so that `22n`
 * is exactly 2.2e-8.
 *
 * @param digits mantissa and exponent, as the first group of {@link NUMBER}.
 * @param letters the second group.
 */
export function spiceNumber(digits: string, letters: string): SpiceNumber | RefusedNumber {
  const exponent = exponentOf(letters);
  if (typeof exponent === 'object') return exponent;
  const [mantissa, power = '0'] = digits.toLowerCase().split('e');
  const value = Number(`${mantissa}e${Number(power) + exponent}`);
  if (!Number.isFinite(value)) return { expected: 'a number below 1e308' };
  return { value, isScaled: exponent !== 0 };
}
