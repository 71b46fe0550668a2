import { digitalMagnitudeInto } from '../filter/digital-response.ts';
import { responseAt } from '../response/curve.ts';
import { DEFAULT_GRID } from '../response/grid.ts';
import { lineLevel } from '../response/line-response.ts';
import { type CurveRow, curveCsv } from '../sheet/curve-csv.ts';
import type { Degrees, Hertz } from '../units.ts';
import type { LineAnalysis } from './line-analysis.ts';
import { lineFilters } from './line-filters.ts';

/** Phase of a line at a frequency as a principal value, above −180 to 180 degrees. */
export function principalPhase({ spans }: Pick<LineAnalysis, 'spans'>, frequency: Hertz): Degrees {
  const sum = spans.reduce((total, { transfer }) => {
    const { re, im } = responseAt(transfer, frequency);
    return total + Math.atan2(im, re);
  }, 0);
  const wrapped = sum - 2 * Math.PI * Math.ceil((sum - Math.PI) / (2 * Math.PI));
  return (wrapped * 180) / Math.PI + 0;
}

/** The line's curve as CSV: the circuit, and the digital filter at a sample rate beside it. */
export function lineCsv(analysis: LineAnalysis, sampleRate: Hertz): string {
  const { frequencies } = DEFAULT_GRID;
  const digital = new Float64Array(frequencies.length);
  const share = new Float64Array(frequencies.length);
  for (const { sections } of lineFilters(analysis.spans, sampleRate)) {
    digitalMagnitudeInto(share, sections, frequencies, sampleRate);
    for (let point = 0; point < digital.length; point += 1) digital[point] = digital[point]! + share[point]!;
  }
  const rows = Array.from(
    frequencies,
    (frequency, index): CurveRow => ({
      frequency,
      magnitude: lineLevel(analysis.spans, frequency),
      phase: principalPhase(analysis, frequency),
      digital: digital[index],
    }),
  );
  return curveCsv(rows, true);
}
