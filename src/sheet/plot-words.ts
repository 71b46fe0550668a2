import {
  frequencyText,
  type PlotCurve,
  type PlotQuantity,
  plotValue,
  QUANTITIES,
  valueAt,
} from './plot-model.ts';

/** Where a curve is quoted. */
const QUOTED = [100, 1000, 5000] as const;

function lowest({ frequencies, values }: PlotCurve): { readonly frequency: number; readonly value: number } {
  let best = -1;
  for (let index = 0; index < values.length; index += 1) {
    if (Number.isFinite(values[index]) && (best < 0 || values[index]! < values[best]!)) best = index;
  }
  return { frequency: frequencies[best] ?? Number.NaN, value: values[best] ?? Number.NaN };
}

/**
 * What a plot shows, in words, for those who do not see it: each lettered curve at 100 Hz, 1 kHz and
 * 5 kHz, and its lowest point. One sentence a curve.
 */
export function plotSentences(curves: readonly PlotCurve[], quantity: PlotQuantity): string {
  const { name, unit } = QUANTITIES[quantity];
  const lettered = curves.filter((curve) => curve.letter !== '');
  const sentences = lettered.map((curve) => {
    const quoted = QUOTED.map(
      (frequency) => `${plotValue(valueAt(curve, frequency), quantity)} at ${frequencyText(frequency)}`,
    );
    const low = lowest(curve);
    const bottom = Number.isFinite(low.value)
      ? `; lowest ${plotValue(low.value, quantity)} at ${frequencyText(low.frequency)}`
      : '';
    return `${curve.letter} ${curve.label}: ${quoted.join(', ')}${bottom}.`;
  });
  const measured = unit === '°' ? 'degrees' : unit;
  return [`${name} in ${measured} from 10 Hz to 40 kHz.`, ...sentences].join(' ');
}
