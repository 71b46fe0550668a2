import { assertRange, NotchworkError } from '../errors.ts';
import type { Ohms, UnitSymbol } from '../units.ts';
import { decimalOf } from './decimal.ts';
import { tidyPasted } from './pasted-text.ts';

/** Limits that a value must keep; both ends belong to it. */
export interface ValueRange {
  readonly min: number;
  readonly max: number;
}

/** Decimal exponents of the prefixes people write on parts, as normalised (both micro signs are U+03BC). */
const PREFIXES: Readonly<Record<string, number>> = {
  p: -12,
  n: -9,
  u: -6,
  μ: -6,
  m: -3,
  k: 3,
  K: 3,
  M: 6,
  G: 9,
};

/** What each unit is called: ways to write it (lower case), spoken words, and values to show as examples. */
const UNITS: Readonly<
  Record<
    UnitSymbol,
    {
      readonly written: readonly string[];
      readonly one: string;
      readonly many: string;
      readonly examples: string;
    }
  >
> = {
  Ω: { written: ['ω', 'ohm', 'ohms', 'r'], one: 'ohm', many: 'ohms', examples: '4k7, 4.7k or 1M' },
  F: { written: ['f', 'farad', 'farads'], one: 'farad', many: 'farads', examples: '22n, 0.022u or 470p' },
  H: { written: ['h', 'henry', 'henries'], one: 'henry', many: 'henries', examples: '10, 250m or 4H5' },
  S: { written: ['s', 'a/v'], one: 'siemens', many: 'siemens', examples: '1.6m or 0.0016' },
  V: { written: ['v', 'volt', 'volts'], one: 'volt', many: 'volts', examples: '300' },
  A: { written: ['a', 'amp', 'amps'], one: 'ampere', many: 'amperes', examples: '1.2m' },
  W: { written: ['w', 'watt', 'watts'], one: 'watt', many: 'watts', examples: '0.5' },
  ratio: { written: ['×', 'x'], one: '', many: '', examples: '60 or 0.5' },
};

/** Longest text worth reading or repeating in a message; a pasted page is neither. */
const LONGEST = 40;

/** What is being read, for the messages. */
interface Reading {
  readonly text: string;
  readonly unit: UnitSymbol;
  readonly range: ValueRange | undefined;
}

function describeRange({ min, max }: ValueRange, unit: UnitSymbol): string {
  if (max === Number.POSITIVE_INFINITY) return `${formatValue(min, unit)} or more is accepted`;
  return `${formatValue(min, unit)} to ${formatValue(max, unit)} is accepted`;
}

function unreadable({ text, unit, range }: Reading, why: string): NotchworkError {
  const quoted = text.length > LONGEST ? `${text.slice(0, LONGEST)}…` : text;
  const limits = range === undefined ? '' : ` ${describeRange(range, unit)}.`;
  return new NotchworkError(
    'value-unreadable',
    `“${quoted}” ${why} Write, for instance, ${UNITS[unit].examples}.${limits}`,
  );
}

function prefixExponent(prefix: string, unit: UnitSymbol): number | undefined {
  if (prefix === '') return 0;
  if (/^mega?$/i.test(prefix)) return 6;
  if (unit === 'F' && /^[PNU]$/.test(prefix)) return PREFIXES[prefix.toLowerCase()];
  return Object.hasOwn(PREFIXES, prefix) ? PREFIXES[prefix] : undefined;
}

/** What stands behind the number: a prefix, and whether the unit was written out. */
interface Suffix {
  readonly prefix: string;
  readonly hasUnit: boolean;
  readonly exponent: number;
}

function readSuffix(suffix: string, unit: UnitSymbol): Suffix | undefined {
  for (const name of ['', ...UNITS[unit].written]) {
    if (!suffix.toLowerCase().endsWith(name)) continue;
    const prefix = suffix.slice(0, suffix.length - name.length);
    const exponent = prefixExponent(prefix, unit);
    if (exponent !== undefined) return { prefix, hasUnit: name !== '', exponent };
  }
  return undefined;
}

/** Refuses prefixes that are read one way by the letter and were almost surely meant another. */
function assertMeant({ prefix, hasUnit, exponent }: Suffix, reading: Reading): void {
  const { unit } = reading;
  if (exponent === 6 && unit !== 'Ω' && unit !== 'ratio') {
    const instead = unit === 'F' ? 'for microfarads write u or µ' : 'for thousandths write a small m';
    throw unreadable(reading, `would be mega${UNITS[unit].many}; ${instead}.`);
  }
  if (unit === 'Ω' && prefix === 'm' && !hasUnit) {
    throw unreadable(reading, 'could be milliohms or megohms; write mΩ or M.');
  }
}

/** Number, then what follows; or the prefix (or unit) in the place of the decimal mark, as in 4k7 and R47. */
const PLAIN = /^([+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d+)?)([^\d.,]*)$/i;
const INFIX = /^([+-]?\d*)(meg|[a-zμω])(\d+)([^\d.,]*)$/iu;

/** A comma with three digits behind it may group thousands or mark decimals; nobody can know which. */
const AMBIGUOUS_COMMA = /^([+-]?[1-9]\d{0,2}),(\d{3}(?!\d).*)$/;

function readNumber(tidied: string, reading: Reading): number {
  if (/[.,].*[.,]/.test(tidied)) throw unreadable(reading, 'has more than one decimal mark.');
  const comma = AMBIGUOUS_COMMA.exec(tidied);
  if (comma) {
    const [, whole, rest] = comma;
    throw unreadable(
      reading,
      `could mean ${whole}${rest} or ${whole}.${rest}: a comma with three digits behind it is not guessed.`,
    );
  }
  const { unit } = reading;
  const plain = PLAIN.exec(tidied);
  const suffix = plain ? readSuffix(plain[2]!, unit) : undefined;
  if (plain && suffix) {
    assertMeant(suffix, reading);
    return scaledNumber(plain[1]!.replace(',', '.'), suffix.exponent);
  }
  const infix = INFIX.exec(tidied);
  const mark = infix ? readSuffix(infix[2]!, unit) : undefined;
  if (infix && mark && readSuffix(infix[4]!, unit)?.prefix === '') {
    assertMeant({ ...mark, hasUnit: mark.hasUnit || infix[4] !== '' }, reading);
    return scaledNumber(`${infix[1]}.${infix[3]}`, mark.exponent);
  }
  throw unreadable(reading, `is not a value in ${unit === 'ratio' ? 'plain numbers' : unit}.`);
}

/** Scales by a power of ten in the decimal literal, so that 22n is exactly 2.2e-8. */
function scaledNumber(literal: string, exponent: number): number {
  const [mantissa, power = '0'] = literal.toLowerCase().split('e');
  return Number(`${mantissa}e${Number(power) + exponent}`);
}

/**
 * Reads a part's value as people write it: `22n`, `0.022u`, `22 nF`, `4k7`, `R47`, `4.7k`, `1M`,
 * `1Meg`, `470p`, `1e-9`, `1 000 000`; both micro signs; comma or point as decimal mark; a leading
 * plus; whatever invisible marks pasting brings along. Capital P, N, U are taken for p, n, µ in farads.
 *
 * Refused rather than guessed, with the reason: three or more bare figures in a field for capacitors
 * (223 could be 223 pF, or the printed code for 22 nF; in ohms it is 223 Ω); mega with any unit but
 * ohms; a bare `m` in ohms; one comma with three digits behind it (1,000); raised figures (10²).
 *
 * @param range what is accepted; every message then says so.
 * @returns the value in the unit, to the last bit what its decimal literal means; zero and negative
 * values too, unless the range forbids them.
 * @throws NotchworkError `value-unreadable` or `value-out-of-range`, saying what is accepted.
 * @example parseValue('4k7', 'Ω') // 4700
 */
export function parseValue(text: string, unit: UnitSymbol, range?: ValueRange): number {
  const reading: Reading = { text: text.trim(), unit, range };
  const tidy = tidyPasted(text);
  if (!tidy.ok) throw unreadable(reading, tidy.why);
  if (tidy.text === '') throw unreadable({ ...reading, text: '' }, 'is empty.');
  if (tidy.text.length > LONGEST) throw unreadable(reading, 'is too long for a value.');
  if (unit === 'F' && /^\d{3,}$/.test(tidy.text)) {
    throw unreadable(
      reading,
      'is not guessed: it could be picofarads, or the code printed on a capacitor (223 is 22 nF).',
    );
  }
  const value = readNumber(tidy.text, reading);
  if (!Number.isFinite(value)) throw unreadable(reading, 'is beyond every number.');
  if (range !== undefined && !(value >= range.min && value <= range.max)) {
    const hint = unit === 'F' && /^[\d.,]+$/.test(tidy.text) ? ' Without p, n or µ it is whole farads.' : '';
    throw new NotchworkError(
      'value-out-of-range',
      `${formatValue(value, unit)} is out of range: ${describeRange(range, unit)}.${hint}`,
    );
  }
  return value + 0; // turns −0, which nobody means, into 0
}

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
  const name = `${prefix.spoken}${number === '1' ? UNITS[unit].one : UNITS[unit].many}`;
  return `${amount} ${name.replace(/^(kil|meg)[oa](?=ohm)/, '$1')}`.trimEnd();
}
