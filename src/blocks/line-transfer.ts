import type { BlockSettings } from './block.ts';
import { type PlacedBlock, type SpanTransfer, spansOf, spanTransfer } from './span.ts';

interface Remembered {
  readonly settings: readonly BlockSettings[];
  readonly transfer: SpanTransfer;
}

/**
 * The transfer functions of a line's spans, remembering the last ones: a span none of whose settings
 * changed (settings are immutable, so the same object means the same values) is not computed again.
 * One of these belongs to each line that is being worked on.
 */
export class LineTransfer {
  readonly #last = new Map<string, Remembered>();

  /**
   * Spans of the blocks present, in the order of the signal.
   *
   * @throws NotchworkError from {@link spanTransfer} or the compiler.
   */
  of(placed: readonly PlacedBlock[]): readonly SpanTransfer[] {
    return spansOf(placed).map((span) => {
      const settings = span.blocks.map((entry) => entry.settings);
      const known = this.#last.get(span.key);
      if (known !== undefined && settings.every((entry, index) => entry === known.settings[index])) {
        return known.transfer;
      }
      const transfer = spanTransfer(span);
      this.#last.set(span.key, { settings, transfer });
      return transfer;
    });
  }
}
