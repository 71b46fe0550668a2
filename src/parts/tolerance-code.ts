import { NotchworkError } from '../errors.ts';

/** How far a part may be off its value, in per cent of it: `minus` below, `plus` above (both ≥ 0). */
export interface ToleranceSpan {
  readonly minus: number;
  readonly plus: number;
}

/** Letters of IEC 60062 (clause 5, from memory), symmetrical ones first. */
const LETTERS: readonly (readonly [letter: string, minus: number, plus: number])[] = [
  ['E', 0.005, 0.005],
  ['L', 0.01, 0.01],
  ['P', 0.02, 0.02],
  ['W', 0.05, 0.05],
  ['B', 0.1, 0.1],
  ['C', 0.25, 0.25],
  ['D', 0.5, 0.5],
  ['F', 1, 1],
  ['G', 2, 2],
  ['H', 3, 3],
  ['J', 5, 5],
  ['K', 10, 10],
  ['M', 20, 20],
  ['N', 30, 30],
  ['Q', 10, 30],
  ['T', 10, 50],
  ['S', 20, 50],
  ['Z', 20, 80],
];

/** All tolerance letters of the code. */
export const TOLERANCE_LETTERS: readonly string[] = LETTERS.map(([letter]) => letter);

/**
 * Letter for a tolerance in per cent: ±5 % is "J". `undefined` where the code has none.
 *
 * Not for capacitors under 10 pF, on which the same letters mean picofarads.
 */
export function toleranceLetter({ minus, plus }: ToleranceSpan): string | undefined {
  return LETTERS.find(([, below, above]) => below === minus && above === plus)?.[0];
}

/**
 * Tolerance in per cent that a letter stands for: the inverse of {@link toleranceLetter}.
 *
 * @throws NotchworkError `value-unreadable` for a letter that the code does not have (small ones included).
 */
export function readToleranceLetter(letter: string): ToleranceSpan {
  const entry = LETTERS.find(([name]) => name === letter);
  if (!entry) {
    throw new NotchworkError(
      'value-unreadable',
      `“${letter.slice(0, 12)}” is not a tolerance letter; the letters are ${TOLERANCE_LETTERS.join(', ')}.`,
    );
  }
  return { minus: entry[1], plus: entry[2] };
}
