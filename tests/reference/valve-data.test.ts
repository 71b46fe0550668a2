import { describe, expect, it } from 'vitest';
import { commonCathodePoint } from '../../src/parts/operating-point.ts';
import { asPentode, asTriode, OUTPUT_VALVE_NAMES, OUTPUT_VALVES } from '../../src/parts/output-valve.ts';
import { triodePoint } from '../../src/parts/triode-model.ts';
import { TRIODE_NAMES, TRIODES, type TriodeName } from '../../src/parts/valve.ts';

/**
 * Figures of the makers' published data sheets of the 1950s and 60s at 250 V on the plate, from
 * memory: grid V, plate mA, gm mA/V, ra kΩ, µ.
 */
const PUBLISHED: Readonly<Record<TriodeName, readonly [number, number, number, number, number]>> = {
  ECC81: [-2, 10, 5.5, 10.9, 60],
  ECC82: [-8.5, 10.5, 2.2, 7.7, 17],
  ECC83: [-2, 1.2, 1.6, 62.5, 100],
};

/**
 * How far the model may miss at that one point, as a share of current and of the small-signal
 * figures. Koren fitted whole families of curves; at the published point his parameters give
 * 0.952 mA for 1.2, 53.7 kΩ for 62.5 and µ 89.7 for 100 (ECC83), and 12.8 mA for 10 (ECC81), by
 * pencil from the paper's formula. Valves themselves scatter about as much.
 */
const HONESTY: Readonly<Record<TriodeName, { current: number; figures: number }>> = {
  ECC81: { current: 0.3, figures: 0.35 },
  ECC82: { current: 0.05, figures: 0.15 },
  ECC83: { current: 0.22, figures: 0.15 },
};

describe('triodes against published data', () => {
  it.each(TRIODE_NAMES)('%s holds the figures as published', (name) => {
    const { published } = TRIODES[name];
    const [grid, current, gm, resistance, mu] = PUBLISHED[name];
    expect(published.plateVoltage).toBe(250);
    expect(published.gridVoltage).toBe(grid);
    expect(published.plateCurrent * 1e3).toBeCloseTo(current, 9);
    expect(published.gm * 1e3).toBeCloseTo(gm, 9);
    expect(published.plateResistance / 1e3).toBeCloseTo(resistance, 9);
    expect(published.mu).toBe(mu);
    // µ = gm · ra (Barkhausen); the sheets round to two or three figures, hence 1 %.
    expect(Math.abs((published.gm * published.plateResistance) / published.mu - 1)).toBeLessThan(0.01);
  });

  it.each(TRIODE_NAMES)('%s: the model comes as near to them as it honestly can', (name) => {
    const [grid, current, gm, resistance, mu] = PUBLISHED[name];
    const point = triodePoint(TRIODES[name].model, 250, grid);
    const { current: ofCurrent, figures } = HONESTY[name];
    expect(Math.abs((point.current * 1e3) / current - 1)).toBeLessThan(ofCurrent);
    expect(Math.abs((point.gm * 1e3) / gm - 1)).toBeLessThan(figures);
    expect(Math.abs(point.plateResistance / 1e3 / resistance - 1)).toBeLessThan(figures);
    expect(Math.abs(point.mu / mu - 1)).toBeLessThan(figures);
  });

  it('the published point is within the limits of each', () => {
    for (const name of TRIODE_NAMES) {
      const { published, limits } = TRIODES[name];
      expect(published.plateVoltage).toBeLessThanOrEqual(limits.plateVoltage);
      expect(published.plateVoltage * published.plateCurrent).toBeLessThanOrEqual(
        limits.plateDissipation * 1.06,
      );
    }
  });

  // Resistance-coupled amplifier table of the ECC83's data sheet, plate load 100 kΩ, next grid leak
  // 330 kΩ, from memory: supply V, cathode resistor Ω, plate mA, voltage gain.
  it.each([
    [200, 1800, 0.65, 50],
    [250, 1500, 0.86, 54.5],
    [300, 1200, 1.11, 57],
    [350, 1000, 1.4, 61],
    [400, 820, 1.72, 63],
  ])(
    'an ECC83 at %s V with %s Ω in its cathode rests and amplifies as the sheet says',
    (supply, cathodeResistor, current, gain) => {
      const point = commonCathodePoint(TRIODES.ECC83.model, { supply, plateLoad: 100e3, cathodeResistor });
      const load = 1 / (1 / 100e3 + 1 / 330e3);
      // The model reads some 10 to 20 % low in current at small bias; gain hangs on µ and is closer.
      expect(Math.abs((point.current * 1e3) / current - 1)).toBeLessThan(0.2);
      expect(Math.abs((point.mu * load) / (point.plateResistance + load) / gain - 1)).toBeLessThan(0.1);
    },
  );
});

describe('output valves against published data', () => {
  // gm mA/V and ra kΩ as pentode or beam valve, 250 V on plate and screen; from memory.
  it.each([
    ['EL34', 11, 15],
    ['EL84', 11.3, 38],
    ['6L6GC', 6, 22.5],
    ['6V6GT', 4.1, 50],
  ] as const)('%s as a pentode', (name, gm, resistance) => {
    const point = asPentode(OUTPUT_VALVES[name]);
    expect(point.gm * 1e3).toBeCloseTo(gm, 9);
    expect(point.plateResistance / 1e3).toBeCloseTo(resistance, 9);
    expect(point.mu).toBeCloseTo(gm * resistance, 9);
  });

  // Triode-strapped figures of the sheets (6L6GC: 250 V, 40 mA; 6V6GT: 250 V, 49.5 mA), from memory.
  // They rest at other currents than the pentode's, and gm goes roughly with the cube root of the
  // current: 77 mA against 40 is a quarter more. With the rounding of µ that makes 40 %, and 30 % for ra.
  it.each([
    ['6L6GC', 4.7, 1.7, 8],
    ['6V6GT', 5, 1.96, 9.8],
  ] as const)('%s strapped as a triode', (name, gm, resistance, mu) => {
    const point = asTriode(OUTPUT_VALVES[name]);
    expect(point.mu).toBe(mu);
    expect(Math.abs((point.gm * 1e3) / gm - 1)).toBeLessThan(0.4);
    expect(Math.abs(point.plateResistance / 1e3 / resistance - 1)).toBeLessThan(0.3);
  });

  it('strapping as a triode lowers the plate resistance by ten times and more (common practice, no source)', () => {
    for (const name of OUTPUT_VALVE_NAMES) {
      const valve = OUTPUT_VALVES[name];
      expect(asTriode(valve).plateResistance).toBeLessThan(asPentode(valve).plateResistance / 10);
      expect(asTriode(valve).gm).toBeGreaterThan(valve.gm);
    }
  });
});
