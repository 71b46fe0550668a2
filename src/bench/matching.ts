import type { SpanTransfer } from '../blocks/span.ts';
import { loudnessThrough, type WeightedSpectrum } from '../clip/loudness-through.ts';
import { digitalMagnitudeInto } from '../filter/digital-response.ts';
import type { Decibels, Hertz } from '../units.ts';
import { lineFilters } from './line-filters.ts';

/** Farthest that matching turns up or down; beyond it a line passes next to nothing. */
const FARTHEST: Decibels = 60;

/**
 * Gain that makes a line as loud as the clip is without it (ITU-R BS.1770, from the clip's spectrum).
 *
 * @param sampleRate rate at which the line's filters run.
 * @returns undefined where the clip or the line is silent.
 */
export function matchingGain(
  spectrum: WeightedSpectrum,
  spans: readonly SpanTransfer[],
  sampleRate: Hertz,
): Decibels | undefined {
  const flat = new Float64Array(spectrum.bands.length).fill(1);
  const dry = loudnessThrough(spectrum, flat);
  const level = new Float64Array(spectrum.bands.length);
  const share = new Float64Array(spectrum.bands.length);
  for (const { sections } of lineFilters(spans, sampleRate)) {
    digitalMagnitudeInto(share, sections, spectrum.bands, sampleRate);
    for (let band = 0; band < level.length; band += 1) level[band] = level[band]! + share[band]!;
  }
  const wet = loudnessThrough(
    spectrum,
    level.map((decibels) => (Number.isNaN(decibels) ? 0 : 10 ** (decibels / 10))),
  );
  if (dry === undefined || wet === undefined) return undefined;
  return Math.min(Math.max(dry - wet, -FARTHEST), FARTHEST);
}
