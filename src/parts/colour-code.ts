import { NotchworkError } from '../errors.ts';
import type { Ohms } from '../units.ts';
import { decimalOf, fromDigits } from './decimal.ts';

/** Colour of one band on a resistor. */
export type BandColour =
  | 'black'
  | 'brown'
  | 'red'
  | 'orange'
  | 'yellow'
  | 'green'
  | 'blue'
  | 'violet'
  | 'grey'
  | 'white'
  | 'gold'
  | 'silver'
  | 'pink';

/** What a set of bands says. */
export interface BandReading {
  readonly value: Ohms;
  /** Tolerance in per cent, both ways; 0 for the single black band of a link. */
  readonly tolerance: number;
}

/** Colours of the figures 0 to 9 (IEC 60062, table 1, from memory). */
const FIGURES: readonly BandColour[] = [
  'black',
  'brown',
  'red',
  'orange',
  'yellow',
  'green',
  'blue',
  'violet',
  'grey',
  'white',
];

/** Multiplier bands that are not figures, by decimal exponent. */
const FRACTIONS: Readonly<Record<number, BandColour>> = { [-1]: 'gold', [-2]: 'silver', [-3]: 'pink' };

/** Tolerance bands in per cent (IEC 60062:2016, from memory; grey meant ±0.05 % in older editions). */
const TOLERANCES: readonly (readonly [colour: BandColour, percent: number])[] = [
  ['brown', 1],
  ['red', 2],
  ['orange', 0.05],
  ['yellow', 0.02],
  ['green', 0.5],
  ['blue', 0.25],
  ['violet', 0.1],
  ['grey', 0.01],
  ['gold', 5],
  ['silver', 10],
];

/** Tolerance of four-band resistors that lack the fourth band, in per cent. */
const WITHOUT_BAND = 20;

/**
 * Bands of a resistor after IEC 60062, in reading order: two figures (`bands` 4) or three (5), the
 * multiplier, the tolerance. ±20 % has no tolerance band, so that three bands remain; 0 Ω is one
 * black band, whatever else is asked for (common practice, no source).
 *
 * @param tolerance per cent, both ways.
 * @returns `undefined` where no bands say it: negative or not finite, too many significant digits, a
 * multiplier beyond 10⁻³ to 10⁹, another tolerance, ±20 % with five bands.
 */
export function colourBands(value: Ohms, tolerance: number, bands: 4 | 5): readonly BandColour[] | undefined {
  if (value === 0) return ['black'];
  if (!(value > 0 && Number.isFinite(value))) return undefined;
  const { digits, exponent } = decimalOf(value);
  const figures = bands - 2;
  const power = exponent - figures + 1;
  const multiplier = power < 0 ? FRACTIONS[power] : FIGURES[power];
  const last = TOLERANCES.find(([, percent]) => percent === tolerance)?.[0];
  const isBare = tolerance === WITHOUT_BAND && bands === 4;
  if (digits.length > figures || !multiplier || !(last || isBare)) return undefined;
  const colours = [...digits.padEnd(figures, '0')].map((digit) => FIGURES[Number(digit)]!);
  return [...colours, multiplier, ...(last ? [last] : [])];
}

/** Decimal exponent of a multiplier band, or `undefined`. */
function powerOf(colour: BandColour): number | undefined {
  const figure = FIGURES.indexOf(colour);
  if (figure >= 0) return figure;
  const fraction = Object.entries(FRACTIONS).find(([, name]) => name === colour);
  return fraction && Number(fraction[0]);
}

/**
 * Value and tolerance that bands stand for: the inverse of {@link colourBands}.
 *
 * @param bands 3, 4 or 5 colours in reading order, or one black one.
 * @throws NotchworkError `value-unreadable`, naming the band that cannot be.
 */
export function readColourBands(bands: readonly BandColour[]): BandReading {
  if (bands.length === 1 && bands[0] === 'black') return { value: 0, tolerance: 0 };
  if (bands.length < 3 || bands.length > 5) {
    throw new NotchworkError(
      'value-unreadable',
      `${bands.length} bands say nothing; a resistor has 3, 4 or 5 (or one black band: a link).`,
    );
  }
  const count = bands.length === 5 ? 3 : 2;
  const refuse = (index: number, role: string): never => {
    throw new NotchworkError('value-unreadable', `Band ${index + 1} (${bands[index]}) cannot be ${role}.`);
  };
  const digits = bands.slice(0, count).map((colour, index) => {
    const figure = FIGURES.indexOf(colour);
    return figure < (index === 0 ? 1 : 0)
      ? refuse(index, index === 0 ? 'the first figure' : 'a figure')
      : figure;
  });
  const power = powerOf(bands[count]!) ?? refuse(count, 'a multiplier');
  const last = bands[count + 1];
  const tolerance =
    last === undefined
      ? WITHOUT_BAND
      : (TOLERANCES.find(([colour]) => colour === last)?.[1] ?? refuse(count + 1, 'a tolerance'));
  return { value: fromDigits(digits.join(''), power), tolerance };
}
