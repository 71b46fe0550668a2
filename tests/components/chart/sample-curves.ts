import { DASHES, type PlotCurve } from '../../../src/sheet/plot-model.ts';

const LETTERS = ['a', 'b', 'c', 'd', 'e', 'f'] as const;

/** Six curves of 512 points with a dip, moved by `shift` dB; the first is the strong one. */
export function sampleCurves(shift = 0, count: number = LETTERS.length): readonly PlotCurve[] {
  const frequencies = Float64Array.from({ length: 512 }, (_, index) => 10 * 4000 ** (index / 511));
  return LETTERS.slice(0, count).map((letter, rank) => ({
    id: letter,
    letter: letter.toUpperCase(),
    label: `Voicing ${letter}`,
    colour: letter,
    dash: DASHES[letter],
    strength: rank === 0 ? 'strong' : 'normal',
    frequencies,
    values: frequencies.map(
      (frequency) => shift - 4 - rank / 10 - 8 * Math.exp(-((Math.log2(frequency / 560) / 2) ** 2)),
    ),
  }));
}
