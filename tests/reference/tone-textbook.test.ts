import { describe, expect, it } from 'vitest';
import { toneBaxandall } from '../../src/blocks/tone-baxandall.ts';
import { toneBridgedT } from '../../src/blocks/tone-bridged-t.ts';
import { toneFixedMiddle } from '../../src/blocks/tone-fixed-middle.ts';
import { toneJames } from '../../src/blocks/tone-james.ts';
import { toneThreeKnob } from '../../src/blocks/tone-three-knob.ts';
import { polynomialRoots } from '../../src/filter/roots.ts';
import { levelOf } from '../../src/response/curve.ts';
import type { TransferFunction } from '../../src/transfer-function.ts';
import { oneSpan, placed } from '../src/blocks/placed.ts';

const NO_LOAD = { choices: { load: 'none' } } as const;
const BAND = [10, 30, 100, 300, 1000, 3000, 10e3, 30e3];

const parallel = (first: number, second: number): number => (first * second) / (first + second);

const rotating = 2 * Math.PI;

/** Real zeros or poles nearest to a frequency in hertz. */
function nearestCorner(coefficients: readonly number[], frequency: number): number {
  const real = [...polynomialRoots(coefficients).real].map((value) => -value / rotating);
  const off = (value: number) => Math.abs(Math.log(Math.max(value, 1e-300) / frequency));
  return real.sort((a, b) => off(a) - off(b))[0]!;
}

function expectCorner(coefficients: readonly number[], frequency: number, tolerance: number): void {
  expect(Math.abs(nearestCorner(coefficients, frequency) / frequency - 1)).toBeLessThan(tolerance);
}

function spread(transfer: TransferFunction): number {
  const levels = BAND.map(levelOf(transfer));
  return Math.max(...levels) - Math.min(...levels);
}

describe('passive bass and treble (E. J. James, Wireless World, February 1949, from memory)', () => {
  const PARTS = {
    bassTop: 100e3,
    bassBottom: 10e3,
    bassTopCap: 2.2e-9,
    bassBottomCap: 22e-9,
    trebleTopCap: 470e-12,
    trebleBottomCap: 4.7e-9,
  };
  const at = (knobs: Readonly<Record<string, number>>, parts = {}) =>
    oneSpan(placed(toneJames, { parts: { ...PARTS, ...parts }, knobs, ...NO_LOAD })).transfer;

  it('is flat where both potentiometers divide as their other parts do, ten to one', () => {
    const flat = at({ bass: 1 / 11, treble: 1 / 11 });
    for (const frequency of BAND) expect(levelOf(flat)(frequency)).toBeCloseTo(20 * Math.log10(1 / 11), 9);
  });

  it('is flat within 0.7 dB at half turn on its 10 % tapers: 1 to 9 is not quite 1 to 10', () => {
    expect(spread(oneSpan(placed(toneJames, { parts: PARTS, ...NO_LOAD })).transfer)).toBeLessThan(0.7);
  });

  // The treble arms taken away, down to 1 pF through 100 Ω: a few parts in a million at these corners.
  const BASS_ALONE = { trebleTopCap: 1e-12, trebleBottomCap: 1e-12, join: 100 };

  it('bass lift turns over at 1/(2π·C2·R2) and levels off at 1/(2π·C2·(R1 + R2)), the pot beside each', () => {
    const { numerator, denominator } = at({ bass: 1, treble: 0.5 }, BASS_ALONE);
    expectCorner(numerator, 1 / (rotating * 22e-9 * parallel(1e6, 10e3)), 1e-4);
    expectCorner(denominator, 1 / (rotating * 22e-9 * parallel(1e6, 110e3)), 1e-4);
  });

  it('bass cut turns over at 1/(2π·C1·R1) and levels off at 1/(2π·C1·pot)', () => {
    const { numerator, denominator } = at({ bass: 0, treble: 0.5 }, BASS_ALONE);
    // Turned down, the pot's megohm lets so little through that 1 pF beside it counts for 5e-4.
    expectCorner(numerator, 1 / (rotating * 2.2e-9 * 1e6), 1e-3);
    expectCorner(denominator, 1 / (rotating * 2.2e-9 * parallel(1e6, 110e3)), 1e-4);
  });

  it('treble lift turns over where its capacitor passes what the bass divider hands on', () => {
    // Bass capacitors so large that its divider is R1 over R2, and no lower treble capacitor.
    const parts = { bassTopCap: 1e-5, bassBottomCap: 1e-5, trebleBottomCap: 1e-12, join: 100e3 };
    const { numerator } = at({ bass: 0.5, treble: 1 }, parts);
    const source = 100e3 + parallel(100e3, 10e3);
    expectCorner(numerator, 1 / 11 / (rotating * 470e-12 * source), 1e-2); // 1 pF beside 470 pF
  });

  it('lifts and cuts both ends, and each knob leaves the far end alone', () => {
    const flat = levelOf(at({ bass: 1 / 11, treble: 1 / 11 }));
    const bass = levelOf(at({ bass: 1, treble: 1 / 11 }));
    const treble = levelOf(at({ bass: 1 / 11, treble: 1 }));
    expect(bass(20) - flat(20)).toBeGreaterThan(15);
    expect(treble(20e3) - flat(20e3)).toBeGreaterThan(15);
    expect(Math.abs(bass(20e3) - flat(20e3))).toBeLessThan(1);
    expect(Math.abs(treble(20) - flat(20))).toBeLessThan(1);
  });
});

describe('feedback bass and treble (P. J. Baxandall, Wireless World, October 1952, from memory)', () => {
  const IDEAL = { gain: 1e6, outputImpedance: 0 };
  const at = (knobs: Readonly<Record<string, number>>, parts = {}) =>
    oneSpan(placed(toneBaxandall, { parts: { ...IDEAL, ...parts }, knobs, ...NO_LOAD })).transfer;

  it('inverts at unity gain and is flat with both controls in the middle', () => {
    const flat = at({ bass: 0.5, treble: 0.5 });
    // A gain of a million leaves an error of a few parts in it.
    for (const frequency of BAND) expect(Math.abs(levelOf(flat)(frequency))).toBeLessThan(1e-4);
    expect(flat.numerator[0]! / flat.denominator[0]!).toBeCloseTo(-1, 4);
  });

  it('stays flat with the finite gain of a valve, a little below unity', () => {
    const flat = oneSpan(placed(toneBaxandall, NO_LOAD)).transfer;
    expect(spread(flat)).toBeLessThan(1);
    expect(levelOf(flat)(1000)).toBeLessThan(0);
    expect(levelOf(flat)(1000)).toBeGreaterThan(-2);
  });

  it('what lift does cut undoes: the curves mirror about unity', () => {
    for (const [bass, treble] of [
      [1, 0.5],
      [0.5, 1],
      [0.8, 0.3],
    ] as const) {
      const up = levelOf(at({ bass, treble }));
      const down = levelOf(at({ bass: 1 - bass, treble: 1 - treble }));
      for (const frequency of BAND) expect(Math.abs(up(frequency) + down(frequency))).toBeLessThan(1e-3);
    }
  });

  it('bass lift reaches 1 + pot/end, from 1/(2π·C·pot) up to 1/(2π·C·(pot beside end))', () => {
    const alone = { trebleCap: 1e-12, bassPot: 500e3, bassEnd: 47e3, bassCap: 10e-9 };
    const { numerator, denominator } = at({ bass: 1, treble: 0.5 }, alone);
    expectCorner(numerator, 1 / (rotating * 10e-9 * parallel(500e3, 47e3)), 1e-3);
    expectCorner(denominator, 1 / (rotating * 10e-9 * 500e3), 1e-3);
    expect(numerator[0]! / denominator[0]!).toBeCloseTo(-(1 + 500 / 47), 3);
  });

  it('treble is lifted turned up and cut turned down, the bass left alone', () => {
    const up = levelOf(at({ bass: 0.5, treble: 1 }));
    const down = levelOf(at({ bass: 0.5, treble: 0 }));
    expect(up(20e3)).toBeGreaterThan(10);
    expect(down(20e3)).toBeLessThan(-10);
    expect(Math.abs(up(30))).toBeLessThan(0.1);
  });
});

describe('bridged-T scoop (F. E. Terman, Radio Engineers’ Handbook, 1943, section 13, from memory)', () => {
  const PARTS = { bridge: 220e3, leg: 10e3, firstCap: 6.8e-9, secondCap: 6.8e-9 };
  const at = (scoop: number, parts = {}) =>
    levelOf(
      oneSpan(placed(toneBridgedT, { parts: { ...PARTS, ...parts }, knobs: { scoop }, ...NO_LOAD })).transfer,
    );

  /** Frequency of the least level, by golden section between two frequencies that enclose one dip. */
  function dip(level: (frequency: number) => number): number {
    let [low, high] = [Math.log(20), Math.log(20e3)];
    const ratio = (Math.sqrt(5) - 1) / 2;
    while (high - low > 1e-6) {
      const [left, right] = [high - ratio * (high - low), low + ratio * (high - low)];
      if (level(Math.exp(left)) < level(Math.exp(right))) high = right;
      else low = left;
    }
    return Math.exp((low + high) / 2);
  }

  it.each([{}, { secondCap: 2.2e-9 }, { leg: 22e3, bridge: 470e3 }])(
    'has its dip at 1/(2π·√(R1·R2·C1·C2)): %o',
    (parts) => {
      const { bridge, leg, firstCap, secondCap } = { ...PARTS, ...parts };
      const expected = 1 / (rotating * Math.sqrt(bridge * leg * firstCap * secondCap));
      // A level near its minimum tells frequency to about the root of its own rounding.
      expect(Math.abs(dip(at(1, parts)) / expected - 1)).toBeLessThan(1e-4);
    },
  );

  it('with equal capacitors is 2·R2/(2·R2 + R1) deep', () => {
    const level = at(1);
    expect(level(dip(level))).toBeCloseTo(20 * Math.log10(20 / 240), 6);
  });

  it('gets shallower turned down, and leaves both ends at unity', () => {
    const depth = [0, 0.5, 0.9, 1].map((scoop) => at(scoop)(dip(at(scoop))));
    expect(depth).toEqual([...depth].sort((a, b) => b - a));
    expect(depth[0]).toBeGreaterThan(-4);
    for (const scoop of [0, 1]) {
      expect(Math.abs(at(scoop)(1))).toBeLessThan(0.01);
      expect(Math.abs(at(scoop)(1e6))).toBeLessThan(0.01);
    }
  });
});

describe('fixed middle', () => {
  it('is the three-knob network with its middle control standing at the resistor’s value', () => {
    const parts = { slope: 56e3, trebleCap: 250e-12, bassCap: 22e-9, midCap: 22e-9 };
    const knobs = { treble: 0.7, bass: 0.3 };
    const fixed = oneSpan(
      placed(toneFixedMiddle, { parts: { ...parts, middleResistor: 10e3 }, knobs }),
    ).transfer;
    const three = oneSpan(
      placed(toneThreeKnob, {
        parts: { ...parts, middlePot: 25e3 },
        knobs: { ...knobs, middle: 0.4 },
        choices: { middleWiring: 'rheostat' },
      }),
    ).transfer;
    for (const frequency of BAND) expect(levelOf(fixed)(frequency)).toBeCloseTo(levelOf(three)(frequency), 9);
  });
});
