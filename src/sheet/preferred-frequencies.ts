import type { Hertz } from '../units.ts';

/** One decade of the third-octave series of ISO 266 (from memory). */
const DECADE: readonly Hertz[] = [10, 12.5, 16, 20, 25, 31.5, 40, 50, 63, 80];

/**
 * Third-octave preferred frequencies of ISO 266 in a band, ends included, ascending.
 *
 * @param from lowest frequency in hertz, at least 10. @param to highest, under 100 kHz.
 */
export function preferredFrequencies(from: Hertz, to: Hertz): readonly Hertz[] {
  return [1, 10, 100, 1000]
    .flatMap((factor) => DECADE.map((frequency) => frequency * factor))
    .filter((frequency) => frequency >= from && frequency <= to);
}
