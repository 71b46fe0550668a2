import { describe, expect, it } from 'vitest';
import {
  asPentode,
  asTriode,
  OUTPUT_VALVE_NAMES,
  OUTPUT_VALVES,
  type OutputValve,
} from '../../../src/parts/output-valve.ts';

describe('output valve data', () => {
  it('is there under each name, and each says its own', () => {
    expect(Object.keys(OUTPUT_VALVES)).toEqual([...OUTPUT_VALVE_NAMES]);
    for (const name of OUTPUT_VALVE_NAMES) expect(OUTPUT_VALVES[name].name).toBe(name);
  });

  it.each(OUTPUT_VALVE_NAMES)('%s rests within its plate dissipation', (name) => {
    // Design-centre limits, from memory: 25, 12, 30 and 12 W (14 W in the later 6V6GT).
    const limit = { EL34: 25, EL84: 12, '6L6GC': 30, '6V6GT': 12 }[name];
    const { plateVoltage, plateCurrent, screenCurrent, gridVoltage } = OUTPUT_VALVES[name];
    expect(plateVoltage * plateCurrent).toBeLessThanOrEqual(limit);
    expect(screenCurrent).toBeLessThan(plateCurrent / 4);
    expect(gridVoltage).toBeLessThan(0);
  });

  const INVENTED: OutputValve = {
    name: 'EL34',
    plateVoltage: 250,
    screenVoltage: 250,
    gridVoltage: -10,
    plateCurrent: 80e-3,
    screenCurrent: 20e-3,
    gm: 8e-3,
    plateResistance: 20e3,
    screenMu: 10,
  };

  it('as a pentode has µ = gm · ra', () => {
    expect(asPentode(INVENTED)).toEqual({ gm: 8e-3, plateResistance: 20e3, mu: 160 });
  });

  it('as a triode has the whole cathode current behind its grid', () => {
    // 8 mA/V · (1 + 20/80) = 10 mA/V; 10/10 mA/V = 1 kΩ, by hand.
    const point = asTriode(INVENTED);
    expect(point.gm).toBeCloseTo(10e-3, 15);
    expect(point.plateResistance).toBeCloseTo(1000, 9);
    expect(point.mu).toBe(10);
  });
});
