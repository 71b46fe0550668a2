import { NotchworkError } from '../errors.ts';
import { toBilinearVariable } from './bilinear-variable.ts';
import { isHurwitz } from './hurwitz.ts';

/** A rational function of s (rad/s) of order 3 or less, ascending powers; a cascade of them is a filter. */
export interface AnalogueSection {
  readonly numerator: readonly number[];
  readonly denominator: readonly number[];
}

/**
 * A digital filter of order 3 or less, `Σ feedforward[k]·z⁻ᵏ / Σ feedback[k]·z⁻ᵏ`, as Web Audio's
 * IIR node takes it: both lists of equal length, `feedback[0]` exactly 1.
 */
export interface DigitalSection {
  readonly feedforward: readonly number[];
  readonly feedback: readonly number[];
}

/** Most coefficients in either list that a Web Audio IIR node accepts (Web Audio API, createIIRFilter). */
const MOST_COEFFICIENTS = 20;

function assertList(name: string, list: readonly number[]): void {
  if (list.length < 1 || list.length > MOST_COEFFICIENTS) {
    throw new NotchworkError(
      'filter-invalid',
      `A filter has ${list.length} ${name} coefficients; it must have 1 to ${MOST_COEFFICIENTS}. Split it into sections.`,
    );
  }
  const bad = list.findIndex((value) => !Number.isFinite(value));
  if (bad >= 0) {
    throw new NotchworkError(
      'filter-invalid',
      `The ${name} coefficient ${bad} of a filter is ${list[bad]}; every one must be a finite number.`,
    );
  }
}

/** Whether all poles of a digital section lie inside the unit circle, judged in the bilinear variable. */
function isStable(feedback: readonly number[]): boolean {
  return isHurwitz(toBilinearVariable(feedback));
}

/**
 * Checks a section before a Web Audio node is made of it: the browser would answer some of these with
 * an error of its own, and an unstable filter not at all (it turns to NaN and stays there).
 *
 * @throws NotchworkError `filter-invalid` for a list of 0 or more than 20 coefficients, unequal
 *   lengths, a value that is not finite, `feedback[0]` other than 1, or feedforward values all 0
 *   (such a section passes nothing: see {@link isSilent}); `filter-unstable` for a pole on or outside
 *   the unit circle.
 */
export function assertPlayable({ feedforward, feedback }: DigitalSection): void {
  assertList('feedforward', feedforward);
  assertList('feedback', feedback);
  if (feedforward.length !== feedback.length) {
    throw new NotchworkError(
      'filter-invalid',
      `A filter has ${feedforward.length} feedforward and ${feedback.length} feedback coefficients; give as many of each, filled up with 0.`,
    );
  }
  if (feedback[0] !== 1) {
    throw new NotchworkError(
      'filter-invalid',
      `The first feedback coefficient is ${feedback[0]}; divide all coefficients by it so that it is 1.`,
    );
  }
  if (feedforward.every((value) => value === 0)) {
    throw new NotchworkError(
      'filter-invalid',
      'All feedforward coefficients are 0, so the filter passes nothing; mute the signal instead.',
    );
  }
  if (!isStable(feedback)) {
    throw new NotchworkError(
      'filter-unstable',
      'A filter has a pole on or outside the unit circle and would run away instead of settling.',
    );
  }
}

/** Whether a cascade passes nothing at all, as with a volume control at zero: some section is all 0. */
export function isSilent(sections: readonly DigitalSection[]): boolean {
  return sections.some(({ feedforward }) => feedforward.every((value) => value === 0));
}
