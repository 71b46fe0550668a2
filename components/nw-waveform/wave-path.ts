import type { Overview } from '../../src/clip/overview.ts';

/** Half the height of the drawing; its middle is 0. */
export const HALF_HEIGHT = 50;

/** Silence is drawn as a line this thick, of {@link HALF_HEIGHT}. */
const THINNEST = 0.6;

/** Clips below −40 dBFS are not blown up further: noise should not look like playing. */
const QUIETEST_PEAK = 0.01;

/** Lowest and highest value of the buckets that fall into a column. */
function extremes({ low, high }: Overview, column: number, columns: number): readonly [number, number] {
  const from = Math.floor((column * low.length) / columns);
  const to = Math.max(from + 1, Math.floor(((column + 1) * low.length) / columns));
  let lowest = Number.POSITIVE_INFINITY;
  let highest = Number.NEGATIVE_INFINITY;
  for (let bucket = from; bucket < to; bucket += 1) {
    lowest = Math.min(lowest, low[bucket]!);
    highest = Math.max(highest, high[bucket]!);
  }
  return [lowest, highest];
}

/**
 * Outline of a waveform as SVG path data: `columns` wide, from −{@link HALF_HEIGHT} to
 * {@link HALF_HEIGHT} high, scaled so that the clip's peak nearly fills it. Linear in the number of
 * buckets, so that an overview of any length can be given; empty without buckets.
 *
 * @param columns most steps across; fewer buckets make fewer, wider steps.
 */
export function wavePath(overview: Overview, columns: number): string {
  const steps = Math.min(columns, overview.low.length);
  if (steps === 0) return '';
  const outline = Array.from({ length: steps }, (_, step) => extremes(overview, step, steps));
  const peak = outline.reduce((most, [low, high]) => Math.max(most, -low, high), QUIETEST_PEAK);
  const scale = (0.96 * HALF_HEIGHT) / peak;
  const x = (step: number): string => (((step + 0.5) * columns) / steps).toFixed(1);
  const upper = outline.map(
    ([, high], step) => `${x(step)} ${(-Math.max(high * scale, THINNEST)).toFixed(1)}`,
  );
  const lower = outline.map(([low], step) => `${x(step)} ${(-Math.min(low * scale, -THINNEST)).toFixed(1)}`);
  return `M${upper.join('L')}L${lower.reverse().join('L')}Z`;
}
