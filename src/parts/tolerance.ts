/** Kinds of part that are sold with a tolerance. */
export type TolerancedKind = 'resistor' | 'capacitor' | 'inductor' | 'potentiometer';

/** One tolerance that a kind of part is sold with. */
export interface ToleranceClass {
  /** Per cent of the value, both ways. */
  readonly percent: number;
  /** What one is likely to be holding. */
  readonly usual: string;
}

/** Tolerances that parts are usually sold with, tight to wide. Common practice, no source. */
export const TOLERANCE_CLASSES: Readonly<Record<TolerancedKind, readonly ToleranceClass[]>> = {
  resistor: [
    { percent: 1, usual: 'metal film' },
    { percent: 2, usual: 'metal oxide' },
    { percent: 5, usual: 'carbon film, wire-wound' },
    { percent: 10, usual: 'carbon composition' },
  ],
  capacitor: [
    { percent: 1, usual: 'selected mica or polystyrene' },
    { percent: 5, usual: 'mica, close film' },
    { percent: 10, usual: 'film' },
    { percent: 20, usual: 'ceramic, electrolytic' },
  ],
  inductor: [
    { percent: 10, usual: 'wound choke' },
    { percent: 20, usual: 'iron-cored choke' },
  ],
  potentiometer: [
    { percent: 10, usual: 'selected' },
    { percent: 20, usual: 'carbon track' },
  ],
};

/** Tolerance assumed of a part of which nothing else is known, in per cent. Common practice, no source. */
export const USUAL_TOLERANCE: Readonly<Record<TolerancedKind, number>> = {
  resistor: 5,
  capacitor: 10,
  inductor: 20,
  potentiometer: 20,
};
