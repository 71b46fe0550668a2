import type { SpanTransfer } from '../blocks/span.ts';
import { bilinear } from '../filter/bilinear.ts';
import { factor } from '../filter/factor.ts';
import type { DigitalSection } from '../filter/section.ts';
import type { Hertz } from '../units.ts';

/** The digital filter of one span, ready for the chain. */
export interface SpanFilter {
  /** The same for the same place in the line, so that the chain knows what it replaces. */
  readonly key: string;
  readonly sections: readonly DigitalSection[];
}

const made = new WeakMap<SpanTransfer, Map<Hertz, SpanFilter>>();

/**
 * The line's filters at a sample rate, one for each span, remembered for as long as the span's
 * transfer function lives: an unchanged span gives the very same object.
 *
 * @throws NotchworkError `filter-unstable` where a span has a pole in the right half-plane.
 */
export function lineFilters(spans: readonly SpanTransfer[], sampleRate: Hertz): readonly SpanFilter[] {
  return spans.map((span) => {
    let byRate = made.get(span);
    if (byRate === undefined) {
      byRate = new Map();
      made.set(span, byRate);
    }
    let filter = byRate.get(sampleRate);
    if (filter === undefined) {
      const sections = factor(span.transfer).map((section) => bilinear(section, sampleRate));
      filter = { key: span.span.blocks[0]!.block.slot, sections };
      byRate.set(sampleRate, filter);
    }
    return filter;
  });
}
