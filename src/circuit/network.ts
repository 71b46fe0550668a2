import type { TransferFunction } from '../transfer-function.ts';
import type { Wiring } from './wiring.ts';

/** Coefficients of every output over their common denominator, ascending powers of `s` (rad/s). */
export interface NetworkResponse {
  /** One numerator for each of the wiring's outputs, in their order. */
  readonly numerators: readonly (readonly number[])[];
  readonly denominator: readonly number[];
}

/** A compiled wiring: the sums of products are known, only the values are missing. */
export interface Network {
  readonly wiring: Wiring;
  /** Number of spanning trees (product terms) in the denominator; may exceed 2^53 and is then approximate. */
  readonly treeCount: number;
  /**
   * Coefficients for one set of values.
   *
   * @param values one value per element, in the order of `wiring.elements`; Ω, F, H, S or ratio.
   *   Zero is allowed (a potentiometer at its end stop); negative, infinite or NaN values are not checked here.
   * @throws NotchworkError `circuit-unsolvable` when the denominator vanishes for these values.
   */
  evaluate(values: ArrayLike<number>): NetworkResponse;
  /** The transfer function to one output (default the first), common zero coefficients removed. */
  transfer(values: ArrayLike<number>, output?: number): TransferFunction;
}
