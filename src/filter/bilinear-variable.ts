import { compensatedDot } from './compensated.ts';

/** `tables[n][k][j]` is the coefficient of `w^k` in `(1 − w)^j (1 + w)^(n−j)`, small exact integers. */
const tables: number[][][] = [];

function makeTable(order: number): number[][] {
  const columns = Array.from({ length: order + 1 }, (_, minus) => {
    let polynomial = [1];
    for (let factor = 0; factor < order; factor++) {
      const sign = factor < minus ? -1 : 1;
      polynomial = [...polynomial, 0].map((value, index) => value + sign * (polynomial[index - 1] ?? 0));
    }
    return polynomial;
  });
  return Array.from({ length: order + 1 }, (_, power) => columns.map((column) => column[power]!));
}

/** Rows of the substitution between `z⁻¹` and the bilinear variable for one order; see {@link toBilinearVariable}. */
export function bilinearTable(order: number): readonly (readonly number[])[] {
  let table = tables[order];
  if (table === undefined) {
    table = makeTable(order);
    tables[order] = table;
  }
  return table;
}

/**
 * A polynomial in `z⁻¹` seen from the variable `w = (1 − z⁻¹)/(1 + z⁻¹)`: the coefficients, ascending
 * powers of w, of `(1 + w)^n · P((1 − w)/(1 + w))`, n being the number of coefficients less one.
 *
 * On the unit circle `w = j·tan(ω/2fs)`, so that low frequencies are small numbers instead of small
 * differences from 1; inside the circle is the left half-plane of w. The sums are taken in twice the
 * precision, because near z = 1 nearly everything cancels.
 */
export function toBilinearVariable(coefficients: readonly number[]): number[] {
  return bilinearTable(coefficients.length - 1).map((row) => compensatedDot(row, coefficients));
}
