import FFT from 'fft.js';
import type { Element, Wiring } from '../../src/circuit/wiring.ts';
import { solveNodal } from '../src/circuit/nodal-solver.ts';

/** Values of the default line that the tests change. */
export interface LineValues {
  readonly treble: number;
  readonly trebleCap: number;
  readonly presence: number;
}

/**
 * The default line written down once more by hand, as two circuits: source, tone network and load;
 * amplifier with feedback and presence. Nothing of the program's blocks is used.
 */
function circuits({ treble, trebleCap, presence }: LineValues): {
  tone: [Wiring, number[]];
  power: [Wiring, number[]];
} {
  const of = (
    kind: 'resistor' | 'capacitor',
    name: string,
    a: string,
    b: string,
    value: number,
  ): [Element, number] => [{ kind, name, nodes: [a, b] }, value];
  const bass = (((1 - 0.15) / 0.15) ** 2) ** 0.5; // audio taper of 15 % at half a turn
  const bassShare = (bass - 1) / (bass * bass - 1);
  const tone = [
    of('resistor', 'rs', 'in', 's', 1300),
    of('capacitor', 'c1', 's', 'a', trebleCap),
    of('resistor', 'r1u', 'a', 'o', 250e3 * (1 - treble)),
    of('resistor', 'r1l', 'o', 'b', 250e3 * treble),
    of('resistor', 'r4', 's', 'd', 47e3),
    of('capacitor', 'c2', 'd', 'b', 33e-9),
    of('resistor', 'r2', 'b', 'e', 500e3 * bassShare),
    of('capacitor', 'c3', 'd', 'f', 22e-9),
    of('resistor', 'r3u', 'e', 'f', 12_500),
    of('resistor', 'r3l', 'f', '0', 12_500),
    of('resistor', 'rl', 'o', '0', 1e6),
    of('capacitor', 'cl', 'o', '0', 47e-12),
  ];
  const gain: [Element, number] = [
    { kind: 'voltage-gain', name: 'a', nodes: ['p', '0'], control: ['in', 't'] },
    60,
  ];
  const power = [
    gain,
    of('resistor', 'ro', 'p', 'o', 40),
    of('resistor', 'rl', 'o', '0', 8),
    of('resistor', 'rf', 'o', 't', 27e3),
    of('resistor', 'pu', 't', 'w', 4700 * (1 - presence)),
    of('resistor', 'pl', 'w', '0', 4700 * presence),
    of('capacitor', 'c4', 'w', '0', 100e-9),
  ];
  const wire = (parts: [Element, number][]): [Wiring, number[]] => [
    { elements: parts.map(([element]) => element), source: ['in', '0'], outputs: [['o', '0']] },
    parts.map(([, value]) => value),
  ];
  return { tone: wire(tone), power: wire(power) };
}

/** Complex response of the default line at an angular frequency, power stage relative to 1 kHz. */
export function lineResponseByHand(values: LineValues, omega: number): { re: number; im: number } {
  const { tone, power } = circuits(values);
  const reference = solveNodal(...circuits({ ...values, presence: 0 }).power, 2 * Math.PI * 1000)[0]!;
  const scale = Math.hypot(reference.re, reference.im);
  const [a, b] = [solveNodal(...tone, omega)[0]!, solveNodal(...power, omega)[0]!];
  return { re: (a.re * b.re - a.im * b.im) / scale, im: (a.re * b.im + a.im * b.re) / scale };
}

/**
 * Samples through the default line in the bilinear transform, computed in the frequency domain:
 * `Y(k) = X(k)·H(j·2fs·tan(ω/2))` for every bin of one long transform. No filter coefficient occurs.
 */
export function renderByHand(samples: Float32Array, sampleRate: number, values: LineValues): Float64Array {
  const size = 2 ** Math.ceil(Math.log2(samples.length * 2));
  const fft = new FFT(size);
  const input = new Float64Array(size);
  input.set(samples);
  const spectrum = fft.createComplexArray();
  fft.realTransform(spectrum, input);
  for (let bin = 0; bin <= size / 2; bin += 1) {
    const omega = bin === size / 2 ? 1e12 : 2 * sampleRate * Math.tan((Math.PI * bin) / size);
    const { re, im } = lineResponseByHand(values, omega);
    const [a, b] = [spectrum[2 * bin]!, spectrum[2 * bin + 1]!];
    spectrum[2 * bin] = a * re - b * im;
    spectrum[2 * bin + 1] = a * im + b * re;
  }
  fft.completeSpectrum(spectrum);
  const output = fft.createComplexArray();
  fft.inverseTransform(output, spectrum);
  return Float64Array.from({ length: samples.length }, (_, index) => output[2 * index]!);
}
