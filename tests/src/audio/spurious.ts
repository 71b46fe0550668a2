/** Modified Bessel function of the first kind, order 0, by its power series. */
function bessel(x: number): number {
  let term = 1;
  let sum = 1;
  for (let index = 1; term > 1e-17 * sum; index += 1) {
    term *= (x / (2 * index)) ** 2;
    sum += term;
  }
  return sum;
}

/**
 * A high-pass by the windowed sinc method with a Kaiser window of 150 dB (J. F. Kaiser, Proc. IEEE
 * ISCAS 1974; from memory): passes from 5 kHz, and stops below 4 kHz what stands 150 dB above it.
 */
function highPass(sampleRate: number): Float64Array {
  const beta = 0.1102 * (150 - 8.7);
  const half = Math.ceil((150 - 8) / (2.285 * 2 * Math.PI * (1000 / sampleRate)) / 2);
  const corner = 4500 / sampleRate;
  return Float64Array.from({ length: 2 * half + 1 }, (_, index) => {
    const place = index - half;
    const sinc = place === 0 ? 2 * corner : Math.sin(2 * Math.PI * corner * place) / (Math.PI * place);
    const window = bessel(beta * Math.sqrt(1 - (place / half) ** 2)) / bessel(beta);
    return ((place === 0 ? 1 : 0) - sinc) * window;
  });
}

/** What a recording of something low holds above 5 kHz, in dB below its own energy. */
export interface Spurious {
  /** Energy above 5 kHz over all energy. */
  readonly energy: number;
  /** Largest sample above 5 kHz over the largest sample. */
  readonly peak: number;
}

/**
 * Measures clicks: a click is what a low tone cannot have, energy above 5 kHz.
 *
 * @param from first frame that counts; the filter sees what is before it, so that the cut itself
 *   is no click. Likewise for `to`.
 */
export function spurious(samples: Float32Array, sampleRate: number, from = 0, to = samples.length): Spurious {
  const filter = highPass(sampleRate);
  const half = filter.length >> 1;
  let above = 0;
  let all = 0;
  let peakAbove = 0;
  let peak = 0;
  for (let index = from; index < to; index += 1) {
    let sum = 0;
    const first = Math.max(0, index + half - samples.length + 1);
    const last = Math.min(filter.length - 1, index + half);
    for (let tap = first; tap <= last; tap += 1) sum += filter[tap]! * samples[index + half - tap]!;
    above += sum * sum;
    all += samples[index]! ** 2;
    peakAbove = Math.max(peakAbove, Math.abs(sum));
    peak = Math.max(peak, Math.abs(samples[index]!));
  }
  return { energy: 10 * Math.log10(above / all), peak: 20 * Math.log10(peakAbove / peak) };
}
