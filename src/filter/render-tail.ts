import type { Hertz } from '../units.ts';
import { impulseTail } from './impulse-tail.ts';
import { type DigitalSection, isSilent } from './section.ts';

/** What rings after a clip's end is written down to 100 dB below it: under the noise of any recording. */
const TAIL_FLOOR = 1e-5;
/** Seconds of tail at the most. */
const LONGEST_TAIL = 2;

/** Samples that a rendering goes on after the clip's end, so that nothing audible is cut off. */
export function renderTail(sections: readonly DigitalSection[], sampleRate: Hertz): number {
  if (sections.length === 0 || isSilent(sections)) return 0;
  return Math.min(impulseTail(sections, sampleRate, TAIL_FLOOR), Math.round(LONGEST_TAIL * sampleRate));
}
