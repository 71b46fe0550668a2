import { describe, expect, it } from 'vitest';
import { NotchworkError } from '../../../src/errors.ts';
import { bracketedRoot } from '../../../src/parts/bracketed-root.ts';
import {
  cathodeFollowerPoint,
  operatingPoint,
  type TriodeSurroundings,
} from '../../../src/parts/operating-point.ts';
import { TRIODES } from '../../../src/parts/valve.ts';

const MODEL = TRIODES.ECC83.model;
const GOOD: TriodeSurroundings = { supply: 300, plateLoad: 100e3, cathodeResistor: 1500, gridVoltage: 0 };

function errorOf(action: () => unknown): NotchworkError {
  try {
    action();
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error('nothing was refused');
}

describe('surroundings of a triode that are refused', () => {
  it('are not these', () => {
    expect(operatingPoint(MODEL, GOOD).current).toBeGreaterThan(0);
  });

  it.each([
    ['supply', 0, /Supply voltage is 0/],
    ['supply', -300, /Supply voltage is -300/],
    ['supply', Number.NaN, /Supply voltage is NaN/],
    ['supply', Number.POSITIVE_INFINITY, /Supply voltage is Infinity/],
    ['supply', 1e30, /Supply voltage is 1e\+30/],
    ['plateLoad', -1, /Plate load is -1/],
    ['plateLoad', Number.NaN, /Plate load is NaN/],
    ['plateLoad', 1e30, /Plate load/],
    ['cathodeResistor', -1, /Cathode resistor is -1/],
    ['cathodeResistor', Number.NaN, /Cathode resistor is NaN/],
    ['cathodeResistor', Number.POSITIVE_INFINITY, /Cathode resistor/],
    ['gridVoltage', Number.NaN, /Grid voltage is NaN/],
    ['gridVoltage', -1e6, /Grid voltage/],
  ] as const)('%s %s', (field, value, message) => {
    const error = errorOf(() => operatingPoint(MODEL, { ...GOOD, [field]: value }));
    expect(error.code).toBe('value-out-of-range');
    expect(error.message).toMatch(message);
    expect(error.message).toMatch(/from .* to /);
  });

  it.each([
    ['a grid held above a grounded cathode', { ...GOOD, cathodeResistor: 0, gridVoltage: 5 }],
    ['a grid above the supply', { ...GOOD, plateLoad: 0, cathodeResistor: 100e3, gridVoltage: 400 }],
    [
      'a grid that the cathode cannot follow',
      { ...GOOD, plateLoad: 100e3, cathodeResistor: 100e3, gridVoltage: 200 },
    ],
  ])('%s: it would draw current, which the model does not know', (_, surroundings) => {
    const error = errorOf(() => operatingPoint(MODEL, surroundings));
    expect(error.code).toBe('circuit-unsolvable');
    expect(error.message).toMatch(/above the cathode and draw current; lower the grid voltage/);
  });

  it('a follower says so too', () => {
    const ask = (): unknown =>
      cathodeFollowerPoint(MODEL, { supply: 100, cathodeResistor: 100e3, gridVoltage: 150 });
    expect(errorOf(ask).code).toBe('circuit-unsolvable');
  });
});

describe('a bracket without a root', () => {
  it.each([
    ['the same sign at both ends', (x: number) => x * x + 1],
    ['NaN at the ends', () => Number.NaN],
    ['infinity at an end', (x: number) => 1 / x],
  ])('%s', (_, evaluate) => {
    const error = errorOf(() => bracketedRoot(evaluate, 0, 1));
    expect(error.code).toBe('circuit-unsolvable');
    expect(error.message).toMatch(/at 0 .* at 1 /);
  });
});
