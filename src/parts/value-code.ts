import { NotchworkError } from '../errors.ts';
import type { UnitSymbol } from '../units.ts';
import { decimalOf, fromDigits } from './decimal.ts';

/** Units whose values are marked with the codes of IEC 60062. */
export type CodedUnit = Extract<UnitSymbol, 'Ω' | 'F'>;

/** Letters that take the place of the decimal mark, with their decimal exponents, ascending. */
const LETTERS: Readonly<Record<CodedUnit, readonly (readonly [letter: string, exponent: number])[]>> = {
  Ω: [
    ['R', 0],
    ['K', 3],
    ['M', 6],
    ['G', 9],
    ['T', 12],
  ],
  F: [
    ['p', -12],
    ['n', -9],
    ['\u00b5', -6],
    ['m', -3],
    ['F', 0],
  ],
};

/** Decimal exponent of what a figure code counts in: ohms, or picofarads. */
const FIGURE_BASE: Readonly<Record<CodedUnit, number>> = { Ω: 0, F: -12 };

/** Characters of the longest letter code (IEC 60062: three to five). */
const LONGEST = 5;

function unreadable(code: string, unit: CodedUnit, accepted: string): NotchworkError {
  const quoted = code.length > 12 ? `${code.slice(0, 12)}…` : code;
  return new NotchworkError(
    'value-unreadable',
    `“${quoted}” is not a printed code for ${unit}; ${accepted}.`,
  );
}

/** The figures with a letter for the decimal mark, or `undefined` where they have no place. */
function withLetter(digits: string, whole: number, letter: string): string {
  if (whole <= 0) return `${letter}${'0'.repeat(-whole)}${digits}`.padEnd(3, '0');
  const padded = digits.padEnd(whole, '0');
  return `${padded.slice(0, whole)}${letter}${padded.slice(whole)}`.padEnd(3, '0');
}

/**
 * A value in the letter code of IEC 60062 (clause 4, from memory): the letter stands for the decimal
 * mark and the prefix. "4K7", "R47", "100K", "3p32", "1M0", "22n"; 0 Ω is "0R0" (common practice, no
 * source). Never more characters than five.
 *
 * @returns `undefined` where no code exists: negative or not finite, more significant digits than fit,
 * beyond the letters.
 */
export function letterCode(value: number, unit: CodedUnit): string | undefined {
  if (value === 0 && unit === 'Ω') return '0R0';
  if (!(value > 0 && Number.isFinite(value))) return undefined;
  const { digits, exponent } = decimalOf(value);
  const letters = LETTERS[unit];
  const [letter, base] = letters.findLast(([, least]) => exponent >= least) ?? letters[0]!;
  const code = withLetter(digits, exponent - base + 1, letter);
  return code.length > LONGEST ? undefined : code;
}

/**
 * The value of a letter code of IEC 60062: the inverse of {@link letterCode}. `k` and `r` are read for
 * K and R, `u` and the Greek letter for the micro sign; other letters only as the standard has them.
 *
 * @throws NotchworkError `value-unreadable`.
 */
export function readLetterCode(code: string, unit: CodedUnit): number {
  const match = /^(\d*)(\D)(\d*)$/u.exec(code);
  const letter = match?.[2] ?? '';
  const same: Readonly<Record<string, string>> =
    unit === 'Ω' ? { k: 'K', r: 'R' } : { u: '\u00b5', '\u03bc': '\u00b5' };
  const entry = LETTERS[unit].find(([name]) => name === (same[letter] ?? letter));
  const digits = `${match?.[1]}${match?.[3]}`;
  if (!match || !entry || digits === '' || code.length > LONGEST) {
    const examples = unit === 'Ω' ? 'such as 4K7, R47 or 1M0' : 'such as 4n7, 3p32 or 1µ0';
    throw unreadable(code, unit, `a letter code has one letter for the decimal mark, ${examples}`);
  }
  return fromDigits(digits, entry[1] - match[3]!.length);
}

/**
 * A value in the figure code of IEC 60062 (from memory): significant figures, then the number of
 * noughts; in ohms, or in picofarads. "223" is 22 nF or 22 kΩ, "4751" is 4.75 kΩ. Where noughts would
 * be negative, R is the decimal mark: "4R7", "R47", "47R5". 0 Ω is all noughts (common practice, no
 * source).
 *
 * @param length characters: 3 (two figures) or 4 (three figures).
 * @returns `undefined` where no code exists: negative or not finite, too many significant digits, or
 * out of reach (for capacitors 8 and 9 noughts do not exist, see {@link readFigureCode}).
 */
export function figureCode(value: number, unit: CodedUnit, length: 3 | 4): string | undefined {
  if (value === 0 && unit === 'Ω') return '0'.repeat(length);
  if (!(value > 0 && Number.isFinite(value))) return undefined;
  const { digits, exponent } = decimalOf(value);
  const figures = length - 1;
  const whole = exponent - FIGURE_BASE[unit] + 1;
  const noughts = whole - figures;
  if (noughts >= 0) {
    if (digits.length > figures || noughts > (unit === 'F' ? 7 : 9)) return undefined;
    return `${digits.padEnd(figures, '0')}${noughts}`;
  }
  const code =
    whole > 0
      ? `${digits.padEnd(whole, '0').slice(0, whole)}R${digits.slice(whole)}`
      : `R${'0'.repeat(-whole)}${digits}`;
  return code.length > length ? undefined : code.padEnd(length, '0');
}

/**
 * The value of a figure code: the inverse of {@link figureCode}. On capacitors a last figure of 8 or 9
 * means hundredths or tenths (common practice, no source): "479" is 4.7 pF.
 *
 * @throws NotchworkError `value-unreadable`.
 */
export function readFigureCode(code: string, unit: CodedUnit): number {
  const base = FIGURE_BASE[unit];
  const plain = /^(\d{2,3})(\d)$/.exec(code);
  if (plain) {
    const noughts = Number(plain[2]);
    return fromDigits(plain[1]!, base + (unit === 'F' && noughts >= 8 ? noughts - 10 : noughts));
  }
  const marked = /^(?=.{3,4}$)(\d*)R(\d*)$/.exec(code);
  if (marked) return fromDigits(`${marked[1]}${marked[2]}`, base - marked[2]!.length);
  throw unreadable(code, unit, 'a figure code has three or four characters, such as 223, 4R7 or 4751');
}
