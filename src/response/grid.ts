import { assertRange, NotchworkError } from '../errors.ts';
import { type Hertz, radiansPerSecond } from '../units.ts';

/** Frequencies at which curves are sampled, with what evaluating them needs again and again. */
export interface FrequencyGrid {
  /** Hertz, ascending. */
  readonly frequencies: Float64Array;
  /** Radians per second. */
  readonly omega: Float64Array;
  /** Squares of `omega`. */
  readonly omegaSquared: Float64Array;
}

const LOWEST: Hertz = 1e-6;
const HIGHEST: Hertz = 1e12;
const MOST_POINTS = 1_000_000;

/** A grid of frequencies of one's own choice, in hertz. */
export function gridOf(frequencies: ArrayLike<number>): FrequencyGrid {
  const hertz = Float64Array.from(frequencies);
  const omega = hertz.map(radiansPerSecond);
  return { frequencies: hertz, omega, omegaSquared: omega.map((value) => value * value) };
}

function assertBand(from: Hertz, to: Hertz): void {
  assertRange('The lowest frequency in hertz', from, LOWEST, HIGHEST);
  assertRange('The highest frequency in hertz', to, LOWEST, HIGHEST);
  if (!(from < to)) {
    throw new NotchworkError(
      'value-out-of-range',
      `The frequencies run from ${from} Hz to ${to} Hz; the first must be the lower one.`,
    );
  }
}

/**
 * Frequencies equally spaced on a logarithmic scale, both ends included exactly.
 *
 * @param from lowest frequency in hertz. @param to highest. @param points how many, at least 2.
 * @throws NotchworkError `value-out-of-range`.
 */
export function logGrid(from: Hertz, to: Hertz, points: number): FrequencyGrid {
  assertBand(from, to);
  assertRange('The number of points', points, 2, MOST_POINTS);
  const last = Math.floor(points) - 1;
  const frequencies = new Float64Array(last + 1);
  for (let index = 0; index < last; index++) frequencies[index] = from * (to / from) ** (index / last);
  frequencies[last] = to;
  return gridOf(frequencies);
}

/**
 * The frequencies `10^(k/perDecade)` within a band, as the preferred frequencies of ISO 266 are laid
 * out (perDecade 10 gives the exact values behind its third-octaves), so that grids of different bands
 * share their points and powers of ten are among them; the ends of the band are added where they are not.
 *
 * @param from lowest frequency in hertz. @param to highest. @param perDecade a whole number, at least 1.
 * @throws NotchworkError `value-out-of-range`.
 */
export function perDecadeGrid(from: Hertz, to: Hertz, perDecade: number): FrequencyGrid {
  assertBand(from, to);
  assertRange('The number of points per decade', perDecade, 1, MOST_POINTS / 20);
  const step = Math.floor(perDecade);
  const frequencies = [from];
  const near = 1e-9; // an end that is a preferred frequency but for rounding is not doubled
  const first = Math.floor(Math.log10(from) * step);
  for (let index = first; ; index++) {
    const decade = Math.floor(index / step);
    // The literal is exact for whole powers of ten.
    const frequency = Number(`1e${decade}`) * 10 ** ((index - decade * step) / step);
    if (frequency >= to * (1 - near)) break;
    if (frequency > from * (1 + near)) frequencies.push(frequency);
  }
  frequencies.push(to);
  return gridOf(frequencies);
}

/** The grid of the plot: 512 points from 10 Hz to 40 kHz. */
export const DEFAULT_GRID: FrequencyGrid = logGrid(10, 40e3, 512);
