import type { Hertz } from '../units.ts';
import { type PlotCurve, type PlotQuantity, QUANTITIES } from './plot-model.ts';

/** Ends of the frequency axis. */
export const PLOT_FROM: Hertz = 10;
export const PLOT_TO: Hertz = 40_000;
const DECADES = Math.log10(PLOT_TO / PLOT_FROM);

/** A frequency that carries a number. */
export interface LabelledFrequency {
  readonly frequency: Hertz;
  readonly text: string;
}

/** All lines of the frequency grid: 1 to 9 of every decade. */
export const GRID_FREQUENCIES: readonly Hertz[] = [10, 100, 1000, 10_000].flatMap((decade) =>
  Array.from({ length: 9 }, (_, index) => decade * (index + 1)).filter((frequency) => frequency <= PLOT_TO),
);

/** What people read off, the most useful first. The members of a row stand on the axis together, or none of them. */
const BY_USE: readonly (readonly Hertz[])[] = [
  [1000],
  [100, 10_000],
  [20],
  [50, 500, 5000],
  [200, 2000, 20_000],
];

/** Least room between two numbers on an axis, in pixels. */
const AIR = 8;

/** A number on the axis with the room it takes, half the air on either side. */
interface PlacedLabel extends LabelledFrequency {
  readonly from: number;
  readonly to: number;
}

function placed(frequency: Hertz, width: number, digitWidth: number): PlacedLabel {
  const text = frequency < 1000 ? String(frequency) : `${frequency / 1000}k`;
  const centre = (Math.log10(frequency / PLOT_FROM) / DECADES) * width;
  const half = (text.length * digitWidth + AIR) / 2;
  return { frequency, text, from: centre - half, to: centre + half };
}

/**
 * The numbers on the frequency axis: 20, 50, 100, 200 … 20k, or fewer where they would touch.
 *
 * @param width length of the axis in pixels. @param digitWidth width of one digit in pixels.
 * @returns ascending in frequency.
 */
export function labelledFrequencies(width: number, digitWidth = 7): readonly LabelledFrequency[] {
  const taken: PlacedLabel[] = [];
  for (const row of BY_USE) {
    const labels = row.map((frequency) => placed(frequency, width, digitWidth));
    const isFree = (label: PlacedLabel): boolean =>
      [...taken, ...labels].every(
        (other) => other === label || label.to <= other.from || label.from >= other.to,
      );
    if (labels.every(isFree)) taken.push(...labels);
  }
  return taken
    .sort((first, second) => first.frequency - second.frequency)
    .map(({ frequency, text }) => ({ frequency, text }));
}

/** Ends of a vertical axis. */
export interface AxisRange {
  readonly min: number;
  readonly max: number;
}

/** Lowest and highest finite value in a band that is drawn; undefined where there is none. */
function extremes(curves: readonly PlotCurve[], above: number): AxisRange | undefined {
  let min = Number.POSITIVE_INFINITY;
  let max = Number.NEGATIVE_INFINITY;
  for (const { frequencies, values } of curves) {
    for (let index = 0; index < values.length; index += 1) {
      const value = values[index]!;
      if (!Number.isFinite(value) || value <= above) continue;
      if (frequencies[index]! < PLOT_FROM || frequencies[index]! > PLOT_TO) continue;
      if (value < min) min = value;
      if (value > max) max = value;
    }
  }
  return min <= max ? { min, max } : undefined;
}

/** The mark of 1, 2, 5, 10 … next to a positive value, downwards or upwards. */
function mark(value: number, direction: 'down' | 'up'): number {
  const exponent = Math.floor(Math.log10(value));
  const marks = [1, 2, 5, 10].map((factor) => Number(`${factor}e${exponent}`));
  return direction === 'down'
    ? marks.findLast((candidate) => candidate <= value * (1 + 1e-9))!
    : marks.find((candidate) => candidate >= value * (1 - 1e-9))!;
}

function logarithmicRange(curves: readonly PlotCurve[]): AxisRange {
  const { min, max } = extremes(curves, 0) ?? { min: 1, max: 100 };
  const low = mark(min, 'down');
  return { min: low, max: Math.max(mark(max, 'up'), 10 * low) };
}

function linearRange(quantity: PlotQuantity, curves: readonly PlotCurve[]): AxisRange {
  const { step, least, deepest } = QUANTITIES[quantity];
  const found = extremes(curves, Number.NEGATIVE_INFINITY) ?? { min: -least, max: 0 };
  const air = 0.1 * step;
  const low = Math.max(found.min, found.max - deepest);
  const max = Math.ceil((found.max + air) / step) * step + 0; // + 0 makes a plain zero of −0
  const min = Math.floor((low - air) / step) * step + 0;
  if (max - min >= least) return { min, max };
  // Levels hang from the top; angles and differences lie about zero.
  if (quantity === 'magnitude') return { min: max - least, max };
  return { min: Math.min(min, -least / 2), max: Math.max(max, least / 2) };
}

/**
 * The axis that shows all curves: whole steps (6 dB, 45°, 1 dB; 1, 2, 5 for ohms), a little air, never
 * shorter than the quantity's least.
 *
 * @param held the axis while something is being moved: it then only grows, so that it does not jump.
 */
export function axisRange(quantity: PlotQuantity, curves: readonly PlotCurve[], held?: AxisRange): AxisRange {
  const range =
    QUANTITIES[quantity].scale === 'logarithmic' ? logarithmicRange(curves) : linearRange(quantity, curves);
  if (held === undefined) return range;
  return { min: Math.min(range.min, held.min), max: Math.max(range.max, held.max) };
}

/** Marks of a logarithmic axis: 1, 2, 5 of each decade, or whole decades where those are many. */
function logarithmicTicks({ min, max }: AxisRange): readonly number[] {
  const factors = Math.log10(max / min) > 3.5 ? [1] : [1, 2, 5];
  const ticks: number[] = [];
  for (let exponent = Math.floor(Math.log10(min)); exponent <= Math.ceil(Math.log10(max)); exponent += 1) {
    for (const factor of factors) {
      const tick = Number(`${factor}e${exponent}`);
      if (tick >= min * (1 - 1e-9) && tick <= max * (1 + 1e-9)) ticks.push(tick);
    }
  }
  return ticks;
}

/** Numbers on the vertical axis: every step, or every second or fourth where they would crowd. */
export function axisTicks(quantity: PlotQuantity, range: AxisRange): readonly number[] {
  const { step, scale } = QUANTITIES[quantity];
  if (scale === 'logarithmic') return logarithmicTicks(range);
  let spacing = step;
  while ((range.max - range.min) / spacing > 8) spacing *= 2;
  const first = Math.ceil(range.min / spacing) * spacing;
  return Array.from(
    { length: Math.floor((range.max - first) / spacing) + 1 },
    (_, index) => first + index * spacing + 0,
  );
}

/** A mark on the vertical axis, short: "−12", "2k". */
export function axisNumber(tick: number): string {
  const size = Math.abs(tick);
  const [value, prefix] = size >= 1e6 ? [size / 1e6, 'M'] : size >= 1000 ? [size / 1000, 'k'] : [size, ''];
  return `${tick < 0 ? '−' : ''}${Number(value.toPrecision(3))}${prefix}`;
}
