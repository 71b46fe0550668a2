import { describe, expect, it } from 'vitest';
import type { Block, DirectOutput } from '../../../src/blocks/block.ts';
import { driverCathodeFollower } from '../../../src/blocks/driver-cathode-follower.ts';
import { driverPlainSource } from '../../../src/blocks/driver-plain-source.ts';
import { driverPlate } from '../../../src/blocks/driver-plate.ts';
import { valuesOf } from '../../../src/blocks/settings.ts';
import { cathodeFollowerPoint, commonCathodePoint } from '../../../src/parts/operating-point.ts';
import { TRIODES } from '../../../src/parts/valve.ts';
import { placed, type Setting } from './placed.ts';

const NONE = Number.POSITIVE_INFINITY;

function direct(block: Block, setting: Setting = {}, load = NONE): DirectOutput {
  return block.direct!(valuesOf(placed(block, setting).settings), load);
}

describe('direct voltages of a plain source', () => {
  it('are those typed in, whatever it feeds', () => {
    const setting = { parts: { supply: 280, restVoltage: 165 } };
    for (const load of [NONE, 10e3]) {
      expect(direct(driverPlainSource, setting, load)).toEqual({
        supply: 280,
        voltage: 165,
        couplingCap: undefined,
        resistors: {},
      });
    }
  });

  it('may reach the supply, and not pass it', () => {
    expect(direct(driverPlainSource, { parts: { supply: 200, restVoltage: 200 } }).voltage).toBe(200);
    expect(() => direct(driverPlainSource, { parts: { supply: 200, restVoltage: 200.1 } })).toThrow(
      expect.objectContaining({ code: 'value-out-of-range' }),
    );
  });
});

describe('direct voltages of a plate', () => {
  const parts = { supply: 300, plateLoad: 100e3, cathodeResistor: 1500 };
  const point = commonCathodePoint(TRIODES.ECC83.model, parts);

  it('are the operating point’s, behind its capacitor or without a load', () => {
    for (const [coupling, load] of [
      ['capacitor', 50e3],
      ['direct', NONE],
    ] as const) {
      const found = direct(driverPlate, { parts, choices: { coupling } }, load);
      expect(found.voltage).toBeCloseTo(point.plateVoltage, 9);
      expect(found.resistors['plateLoad']!.running).toBeCloseTo(300 - point.plateVoltage, 9);
      expect(found.resistors['cathodeResistor']!.running).toBeCloseTo(point.cathodeVoltage, 9);
      expect(found.couplingCap).toBe(coupling === 'capacitor' ? 'couplingCap' : undefined);
    }
  });

  it('fall with a load that draws direct current, less than by its share: the valve then draws less too', () => {
    const choices = { coupling: 'direct' };
    const loaded = direct(driverPlate, { parts, choices }, 100e3);
    expect(loaded.voltage).toBeLessThan(point.plateVoltage);
    expect(loaded.voltage).toBeGreaterThan(point.plateVoltage / 2);
    const typed = direct(
      driverPlate,
      { parts: { ...parts, restVoltage: 120 }, choices: { ...choices, rest: 'typed' } },
      100e3,
    );
    // 1.8 mA through the load resistor, 1.2 of them into the load: 0.6 mA through the valve.
    expect(typed.resistors['cathodeResistor']!.running).toBeCloseTo(0.6e-3 * 1500, 9);
  });

  it('are the supply while it is cold, its own resistors then without current', () => {
    const { supply, resistors } = direct(driverPlate, { parts });
    expect(supply).toBe(300);
    for (const { cold } of Object.values(resistors)) expect(cold).toBe(0);
  });
});

describe('direct voltages of a cathode follower', () => {
  const parts = { supply: 300, gridVoltage: 160, cathodeLoad: 100e3 };

  it('are the operating point’s', () => {
    const point = cathodeFollowerPoint(TRIODES.ECC82.model, {
      supply: 300,
      gridVoltage: 160,
      cathodeResistor: 100e3,
    });
    const found = direct(driverCathodeFollower, { parts, choices: { valve: 'ECC82' } });
    expect(found.voltage).toBeCloseTo(point.cathodeVoltage, 9);
    expect(found.resistors).toEqual({ cathodeLoad: { running: found.voltage, cold: 300 } });
  });

  it('count a load joined to the cathode beside its resistor, and none behind a capacitor', () => {
    const beside = cathodeFollowerPoint(TRIODES.ECC83.model, {
      supply: 300,
      gridVoltage: 160,
      cathodeResistor: 80e3,
    });
    expect(direct(driverCathodeFollower, { parts }, 400e3).voltage).toBeCloseTo(beside.cathodeVoltage, 9);
    const coupled = { parts, choices: { coupling: 'capacitor' } };
    expect(direct(driverCathodeFollower, coupled, 400e3)).toEqual(
      direct(driverCathodeFollower, coupled, NONE),
    );
    expect(direct(driverCathodeFollower, coupled).couplingCap).toBe('couplingCap');
  });

  it('are as typed in for a valve without a model', () => {
    const typed = { parts: { ...parts, restVoltage: 155 }, choices: { valve: 'typed' } };
    expect(direct(driverCathodeFollower, typed).voltage).toBe(155);
  });

  it('are refused where the grid would draw current', () => {
    expect(() => direct(driverCathodeFollower, { parts: { ...parts, gridVoltage: 290 } }, 5000)).toThrow(
      /draw current/,
    );
  });
});
