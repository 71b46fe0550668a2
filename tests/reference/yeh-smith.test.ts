import { describe, expect, it } from 'vitest';
import type { BlockSettings } from '../../src/blocks/block.ts';
import { defaultSettings } from '../../src/blocks/settings.ts';
import { spansOf, spanTransfer } from '../../src/blocks/span.ts';
import { toneThreeKnob } from '../../src/blocks/tone-three-knob.ts';
import { LINEAR } from '../../src/parts/taper.ts';
import { seededRandom } from '../../src/study/blind-trial.ts';
import { rotation } from '../../src/units.ts';

/** Part values as the paper names them, and the three positions t, m and l. */
interface Network {
  readonly C1: number;
  readonly C2: number;
  readonly C3: number;
  readonly R1: number;
  readonly R2: number;
  readonly R3: number;
  readonly R4: number;
  readonly t: number;
  readonly m: number;
  readonly l: number;
}

/**
 * Coefficients of H(s) = (b1·s + b2·s² + b3·s³)/(1 + a1·s + a2·s² + a3·s³), D. T. Yeh and J. O. Smith,
 * DAFx-06, Montreal, 2006 (from memory): ideal source, no load; t treble, m middle, l bass (linear).
 */
function closedForm({ C1, C2, C3, R1, R2, R3, R4, t, m, l }: Network): { b: number[]; a: number[] } {
  const b1 = t * C1 * R1 + m * C3 * R3 + l * (C1 * R2 + C2 * R2) + (C1 * R3 + C2 * R3);
  // Grouped so that nothing is subtracted (m − m² is m·(1 − m), and so on): the published sums lose
  // digits in double precision at the stops, and this would then test the formula, not the engine.
  const rest = 1 - m;
  const b2 =
    t * (C1 * C2 * R1 * R4 + C1 * C3 * R1 * R4) +
    m * rest * (C1 * C3 * R3 * R3 + C2 * C3 * R3 * R3) +
    m * C1 * C3 * R1 * R3 +
    l * (C1 * C2 * R1 * R2 + C1 * C2 * R2 * R4 + C1 * C3 * R2 * R4) +
    l * m * (C1 * C3 * R2 * R3 + C2 * C3 * R2 * R3) +
    (C1 * C2 * R1 * R3 + C1 * C2 * R3 * R4 + C1 * C3 * R3 * R4);
  const b3 =
    l * m * (C1 * C2 * C3 * R1 * R2 * R3 + C1 * C2 * C3 * R2 * R3 * R4) +
    m * rest * (C1 * C2 * C3 * R1 * R3 * R3 + C1 * C2 * C3 * R3 * R3 * R4) +
    t * rest * C1 * C2 * C3 * R1 * R3 * R4 +
    t * l * C1 * C2 * C3 * R1 * R2 * R4;
  const a1 = C1 * R1 + C1 * R3 + C2 * R3 + C2 * R4 + C3 * R4 + m * C3 * R3 + l * (C1 * R2 + C2 * R2);
  const a2 =
    m * C1 * C3 * R1 * R3 +
    rest * C2 * C3 * R3 * R4 +
    m * rest * (C1 * C3 * R3 * R3 + C2 * C3 * R3 * R3) +
    l * m * (C1 * C3 * R2 * R3 + C2 * C3 * R2 * R3) +
    l * (C1 * C2 * R2 * R4 + C1 * C2 * R1 * R2 + C1 * C3 * R2 * R4 + C2 * C3 * R2 * R4) +
    (C1 * C2 * R1 * R4 + C1 * C3 * R1 * R4 + C1 * C2 * R3 * R4 + C1 * C2 * R1 * R3 + C1 * C3 * R3 * R4);
  const a3 =
    l * m * (C1 * C2 * C3 * R1 * R2 * R3 + C1 * C2 * C3 * R2 * R3 * R4) +
    m * rest * (C1 * C2 * C3 * R1 * R3 * R3 + C1 * C2 * C3 * R3 * R3 * R4) +
    l * C1 * C2 * C3 * R1 * R2 * R4 +
    rest * C1 * C2 * C3 * R1 * R3 * R4;
  return { b: [0, b1, b2, b3], a: [1, a1, a2, a3] };
}

function engine(network: Network): { b: number[]; a: number[] } {
  const { C1, C2, C3, R1, R2, R3, R4, t, m, l } = network;
  const settings: BlockSettings = {
    ...defaultSettings(toneThreeKnob),
    parts: {
      ...defaultSettings(toneThreeKnob).parts,
      trebleCap: C1,
      bassCap: C2,
      midCap: C3,
      treblePot: R1,
      bassPot: R2,
      middlePot: R3,
      slope: R4,
    },
    knobs: { treble: rotation(t), middle: rotation(m), bass: rotation(l) },
    tapers: { treble: LINEAR, middle: LINEAR, bass: LINEAR },
    choices: { middleWiring: 'wiper', load: 'none' },
  };
  const [span] = spansOf([{ block: toneThreeKnob, settings }]);
  const { numerator, denominator } = spanTransfer(span!).transfer;
  const filled = (coefficients: readonly number[]): number[] => {
    const scaled = coefficients.map((value) => value / denominator[0]!);
    return Array.from({ length: 4 }, (_, power) => scaled[power] ?? 0);
  };
  return { b: filled(numerator), a: filled(denominator) };
}

describe('three-knob network against the published closed form', () => {
  it('agrees to 1e-12 at 1,000 random values and positions, end stops included', () => {
    const random = seededRandom(2006);
    const between = (low: number, high: number) => low * (high / low) ** random();
    const position = () => {
      const draw = random();
      return draw < 0.15 ? 0 : draw > 0.85 ? 1 : random();
    };
    let worst = 0;
    for (let index = 0; index < 1000; index += 1) {
      const network: Network = {
        C1: between(50e-12, 5e-9),
        C2: between(1e-9, 1e-6),
        C3: between(1e-9, 1e-6),
        R1: between(50e3, 1e6),
        R2: between(100e3, 2e6),
        R3: between(5000, 100e3),
        R4: between(10e3, 220e3),
        t: position(),
        m: position(),
        l: position(),
      };
      const [expected, got] = [closedForm(network), engine(network)];
      for (const side of ['b', 'a'] as const) {
        expected[side].forEach((value, power) => {
          const scale = Math.abs(value);
          if (scale === 0) expect(got[side][power]).toBe(0);
          else worst = Math.max(worst, Math.abs(got[side][power]! - value) / scale);
        });
      }
    }
    // Some twenty products of seven factors on either side, each rounded: some 1e-15 in all.
    expect(worst).toBeLessThan(1e-12);
  });
});
