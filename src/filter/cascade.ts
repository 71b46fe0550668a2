import { NotchworkError } from '../errors.ts';
import type { DigitalSection } from './section.ts';

const HIGHEST_ORDER = 3;

/** Coefficients of one section, filled up to order 3: b0 … b3, then a1 … a3. */
function layOut({ feedforward, feedback }: DigitalSection): Float64Array {
  if (Math.max(feedforward.length, feedback.length) > HIGHEST_ORDER + 1 || feedback[0] !== 1) {
    throw new NotchworkError(
      'filter-invalid',
      `A section has ${feedforward.length} feedforward and ${feedback.length} feedback coefficients, the first of which is ${feedback[0]}; a cascade takes sections of order 0 to ${HIGHEST_ORDER} whose first feedback coefficient is 1.`,
    );
  }
  const laid = new Float64Array(2 * HIGHEST_ORDER + 1);
  laid.set(feedforward);
  laid.set(feedback.slice(1), HIGHEST_ORDER + 1);
  return laid;
}

/** One section over one block, in place: transposed direct form II, the least sensitive of the direct forms. */
function run(coefficients: Float64Array, delays: Float64Array, block: Float64Array): void {
  const b0 = coefficients[0]!;
  const b1 = coefficients[1]!;
  const b2 = coefficients[2]!;
  const b3 = coefficients[3]!;
  const a1 = coefficients[4]!;
  const a2 = coefficients[5]!;
  const a3 = coefficients[6]!;
  let first = delays[0]!;
  let second = delays[1]!;
  let third = delays[2]!;
  for (let index = 0; index < block.length; index++) {
    const input = block[index]!;
    const output = b0 * input + first;
    first = b1 * input - a1 * output + second;
    second = b2 * input - a2 * output + third;
    third = b3 * input - a3 * output;
    block[index] = output;
  }
  delays[0] = settled(first);
  delays[1] = settled(second);
  delays[2] = settled(third);
}

/** Lets a decayed delay end at 0: numbers below the normal range would slow the processor down. */
function settled(value: number): number {
  return Math.abs(value) < 1e-200 ? 0 : value;
}

/**
 * A cascade of digital sections that runs over signals of any length, block by block, in double
 * precision; what the terminal renders with. Its state is kept from block to block, for each channel.
 */
export class Cascade {
  readonly #sections: readonly Float64Array[];
  /** For each channel, the delays of every section. */
  readonly #delays: readonly (readonly Float64Array[])[];

  /**
   * @param sections in the order of the signal; none passes the signal as it is.
   * @param channels how many signals run through it side by side.
   * @throws NotchworkError `filter-invalid` for a section above order 3, or not normalised.
   */
  constructor(sections: readonly DigitalSection[], channels = 1) {
    this.#sections = sections.map(layOut);
    this.#delays = Array.from({ length: channels }, () =>
      sections.map(() => new Float64Array(HIGHEST_ORDER)),
    );
  }

  /**
   * Filters the next block of one channel, in place.
   *
   * @param block samples; any length, different from call to call if need be.
   * @param channel counted from 0.
   */
  process(block: Float64Array, channel = 0): void {
    const delays = this.#delays[channel];
    if (delays === undefined) {
      throw new NotchworkError(
        'filter-invalid',
        `There is no channel ${channel}; the cascade has ${this.#delays.length}, counted from 0.`,
      );
    }
    this.#sections.forEach((coefficients, index) => {
      run(coefficients, delays[index]!, block);
    });
  }

  /** Forgets what has passed through, as if new. */
  reset(): void {
    for (const channel of this.#delays) for (const delays of channel) delays.fill(0);
  }
}
