import type { LineFilter } from '../audio/engine-types.ts';
import type { SpanTransfer } from '../blocks/span.ts';
import { bilinear } from '../filter/bilinear.ts';
import { factor } from '../filter/factor.ts';
import type { Hertz } from '../units.ts';

const made = new WeakMap<SpanTransfer, Map<Hertz, LineFilter>>();

/**
 * The line's filters at a sample rate, one for each span, remembered for as long as the span's
 * transfer function lives: an unchanged span gives the very same object.
 *
 * @throws NotchworkError `filter-unstable` where a span has a pole in the right half-plane.
 */
export function lineFilters(spans: readonly SpanTransfer[], sampleRate: Hertz): readonly LineFilter[] {
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
