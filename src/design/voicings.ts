import type { LineSettings } from '../blocks/line.ts';
import type { DesignChange } from './changes.ts';
import { activeVoicing, type Design, VOICING_LETTERS, type Voicing, type VoicingLetter } from './design.ts';

/** Longest name of a voicing, in characters. */
export const LONGEST_VOICING_NAME = 40;

/** The next letter not in use, or `undefined` when all eight are taken. */
export function freeLetter(design: Design): VoicingLetter | undefined {
  return VOICING_LETTERS.find((letter) => !design.voicings.some((voicing) => voicing.letter === letter));
}

function changeVoicing(letter: VoicingLetter, change: (voicing: Voicing) => Voicing): DesignChange {
  return (design) =>
    design.voicings.some((voicing) => voicing.letter === letter)
      ? {
          ...design,
          voicings: design.voicings.map((voicing) => (voicing.letter === letter ? change(voicing) : voicing)),
        }
      : design;
}

/** Edits and hears another voicing; no change if the design does not have that letter. */
export function chooseVoicing(letter: VoicingLetter): DesignChange {
  return (design) =>
    design.active !== letter && design.voicings.some((voicing) => voicing.letter === letter)
      ? { ...design, active: letter }
      : design;
}

/**
 * Keeps the active voicing's line (or `line`) under the next free letter and makes that one active.
 * No change when all eight letters are taken.
 */
export function keepVoicing(name: string, line?: LineSettings): DesignChange {
  return (design) => {
    const letter = freeLetter(design);
    if (letter === undefined) return design;
    const kept: Voicing = {
      letter,
      name: tidyName(name, letter),
      colour: letter,
      line: line ?? activeVoicing(design).line,
    };
    return { ...design, voicings: [...design.voicings, kept], active: letter };
  };
}

function tidyName(name: string, letter: VoicingLetter): string {
  const tidy = name.trim().slice(0, LONGEST_VOICING_NAME);
  return tidy === '' ? `Voicing ${letter}` : tidy;
}

/** Gives a voicing another name; an empty one becomes "Voicing" and its letter. */
export function renameVoicing(letter: VoicingLetter, name: string): DesignChange {
  return changeVoicing(letter, (voicing) => ({ ...voicing, name: tidyName(name, letter) }));
}

/** Draws a voicing in another letter's colour and dash. */
export function recolourVoicing(letter: VoicingLetter, colour: VoicingLetter): DesignChange {
  return changeVoicing(letter, (voicing) => (voicing.colour === colour ? voicing : { ...voicing, colour }));
}

/** Moves a voicing by `places` in the row (negative: towards the front); it stops at the ends. */
export function moveVoicing(letter: VoicingLetter, places: number): DesignChange {
  return (design) => {
    const from = design.voicings.findIndex((voicing) => voicing.letter === letter);
    const to = Math.min(Math.max(from + places, 0), design.voicings.length - 1);
    if (from < 0 || to === from) return design;
    const voicings = design.voicings.filter((_, index) => index !== from);
    return { ...design, voicings: voicings.toSpliced(to, 0, design.voicings[from]!) };
  };
}

/** Takes a voicing out; the last one stays. Where it was active, its neighbour becomes so. */
export function deleteVoicing(letter: VoicingLetter): DesignChange {
  return (design) => {
    const index = design.voicings.findIndex((voicing) => voicing.letter === letter);
    if (index < 0 || design.voicings.length === 1) return design;
    const voicings = design.voicings.filter((_, position) => position !== index);
    const neighbour = voicings[Math.min(index, voicings.length - 1)]!;
    return { ...design, voicings, active: design.active === letter ? neighbour.letter : design.active };
  };
}
