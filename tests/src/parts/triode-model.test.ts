import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { type TriodeParameters, triodePoint } from '../../../src/parts/triode-model.ts';
import { TRIODE_NAMES, TRIODES } from '../../../src/parts/valve.ts';

const ECC83 = TRIODES.ECC83.model;

const anyModel = fc.constantFrom(...TRIODE_NAMES).map((name) => TRIODES[name].model);
const anyPlate = fc.double({ min: 1, max: 450, noNaN: true });
/** Grid voltages at which an audio triode works; far beyond cut-off there is nothing to differentiate. */
const anyGrid = fc.double({ min: -12, max: 0, noNaN: true });

/** Central difference of fourth order. */
function slope(evaluate: (place: number) => number, place: number, step: number): number {
  const odd = (distance: number): number => evaluate(place + distance) - evaluate(place - distance);
  return (8 * odd(step) - odd(2 * step)) / (12 * step);
}

describe('triode model', () => {
  it('gives what the paper’s formula gives by pencil', () => {
    // ECC83 at 250 V, −2 V: √62800 = 250.599; x = 600·(0.01 − 0.0079809) = 1.21147;
    // ln(1 + eˣ) = 1.47213; E = 250/600·1.47213 = 0.613387; E^1.4 = 0.504456; 2·0.504456/1060.
    const point = triodePoint(ECC83, 250, -2);
    // Six figures carried by hand.
    expect(point.current).toBeCloseTo(0.9518e-3, 7);
    // ∂E/∂Vg = 250·0.770572/250.599 = 0.768730; gm = 1.4·I/E·0.768730.
    expect(point.gm).toBeCloseTo(1.66998e-3, 7);
    // ∂E/∂Vp = 0.00245355 + 0.770572·2·62500/15737620 = 0.00857408.
    expect(point.mu).toBeCloseTo(0.76873 / 0.00857408, 2);
  });

  it('has derivatives that are those of its own current', () => {
    fc.assert(
      fc.property(anyModel, anyPlate, anyGrid, (model, plate, grid) => {
        const point = triodePoint(model, plate, grid);
        fc.pre(point.current > 1e-9);
        const current = (p: number, g: number): number => triodePoint(model, p, g).current;
        // Fourth order with a thousandth of the shortest length of the curve (√(kvb + Vp²)/kp volts of
        // grid): truncation about 1e-10, cancellation about 1e-12 of current over step.
        const step = Math.sqrt(model.kvb + plate * plate) / model.kp / 100;
        const gm = slope((g) => current(plate, g), grid, step);
        const gp = slope((p) => current(p, grid), plate, Math.min(step, plate / 100));
        expect(Math.abs(gm / point.gm - 1)).toBeLessThan(1e-6);
        expect(Math.abs(gp - point.gp)).toBeLessThan(1e-6 * Math.max(point.gp, point.gm / model.mu));
      }),
      { numRuns: 300 },
    );
  });

  it('has µ = gm · ra, and 1/ra for conductance', () => {
    fc.assert(
      fc.property(anyModel, anyPlate, anyGrid, (model, plate, grid) => {
        const point = triodePoint(model, plate, grid);
        fc.pre(point.current > 0 && point.gp > 0);
        // Two roundings.
        expect(point.gm * point.plateResistance).toBeCloseTo(point.mu, 9);
        expect(point.gp * point.plateResistance).toBeCloseTo(1, 14);
      }),
    );
  });

  it('never conducts less with more plate or grid voltage', () => {
    fc.assert(
      fc.property(
        anyModel,
        anyPlate,
        anyGrid,
        fc.double({ min: 0, max: 50, noNaN: true }),
        (model, plate, grid, more) => {
          const { current, gm, gp } = triodePoint(model, plate, grid);
          expect(current).toBeGreaterThanOrEqual(0);
          expect(gm).toBeGreaterThanOrEqual(0);
          expect(gp).toBeGreaterThanOrEqual(0);
          expect(triodePoint(model, plate + more, grid).current).toBeGreaterThanOrEqual(current);
          expect(triodePoint(model, plate, grid + more / 50).current).toBeGreaterThanOrEqual(current);
        },
      ),
    );
  });

  it('becomes the law of the ideal triode, K·(Vp/µ + Vg)^1.5, with a sharp cut-off (Child 1911, Langmuir 1913)', () => {
    const ideal: TriodeParameters = { mu: 20, ex: 1.5, kg1: 1000, kp: 1e6, kvb: 0 };
    for (const [plate, grid] of [
      [250, -5],
      [100, -1],
      [300, 0],
    ] as const) {
      const drive = plate / 20 + grid;
      const { current, gm, mu, plateResistance } = triodePoint(ideal, plate, grid);
      // e^−x with x over 10⁴ is nothing; only rounding is left.
      expect(current / ((2 / 1000) * drive ** 1.5)).toBeCloseTo(1, 12);
      expect(gm / ((3 / 1000) * drive ** 0.5)).toBeCloseTo(1, 12);
      expect(mu).toBeCloseTo(20, 9);
      expect(plateResistance * gm).toBeCloseTo(20, 9);
    }
    // Beyond cut-off (−250/20 = −12.5 V) nothing is left.
    expect(triodePoint(ideal, 250, -13).current).toBe(0);
  });

  it.each([
    ['a plate at the cathode', 0, -1],
    ['a plate below the cathode', -100, 0],
    ['a grid far beyond cut-off', 250, -1e6],
  ])('gives nothing with %s', (_, plate, grid) => {
    expect(triodePoint(ECC83, plate, grid)).toEqual({
      current: 0,
      gm: 0,
      gp: 0,
      plateResistance: Number.POSITIVE_INFINITY,
      mu: 0,
    });
  });

  it('stays finite over any voltages that are numbers', () => {
    fc.assert(
      fc.property(
        anyModel,
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        fc.double({ min: -1e6, max: 1e6, noNaN: true }),
        (model, plate, grid) => {
          const { current, gm, gp, mu, plateResistance } = triodePoint(model, plate, grid);
          for (const figure of [current, gm, gp, mu]) expect(Number.isFinite(figure)).toBe(true);
          expect(plateResistance).not.toBeNaN();
        },
      ),
    );
  });

  it('passes NaN on', () => {
    expect(triodePoint(ECC83, Number.NaN, -1).current).toBeNaN();
    expect(triodePoint(ECC83, 250, Number.NaN).current).toBeNaN();
  });
});
