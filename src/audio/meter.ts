import { type Decibels, decibels, type Seconds } from '../units.ts';

const FALL = 20 / 1.7; // dB/s: 20 dB in 1.7 s, peak programme meter type I of IEC 60268-10 (from memory)
const HOLD: Seconds = 2; // common practice, no source
const LIMITED_SHOWN: Seconds = 2; // long enough to be noticed

/** The moving parts of a peak meter: rises at once, falls slowly, holds the highest level for a while. */
export class PeakMeter {
  readonly #ceiling: number;
  #level: Decibels = Number.NEGATIVE_INFINITY;
  #hold: Decibels = Number.NEGATIVE_INFINITY;
  #held: Seconds = 0;
  #sinceLimited: Seconds = Number.POSITIVE_INFINITY;

  /** @param ceiling amplitude above which the signal is limited. */
  constructor(ceiling: number) {
    this.#ceiling = ceiling;
  }

  /**
   * Takes the largest amplitude since the last call.
   *
   * @param peak of the signal before the limiter, as an amplitude; what lies above the ceiling shows
   *   as the ceiling, which is what is heard.
   * @param elapsed time since the last call.
   */
  update(peak: number, elapsed: Seconds): { level: Decibels; hold: Decibels; limited: boolean } {
    const now = decibels(Math.min(peak, this.#ceiling));
    this.#level = Math.max(now, this.#level - FALL * elapsed);
    this.#held += elapsed;
    if (now >= this.#hold) {
      this.#hold = now;
      this.#held = 0;
    } else if (this.#held > HOLD) {
      this.#hold = Math.max(this.#level, this.#hold - FALL * (this.#held - HOLD));
      this.#held = HOLD;
    }
    this.#sinceLimited = peak > this.#ceiling ? 0 : this.#sinceLimited + elapsed;
    return { level: this.#level, hold: this.#hold, limited: this.#sinceLimited < LIMITED_SHOWN };
  }
}
