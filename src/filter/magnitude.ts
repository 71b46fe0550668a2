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

type Four = [number, number, number, number];
type Six = [...Four, number, number];
type Ten = [...Six, number, number, number, number];
type Signed = readonly number[];

/** Coefficients with the signs that E and O have, scaled, filled up with 0 to a length. */
function signed(coefficients: readonly number[], length: number, scale: number): Signed {
  const list: number[] = [];
  for (let power = 0; power < length; power++) {
    const value = power < coefficients.length ? coefficients[power]! * scale : 0;
    list.push(power & 2 ? -value : value);
  }
  return list;
}

/** Orders 0 to 3. */
function upToThird(out: Float64Array, above: Signed, below: Signed, squares: Float64Array): void {
  const [n0, n1, n2, n3] = above as Four;
  const [d0, d1, d2, d3] = below as Four;
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    const even = n0 + x * n2;
    const odd = n1 + x * n3;
    const evenBelow = d0 + x * d2;
    const oddBelow = d1 + x * d3;
    const ratio = (even * even + x * odd * odd) / (evenBelow * evenBelow + x * oddBelow * oddBelow);
    out[point] = 10 * Math.log10(ratio);
  }
}

/** Orders 4 and 5. */
function upToFifth(out: Float64Array, above: Signed, below: Signed, squares: Float64Array): void {
  const [n0, n1, n2, n3, n4, n5] = above as Six;
  const [d0, d1, d2, d3, d4, d5] = below as Six;
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    const even = n0 + x * (n2 + x * n4);
    const odd = n1 + x * (n3 + x * n5);
    const evenBelow = d0 + x * (d2 + x * d4);
    const oddBelow = d1 + x * (d3 + x * d5);
    const ratio = (even * even + x * odd * odd) / (evenBelow * evenBelow + x * oddBelow * oddBelow);
    out[point] = 10 * Math.log10(ratio);
  }
}

/** Orders 6 to 9. */
function upToNinth(out: Float64Array, above: Signed, below: Signed, squares: Float64Array): void {
  const [n0, n1, n2, n3, n4, n5, n6, n7, n8, n9] = above as Ten;
  const [d0, d1, d2, d3, d4, d5, d6, d7, d8, d9] = below as Ten;
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    const even = n0 + x * (n2 + x * (n4 + x * (n6 + x * n8)));
    const odd = n1 + x * (n3 + x * (n5 + x * (n7 + x * n9)));
    const evenBelow = d0 + x * (d2 + x * (d4 + x * (d6 + x * d8)));
    const oddBelow = d1 + x * (d3 + x * (d5 + x * (d7 + x * d9)));
    const ratio = (even * even + x * odd * odd) / (evenBelow * evenBelow + x * oddBelow * oddBelow);
    out[point] = 10 * Math.log10(ratio);
  }
}

/** E² + ω²·O² of a polynomial of any length. */
function squaredSize(coefficients: Signed, x: number): number {
  let even = 0;
  let odd = 0;
  const top = coefficients.length - 1;
  for (let power = top - (top % 2); power >= 0; power -= 2) even = even * x + coefficients[power]!;
  for (let power = top - ((top + 1) % 2); power >= 1; power -= 2) odd = odd * x + coefficients[power]!;
  return even * even + x * odd * odd;
}

function anyOrder(out: Float64Array, above: Signed, below: Signed, squares: Float64Array): void {
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
  const { numerator, denominator } = transfer;
  const longest = Math.max(numerator.length, denominator.length);
  const length = longest <= 4 ? 4 : longest <= 6 ? 6 : Math.max(longest, 10);
  const scale = scaleFor(denominator, squares);
  const above = signed(numerator, length, scale);
  const below = signed(denominator, length, scale);
  if (length === 4) upToThird(out, above, below, squares);
  else if (length === 6) upToFifth(out, above, below, squares);
  else if (length === 10) upToNinth(out, above, below, squares);
  else anyOrder(out, above, below, squares);
}
