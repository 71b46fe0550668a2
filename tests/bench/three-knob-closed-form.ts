import type { TransferFunction } from '../../src/transfer-function.ts';

/** Part values and control positions of the three-knob network, named as in the paper. */
export interface ClosedFormValues {
  /** Treble, bass (low) and middle control, as ratios of their tracks. */
  readonly t: number;
  readonly l: number;
  readonly m: number;
  /** Treble, bass and middle potentiometer and slope resistor in ohms. */
  readonly R1: number;
  readonly R2: number;
  readonly R3: number;
  readonly R4: number;
  /** Treble, bass and mid capacitor in farads. */
  readonly C1: number;
  readonly C2: number;
  readonly C3: number;
}

/**
 * The three-knob network with an ideal source and no load, mid capacitor to the wiper, in closed form:
 * D. T. Yeh and J. O. Smith, DAFx-06, Montreal, 2006 (coefficients from memory; the benchmark compares
 * them with the engine before it times them).
 */
export function threeKnobClosedForm(values: ClosedFormValues): TransferFunction {
  const { t, l, m, R1, R2, R3, R4, C1, C2, C3 } = values;
  const C123 = C1 * C2 * C3;
  const squares = C1 * C3 * R3 * R3 + C2 * C3 * R3 * R3;
  const wiper = C123 * R1 * R3 * R3 + C123 * R3 * R3 * R4;
  const cross = C1 * C3 * R2 * R3 + C2 * C3 * R2 * R3;
  const b1 = t * C1 * R1 + m * C3 * R3 + l * (C1 * R2 + C2 * R2) + (C1 * R3 + C2 * R3);
  const b2 =
    t * (C1 * C2 * R1 * R4 + C1 * C3 * R1 * R4) -
    m * m * squares +
    m * (C1 * C3 * R1 * R3 + squares) +
    l * (C1 * C2 * R1 * R2 + C1 * C2 * R2 * R4 + C1 * C3 * R2 * R4) +
    l * m * cross +
    (C1 * C2 * R1 * R3 + C1 * C2 * R3 * R4 + C1 * C3 * R3 * R4);
  const b3 =
    l * m * (C123 * R1 * R2 * R3 + C123 * R2 * R3 * R4) -
    m * m * wiper +
    m * wiper +
    t * C123 * R1 * R3 * R4 -
    t * m * C123 * R1 * R3 * R4 +
    t * l * C123 * R1 * R2 * R4;
  const a1 = C1 * R1 + C1 * R3 + C2 * R3 + C2 * R4 + C3 * R4 + m * C3 * R3 + l * (C1 * R2 + C2 * R2);
  const a2 =
    m * (C1 * C3 * R1 * R3 - C2 * C3 * R3 * R4 + squares) +
    l * m * cross -
    m * m * squares +
    l * (C1 * C2 * R2 * R4 + C1 * C2 * R1 * R2 + C1 * C3 * R2 * R4 + C2 * C3 * R2 * R4) +
    (C1 * C2 * R1 * R4 +
      C1 * C3 * R1 * R4 +
      C1 * C2 * R3 * R4 +
      C1 * C2 * R1 * R3 +
      C1 * C3 * R3 * R4 +
      C2 * C3 * R3 * R4);
  const a3 =
    l * m * (C123 * R1 * R2 * R3 + C123 * R2 * R3 * R4) -
    m * m * wiper +
    m * (wiper - C123 * R1 * R3 * R4) +
    l * C123 * R1 * R2 * R4 +
    C123 * R1 * R3 * R4;
  return { numerator: [0, b1, b2, b3], denominator: [1, a1, a2, a3] };
}
