import { Cascade } from '../filter/cascade.ts';
import type { DigitalSection } from '../filter/section.ts';

/** How a rendering begins. */
export interface RenderStart {
  readonly sections: readonly DigitalSection[];
  readonly channels: number;
  /** Amplitude ratio that everything is multiplied by. */
  readonly gain: number;
}

/** Filters a recording block by block, keeping the filters' state, in double precision throughout. */
export class BlockRenderer {
  readonly #cascade: Cascade;
  readonly #gain: number;

  /** @throws NotchworkError `filter-invalid` for sections a cascade does not take. */
  constructor({ sections, channels, gain }: RenderStart) {
    this.#cascade = new Cascade(sections, channels);
    this.#gain = gain;
  }

  /** The next block, one array for each channel, rounded to single precision once, at the end. */
  process(block: readonly Float32Array[]): Float32Array<ArrayBuffer>[] {
    return block.map((samples, channel) => {
      const work = Float64Array.from(samples);
      this.#cascade.process(work, channel);
      return Float32Array.from(work, (value) => value * this.#gain);
    });
  }
}
