import { readFigures } from '../response/figures.ts';
import { lineLevel } from '../response/line-response.ts';
import { frequencyText, plotNumber } from '../sheet/plot-model.ts';
import type { Hertz } from '../units.ts';
import type { LineAnalysis } from './line-analysis.ts';

/** A figure in words, ready to be shown. */
export interface FigureText {
  readonly label: string;
  readonly value: string;
  readonly note?: string;
}

/** The figures that people quote of a line, read off its exact response, and the level at the cursor. */
export function lineFigures({ spans }: LineAnalysis, cursor: Hertz): readonly FigureText[] {
  const level = (frequency: Hertz): number => lineLevel(spans, frequency);
  const decibels = (value: number, signed = false): string =>
    `${plotNumber(value, 'magnitude', signed)}\u202fdB`;
  const { levelAt1k, midDip, liftAt100, liftAt5k } = readFigures(level);
  return [
    { label: `At the cursor, ${frequencyText(cursor)}`, value: decibels(level(cursor)) },
    { label: 'Level at 1\u202fkHz', value: decibels(levelAt1k) },
    midDip === undefined
      ? { label: 'Mid dip', value: 'none' }
      : {
          label: 'Mid dip',
          value: decibels(midDip.level),
          note: `at ${frequencyText(midDip.frequency)}, ${plotNumber(midDip.depth, 'magnitude')}\u202fdB deep`,
        },
    { label: '100\u202fHz over 1\u202fkHz', value: decibels(liftAt100, true) },
    { label: '5\u202fkHz over 1\u202fkHz', value: decibels(liftAt5k, true) },
  ];
}
