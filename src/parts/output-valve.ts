import type { Amperes, Ohms, Siemens, Volts } from '../units.ts';

/** Output valves with data here. */
export type OutputValveName = 'EL34' | 'EL84' | '6L6GC' | '6V6GT';

/** An output pentode or beam tetrode at its usual class A point. */
export interface OutputValve {
  readonly name: OutputValveName;
  readonly plateVoltage: Volts;
  readonly screenVoltage: Volts;
  readonly gridVoltage: Volts;
  readonly plateCurrent: Amperes;
  readonly screenCurrent: Amperes;
  /** Control grid to plate. */
  readonly gm: Siemens;
  /** As pentode, the screen held. */
  readonly plateResistance: Ohms;
  /** Amplification factor of the control grid at the screen, which becomes µ of the valve strapped as a triode. */
  readonly screenMu: number;
}

/** What a small signal meets at the plate of an output valve. */
export interface OutputPoint {
  readonly gm: Siemens;
  readonly plateResistance: Ohms;
  readonly mu: number;
}

/** Published data at 250 V on plate and screen, from memory. */
export const OUTPUT_VALVES: Readonly<Record<OutputValveName, OutputValve>> = {
  EL34: {
    name: 'EL34',
    plateVoltage: 250,
    screenVoltage: 250,
    gridVoltage: -12.2,
    plateCurrent: 100e-3,
    screenCurrent: 15e-3,
    gm: 11e-3,
    plateResistance: 15e3,
    screenMu: 11,
  },
  EL84: {
    name: 'EL84',
    plateVoltage: 250,
    screenVoltage: 250,
    gridVoltage: -7.3,
    plateCurrent: 48e-3,
    screenCurrent: 5.5e-3,
    gm: 11.3e-3,
    plateResistance: 38e3,
    screenMu: 19,
  },
  '6L6GC': {
    name: '6L6GC',
    plateVoltage: 250,
    screenVoltage: 250,
    gridVoltage: -14,
    plateCurrent: 72e-3,
    screenCurrent: 5e-3,
    gm: 6e-3,
    plateResistance: 22_500,
    screenMu: 8,
  },
  '6V6GT': {
    name: '6V6GT',
    plateVoltage: 250,
    screenVoltage: 250,
    gridVoltage: -12.5,
    plateCurrent: 45e-3,
    screenCurrent: 4.5e-3,
    gm: 4.1e-3,
    plateResistance: 50e3,
    screenMu: 9.8,
  },
};

/** Names of the output valves, in order. */
export const OUTPUT_VALVE_NAMES: readonly OutputValveName[] = ['EL34', 'EL84', '6L6GC', '6V6GT'];

/** Transconductance and plate resistance as a pentode (or beam tetrode) at the published point; µ = gm · ra. */
export function asPentode({ gm, plateResistance }: OutputValve): OutputPoint {
  return { gm, plateResistance, mu: gm * plateResistance };
}

/**
 * The same valve at the same currents with its screen strapped to the plate. The whole cathode current
 * then answers to the grid, so `gm' = gm · (1 + Is/Ip)`, with µ that of grid and screen and
 * `ra = µ/gm'` (common practice, no source; published triode figures agree within 40 % in gm and 30 % in ra, see the
 * reference tests).
 */
export function asTriode({ gm, plateCurrent, screenCurrent, screenMu }: OutputValve): OutputPoint {
  const whole = gm * (1 + screenCurrent / plateCurrent);
  return { gm: whole, plateResistance: screenMu / whole, mu: screenMu };
}
