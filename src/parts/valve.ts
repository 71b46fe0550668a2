import type { Amperes, Farads, Ohms, Siemens, Volts, Watts } from '../units.ts';
import type { TriodeParameters } from './triode-model.ts';

/** Small-signal triodes with data here; each envelope holds two of them. */
export type TriodeName = 'ECC81' | 'ECC82' | 'ECC83';

/** Small-signal figures at one operating point. */
export interface TriodeData {
  /** Plate and grid voltage against the cathode, and the plate current, at which the figures hold. */
  readonly plateVoltage: Volts;
  readonly gridVoltage: Volts;
  readonly plateCurrent: Amperes;
  readonly gm: Siemens;
  readonly plateResistance: Ohms;
  readonly mu: number;
}

/** One triode system, as its published data have it. */
export interface Triode {
  readonly name: TriodeName;
  /** The American designation. */
  readonly otherName: string;
  readonly published: TriodeData;
  /** Capacitances between electrodes inside the envelope (first system), without socket and wiring. */
  readonly capacitance: {
    readonly gridPlate: Farads;
    readonly gridCathode: Farads;
    readonly plateCathode: Farads;
  };
  /** Limits of one system, design-centre ratings. */
  readonly limits: { readonly plateVoltage: Volts; readonly plateDissipation: Watts };
  readonly model: TriodeParameters;
}

/**
 * Published data, from memory, at the usual 250 V; real valves scatter by a third and more around
 * them. The model parameters are those of Koren (1996), from memory: fitted to whole families of
 * curves, they miss the published current at this one point by up to 30 % (ECC81; ECC83 21 %,
 * ECC82 1 %), gm by as much for ECC81.
 */
export const TRIODES: Readonly<Record<TriodeName, Triode>> = {
  ECC81: {
    name: 'ECC81',
    otherName: '12AT7',
    published: {
      plateVoltage: 250,
      gridVoltage: -2,
      plateCurrent: 10e-3,
      gm: 5.5e-3,
      plateResistance: 10.9e3,
      mu: 60,
    },
    capacitance: { gridPlate: 1.5e-12, gridCathode: 2.2e-12, plateCathode: 0.5e-12 },
    limits: { plateVoltage: 300, plateDissipation: 2.5 },
    model: { mu: 60, ex: 1.35, kg1: 460, kp: 300, kvb: 300 },
  },
  ECC82: {
    name: 'ECC82',
    otherName: '12AU7',
    published: {
      plateVoltage: 250,
      gridVoltage: -8.5,
      plateCurrent: 10.5e-3,
      gm: 2.2e-3,
      plateResistance: 7700,
      mu: 17,
    },
    capacitance: { gridPlate: 1.5e-12, gridCathode: 1.6e-12, plateCathode: 0.5e-12 },
    limits: { plateVoltage: 300, plateDissipation: 2.75 },
    model: { mu: 21.5, ex: 1.3, kg1: 1180, kp: 84, kvb: 300 },
  },
  ECC83: {
    name: 'ECC83',
    otherName: '12AX7',
    published: {
      plateVoltage: 250,
      gridVoltage: -2,
      plateCurrent: 1.2e-3,
      gm: 1.6e-3,
      plateResistance: 62_500,
      mu: 100,
    },
    capacitance: { gridPlate: 1.6e-12, gridCathode: 1.6e-12, plateCathode: 0.46e-12 },
    limits: { plateVoltage: 300, plateDissipation: 1 },
    model: { mu: 100, ex: 1.4, kg1: 1060, kp: 600, kvb: 300 },
  },
};

/** Names of the triodes, in order. */
export const TRIODE_NAMES: readonly TriodeName[] = ['ECC81', 'ECC82', 'ECC83'];
