import type { Decibels } from '../units.ts';
import type { Bench } from './bench.ts';

/** A voicing with the gain that makes it as loud as the clip is without the line. */
export interface MatchedVoicing {
  readonly letter: string;
  readonly name: string;
  /** Undefined where clip or line is silent, or nothing is known yet. */
  readonly gain: Decibels | undefined;
}

/** Gains of all voicings; reads signals, so that whoever calls it in an effect hears of changes. */
export function matchedVoicings(bench: Bench): readonly MatchedVoicing[] {
  return bench.voicings.value.map(({ letter, name, analysis }) => ({
    letter,
    name,
    gain: bench.sound.gainOf(analysis),
  }));
}
