import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  cathodeFollowerPoint,
  commonCathodePoint,
  operatingPoint,
} from '../../../src/parts/operating-point.ts';
import { type TriodeParameters, triodePoint } from '../../../src/parts/triode-model.ts';
import { TRIODE_NAMES, TRIODES } from '../../../src/parts/valve.ts';

const ECC83 = TRIODES.ECC83.model;

/**
 * A straight-line valve inside the model: exponent 1, no knee, the sharpest of cut-offs, so that
 * `I = (Vp/µ + Vg)·gm` with µ = 100, gm = 1.6 mA/V, ra = 62.5 kΩ. Its circuits are solved by hand.
 */
const STRAIGHT: TriodeParameters = { mu: 100, ex: 1, kg1: 1250, kp: 1e9, kvb: 0 };
const MU = 100;
const RA = 62_500;

const anyModel = fc.constantFrom(...TRIODE_NAMES).map((name) => TRIODES[name].model);
const anySupply = fc.double({ min: 50, max: 450, noNaN: true });
const anyLoad = fc.double({ min: 1e3, max: 1e6, noNaN: true });
const anyCathode = fc.double({ min: 100, max: 1e5, noNaN: true });

describe('common-cathode stage', () => {
  it('of the straight-line valve rests where the load line says, I = Vb/(ra + Ra + (µ + 1)·Rk)', () => {
    // 300/(62.5k + 100k + 101·1.5k) = 300/314k = 0.95541 mA, by hand.
    const point = commonCathodePoint(STRAIGHT, { supply: 300, plateLoad: 100e3, cathodeResistor: 1500 });
    expect(point.current).toBeCloseTo(0.95541e-3, 8);
    expect(point.current / (300 / (RA + 100e3 + (MU + 1) * 1500))).toBeCloseTo(1, 12);
    expect(point.plateVoltage).toBeCloseTo(300 - 95.541, 2);
    expect(point.cathodeVoltage).toBeCloseTo(1.4331, 4);
    expect(point.gm).toBeCloseTo(1.6e-3, 12);
    expect(point.plateResistance).toBeCloseTo(RA, 3);
  });

  it('of an ECC83 meets its load line at the point chosen by pencil', () => {
    // 250 V, −2 V gives 0.95180 mA (worked in the model's test). Rk = 2/0.95180 mA = 2101.3 Ω drops
    // 2 V, 100 kΩ drops 95.180 V, so the supply is 347.18 V.
    const point = commonCathodePoint(ECC83, { supply: 347.18, plateLoad: 100e3, cathodeResistor: 2101.3 });
    // Five figures by hand.
    expect(point.bias).toBeCloseTo(-2, 3);
    expect(point.acrossValve).toBeCloseTo(250, 1);
    expect(point.current * 1e3).toBeCloseTo(0.9518, 3);
  });

  it('obeys the laws of Kirchhoff and the valve at once', () => {
    fc.assert(
      fc.property(anyModel, anySupply, anyLoad, anyCathode, (model, supply, plateLoad, cathodeResistor) => {
        const point = commonCathodePoint(model, { supply, plateLoad, cathodeResistor });
        const { current, plateVoltage, cathodeVoltage, bias, acrossValve } = point;
        // Rounding of voltages up to 450.
        expect(current * (plateLoad + cathodeResistor) + acrossValve).toBeCloseTo(supply, 10);
        expect(plateVoltage - cathodeVoltage).toBeCloseTo(acrossValve, 10);
        expect(bias).toBeCloseTo(-current * cathodeResistor, 12);
        // A last digit of the voltages (6e-14 V) is worth gm times as much current, at a few percent of it.
        const again = triodePoint(model, acrossValve, bias);
        expect(Math.abs(again.current / current - 1)).toBeLessThan(1e-9);
        expect([again.gm, again.plateResistance]).toEqual([point.gm, point.plateResistance]);
      }),
    );
  });

  it('spends in valve and resistors just what the supply gives', () => {
    fc.assert(
      fc.property(anyModel, anySupply, anyLoad, anyCathode, (model, supply, plateLoad, cathodeResistor) => {
        const point = commonCathodePoint(model, { supply, plateLoad, cathodeResistor });
        const spent = point.plateDissipation + point.plateLoadDissipation + point.cathodeResistorDissipation;
        expect(spent / (supply * point.current)).toBeCloseTo(1, 11);
        expect(point.plateDissipation).toBeGreaterThan(0);
      }),
    );
  });

  it('draws less with more of either resistor, and more with more supply', () => {
    fc.assert(
      fc.property(anyModel, anySupply, anyLoad, anyCathode, (model, supply, plateLoad, cathodeResistor) => {
        const { current } = commonCathodePoint(model, { supply, plateLoad, cathodeResistor });
        expect(
          commonCathodePoint(model, { supply, plateLoad: plateLoad * 1.1, cathodeResistor }).current,
        ).toBeLessThan(current);
        expect(
          commonCathodePoint(model, { supply, plateLoad, cathodeResistor: cathodeResistor * 1.1 }).current,
        ).toBeLessThan(current);
        expect(
          commonCathodePoint(model, { supply: supply * 1.1, plateLoad, cathodeResistor }).current,
        ).toBeGreaterThan(current);
      }),
    );
  });

  it('rests within the usual range with the usual parts (common practice, no source)', () => {
    // 1 to 1.8 V on the cathode and half to three quarters of the supply on the plate.
    const point = commonCathodePoint(ECC83, { supply: 300, plateLoad: 100e3, cathodeResistor: 1500 });
    expect(point.cathodeVoltage).toBeGreaterThan(1);
    expect(point.cathodeVoltage).toBeLessThan(1.8);
    expect(point.plateVoltage).toBeGreaterThan(150);
    expect(point.plateVoltage).toBeLessThan(225);
  });

  it('without any resistor is the model itself; without a cathode resistor it has no bias', () => {
    const bare = commonCathodePoint(ECC83, { supply: 100, plateLoad: 0, cathodeResistor: 0 });
    expect(bare.current).toBe(triodePoint(ECC83, 100, 0).current);
    expect(bare.plateVoltage).toBe(100);
    const loaded = commonCathodePoint(ECC83, { supply: 300, plateLoad: 100e3, cathodeResistor: 0 });
    expect(loaded.bias + 0).toBe(0);
    expect(loaded.current * 100e3 + loaded.plateVoltage).toBeCloseTo(300, 10);
  });

  it('is solved at the ends of what is accepted', () => {
    for (const supply of [1e-3, 1e4]) {
      for (const plateLoad of [0, 1e-6, 1e9]) {
        for (const cathodeResistor of [0, 1e-6, 1e9]) {
          const point = commonCathodePoint(ECC83, { supply, plateLoad, cathodeResistor });
          expect(point.current).toBeGreaterThanOrEqual(0);
          expect(point.current * (plateLoad + cathodeResistor)).toBeLessThanOrEqual(supply);
        }
      }
    }
  });
});

describe('cathode follower', () => {
  it('of the straight-line valve rests at I = (Vb + µ·Vg)/(ra + (µ + 1)·Rk)', () => {
    // (300 + 100·150)/(62.5k + 101·100k) = 15300/10.1625M = 1.50554 mA, by hand.
    const point = cathodeFollowerPoint(STRAIGHT, { supply: 300, cathodeResistor: 100e3, gridVoltage: 150 });
    expect(point.current).toBeCloseTo(1.50554e-3, 8);
    expect(point.cathodeVoltage).toBeCloseTo(150.554, 3);
    expect(point.bias).toBeCloseTo(-0.554, 3);
    expect(point.plateVoltage).toBe(300);
  });

  it('has its cathode a little above its grid, by what the valve needs as bias', () => {
    fc.assert(
      fc.property(
        fc.double({ min: 60, max: 180, noNaN: true }),
        fc.double({ min: 22e3, max: 220e3, noNaN: true }),
        (gridVoltage, cathodeResistor) => {
          const point = cathodeFollowerPoint(TRIODES.ECC82.model, {
            supply: 350,
            cathodeResistor,
            gridVoltage,
          });
          expect(point.cathodeVoltage).toBeGreaterThan(gridVoltage);
          expect(
            triodePoint(TRIODES.ECC82.model, point.acrossValve, point.bias).current / point.current,
          ).toBeCloseTo(1, 9);
        },
      ),
    );
  });

  it('coupled directly takes its grid voltage from the plate before it', () => {
    const first = commonCathodePoint(ECC83, { supply: 300, plateLoad: 100e3, cathodeResistor: 820 });
    const follower = cathodeFollowerPoint(ECC83, {
      supply: 300,
      cathodeResistor: 100e3,
      gridVoltage: first.plateVoltage,
    });
    expect(follower.cathodeVoltage).toBeGreaterThan(first.plateVoltage);
    expect(follower.cathodeVoltage - first.plateVoltage).toBeLessThan(3);
  });
});

describe('any triode circuit', () => {
  it('with its grid far below the cathode lets nothing flow', () => {
    const point = operatingPoint(ECC83, {
      supply: 300,
      plateLoad: 100e3,
      cathodeResistor: 0,
      gridVoltage: -5000,
    });
    expect([point.current, point.plateVoltage, point.gm, point.plateResistance]).toEqual([
      0,
      300,
      0,
      Number.POSITIVE_INFINITY,
    ]);
  });
});
