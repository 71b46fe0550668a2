import { assertRange, NotchworkError } from '../errors.ts';
import type { Hertz } from '../units.ts';
import { bilinearTable } from './bilinear-variable.ts';
import { degreeOf } from './roots.ts';
import type { AnalogueSection, DigitalSection } from './section.ts';

/** How {@link bilinear} maps frequencies. */
export interface BilinearOptions {
  /**
   * Frequency at which the digital filter meets the analogue one exactly, in hertz, above 0 and below
   * half the sample rate. @default none: they meet at 0 Hz, to first order.
   */
  readonly prewarp?: Hertz;
}

const HIGHEST_ORDER = 3;

/** The factor c of `s = c·(1 − z⁻¹)/(1 + z⁻¹)`: 2·fs, or what makes one frequency exact. */
function mappingFactor(sampleRate: Hertz, prewarp: Hertz | undefined): number {
  assertRange('The sample rate in hertz', sampleRate, 1, 1e9);
  if (prewarp === undefined) return 2 * sampleRate;
  if (!(prewarp > 0 && prewarp < sampleRate / 2)) {
    throw new NotchworkError(
      'value-out-of-range',
      `The pre-warp frequency is ${prewarp} Hz; it must lie above 0 and below half the sample rate, ${sampleRate / 2} Hz.`,
    );
  }
  return (2 * Math.PI * prewarp) / Math.tan((Math.PI * prewarp) / sampleRate);
}

/** Coefficients of `(1 + z⁻¹)^order · P(s)` after the substitution, ascending powers of `z⁻¹`. */
function substitute(polynomial: readonly number[], order: number, factor: number): number[] {
  const rows = bilinearTable(order);
  const digital = new Array<number>(order + 1).fill(0);
  let power = 1;
  for (let index = 0; index < polynomial.length; index++) {
    const term = polynomial[index]! * power;
    power *= factor;
    for (let delay = 0; delay <= order; delay++) digital[delay]! += term * rows[delay]![index]!;
  }
  return digital;
}

/**
 * The digital section that does at the sample rate what the analogue one does in continuous time:
 * `s = 2·fs·(1 − z⁻¹)/(1 + z⁻¹)` (A. Tustin 1947), the trapezoidal rule. Its response at ω (rad/s) is
 * exactly the analogue one at `2·fs·tan(ω/2fs)`; with `prewarp` the factor 2·fs is changed so that
 * the two agree at that frequency.
 *
 * @param section of order 3 or less, stable; `factor.ts` makes such sections.
 * @param sampleRate in hertz.
 * @throws NotchworkError `filter-invalid` for an order above 3, or a numerator of higher order than the
 *   denominator (its gain would grow without limit and the digital filter never settle), or
 *   coefficients beyond double precision; `value-out-of-range` for the sample rate or pre-warp frequency.
 */
export function bilinear(
  section: AnalogueSection,
  sampleRate: Hertz,
  options: BilinearOptions = {},
): DigitalSection {
  const factor = mappingFactor(sampleRate, options.prewarp);
  const order = degreeOf(section.denominator);
  if (order < 0 || order > HIGHEST_ORDER || degreeOf(section.numerator) > order) {
    throw new NotchworkError(
      'filter-invalid',
      `A section has a numerator of order ${degreeOf(section.numerator)} over a denominator of order ${order}; the denominator must be of order 0 to ${HIGHEST_ORDER} and the numerator no higher. Factor it first.`,
    );
  }
  const feedforward = substitute(section.numerator.slice(0, order + 1), order, factor);
  const feedback = substitute(section.denominator.slice(0, order + 1), order, factor);
  const lead = feedback[0]!;
  for (let delay = 0; delay <= order; delay++) {
    feedforward[delay]! /= lead;
    feedback[delay]! /= lead;
  }
  feedback[0] = 1;
  if (!feedforward.every(Number.isFinite) || !feedback.every(Number.isFinite)) {
    throw new NotchworkError(
      'filter-invalid',
      'The coefficients of a section are not numbers that double precision can hold at this sample rate.',
    );
  }
  return { feedforward, feedback };
}
