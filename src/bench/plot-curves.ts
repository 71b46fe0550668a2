import type { SlotName } from '../blocks/block.ts';
import type { VoicingLetter } from '../design/design.ts';
import { DEFAULT_GRID } from '../response/grid.ts';
import { DASHES, type PlotCurve, type PlotQuantity } from '../sheet/plot-model.ts';
import type { Hertz } from '../units.ts';
import type { Filtering } from './filtering.ts';
import type { LineAnalysis } from './line-analysis.ts';

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
  /** What the views other than the level need; undefined until it is loaded. */
  readonly filtering: Filtering | undefined;
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

function valuesOf(analysis: LineAnalysis, { view, sampleRate, filtering }: PlotRequest): Float64Array {
  if (view === 'magnitude') return analysis.response.magnitude;
  if (filtering === undefined) return new Float64Array(DEFAULT_GRID.frequencies.length).fill(Number.NaN);
  return view === 'phase' ? filtering.linePhase(analysis) : filtering.lineDifference(analysis, sampleRate);
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
