import type { Amperes, Ohms, Siemens, Volts } from '../units.ts';

/**
 * Parameters of the triode model of N. Koren, "Improved vacuum tube models for SPICE simulations",
 * Glass Audio 8(5), 1996. All above 0 (`kvb` may be 0); the names are the paper's.
 */
export interface TriodeParameters {
  /** Amplification factor far from cut-off. */
  readonly mu: number;
  /** Exponent of the current law, near 3/2. */
  readonly ex: number;
  /** Inverse perveance, V^ex/A (the law has 2/kg1). */
  readonly kg1: number;
  /** Sharpness of the cut-off. */
  readonly kp: number;
  /** Bend of the knee, V². */
  readonly kvb: number;
}

/** A triode at one pair of voltages: its current and what small signals meet. */
export interface TriodePoint {
  readonly current: Amperes;
  /** Transconductance ∂I/∂V(grid). */
  readonly gm: Siemens;
  /** Plate conductance ∂I/∂V(plate), the inverse of the plate resistance. */
  readonly gp: Siemens;
  /** Plate resistance `1/gp`; Infinity where nothing flows. */
  readonly plateResistance: Ohms;
  /** Amplification factor `gm/gp`; 0 where nothing flows. */
  readonly mu: number;
}

const OFF: TriodePoint = { current: 0, gm: 0, gp: 0, plateResistance: Number.POSITIVE_INFINITY, mu: 0 };

/**
 * Plate current and its analytic derivatives at given voltages against the cathode.
 *
 * `E = (Vp/kp) · ln(1 + exp(kp · (1/µ + Vg/√(kvb + Vp²))))`, `I = 2 · E^ex / kg1` (Koren 1996,
 * equations 4 and 5; the paper's `1 + sgn(E)` is 2, as E is above 0 with a positive plate). The
 * derivatives are those of the formula, exact but for rounding:
 * `∂E/∂Vg = Vp·σ/√(kvb + Vp²)` and `∂E/∂Vp = ln(1 + eˣ)/kp − σ·Vg·Vp²/(kvb + Vp²)^{3/2}`, where
 * x is the exponent above and σ = 1/(1 + e⁻ˣ).
 *
 * Special cases: a plate at or below the cathode gives no current; NaN gives NaN. Grid current is not
 * part of the model: with the grid above the cathode the plate current is an extrapolation.
 *
 * @param plate plate voltage against the cathode. @param grid grid voltage against the cathode.
 */
export function triodePoint(
  { mu, ex, kg1, kp, kvb }: TriodeParameters,
  plate: Volts,
  grid: Volts,
): TriodePoint {
  if (plate <= 0) return OFF;
  const square = kvb + plate * plate;
  const root = Math.sqrt(square);
  const x = kp * (1 / mu + grid / root);
  // ln(1 + eˣ) and the logistic function, each without overflow on either side.
  const decay = Math.exp(-Math.abs(x));
  const softened = Math.max(x, 0) + Math.log1p(decay);
  const share = x > 0 ? 1 / (1 + decay) : decay / (1 + decay);
  const drive = (plate / kp) * softened;
  if (drive === 0) return OFF;
  const current = (2 * drive ** ex) / kg1;
  const slope = (ex * current) / drive;
  const gm = (slope * plate * share) / root;
  const gp = slope * (softened / kp - (share * grid * plate * plate) / (square * root));
  if (current === 0 || gp === 0) return { ...OFF, current };
  return { current, gm, gp, plateResistance: 1 / gp, mu: gm / gp };
}
