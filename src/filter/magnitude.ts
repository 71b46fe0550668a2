import type { TransferFunction } from '../transfer-function.ts';

/*
 * P(jω) = E(ω²) + jω·O(ω²): the even coefficients give the real part, the odd ones the imaginary part,
 * both with alternating signs. So |P|² = E² + ω²·O² takes about as many multiplications as the degree,
 * all real; and one logarithm of the quotient serves a point. Unlike |P|² as one polynomial in ω² this
 * keeps its digits at the bottom of a dip.
 *
 * The lengths that the blocks here have are written out: a loop over three coefficients costs more
 * than the three multiplications.
 */

/** The signed coefficient of a power, as E and O have it, 0 above the degree; scaled. */
function signed(coefficients: readonly number[], power: number, scale: number): number {
  if (power >= coefficients.length) return 0;
  return (power & 2 ? -scale : scale) * coefficients[power]!;
}

function upToCubic(
  out: Float64Array,
  { numerator, denominator }: TransferFunction,
  squares: Float64Array,
  scale: number,
): void {
  const n0 = signed(numerator, 0, scale);
  const n1 = signed(numerator, 1, scale);
  const n2 = signed(numerator, 2, scale);
  const n3 = signed(numerator, 3, scale);
  const d0 = signed(denominator, 0, scale);
  const d1 = signed(denominator, 1, scale);
  const d2 = signed(denominator, 2, scale);
  const d3 = signed(denominator, 3, scale);
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    const above = n0 + x * n2;
    const aboveOdd = n1 + x * n3;
    const below = d0 + x * d2;
    const belowOdd = d1 + x * d3;
    const ratio = (above * above + x * aboveOdd * aboveOdd) / (below * below + x * belowOdd * belowOdd);
    out[point] = 10 * Math.log10(ratio);
  }
}

function upToQuintic(
  out: Float64Array,
  { numerator, denominator }: TransferFunction,
  squares: Float64Array,
  scale: number,
): void {
  const n0 = signed(numerator, 0, scale);
  const n1 = signed(numerator, 1, scale);
  const n2 = signed(numerator, 2, scale);
  const n3 = signed(numerator, 3, scale);
  const n4 = signed(numerator, 4, scale);
  const n5 = signed(numerator, 5, scale);
  const d0 = signed(denominator, 0, scale);
  const d1 = signed(denominator, 1, scale);
  const d2 = signed(denominator, 2, scale);
  const d3 = signed(denominator, 3, scale);
  const d4 = signed(denominator, 4, scale);
  const d5 = signed(denominator, 5, scale);
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    const above = n0 + x * (n2 + x * n4);
    const aboveOdd = n1 + x * (n3 + x * n5);
    const below = d0 + x * (d2 + x * d4);
    const belowOdd = d1 + x * (d3 + x * d5);
    const ratio = (above * above + x * aboveOdd * aboveOdd) / (below * below + x * belowOdd * belowOdd);
    out[point] = 10 * Math.log10(ratio);
  }
}

/** E² + ω²·O² of a polynomial of any length, from its signed coefficients. */
function squaredSize(coefficients: Float64Array, x: number): number {
  let even = 0;
  let odd = 0;
  const top = coefficients.length - 1;
  for (let power = top - (top % 2); power >= 0; power -= 2) even = even * x + coefficients[power]!;
  for (let power = top - ((top + 1) % 2); power >= 1; power -= 2) odd = odd * x + coefficients[power]!;
  return even * even + x * odd * odd;
}

function anyLength(
  out: Float64Array,
  { numerator, denominator }: TransferFunction,
  squares: Float64Array,
  scale: number,
): void {
  const above = Float64Array.from(numerator, (_, power) => signed(numerator, power, scale));
  const below = Float64Array.from(denominator, (_, power) => signed(denominator, power, scale));
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    out[point] = 10 * Math.log10(squaredSize(above, x) / squaredSize(below, x));
  }
}

/** A power of two that brings the denominator's largest term in the middle of the grid near 1: squares then neither overflow nor vanish. */
function scaleFor(denominator: readonly number[], squares: Float64Array): number {
  const omega = Math.sqrt(squares[squares.length >> 1] ?? 1);
  let largest = 0;
  let power = 1;
  for (const coefficient of denominator) {
    largest = Math.max(largest, Math.abs(coefficient) * power);
    power *= omega;
  }
  return largest > 0 && largest < Number.POSITIVE_INFINITY ? 2 ** -Math.round(Math.log2(largest)) : 1;
}

/**
 * Magnitude in dB of a transfer function, `20·log10|N(jω)/D(jω)|`, one value a point.
 *
 * A numerator that is 0 gives −Infinity, a pole on the axis +Infinity.
 *
 * @param out receives the decibels; as long as `squares`.
 * @param transfer ascending powers of the variable.
 * @param squares the squares of the imaginary variable: ω² in (rad/s)² for the analogue case.
 */
export function magnitudeAtSquares(
  out: Float64Array,
  transfer: TransferFunction,
  squares: Float64Array,
): void {
  const length = Math.max(transfer.numerator.length, transfer.denominator.length);
  const scale = scaleFor(transfer.denominator, squares);
  if (length <= 4) upToCubic(out, transfer, squares, scale);
  else if (length <= 6) upToQuintic(out, transfer, squares, scale);
  else anyLength(out, transfer, squares, scale);
}
