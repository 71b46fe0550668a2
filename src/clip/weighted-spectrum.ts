import FFT from 'fft.js';
import type { Hertz } from '../units.ts';
import type { Clip } from './clip.ts';
import { kWeighted, kWeighting } from './k-weighting.ts';
import { BLOCK, channelWeight, HOP } from './loudness.ts';
import type { WeightedSpectrum } from './loudness-through.ts';

/** Bands a decade, and where they begin and end. */
const BANDS_PER_DECADE = 24;
const LOWEST: Hertz = 20;
const HIGHEST: Hertz = 23_900;

/**
 * Length of the analysis window in steps of 0.1 s: long enough to tell low notes from what lies a
 * semitone beside them, short enough for the gates.
 */
const WINDOW_HOPS = 3;

function bandCentres(): Float64Array {
  const count = Math.floor(Math.log10(HIGHEST / LOWEST) * BANDS_PER_DECADE);
  return Float64Array.from({ length: count + 1 }, (_, index) => LOWEST * 10 ** (index / BANDS_PER_DECADE));
}

/** Power gain |K(f)|² of both weighting filters, evaluated at the clip's own rate. */
function weightingPower(frequency: Hertz, sampleRate: Hertz): number {
  const angle = (2 * Math.PI * frequency) / sampleRate;
  const size = ([a, b, c]: readonly [number, number, number]): number => {
    const re = a + b * Math.cos(angle) + c * Math.cos(2 * angle);
    const im = b * Math.sin(angle) + c * Math.sin(2 * angle);
    return re * re + im * im;
  };
  return kWeighting(sampleRate).reduce(
    (product, { feedforward, feedback }) => (product * size(feedforward)) / size(feedback),
    1,
  );
}

/** The power of two at or above a number. */
function powerOfTwo(least: number): number {
  return 2 ** Math.ceil(Math.log2(Math.max(2, least)));
}

/**
 * Analyses a clip once, so that {@link loudnessThrough} answers in microseconds.
 *
 * Every tenth of a second is transformed with a Hann window three times as long (squares of such
 * windows overlap to a constant), its K-weighted power sorted into bands; four steps make a block.
 */
export function weightedSpectrum(clip: Clip): WeightedSpectrum {
  const bands = bandCentres();
  const bandCount = bands.length;
  const hop = Math.max(1, Math.round(HOP * clip.sampleRate));
  const perBlock = Math.round(BLOCK / HOP);
  const length = WINDOW_HOPS * hop;
  const size = powerOfTwo(length);
  const fft = new FFT(size);
  const window = Float64Array.from(
    { length },
    (_, index) => 0.5 - 0.5 * Math.cos((2 * Math.PI * (index + 0.5)) / length),
  );
  // A bin between two bands is shared by both, so that a tone on a slope is weighed as where it is.
  const bandOf = new Int16Array(size / 2 + 1).fill(-1);
  const upperShare = new Float64Array(size / 2 + 1);
  const weight = new Float64Array(size / 2 + 1);
  for (let bin = 1; bin <= size / 2; bin += 1) {
    const frequency = (bin * clip.sampleRate) / size;
    const place = Math.log10(frequency / LOWEST) * BANDS_PER_DECADE;
    if (place < 0) continue;
    bandOf[bin] = Math.min(bandCount - 2, Math.floor(place));
    upperShare[bin] = Math.min(1, place - bandOf[bin]!);
    weight[bin] = weightingPower(frequency, clip.sampleRate);
  }
  const steps = Math.max(1, Math.floor(clip.frames / hop));
  const stepPowers = new Float64Array(steps * bandCount);
  const shape = new Float64Array(bandCount);
  const input = new Float64Array(size);
  const output = fft.createComplexArray();
  clip.channels.forEach((channel, index) => {
    const gain = channelWeight(index, clip.channels.length);
    if (gain === 0) return;
    const exact = kWeighted(channel, clip.sampleRate);
    for (let step = 0; step < steps; step += 1) {
      shape.fill(0);
      const start = step * hop - ((length - hop) >> 1); // centred on the step
      for (let at = 0; at < length; at += 1) input[at] = window[at]! * (channel[start + at] ?? 0);
      fft.realTransform(output, input);
      for (let bin = 1; bin <= size / 2; bin += 1) {
        const band = bandOf[bin]!;
        if (band < 0) continue;
        const power = (output[2 * bin]! ** 2 + output[2 * bin + 1]! ** 2) * weight[bin]!;
        shape[band] = shape[band]! + (1 - upperShare[bin]!) * power;
        shape[band + 1] = shape[band + 1]! + upperShare[bin]! * power;
      }
      // The window tells how the power is spread over the bands; how much there is, the samples tell.
      let power = 0;
      for (let frame = step * hop; frame < Math.min((step + 1) * hop, clip.frames); frame += 1)
        power += exact[frame]! ** 2;
      const total = shape.reduce((sum, value) => sum + value, 0);
      const scale = total > 0 ? (gain * power) / (hop * total) : 0;
      for (let band = 0; band < bandCount; band += 1) {
        const at = step * bandCount + band;
        stepPowers[at] = stepPowers[at]! + scale * shape[band]!;
      }
    }
  });
  const short = clip.frames < perBlock * hop;
  const span = short ? steps : perBlock;
  const blocks = short ? 1 : steps - perBlock + 1;
  const powers = new Float32Array(blocks * bandCount);
  for (let block = 0; block < blocks; block += 1) {
    for (let band = 0; band < bandCount; band += 1) {
      let sum = 0;
      for (let part = 0; part < span; part += 1) sum += stepPowers[(block + part) * bandCount + band]!;
      powers[block * bandCount + band] = sum / span;
    }
  }
  return { bands, powers, blocks, short };
}
