import { serve } from '../audio/worker-port.ts';
import type { Clip } from '../clip/clip.ts';
import type { WeightedSpectrum } from '../clip/loudness-through.ts';
import { type Overview, overviewOf } from '../clip/overview.ts';
import { weightedSpectrum } from '../clip/weighted-spectrum.ts';

/** What the page asks: a waveform of so many buckets, or the spectrum that loudness is told from. */
export type ClipQuestion =
  | { readonly kind: 'overview'; readonly clip: Clip; readonly buckets: number }
  | { readonly kind: 'spectrum'; readonly clip: Clip };

serve<ClipQuestion, Overview | WeightedSpectrum>((question) =>
  question.kind === 'overview'
    ? { answer: overviewOf(question.clip, question.buckets), transfer: [] }
    : { answer: weightedSpectrum(question.clip), transfer: [] },
);
