import type { Decibels, Hertz } from '../units.ts';

/** A hollow in the response between two higher shoulders. */
export interface Dip {
  readonly frequency: Hertz;
  readonly level: Decibels;
  /** How far it lies under the lower of its two shoulders, in dB, above 0; Infinity for a perfect notch. */
  readonly depth: Decibels;
}

/** What people quote of a tone control's response. */
export interface Figures {
  /** Level at 1 kHz. */
  readonly levelAt1k: Decibels;
  /** The mid dip; `undefined` where the response has none. */
  readonly midDip: Dip | undefined;
  /** Level at 100 Hz relative to 1 kHz. */
  readonly liftAt100: Decibels;
  /** Level at 5 kHz relative to 1 kHz. */
  readonly liftAt5k: Decibels;
}

/** Where the bottom of a mid dip is looked for. */
const DIP_BAND: readonly [Hertz, Hertz] = [100, 5000];
/** How far out its shoulders are looked for: what is heard. */
const SHOULDER_BAND: readonly [Hertz, Hertz] = [20, 20e3];
const POINTS_PER_OCTAVE = 24;
const LEAST_DEPTH: Decibels = 0.01; // less is a ripple that nobody measures
const GOLDEN = (Math.sqrt(5) - 1) / 2;
const NARROW = 1e-9; // octaves; the flat bottom of a dip determines its place no better than that

/** Golden-section search for the minimum of `value` between two points (J. Kiefer 1953); its place. */
function goldenMinimum(value: (place: number) => number, from: number, to: number): number {
  let [low, high] = [from, to];
  let left = high - GOLDEN * (high - low);
  let right = low + GOLDEN * (high - low);
  let atLeft = value(left);
  let atRight = value(right);
  while (high - low > NARROW) {
    if (atLeft < atRight) {
      high = right;
      right = left;
      atRight = atLeft;
      left = high - GOLDEN * (high - low);
      atLeft = value(left);
    } else {
      low = left;
      left = right;
      atLeft = atRight;
      right = low + GOLDEN * (high - low);
      atRight = value(right);
    }
  }
  return atLeft < atRight ? left : right;
}

/** Level against octaves above the lowest shoulder, sampled once and refined where needed. */
class Landscape {
  readonly #level: (octave: number) => Decibels;
  readonly #octaves: number;
  readonly levels: Float64Array;

  constructor(level: (frequency: Hertz) => Decibels) {
    this.#level = (octave) => level(SHOULDER_BAND[0] * 2 ** octave);
    this.#octaves = Math.log2(SHOULDER_BAND[1] / SHOULDER_BAND[0]);
    const points = Math.ceil(this.#octaves * POINTS_PER_OCTAVE) + 1;
    this.levels = Float64Array.from({ length: points }, (_, index) => this.#level(this.#octave(index)));
  }

  #octave(index: number): number {
    return Math.min(this.#octaves, index / POINTS_PER_OCTAVE);
  }

  frequency(octave: number): Hertz {
    return SHOULDER_BAND[0] * 2 ** octave;
  }

  level(octave: number): Decibels {
    return this.#level(octave);
  }

  /** Place of the lowest point between the neighbours of a sample. */
  bottomNear(index: number): number {
    return goldenMinimum(this.#level, this.#octave(index - 1), this.#octave(index + 1));
  }

  /** Highest level among samples `from` … `to`, refined about the highest of them. */
  highest(from: number, to: number): Decibels {
    let best = from;
    for (let index = from; index <= to; index++) if (this.levels[index]! > this.levels[best]!) best = index;
    const low = this.#octave(Math.max(best - 1, from));
    const high = this.#octave(Math.min(best + 1, to));
    const place = goldenMinimum((octave) => -this.#level(octave), low, high);
    return Math.max(this.levels[best]!, this.#level(place));
  }
}

/** Sampled minima whose neighbours are both higher, away from the ends. */
function hollows(levels: Float64Array): number[] {
  const found: number[] = [];
  for (let index = 1; index < levels.length - 1; index++) {
    if (levels[index]! < levels[index - 1]! && levels[index]! <= levels[index + 1]!) found.push(index);
  }
  return found;
}

/** The deepest hollow between 100 Hz and 5 kHz; its shoulders are the highest points on either side, 20 Hz to 20 kHz. */
function findDip(landscape: Landscape): Dip | undefined {
  let deepest: Dip | undefined;
  for (const index of hollows(landscape.levels)) {
    const place = landscape.bottomNear(index);
    const frequency = landscape.frequency(place);
    if (frequency < DIP_BAND[0] || frequency > DIP_BAND[1]) continue;
    const level = landscape.level(place);
    const left = landscape.highest(0, index);
    const right = landscape.highest(index, landscape.levels.length - 1);
    const depth = Math.min(left, right) - level;
    if (depth >= LEAST_DEPTH && (deepest === undefined || depth > deepest.depth)) {
      deepest = { frequency, level, depth };
    }
  }
  return deepest;
}

/**
 * Reads the quoted figures off a response itself, not off a sampled curve: extremes are found by
 * golden-section search, so they do not depend on any grid.
 *
 * The mid dip is the deepest interior local minimum between 100 Hz and 5 kHz, its depth counted from
 * the lower of the highest points on either side between 20 Hz and 20 kHz; under 0.01 dB it is none.
 * A notch narrower than a twenty-fourth of an octave may be missed.
 *
 * @param level decibels at a frequency in hertz: one block, or the sum of a line's.
 */
export function readFigures(level: (frequency: Hertz) => Decibels): Figures {
  const levelAt1k = level(1000);
  return {
    levelAt1k,
    midDip: findDip(new Landscape(level)),
    liftAt100: level(100) - levelAt1k,
    liftAt5k: level(5000) - levelAt1k,
  };
}
