import { NotchworkError } from '../errors.ts';
import type { UnitSymbol } from '../units.ts';
import { tidyPasted } from './pasted-text.ts';
import { formatValue, UNIT_WORDS } from './value-text.ts';

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

/** Ways to write each unit (lower case), and values to show as examples. */
const UNITS: Readonly<
  Record<
    UnitSymbol,
    {
      readonly written: readonly string[];
      readonly examples: string;
    }
  >
> = {
  Ω: { written: ['ω', 'ohm', 'ohms', 'r'], examples: '4k7, 4.7k or 1M' },
  F: { written: ['f', 'farad', 'farads'], examples: '22n, 0.022u or 470p' },
  H: { written: ['h', 'henry', 'henries'], examples: '10, 250m or 4H5' },
  S: { written: ['s', 'a/v'], examples: '1.6m or 0.0016' },
  V: { written: ['v', 'volt', 'volts'], examples: '300' },
  A: { written: ['a', 'amp', 'amps'], examples: '1.2m' },
  W: { written: ['w', 'watt', 'watts'], examples: '0.5' },
  ratio: { written: ['×', 'x'], examples: '60 or 0.5' },
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
    throw unreadable(reading, `would be mega${UNIT_WORDS[unit].many}; ${instead}.`);
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
