import { assertRange } from '../errors.ts';
import type { Hertz } from '../units.ts';
import { toBilinearVariable } from './bilinear-variable.ts';
import { polynomialRoots } from './roots.ts';
import type { DigitalSection } from './section.ts';

const LONGEST_SECONDS = 60; // a pole that rings for longer than this belongs to no tone network

/**
 * Nepers that a pole loses in one sample, `−ln|z|`, from its place in the bilinear variable:
 * `|z|² = |1 + w|²/|1 − w|²`, so that a pole next to the circle keeps its digits.
 */
function lossPerSample(re: number, im: number): number {
  return -Math.log1p((4 * re) / ((1 - re) ** 2 + im * im)) / 2;
}

/** Samples in which a pole loses so many nepers; endless for one that does not decay. */
function decay(nepers: number, loss: number): number {
  return loss > 0 ? nepers / loss : Number.POSITIVE_INFINITY;
}

/** Samples that all poles of a section need one after the other. */
function sectionTail({ feedback }: DigitalSection, nepers: number): number {
  const { real, pairs } = polynomialRoots(toBilinearVariable(feedback));
  let samples = feedback.length - 1;
  for (const root of real) samples += decay(nepers, lossPerSample(root, 0));
  for (const { re, im } of pairs) samples += 2 * decay(nepers, lossPerSample(re, im));
  return samples;
}

/**
 * After how many samples the impulse response of a stable cascade stays under `floor` times its start.
 *
 * The pole with the largest radius decides, `n = ln(floor)/ln|z|`. Every other pole adds its own such
 * time: a cascade of decays has decayed once each has had its time, even where poles coincide, and the
 * quick ones add next to nothing. So this is never too short, and for one pole exact.
 *
 * @param sampleRate in hertz; the answer is at most 60 s.
 * @param floor a ratio of amplitudes above 0 and below 1: 1e-6 is 120 dB.
 * @throws NotchworkError `value-out-of-range` for the floor or the sample rate.
 */
export function impulseTail(sections: readonly DigitalSection[], sampleRate: Hertz, floor: number): number {
  assertRange('The sample rate in hertz', sampleRate, 1, 1e9);
  assertRange('The floor of a decay, as a ratio of amplitudes,', floor, Number.MIN_VALUE, 1);
  const nepers = -Math.log(floor);
  const samples = sections.reduce((sum, section) => sum + sectionTail(section, nepers), 0);
  return Math.ceil(Math.min(samples, LONGEST_SECONDS * sampleRate));
}
