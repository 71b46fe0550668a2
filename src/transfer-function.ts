/**
 * A rational transfer function of the complex frequency `s` (rad/s).
 *
 * Both arrays hold real coefficients in ascending powers of `s`: `numerator[k]` multiplies `s^k`.
 * The lengths may differ; `denominator` has at least one coefficient that is not zero.
 */
export interface TransferFunction {
  readonly numerator: readonly number[];
  readonly denominator: readonly number[];
}
