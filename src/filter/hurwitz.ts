import { differenceOfProducts } from './compensated.ts';

/**
 * The first column of Routh's array, all of one sign when every root lies in the open left half-plane.
 * `upper` and `lower` are the first two rows: every second coefficient from the top of the polynomial.
 */
function routhHolds(upper: readonly number[], lower: readonly number[]): boolean {
  let above = [...upper];
  let row = [...lower];
  while (row.length > 0) {
    if (!(row[0]! > 0)) return false;
    const ratio = above[0]! / row[0]!;
    const next = above.slice(1).map((value, index) => value - ratio * (row[index + 1] ?? 0));
    above = row;
    row = next;
  }
  return true;
}

/**
 * Whether all roots of a real polynomial have a negative real part (E. J. Routh 1877; A. Hurwitz
 * 1895). A constant other than 0 has no roots and is stable; a root on the axis is not.
 *
 * @param coefficients ascending powers; the last is not 0.
 */
export function isHurwitz(coefficients: readonly number[]): boolean {
  const degree = coefficients.length - 1;
  const sign = Math.sign(coefficients[degree]!);
  for (const coefficient of coefficients) if (!(coefficient * sign > 0)) return false;
  if (degree < 3) return true;
  if (degree === 3) {
    const [c0, c1, c2, c3] = coefficients as [number, number, number, number];
    return differenceOfProducts(c1, c2, c0, c3) > 0;
  }
  const descending = coefficients.map((value) => value * sign).reverse();
  return routhHolds(
    descending.filter((_, index) => index % 2 === 0),
    descending.filter((_, index) => index % 2 === 1),
  );
}
