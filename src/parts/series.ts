import { assertRange, NotchworkError } from '../errors.ts';
import { fromDigits } from './decimal.ts';

/** Name of a series of preferred values of IEC 60063; the number is how many there are in a decade. */
export type SeriesName = 'E3' | 'E6' | 'E12' | 'E24' | 'E48' | 'E96' | 'E192';

/** All series, coarse to fine. */
export const SERIES_NAMES: readonly SeriesName[] = ['E3', 'E6', 'E12', 'E24', 'E48', 'E96', 'E192'];

/** E24 of IEC 60063: two digits, not a rounded geometric series (2.7 to 4.7 and 8.2 depart from it). */
const E24 = [10, 11, 12, 13, 15, 16, 18, 20, 22, 24, 27, 30, 33, 36, 39, 43, 47, 51, 56, 62, 68, 75, 82, 91];

/** E48 to E192: three digits, `round(10^(k/n))`, with the one exception of 9.20 in E192. */
function threeDigits(count: number): number[] {
  return Array.from({ length: count }, (_, index) => {
    const value = Math.round(100 * 10 ** (index / count));
    return count === 192 && value === 919 ? 920 : value;
  });
}

const every = (step: number): number[] => E24.filter((_, index) => index % step === 0);

/** Significant digits of every series as whole numbers, and how many digits they have. */
const TABLES: Readonly<Record<SeriesName, { readonly digits: readonly number[]; readonly scale: 1 | 2 }>> = {
  E3: { digits: every(8), scale: 1 },
  E6: { digits: every(4), scale: 1 },
  E12: { digits: every(2), scale: 1 },
  E24: { digits: E24, scale: 1 },
  E48: { digits: threeDigits(48), scale: 2 },
  E96: { digits: threeDigits(96), scale: 2 },
  E192: { digits: threeDigits(192), scale: 2 },
};

/**
 * Tolerance with which parts of a series are usually sold, in per cent, both ways: IEC 60063 gives it
 * beside its tables (from memory). E3 has none in the standard beyond "over 20 %"; 40 % lets its
 * values meet half-way (common practice, no source).
 */
export const SERIES_TOLERANCE: Readonly<Record<SeriesName, number>> = {
  E3: 40,
  E6: 20,
  E12: 10,
  E24: 5,
  E48: 2,
  E96: 1,
  E192: 0.5,
};

/** The values of a series in one decade, 1 to just under 10. */
export function seriesValues(series: SeriesName): readonly number[] {
  const { digits, scale } = TABLES[series];
  return digits.map((value) => fromDigits(String(value), -scale));
}

/** Values served. Far wider than any part; inside it no step or comparison leaves the doubles. */
const SMALLEST = 1e-60;
const LARGEST = 1e60;

function assertServed(value: number): void {
  if (!(value >= SMALLEST && value <= LARGEST)) {
    throw new NotchworkError(
      'value-out-of-range',
      `${value} has no preferred value near it; only values above 0, from ${SMALLEST} to ${LARGEST}, have.`,
    );
  }
}

function assertWhole(name: string, count: number): void {
  if (!Number.isSafeInteger(count)) {
    throw new NotchworkError('value-out-of-range', `${name} is ${count}; it must be a whole number.`);
  }
}

/** The value at a place of the endless series: place 0 is 1, place n (values a decade) is 10. */
function valueAt(series: SeriesName, place: number): number {
  const { digits, scale } = TABLES[series];
  const decade = Math.floor(place / digits.length);
  return fromDigits(String(digits[place - decade * digits.length]), decade - scale);
}

/** How far a value may be off a member and still be it: the rounding of a calculation, no part's tolerance. */
const SAME = 1e-9;

/** Place of the largest value of the series that is not above `value`, rounding apart. */
function placeAtOrBelow(series: SeriesName, value: number): number {
  // The series is near enough geometric for the logarithm to land within a place or two.
  let place = Math.floor(Math.log10(value) * TABLES[series].digits.length);
  while (valueAt(series, place) > value * (1 + SAME)) place -= 1;
  while (valueAt(series, place + 1) <= value * (1 + SAME)) place += 1;
  return place;
}

/**
 * The value of a series nearest in ratio (the smaller of two equally near).
 *
 * @throws NotchworkError `value-out-of-range` unless the value is from 1e-60 to 1e60.
 */
export function nearest(value: number, series: SeriesName): number {
  assertServed(value);
  const place = placeAtOrBelow(series, value);
  const below = valueAt(series, place);
  const above = valueAt(series, place + 1);
  return value / below <= above / value ? below : above;
}

/**
 * The value of a series so many steps up (or down, negative) from any value. The first step from
 * between two members goes to the nearer side only: in E12 one up from 4.6 is 4.7, from 4.7 it is 5.6.
 * No step (0) gives the member at or below. Results are exactly the decimal literal (4.7e-9).
 *
 * @param steps whole number.
 * @throws NotchworkError `value-out-of-range` unless value and result are from 1e-60 to 1e60.
 */
export function next(value: number, series: SeriesName, steps: number): number {
  assertServed(value);
  assertWhole('Number of steps', steps);
  const below = placeAtOrBelow(series, value);
  const isMember = Math.abs(valueAt(series, below) / value - 1) <= SAME;
  const result = valueAt(series, below + steps + (steps < 0 && !isMember ? 1 : 0));
  assertServed(result);
  return result;
}

/**
 * A value's neighbours in a series, `count` on each side, itself in the middle even where it is not
 * a member; ascending, `2·count + 1` values.
 *
 * @param count whole number from 0 to 1000.
 * @throws NotchworkError `value-out-of-range` as {@link next} does.
 */
export function neighbours(value: number, series: SeriesName, count: number): readonly number[] {
  assertServed(value);
  assertWhole('Number of neighbours', count);
  assertRange('Number of neighbours', count, 0, 1000);
  const steps = Array.from({ length: count }, (_, index) => index + 1);
  return [
    ...steps.map((step) => next(value, series, -step)).reverse(),
    value,
    ...steps.map((step) => next(value, series, step)),
  ];
}
