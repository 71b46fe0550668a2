import { describe, expect, it } from 'vitest';
import { driverCathodeFollower } from '../../src/blocks/driver-cathode-follower.ts';
import { driverPlainSource } from '../../src/blocks/driver-plain-source.ts';
import { driverPlate } from '../../src/blocks/driver-plate.ts';
import { inputGrid } from '../../src/blocks/input-grid.ts';
import { sourceImpedance } from '../../src/blocks/source-impedance.ts';
import { stageCommonCathode } from '../../src/blocks/stage-common-cathode.ts';
import { toneThreeKnob } from '../../src/blocks/tone-three-knob.ts';
import { toneTrebleCut } from '../../src/blocks/tone-treble-cut.ts';
import { volumeBright } from '../../src/blocks/volume-bright.ts';
import { impedance } from '../../src/circuit/impedance.ts';
import { polynomialRoots } from '../../src/filter/roots.ts';
import { TRIODE_NAMES, TRIODES } from '../../src/parts/valve.ts';
import { levelOf, responseAt } from '../../src/response/curve.ts';
import { oneSpan, placed } from '../src/blocks/placed.ts';

/**
 * Formulas that every handbook of valve amplifiers gives (here: F. Langford-Smith, Radiotron Designer's
 * Handbook, 4th edition, 1953, chapters 2, 7, 12 and 15, from memory), worked out here by themselves.
 */
const parallel = (...ohms: number[]): number => 1 / ohms.reduce((sum, value) => sum + 1 / value, 0);

const rotating = 2 * Math.PI;

/** Frequencies in hertz of the real zeros or poles, ascending; the ones at 0 left out. */
function corners(coefficients: readonly number[]): number[] {
  const { real, pairs } = polynomialRoots(coefficients);
  expect(pairs).toEqual([]);
  return [...real]
    .map((value) => -value / rotating)
    .filter((value) => value !== 0)
    .sort((a, b) => a - b);
}

const FORMULA = 9; // digits: both sides are the same expression, apart from rounding

function expectRatio(found: number, expected: number, tolerance = 10 ** -FORMULA): void {
  expect(Math.abs(found / expected - 1)).toBeLessThan(tolerance);
}

describe('what drives the network (Langford-Smith, ch. 7 and 12)', () => {
  const TYPED = [
    { mu: 100, gm: 1.6e-3 },
    { mu: 20, gm: 2.5e-3 },
  ];

  it.each(TYPED)('a cathode follower of µ $mu is ra/(µ + 1) beside its resistor, about 1/gm', (parts) => {
    const resistance = parts.mu / parts.gm;
    const driver = placed(driverCathodeFollower, {
      parts: { ...parts, cathodeLoad: 100e3 },
      choices: { valve: 'typed' },
    });
    const found = responseAt(sourceImpedance([driver]), 1000);
    expectRatio(found.re, parallel(resistance / (parts.mu + 1), 100e3));
    expect(found.im).toBeCloseTo(0, 9);
    // 1/gm leaves out the 1 beside µ, and the resistor.
    expectRatio(found.re, 1 / parts.gm, 1 / parts.mu + 1 / (parts.gm * 100e3));
  });

  it.each(TYPED)('a plate of µ $mu is ra beside its load', (parts) => {
    const driver = placed(driverPlate, {
      parts: { ...parts, plateLoad: 100e3 },
      choices: { valve: 'typed', coupling: 'direct' },
    });
    expectRatio(responseAt(sourceImpedance([driver]), 50).re, parallel(parts.mu / parts.gm, 100e3));
  });

  it('gives the figures worked by hand for an ECC83 with 100 kΩ: 615 Ω and 38.5 kΩ', () => {
    const follower = sourceImpedance([placed(driverCathodeFollower)]);
    const plate = sourceImpedance([placed(driverPlate, { choices: { coupling: 'direct' } })]);
    // 62.5 kΩ/101 beside 100 kΩ; 62.5 kΩ beside 100 kΩ; by hand to three digits.
    expect(responseAt(follower, 1000).re).toBeCloseTo(615, 0);
    expect(responseAt(plate, 1000).re / 1e3).toBeCloseTo(38.46, 2);
  });

  it('amplifies by µ·Ra/(ra + Ra) from the plate and by µ·Rk/(ra + (µ + 1)·Rk) from the cathode', () => {
    for (const valve of TRIODE_NAMES) {
      const { gm, plateResistance } = TRIODES[valve].published;
      const mu = gm * plateResistance;
      const plate = oneSpan(placed(driverPlate, { choices: { valve, coupling: 'direct' } }));
      expectRatio(plate.reference, (mu * 100e3) / (plateResistance + 100e3));
      const follower = oneSpan(placed(driverCathodeFollower, { choices: { valve } }));
      expectRatio(follower.reference, (mu * 100e3) / (plateResistance + (mu + 1) * 100e3));
    }
  });

  it('a follower loses less than a plate in the network behind it (common practice, no source)', () => {
    for (const bass of [0, 0.5, 1]) {
      const tone = placed(toneThreeKnob, { knobs: { treble: 0.5, bass, middle: 0.5 } });
      const loss = (driver: typeof tone) => -levelOf(oneSpan(driver, tone).transfer)(1000);
      const follower = loss(placed(driverCathodeFollower));
      expect(follower).toBeGreaterThan(0);
      expect(follower).toBeLessThan(loss(placed(driverPlate)) - 1); // dB: it is heard
      expect(follower).toBeLessThan(loss(placed(driverPlainSource, { parts: { sourceResistance: 38e3 } })));
    }
  });
});

describe('the Miller effect (J. M. Miller, Scientific Papers of the Bureau of Standards 351, 1920)', () => {
  /** Input capacitance at low frequencies of a valve with its capacitances drawn in. */
  function drawnIn(
    valve: (typeof TRIODE_NAMES)[number],
    plateLoad: number,
  ): { gain: number; farads: number } {
    const { capacitance, published } = TRIODES[valve];
    const elements = [
      { kind: 'capacitor', name: 'cgk', nodes: ['g', '0'] },
      { kind: 'capacitor', name: 'cgp', nodes: ['g', 'p'] },
      { kind: 'transconductance', name: 'gm', nodes: ['p', '0'], control: ['g', '0'] },
      { kind: 'resistor', name: 'load', nodes: ['p', '0'] },
    ] as const;
    const load = parallel(published.plateResistance, plateLoad);
    const values = [capacitance.gridCathode, capacitance.gridPlate, published.gm, load];
    const seen = impedance({ elements, source: ['g', '0'], outputs: [] }, values, ['g', '0'], 'removed');
    return { gain: published.gm * load, farads: -1 / (rotating * 10 * responseAt(seen, 10).im) };
  }

  it.each(TRIODE_NAMES)(
    '%s: the block’s corner is that of the valve with its capacitances drawn in',
    (valve) => {
      const { gain, farads } = drawnIn(valve, 100e3);
      const input = placed(inputGrid, {
        parts: {
          sourceResistance: 0,
          cableCapacitance: 0,
          wiringCapacitance: 0,
          stopper: 68e3,
          stageGain: gain,
        },
        choices: { valve },
      });
      const [corner] = corners(oneSpan(input).transfer.denominator);
      // At 10 Hz the drawn-in capacitance is short of its limit by (10 Hz over some MHz)².
      expectRatio(corner!, 1 / (rotating * 68e3 * farads), 1e-6);
    },
  );

  it('makes 91.2 pF of an ECC83 with a gain of 55, by hand: 1.6 + 1.6 · 56', () => {
    const input = placed(inputGrid, {
      parts: { sourceResistance: 0, cableCapacitance: 0, wiringCapacitance: 0, stageGain: 55 },
    });
    const [corner] = corners(oneSpan(input).transfer.denominator);
    expectRatio(corner!, 1 / (rotating * 68e3 * 91.2e-12));
  });

  it('a cable on its own rolls off at 1/(2πRC), the leak beside the source', () => {
    const input = placed(inputGrid, {
      parts: {
        sourceResistance: 10e3,
        cableCapacitance: 1e-9,
        stopper: 0,
        stageGain: 0,
        wiringCapacitance: 0,
      },
    });
    const farads = 1e-9 + 3.2e-12; // the valve’s own, at no gain
    expectRatio(
      corners(oneSpan(input).transfer.denominator)[0]!,
      1 / (rotating * parallel(10e3, 1e6) * farads),
    );
  });
});

describe('cathode bypass and coupling (Langford-Smith, ch. 12)', () => {
  const { gm, plateResistance } = TRIODES.ECC83.published;
  const mu = gm * plateResistance;
  const CATHODE = 1500;
  const BYPASS = 1e-6;
  /** A coupling whose own corner, below 1e-4 Hz, does not show. */
  const WIDE = { couplingCap: 1e-4, nextLeak: 22e6, plateLoad: 100e3, cathodeResistor: CATHODE };
  const load = parallel(100e3, 22e6);
  /** What the cathode looks like from its capacitor, its resistor apart. */
  const inward = (plateResistance + load) / (mu + 1);
  // The coupling's 7e-5 Hz are 1e-6 of the lowest corner here, and pull at it by as much.
  const SHIFT = 1e-5;

  it('a bypassed cathode is a shelf from 1/(2π·Rk·Ck) to (1 + (µ + 1)·Rk/(ra + RL)) times that', () => {
    const stage = placed(stageCommonCathode, { parts: { ...WIDE, bypassCap: BYPASS } });
    const { transfer } = oneSpan(stage);
    const step = 1 + ((mu + 1) * CATHODE) / (plateResistance + load);
    const low = 1 / (rotating * CATHODE * BYPASS);
    expectRatio(corners(transfer.numerator).at(-1)!, low, SHIFT);
    expectRatio(corners(transfer.denominator).at(-1)!, low * step, SHIFT);
    const level = levelOf(transfer);
    // Measured two decades off on either side, where the shelf is done but for (1/100)².
    expect(level(1e5) - level(1)).toBeCloseTo(20 * Math.log10(step), 2);
  });

  it('a resistor in series with the capacitor makes the shelf lower and moves both its corners', () => {
    const series = 1000;
    const stage = placed(stageCommonCathode, {
      parts: { ...WIDE, bypassCap: BYPASS, bypassResistor: series },
      choices: { bypass: 'partial' },
    });
    const { transfer } = oneSpan(stage);
    expectRatio(corners(transfer.numerator).at(-1)!, 1 / (rotating * (CATHODE + series) * BYPASS), SHIFT);
    expectRatio(
      corners(transfer.denominator).at(-1)!,
      1 / (rotating * (series + parallel(CATHODE, inward)) * BYPASS),
      SHIFT,
    );
  });

  it('amplifies by µ·RL/(ra + RL), and by µ·RL/(ra + RL + (µ + 1)·Rk) without a bypass', () => {
    const gain = (bypass: string, parts: Readonly<Record<string, number>>) =>
      oneSpan(placed(stageCommonCathode, { parts: { ...WIDE, ...parts }, choices: { bypass } })).reference;
    // At 1 kHz a bypass of 1 mF is short but for 1e-7.
    expectRatio(gain('full', { bypassCap: 1e-3 }), (mu * load) / (plateResistance + load), 1e-6);
    expectRatio(gain('none', {}), (mu * load) / (plateResistance + load + (mu + 1) * CATHODE), 1e-6);
  });

  it('a coupling capacitor has its corner at 1/(2πC·(source + leak))', () => {
    const stage = placed(stageCommonCathode, {
      parts: { couplingCap: 22e-9, nextLeak: 470e3, plateLoad: 100e3, cathodeResistor: CATHODE },
      choices: { bypass: 'none' },
    });
    const source = parallel(100e3, plateResistance + (mu + 1) * CATHODE);
    const { denominator } = oneSpan(stage).transfer;
    expect(corners(denominator)).toHaveLength(1);
    expectRatio(corners(denominator)[0]!, 1 / (rotating * 22e-9 * (source + 470e3)));
  });

  it('a coupling capacitor passes no direct voltage (common practice, no source)', () => {
    for (const bypass of ['full', 'partial', 'none']) {
      const { numerator, denominator } = oneSpan(
        placed(stageCommonCathode, { choices: { bypass } }),
      ).transfer;
      expect(numerator[0]).toBe(0);
      expect(denominator[0]).toBeGreaterThan(0);
    }
    const plate = oneSpan(placed(driverPlate), placed(toneTrebleCut)).transfer;
    expect(plate.numerator[0]).toBe(0);
    expect(plate.denominator[0]).toBeGreaterThan(0);
  });
});

describe('volume and treble cut (common practice, no source; corners by Ohm’s law)', () => {
  it('a bright capacitor lifts from 1/(2π·C·R(upper)) and does nothing at full volume', () => {
    const parts = { volumePot: 1e6, brightCap: 100e-12, strayCapacitance: 0 };
    const half = oneSpan(placed(volumeBright, { parts, knobs: { volume: 0.2 } })).transfer;
    expectRatio(corners(half.numerator)[0]!, 1 / (rotating * 100e-12 * 800e3));
    expectRatio(corners(half.denominator)[0]!, 1 / (rotating * 100e-12 * parallel(800e3, 200e3)));
    const full = levelOf(oneSpan(placed(volumeBright, { parts, knobs: { volume: 1 } })).transfer);
    for (const frequency of [20, 1000, 20e3]) expect(full(frequency)).toBeCloseTo(0, 12);
  });

  it('a treble cut turned down rolls off at 1/(2π·C·R), and turned up all but leaves', () => {
    const parts = { seriesResistor: 100e3, cutCap: 4.7e-9, cutPot: 1e6 };
    const at = (tone: number) =>
      oneSpan(placed(toneTrebleCut, { parts, knobs: { tone }, choices: { load: 'none' } })).transfer;
    expectRatio(corners(at(0).denominator)[0]!, 1 / (rotating * 100e3 * 4.7e-9));
    const up = levelOf(at(1));
    expect(up(20e3)).toBeCloseTo(20 * Math.log10(1e6 / 1.1e6), 3); // the resistors’ divider is left
  });
});
