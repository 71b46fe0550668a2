import type { Hertz } from '../units.ts';

/** What a plot's vertical axis is. */
export type PlotQuantity = 'magnitude' | 'phase' | 'difference';

/** A curve to draw: told apart by colour, dash and letter. */
export interface PlotCurve {
  readonly id: string;
  /** Drawn at the curve's end; may be empty for helping lines. */
  readonly letter: string;
  /** Name in legends and tables. */
  readonly label: string;
  /** Letter of the palette, a to h, or `soft` for helping lines. */
  readonly colour: 'a' | 'b' | 'c' | 'd' | 'e' | 'f' | 'g' | 'h' | 'soft';
  /** Lengths of strokes and gaps; empty for a solid line. */
  readonly dash: readonly number[];
  readonly strength: 'strong' | 'normal' | 'faint';
  /** Hertz, ascending. */
  readonly frequencies: Float64Array;
  /** In the unit of the quantity; not finite where there is nothing to draw. */
  readonly values: Float64Array;
}

/** Dash of each palette letter, so that curves differ without colour too. */
export const DASHES: Readonly<Record<PlotCurve['colour'], readonly number[]>> = {
  a: [],
  b: [9, 5],
  c: [2, 5],
  d: [12, 4, 2, 4],
  e: [16, 4],
  f: [5, 3],
  g: [12, 3, 2, 3, 2, 3],
  h: [1, 3],
  soft: [],
};

/** Ends of the frequency axis. */
export const PLOT_FROM: Hertz = 10;
export const PLOT_TO: Hertz = 40_000;

/** Frequencies that carry a number, as people read them off. */
export const LABELLED: readonly { readonly frequency: Hertz; readonly text: string }[] = [
  20, 50, 100, 200, 500, 1000, 2000, 5000, 10_000, 20_000,
].map((frequency) => ({ frequency, text: frequency < 1000 ? String(frequency) : `${frequency / 1000}k` }));

/** All lines of the frequency grid: 1 to 9 of every decade. */
export const GRID_FREQUENCIES: readonly Hertz[] = [10, 100, 1000, 10_000].flatMap((decade) =>
  Array.from({ length: 9 }, (_, index) => decade * (index + 1)).filter((frequency) => frequency <= PLOT_TO),
);

/** What each quantity is measured in, and how its axis is divided. */
export const QUANTITIES: Readonly<
  Record<
    PlotQuantity,
    {
      readonly name: string;
      readonly unit: string;
      readonly step: number;
      readonly least: number;
      readonly digits: number;
    }
  >
> = {
  magnitude: { name: 'Level', unit: 'dB', step: 6, least: 24, digits: 1 },
  phase: { name: 'Phase', unit: '°', step: 45, least: 90, digits: 0 },
  difference: { name: 'Digital less analogue', unit: 'dB', step: 1, least: 2, digits: 2 },
};

/** Ends of a vertical axis. */
export interface AxisRange {
  readonly min: number;
  readonly max: number;
}

/** Curves that fall without end are cut this far under the highest point. */
const DEEPEST: Readonly<Record<PlotQuantity, number>> = { magnitude: 60, phase: 1440, difference: 12 };

/**
 * The axis that shows all curves: whole steps, a little air above, never shorter than the quantity's
 * least. While something is being moved (`held` given) it only grows, so that it does not jump.
 */
export function axisRange(quantity: PlotQuantity, curves: readonly PlotCurve[], held?: AxisRange): AxisRange {
  const { step, least } = QUANTITIES[quantity];
  let low = Number.POSITIVE_INFINITY;
  let high = Number.NEGATIVE_INFINITY;
  for (const { values } of curves) {
    for (const value of values) {
      if (!Number.isFinite(value)) continue;
      if (value < low) low = value;
      if (value > high) high = value;
    }
  }
  if (low > high) [low, high] = [-least, 0];
  low = Math.max(low, high - DEEPEST[quantity]);
  let max = Math.ceil((high + 0.1 * step) / step) * step + 0; // + 0 makes a plain zero of −0
  let min = Math.floor((low - 0.1 * step) / step) * step + 0;
  if (max - min < least) {
    if (quantity === 'magnitude') min = max - least;
    else [min, max] = [Math.min(min, -least / 2), Math.max(max, least / 2)];
  }
  if (held !== undefined) [min, max] = [Math.min(min, held.min), Math.max(max, held.max)];
  return { min, max };
}

/** Numbers on the vertical axis: every step, or every second or fourth where they would crowd. */
export function axisTicks(quantity: PlotQuantity, { min, max }: AxisRange): readonly number[] {
  const { step } = QUANTITIES[quantity];
  let spacing = step;
  while ((max - min) / spacing > 8) spacing *= 2;
  const first = Math.ceil(min / spacing) * spacing;
  return Array.from(
    { length: Math.floor((max - first) / spacing) + 1 },
    (_, index) => first + index * spacing,
  );
}

/** A curve's value at a frequency, interpolated along the logarithmic axis; NaN outside it. */
export function valueAt({ frequencies, values }: PlotCurve, frequency: Hertz): number {
  let low = 0;
  let high = frequencies.length - 1;
  if (high < 0 || !(frequency >= frequencies[0]! && frequency <= frequencies[high]!)) return Number.NaN;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (frequencies[middle]! <= frequency) low = middle;
    else high = middle;
  }
  if (high === low) return values[low]!;
  const share = Math.log(frequency / frequencies[low]!) / Math.log(frequencies[high]! / frequencies[low]!);
  return values[low]! + share * (values[high]! - values[low]!);
}

/** A number with a real minus sign and the quantity's digits: "−9.8". */
export function plotNumber(value: number, quantity: PlotQuantity, signed = false): string {
  if (Number.isNaN(value)) return '–';
  if (value === Number.NEGATIVE_INFINITY) return '−∞';
  const text = Math.abs(value).toFixed(QUANTITIES[quantity].digits);
  const isZero = Number(text) === 0;
  return `${value < 0 && !isZero ? '−' : signed && !isZero ? '+' : ''}${text}`;
}

/** A frequency as people say it: "560 Hz", "1.25 kHz". */
export function frequencyText(frequency: Hertz): string {
  const digits =
    frequency >= 1000 ? Number((frequency / 1000).toPrecision(3)) : Number(frequency.toPrecision(3));
  return `${digits}\u202f${frequency >= 1000 ? 'kHz' : 'Hz'}`;
}
