import { describe, expect, it } from 'vitest';
import { commonCathodePoint } from '../../../src/parts/operating-point.ts';
import { TRIODE_NAMES, TRIODES } from '../../../src/parts/valve.ts';

describe('triode data', () => {
  it('is there under each name, and each says its own', () => {
    expect(Object.keys(TRIODES)).toEqual([...TRIODE_NAMES]);
    for (const name of TRIODE_NAMES) expect(TRIODES[name].name).toBe(name);
    expect(TRIODE_NAMES.map((name) => TRIODES[name].otherName)).toEqual(['12AT7', '12AU7', '12AX7']);
  });

  it.each(TRIODE_NAMES)('%s has capacitances of the size that miniature valves have', (name) => {
    // 0.3 to 3 pF inside the envelope of any double triode on nine pins (common practice, no source).
    for (const value of Object.values(TRIODES[name].capacitance)) {
      expect(value).toBeGreaterThan(0.3e-12);
      expect(value).toBeLessThan(3e-12);
    }
  });

  it.each(TRIODE_NAMES)('%s has parameters with which a plain stage works within its limits', (name) => {
    const { model, limits } = TRIODES[name];
    const point = commonCathodePoint(model, {
      supply: limits.plateVoltage,
      plateLoad: 100e3,
      cathodeResistor: 1500,
    });
    expect(point.plateDissipation).toBeLessThan(limits.plateDissipation);
    expect(point.mu).toBeGreaterThan(10);
    expect(point.bias).toBeLessThan(-0.5);
  });

  it('orders the three as everybody knows them: µ and ra rise from ECC82 to ECC83', () => {
    const figures = (['ECC82', 'ECC81', 'ECC83'] as const).map((name) => TRIODES[name].published);
    for (const key of ['mu', 'plateResistance'] as const) {
      const values = figures.map((entry) => entry[key]);
      expect(values).toEqual([...values].sort((a, b) => a - b));
    }
  });
});
