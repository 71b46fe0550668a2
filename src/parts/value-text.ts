import { assertRange } from '../errors.ts';
import type { Ohms, UnitSymbol } from '../units.ts';
import { decimalOf } from './decimal.ts';

/** What each unit is called when spoken, one of it and many. */
export const UNIT_WORDS: Readonly<Record<UnitSymbol, { readonly one: string; readonly many: string }>> = {
  Ω: { one: 'ohm', many: 'ohms' },
  F: { one: 'farad', many: 'farads' },
  H: { one: 'henry', many: 'henries' },
  S: { one: 'siemens', many: 'siemens' },
  V: { one: 'volt', many: 'volts' },
  A: { one: 'ampere', many: 'amperes' },
  W: { one: 'watt', many: 'watts' },
  ratio: { one: '', many: '' },
};

const SIGNS: readonly { readonly exponent: number; readonly sign: string; readonly spoken: string }[] = [
  { exponent: 9, sign: 'G', spoken: 'giga' },
  { exponent: 6, sign: 'M', spoken: 'mega' },
  { exponent: 3, sign: 'k', spoken: 'kilo' },
  { exponent: 0, sign: '', spoken: '' },
  { exponent: -3, sign: 'm', spoken: 'milli' },
  { exponent: -6, sign: '\u00b5', spoken: 'micro' },
  { exponent: -9, sign: 'n', spoken: 'nano' },
  { exponent: -12, sign: 'p', spoken: 'pico' },
];

const NO_PREFIX = SIGNS.find(({ exponent }) => exponent === 0)!;

/** Digits that somebody may have typed; a value with more comes from a calculation. */
const TYPED_DIGITS = 9;
/** Digits shown of a calculated value. */
const SHOWN_DIGITS = 4;

interface Scaled {
  /** The number in front of the prefix, with a plain hyphen as minus. */
  readonly number: string;
  readonly prefix: (typeof SIGNS)[number];
}

function rounded(value: number, digits: number | undefined): number {
  if (digits !== undefined) return Number(value.toPrecision(digits));
  const typed = Number(value.toPrecision(TYPED_DIGITS));
  return typed === value ? value : Number(value.toPrecision(SHOWN_DIGITS));
}

/** Prefixes used for a unit: none for ratios; farads have no milli and up (0.0047 F is 4700 µF). */
function isUsable(exponent: number, unit: UnitSymbol): boolean {
  if (unit === 'ratio') return exponent === 0;
  return unit !== 'F' || (exponent !== -3 && exponent <= 0);
}

/** A number between 1 and 999.9 with the prefix that makes it so, the point moved in the digits themselves. */
function scale(value: number, unit: UnitSymbol, digits?: number): Scaled {
  if (digits !== undefined) assertRange('Number of digits', digits, 1, 15);
  if (Number.isNaN(value)) return { number: 'unknown', prefix: NO_PREFIX };
  const minus = value < 0 ? '-' : '';
  const size = rounded(Math.abs(value), digits);
  if (size === 0) return { number: '0', prefix: NO_PREFIX };
  if (size === Number.POSITIVE_INFINITY) return { number: `${minus}∞`, prefix: NO_PREFIX };
  const { digits: figures, exponent } = decimalOf(size);
  if (exponent >= 12 || exponent < -15) {
    return { number: `${minus}${String(size).replace('e+', 'e')}`, prefix: NO_PREFIX };
  }
  const usable = SIGNS.filter((prefix) => isUsable(prefix.exponent, unit));
  const prefix = usable.find((entry) => exponent >= entry.exponent) ?? usable.at(-1)!;
  const whole = exponent - prefix.exponent + 1;
  const padded = whole > 0 ? figures.padEnd(whole, '0') : '0'.repeat(1 - whole) + figures;
  const point = Math.max(whole, 1);
  const fraction = padded.slice(point);
  return { number: `${minus}${padded.slice(0, point)}${fraction === '' ? '' : `.${fraction}`}`, prefix };
}

/**
 * A value as it is printed: "390 pF", "4.7 kΩ", "60"; a narrow no-break space (U+202F) between, the
 * micro sign U+00B5, a real minus sign (U+2212).
 *
 * Without `digits`, a value of up to nine significant digits (whatever somebody typed) is written
 * whole, so that reading it again gives the same number; a longer one comes from a calculation and is
 * rounded to four. Special cases: "∞ Ω"; NaN is "unknown Ω"; from 1e12 up and below 1e-15 the
 * exponent is written out ("1e30 F").
 *
 * @param options.digits significant digits to round to instead, 1 to 15.
 * @throws NotchworkError `value-out-of-range` for another number of digits.
 */
export function formatValue(
  value: number,
  unit: UnitSymbol,
  options: { readonly digits?: number } = {},
): string {
  const { number, prefix } = scale(value, unit, options.digits);
  const shown = number.replace(/^-/, '\u2212');
  return unit === 'ratio' ? shown : `${shown}\u202f${prefix.sign}${unit}`;
}

/**
 * A resistance as short as it gets, for the readout under a knob, to three digits: "150k", "12k5",
 * "820", "0". Below 1 Ω to hundredths ("0.47").
 */
export function formatShort(value: Ohms): string {
  if (Math.abs(value) < 1) return String(Number(value.toFixed(2)) + 0);
  const { number, prefix } = scale(value, 'Ω', 3);
  const shown = number.replace(/^-/, '\u2212');
  return prefix.sign !== '' && shown.includes('.')
    ? shown.replace('.', prefix.sign)
    : `${shown}${prefix.sign}`;
}

/** A value in words, for reading aloud: "390 picofarads", "1 megohm", "minus 5 volts"; digits as in {@link formatValue}. */
export function speakValue(value: number, unit: UnitSymbol): string {
  const { number, prefix } = scale(value, unit);
  const amount = number.replace(/^-/, 'minus ').replace('∞', 'infinite');
  const name = `${prefix.spoken}${number === '1' ? UNIT_WORDS[unit].one : UNIT_WORDS[unit].many}`;
  return `${amount} ${name.replace(/^(kil|meg)[oa](?=ohm)/, '$1')}`.trimEnd();
}
