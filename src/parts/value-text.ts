import { NotchworkError } from '../errors.ts';
import type { UnitSymbol } from '../units.ts';

/** Limits that a value must keep; both ends belong to it. */
export interface ValueRange {
  readonly min: number;
  readonly max: number;
}

/** Decimal exponents of the prefixes people write on parts. */
const PREFIXES: Readonly<Record<string, number>> = {
  f: -15,
  p: -12,
  n: -9,
  u: -6,
  µ: -6,
  μ: -6,
  m: -3,
  k: 3,
  K: 3,
  M: 6,
  meg: 6,
  G: 9,
  R: 0,
};

/** Ways to write each unit, lower case. */
const UNIT_NAMES: Readonly<Record<UnitSymbol, readonly string[]>> = {
  Ω: ['ω', 'ohm', 'ohms'],
  F: ['f', 'farad', 'farads'],
  H: ['h', 'henry', 'henries'],
  S: ['s', 'a/v'],
  V: ['v', 'volt', 'volts'],
  A: ['a', 'amp', 'amps'],
  W: ['w', 'watt', 'watts'],
  ratio: ['', '×', 'x'],
};

const EXAMPLES: Readonly<Record<UnitSymbol, string>> = {
  Ω: '4k7, 4.7k or 1M',
  F: '22n, 0.022u or 470p',
  H: '10, 250m or 4H5',
  S: '1.6m or 0.0016',
  V: '300',
  A: '1.2m',
  W: '0.5',
  ratio: '60 or 0.5',
};

function unreadable(text: string, unit: UnitSymbol, why: string): NotchworkError {
  return new NotchworkError('value-unreadable', `“${text}” ${why} Write, for instance, ${EXAMPLES[unit]}.`);
}

/** Takes out what pasting brings along: spaces of every width, marks that cannot be seen, a real minus sign. */
function tidy(text: string): string {
  return text
    .normalize('NFKC')
    .replace(/[\u200b-\u200f\u2060\ufeff\u00ad]/g, '')
    .replace(/\s+/g, '')
    .replace(/[\u2212\u2013]/g, '-')
    .replace(/\u2126/g, 'Ω');
}

function prefixExponent(prefix: string, unit: UnitSymbol): number | undefined {
  if (prefix === '') return 0;
  if (/^meg$/i.test(prefix)) return 6;
  if (unit === 'F' && prefix === 'U') return -6;
  if (unit === 'F' && (prefix === 'N' || prefix === 'P')) return PREFIXES[prefix.toLowerCase()];
  return Object.hasOwn(PREFIXES, prefix) ? PREFIXES[prefix] : undefined;
}

/** Splits what stands behind the number into a prefix and the unit; `undefined` where it is neither. */
function exponentOfSuffix(suffix: string, unit: UnitSymbol): number | undefined {
  for (const name of ['', ...UNIT_NAMES[unit]]) {
    if (!suffix.toLowerCase().endsWith(name)) continue;
    const exponent = prefixExponent(suffix.slice(0, suffix.length - name.length), unit);
    if (exponent !== undefined) return exponent;
  }
  return undefined;
}

/** A comma with three digits behind it may group thousands or mark decimals; nobody can know which. */
const AMBIGUOUS_COMMA = /^[+-]?[1-9]\d{0,2},\d{3}(?!\d)/;

/** Number, then what follows; or the prefix in the place of the decimal mark, as in 4k7. */
const PLAIN = /^([+-]?(?:\d+(?:[.,]\d*)?|[.,]\d+)(?:e[+-]?\d+)?)([^\d.,]*)$/i;
const INFIX = /^([+-]?\d+)(meg|[a-zA-ZµμΩ])(\d+)([^\d.,]*)$/i;

function readNumber(tidied: string, text: string, unit: UnitSymbol): number {
  if (AMBIGUOUS_COMMA.test(tidied)) {
    const [whole, rest] = tidied.split(',');
    throw unreadable(
      text,
      unit,
      `could mean ${whole}${rest} or ${whole}.${rest}: a comma with three digits behind it is not guessed.`,
    );
  }
  const plain = PLAIN.exec(tidied);
  if (plain) {
    const exponent = exponentOfSuffix(plain[2]!, unit);
    if (exponent !== undefined) return scaledNumber(plain[1]!.replace(',', '.'), exponent);
  }
  const infix = INFIX.exec(tidied);
  if (infix) {
    const [, whole, mark, fraction, rest] = infix;
    const isUnit = UNIT_NAMES[unit].includes(mark!.toLowerCase());
    const exponent = isUnit ? 0 : prefixExponent(mark!, unit);
    if (exponent !== undefined && exponentOfSuffix(rest!, unit) === 0) {
      return scaledNumber(`${whole}.${fraction}`, exponent);
    }
  }
  throw unreadable(text, unit, `is not a value in ${unit === 'ratio' ? 'plain numbers' : unit}.`);
}

/** Scales by a power of ten in the decimal literal, so that 22n is exactly 2.2e-8. */
function scaledNumber(literal: string, exponent: number): number {
  const [mantissa, power = '0'] = literal.toLowerCase().split('e');
  return Number(`${mantissa}e${Number(power) + exponent}`);
}

/**
 * Reads a part's value as people write it: `22n`, `0.022u`, `22 nF`, `4k7`, `4.7k`, `1M`, `1Meg`,
 * `470p`, `1e-9`; both micro signs; comma or point as decimal mark; spaces anywhere.
 *
 * Not guessed: a bare number of picofarads or a printed code such as `223` in a field for capacitors
 * (it could be 223 pF, or the code for 22 nF), a capital M in front of farads, and a comma with three
 * digits behind it.
 *
 * @param range what is accepted; the message says so where the value lies outside.
 * @throws NotchworkError `value-unreadable` or `value-out-of-range`, saying what is accepted.
 */
export function parseValue(text: string, unit: UnitSymbol, range?: ValueRange): number {
  const tidied = tidy(text);
  if (tidied === '') throw unreadable(text, unit, 'is empty.');
  if (unit === 'F' && /^\d{3,}$/.test(tidied)) {
    throw unreadable(
      text,
      unit,
      'is not guessed: it could be picofarads, or the code printed on a capacitor (223 is 22 nF).',
    );
  }
  if (unit === 'F' && /M(F|farads?)?$/.test(tidied) && !/meg/i.test(tidied)) {
    throw unreadable(text, unit, 'would be megafarads; for microfarads write u or µ.');
  }
  const value = readNumber(tidied, text, unit);
  if (!Number.isFinite(value)) throw unreadable(text, unit, 'is beyond every number.');
  if (range !== undefined && !(value >= range.min && value <= range.max)) {
    throw new NotchworkError(
      'value-out-of-range',
      `${formatValue(value, unit)} is out of range: ${formatValue(range.min, unit)} to ${formatValue(range.max, unit)} is accepted.`,
    );
  }
  return value;
}

const SIGNS: readonly { readonly exponent: number; readonly sign: string; readonly spoken: string }[] = [
  { exponent: 9, sign: 'G', spoken: 'giga' },
  { exponent: 6, sign: 'M', spoken: 'mega' },
  { exponent: 3, sign: 'k', spoken: 'kilo' },
  { exponent: 0, sign: '', spoken: '' },
  { exponent: -3, sign: 'm', spoken: 'milli' },
  { exponent: -6, sign: 'µ', spoken: 'micro' },
  { exponent: -9, sign: 'n', spoken: 'nano' },
  { exponent: -12, sign: 'p', spoken: 'pico' },
];

const SPOKEN_UNITS: Readonly<Record<UnitSymbol, string>> = {
  Ω: 'ohms',
  F: 'farads',
  H: 'henries',
  S: 'siemens',
  V: 'volts',
  A: 'amperes',
  W: 'watts',
  ratio: '',
};

/** Significant digits shown; a value that needs more is rounded for the eye only. */
const SHOWN_DIGITS = 4;

interface Scaled {
  readonly digits: string;
  readonly prefix: (typeof SIGNS)[number];
}

/** A number between 1 and 999.9 with the prefix that makes it so; farads have no milli (0.0047 F is 4700 µF). */
function scale(value: number, unit: UnitSymbol, digits: number): Scaled {
  const usable = SIGNS.filter(({ exponent }) =>
    unit === 'ratio' ? exponent === 0 : !(unit === 'F' && exponent === -3),
  );
  const rounded = Number(value.toPrecision(digits));
  const size = Math.abs(rounded);
  const prefix =
    size === 0
      ? SIGNS.find(({ exponent }) => exponent === 0)!
      : (usable.find(({ exponent }) => size >= Number(`1e${exponent}`)) ?? usable.at(-1)!);
  const shown = rounded / 10 ** prefix.exponent;
  return { digits: String(Number(shown.toPrecision(digits))), prefix };
}

/** A value as it is printed: "390 pF", "4.7 kΩ", "60"; a narrow no-break space between, a real minus sign. */
export function formatValue(value: number, unit: UnitSymbol, digits = SHOWN_DIGITS): string {
  const { digits: shown, prefix } = scale(value, unit, digits);
  const number = shown.replace('-', '\u2212');
  return unit === 'ratio' ? number : `${number}\u202f${prefix.sign}${unit}`;
}

/** A resistance as short as it gets, for the readout under a knob: "150k", "12k5", "0". */
export function formatShort(value: number): string {
  const { digits, prefix } = scale(value, 'Ω', 3);
  return prefix.sign !== '' && digits.includes('.')
    ? digits.replace('.', prefix.sign)
    : `${digits}${prefix.sign}`;
}

/** A value in words, for reading aloud: "390 picofarads". */
export function speakValue(value: number, unit: UnitSymbol): string {
  const { digits, prefix } = scale(value, unit, SHOWN_DIGITS);
  return `${digits} ${prefix.spoken}${SPOKEN_UNITS[unit]}`
    .trim()
    .replace('kiloohms', 'kilohms')
    .replace('megaohms', 'megohms');
}
