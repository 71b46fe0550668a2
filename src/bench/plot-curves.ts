import type { SlotName } from '../blocks/block.ts';
import type { SpanTransfer } from '../blocks/span.ts';
import type { VoicingLetter } from '../design/design.ts';
import { digitalMagnitudeInto } from '../filter/digital-response.ts';
import { phaseInto } from '../response/curve.ts';
import { DEFAULT_GRID } from '../response/grid.ts';
import { DASHES, type PlotCurve, type PlotQuantity } from '../sheet/plot-model.ts';
import type { Hertz } from '../units.ts';
import type { LineAnalysis } from './line-analysis.ts';
import { lineFilters } from './line-filters.ts';

/** A voicing as the plot needs it. */
export interface DrawnVoicing {
  readonly letter: VoicingLetter;
  readonly name: string;
  readonly colour: VoicingLetter;
  readonly analysis: LineAnalysis;
}

/** What is to be drawn. */
export interface PlotRequest {
  readonly view: PlotQuantity;
  readonly voicings: readonly DrawnVoicing[];
  readonly active: VoicingLetter;
  readonly pinned: { readonly name: string; readonly analysis: LineAnalysis } | undefined;
  /** Draw each block's share of the active voicing too. */
  readonly showBlocks: boolean;
  /** Rate of the digital filters, for the view `difference`. */
  readonly sampleRate: Hertz;
}

const BLOCK_LETTERS: Readonly<Record<SlotName, string>> = {
  input: 'in',
  stage: 'st',
  volume: 'vol',
  driver: 'drv',
  tone: 'tone',
  power: 'pwr',
  speaker: 'spk',
};
const BLOCK_DASHES: Readonly<Record<SlotName, readonly number[]>> = {
  input: [1, 3],
  stage: [6, 2, 1, 2],
  volume: [3, 2],
  driver: [1, 5],
  tone: [4, 3],
  power: [8, 3],
  speaker: [2, 2],
};

function linePhase(spans: readonly SpanTransfer[]): Float64Array {
  const sum = new Float64Array(DEFAULT_GRID.frequencies.length);
  const share = new Float64Array(sum.length);
  for (const { transfer } of spans) {
    phaseInto(share, transfer, DEFAULT_GRID);
    for (let point = 0; point < sum.length; point += 1) sum[point] = sum[point]! + share[point]!;
  }
  return sum;
}

/** Level of the digital filters less that of the circuit; NaN above half the sample rate. */
function lineDifference({ spans, response }: LineAnalysis, sampleRate: Hertz): Float64Array {
  const sum = response.magnitude.map((value) => -value);
  const share = new Float64Array(sum.length);
  for (const { sections } of lineFilters(spans, sampleRate)) {
    digitalMagnitudeInto(share, sections, DEFAULT_GRID.frequencies, sampleRate);
    for (let point = 0; point < sum.length; point += 1) sum[point] = sum[point]! + share[point]!;
  }
  return sum;
}

function valuesOf(analysis: LineAnalysis, { view, sampleRate }: PlotRequest): Float64Array {
  if (view === 'magnitude') return analysis.response.magnitude;
  return view === 'phase' ? linePhase(analysis.spans) : lineDifference(analysis, sampleRate);
}

/** The curves of a plot, faint ones first. */
export function plotCurves(request: PlotRequest): readonly PlotCurve[] {
  const { frequencies } = DEFAULT_GRID;
  const curves: PlotCurve[] = [];
  const active = request.voicings.find((voicing) => voicing.letter === request.active);
  if (request.pinned !== undefined) {
    curves.push({
      id: 'pinned',
      letter: 'ref',
      label: request.pinned.name,
      colour: 'soft',
      dash: [3, 4],
      strength: 'normal',
      frequencies,
      values: valuesOf(request.pinned.analysis, request),
    });
  }
  if (request.showBlocks && request.view === 'magnitude' && active !== undefined) {
    for (const { slot, magnitude } of active.analysis.response.blocks) {
      curves.push({
        id: `block-${slot}`,
        letter: BLOCK_LETTERS[slot],
        label: slot,
        colour: 'soft',
        dash: BLOCK_DASHES[slot],
        strength: 'faint',
        frequencies,
        values: magnitude,
      });
    }
  }
  for (const { letter, name, colour, analysis } of request.voicings) {
    const drawn = colour.toLowerCase() as 'a' | 'b' | 'c' | 'd' | 'e' | 'f' | 'g' | 'h';
    curves.push({
      id: letter,
      letter,
      label: name,
      colour: drawn,
      dash: DASHES[drawn],
      strength: letter === request.active ? 'strong' : 'normal',
      frequencies,
      values: valuesOf(analysis, request),
    });
  }
  return curves;
}
