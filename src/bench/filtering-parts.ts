import { digitalMagnitudeInto } from '../filter/digital-response.ts';
import { phaseInto } from '../response/curve.ts';
import { DEFAULT_GRID } from '../response/grid.ts';
import type { Hertz } from '../units.ts';
import type { LineAnalysis } from './line-analysis.ts';
import { lineFilters } from './line-filters.ts';

export { lineFilters } from './line-filters.ts';
export { matchingGain } from './matching.ts';

/** Level of the digital filters less that of the circuit, on the plot's grid; NaN above half the sample rate. */
export function lineDifference({ spans, response }: LineAnalysis, sampleRate: Hertz): Float64Array {
  const sum = response.magnitude.map((value) => -value);
  const share = new Float64Array(sum.length);
  for (const { sections } of lineFilters(spans, sampleRate)) {
    digitalMagnitudeInto(share, sections, DEFAULT_GRID.frequencies, sampleRate);
    for (let point = 0; point < sum.length; point += 1) sum[point] = sum[point]! + share[point]!;
  }
  return sum;
}

/** Phase of a line in degrees on the plot's grid, unwrapped. */
export function linePhase({ spans }: LineAnalysis): Float64Array {
  const sum = new Float64Array(DEFAULT_GRID.frequencies.length);
  const share = new Float64Array(sum.length);
  for (const { transfer } of spans) {
    phaseInto(share, transfer, DEFAULT_GRID);
    for (let point = 0; point < sum.length; point += 1) sum[point] = sum[point]! + share[point]!;
  }
  return sum;
}
