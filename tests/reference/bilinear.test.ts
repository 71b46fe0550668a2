import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { bilinear } from '../../src/filter/bilinear.ts';
import { digitalMagnitudeInto, digitalPhaseInto } from '../../src/filter/digital-response.ts';
import { factor } from '../../src/filter/factor.ts';
import type { DigitalSection } from '../../src/filter/section.ts';
import { curveOf } from '../../src/response/curve.ts';
import { gridOf } from '../../src/response/grid.ts';
import type { TransferFunction } from '../../src/transfer-function.ts';

/**
 * The bilinear transform against mpmath (coefficients with 50 digits) and SciPy (magnitudes);
 * `make_bilinear.py` beside this file made the data.
 */
interface Case {
  readonly sampleRateHz: number;
  readonly analogue: TransferFunction;
  readonly digital: DigitalSection;
  readonly scipy: { readonly frequenciesHz: readonly number[]; readonly magnitudeDb: readonly number[] };
}

const reference = JSON.parse(readFileSync(new URL('bilinear.json', import.meta.url), 'utf8')) as {
  readonly cases: readonly Case[];
};

const orderOf = ({ analogue }: Case) => analogue.denominator.length - 1;
const titled = (cases: readonly Case[]) =>
  cases.map((entry) => [orderOf(entry), entry.sampleRateHz, entry] as const);
const short = titled(reference.cases.filter((entry) => orderOf(entry) <= 3));
const all = titled(reference.cases);

const sectionsOf = ({ analogue, sampleRateHz }: Case) =>
  factor(analogue).map((section) => bilinear(section, sampleRateHz));

function magnitudes(entry: Case): Float64Array {
  const frequencies = Float64Array.from(entry.scipy.frequenciesHz);
  const out = new Float64Array(frequencies.length);
  digitalMagnitudeInto(out, sectionsOf(entry), frequencies, entry.sampleRateHz);
  return out;
}

/**
 * How far rounding the coefficients once can move |P(e^jω)|, relative: half a unit of each against
 * what is left of their sum. Near z = 1 nearly everything cancels, the more so the more poles lie there.
 */
function roundingOf(coefficients: readonly number[], angle: number): number {
  let [re, im, sizes] = [0, 0, 0];
  coefficients.forEach((value, delay) => {
    re += value * Math.cos(delay * angle);
    im -= value * Math.sin(delay * angle);
    sizes += Math.abs(value);
  });
  return (Number.EPSILON * sizes) / Math.hypot(re, im);
}

/** The same for a cascade, numerators and denominators, with the roundings of a few operations. */
function cascadeRounding(sections: readonly DigitalSection[], frequency: number, sampleRate: number): number {
  const angle = (2 * Math.PI * frequency) / sampleRate;
  return sections.reduce(
    (sum, { feedforward, feedback }) => sum + roundingOf(feedforward, angle) + roundingOf(feedback, angle),
    0,
  );
}

describe('the bilinear transform against mpmath and SciPy', () => {
  it('reads orders 1 to 5 at four rates', () => {
    expect(new Set(reference.cases.map(orderOf))).toEqual(new Set([1, 2, 3, 4, 5]));
    expect(new Set(reference.cases.map((entry) => entry.sampleRateHz)).size).toBe(4);
  });

  it.each(short)('order %i at %i Hz: coefficients to the last digits', (_, __, entry) => {
    const [section, ...more] = sectionsOf(entry);
    expect(more).toEqual([]);
    for (const side of ['feedforward', 'feedback'] as const) {
      const scale = Math.max(...entry.digital[side].map(Math.abs));
      entry.digital[side].forEach((value, index) => {
        // Four terms summed and one division: a few roundings of the largest coefficient.
        expect(Math.abs(section![side][index]! - value)).toBeLessThan(4 * Number.EPSILON * scale);
      });
    }
  });

  it.each(all)('order %i at %i Hz: SciPy’s magnitude', (order, rate, entry) => {
    // SciPy evaluates one direct form in double precision, and that form drifts where it is long and
    // its poles crowd near z = 1: order 5 at 192 kHz is off by 1e-5 dB at 20 Hz. So orders 4 and 5 are
    // compared factored on our side, and as well as SciPy's own side allows; the exact comparison for
    // them is the identity below.
    const digital = [entry.digital];
    const [ours, theirs] = [magnitudes(entry), entry.scipy.magnitudeDb];
    entry.scipy.frequenciesHz.forEach((frequency, index) => {
      const drift = 20 * Math.log10(1 + cascadeRounding(digital, frequency, rate));
      expect(Math.abs(ours[index]! - theirs[index]!), `${frequency} Hz`).toBeLessThan(1e-9 + 4 * drift);
      if (order <= 2) expect(Math.abs(ours[index]! - theirs[index]!)).toBeLessThan(1e-9);
    });
  });
});

describe('the frequency mapping H_d(e^jω) = H(j·2fs·tan(ω/2fs))', () => {
  it.each(all)('order %i at %i Hz, in magnitude and phase', (order, rate, entry) => {
    const frequencies = Float64Array.of(20, 82.4, 440, 1000, 3300, 10000, 18000, 0.49 * rate);
    const sections = sectionsOf(entry);
    const mapped = gridOf(
      frequencies.map((frequency) => (rate / Math.PI) * Math.tan((Math.PI * frequency) / rate)),
    );
    const expected = curveOf(entry.analogue, mapped, { phase: true });
    const magnitude = new Float64Array(frequencies.length);
    const phase = new Float64Array(frequencies.length);
    digitalMagnitudeInto(magnitude, sections, frequencies, rate);
    digitalPhaseInto(phase, sections, frequencies, rate);
    frequencies.forEach((frequency, index) => {
      // 1e-9, and what rounding the digital coefficients to doubles costs: it is the filter itself
      // that differs by this, and no double-precision coefficients could do better.
      const tolerance = 1e-9 + cascadeRounding(sections, frequency, rate);
      const ratio = 10 ** ((magnitude[index]! - expected.magnitude[index]!) / 20);
      expect(Math.abs(ratio - 1), `${frequency} Hz`).toBeLessThan(tolerance);
      const radians = ((phase[index]! - expected.phase![index]!) * Math.PI) / 180;
      expect(Math.abs(radians), `${frequency} Hz`).toBeLessThan(tolerance);
      // From the lowest note of the usual instruments up, and in factored form, 1e-9 holds as it stands.
      if (order > 3 && frequency > 80) expect(Math.abs(ratio - 1)).toBeLessThan(1e-9);
    });
  });
});
