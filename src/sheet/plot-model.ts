import type { Hertz } from '../units.ts';

/** What a plot's vertical axis is. */
export type PlotQuantity = 'magnitude' | 'phase' | 'difference' | 'impedance';

/** A curve to draw: told apart by colour, dash and letter. */
export interface PlotCurve {
  readonly id: string;
  /** Drawn at the curve's end; may be empty for helping lines. */
  readonly letter: string;
  /** Name in legends and tables. */
  readonly label: string;
  /** Letter of the palette, a to h, or `soft` for helping lines. */
  readonly colour: 'a' | 'b' | 'c' | 'd' | 'e' | 'f' | 'g' | 'h' | 'soft';
  /** Lengths of strokes and gaps in pixels; empty for a solid line. */
  readonly dash: readonly number[];
  readonly strength: 'strong' | 'normal' | 'faint';
  /** Hertz, ascending. */
  readonly frequencies: Float64Array;
  /** In the unit of the quantity, as many as `frequencies`; not finite where there is nothing to draw. */
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

/** How a quantity is named, written and divided on its axis. */
export interface QuantityTraits {
  readonly name: string;
  readonly unit: string;
  /** A logarithmic axis is divided 1, 2, 5; its `step` and `least` are not used. */
  readonly scale: 'linear' | 'logarithmic';
  /** The axis begins and ends on multiples of this. */
  readonly step: number;
  /** Shortest axis. */
  readonly least: number;
  /** Curves that fall without end are cut this far under the highest point. */
  readonly deepest: number;
  /** Decimals of a value that is read off. */
  readonly digits: number;
}

/** What each quantity is measured in, and how its axis is divided. */
export const QUANTITIES: Readonly<Record<PlotQuantity, QuantityTraits>> = {
  magnitude: { name: 'Level', unit: 'dB', scale: 'linear', step: 6, least: 24, deepest: 60, digits: 1 },
  phase: { name: 'Phase', unit: '°', scale: 'linear', step: 45, least: 90, deepest: 1440, digits: 0 },
  difference: {
    name: 'Digital less analogue',
    unit: 'dB',
    scale: 'linear',
    step: 1,
    least: 2,
    deepest: 12,
    digits: 2,
  },
  impedance: {
    name: 'Impedance',
    unit: 'Ω',
    scale: 'logarithmic',
    step: 1,
    least: 1,
    deepest: 1e9,
    digits: 1,
  },
};

/** A curve's value at a frequency, interpolated along the logarithmic axis; NaN outside it. */
export function valueAt(
  { frequencies, values }: Pick<PlotCurve, 'frequencies' | 'values'>,
  frequency: Hertz,
): number {
  let low = 0;
  let high = frequencies.length - 1;
  if (high < 0 || !(frequency >= frequencies[0]! && frequency <= frequencies[high]!)) return Number.NaN;
  while (high - low > 1) {
    const middle = (low + high) >> 1;
    if (frequencies[middle]! <= frequency) low = middle;
    else high = middle;
  }
  // Points are returned as they are: between an infinite one and its neighbour there is no value.
  if (frequency === frequencies[low]) return values[low]!;
  if (frequency === frequencies[high]) return values[high]!;
  const share = Math.log(frequency / frequencies[low]!) / Math.log(frequencies[high]! / frequencies[low]!);
  return values[low]! + share * (values[high]! - values[low]!);
}

/** A number with a real minus sign and the quantity's digits: "−9.8"; a dash where there is none. */
export function plotNumber(value: number, quantity: PlotQuantity, signed = false): string {
  if (Number.isNaN(value)) return '–';
  if (!Number.isFinite(value)) return value > 0 ? '∞' : '−∞';
  const text = Math.abs(value).toFixed(QUANTITIES[quantity].digits);
  const isZero = Number(text) === 0;
  return `${value < 0 && !isZero ? '−' : signed && !isZero ? '+' : ''}${text}`;
}

/** A value with its unit, a thin space between them: "−9.8 dB", "45°". */
export function plotValue(value: number, quantity: PlotQuantity, signed = false): string {
  const { unit } = QUANTITIES[quantity];
  return `${plotNumber(value, quantity, signed)}${unit === '°' ? '' : '\u202f'}${unit}`;
}

/** A frequency as people say it: "560 Hz", "1.25 kHz". */
export function frequencyText(frequency: Hertz): string {
  const rounded = Number(frequency.toPrecision(3));
  return rounded >= 1000 ? `${rounded / 1000}\u202fkHz` : `${rounded}\u202fHz`;
}
