/**
 * Sums, products and polynomials evaluated as if in twice the working precision, by error-free
 * transformations: every rounding error is itself a double and is carried along (T. J. Dekker 1971,
 * D. E. Knuth's two-sum; Ogita, Rump and Oishi, SIAM J. Sci. Comput. 26, 2005; the compensated
 * Horner scheme of Langlois and Louvet, ARITH 18, 2007).
 */

const SPLITTER = 2 ** 27 + 1; // Veltkamp's constant: halves the 53 bits of a double

/** The upper half of a double's bits; the rest is `value − upper`. Overflows above about 1e300. */
function upperHalf(value: number): number {
  const scaled = SPLITTER * value;
  return scaled - (scaled - value);
}

/** What `first × second` lost when it was rounded to `product`, exactly. */
export function productError(first: number, second: number, product: number): number {
  const firstUpper = upperHalf(first);
  const secondUpper = upperHalf(second);
  const firstLower = first - firstUpper;
  const secondLower = second - secondUpper;
  return (
    firstLower * secondLower -
    (product - firstUpper * secondUpper - firstLower * secondUpper - firstUpper * secondLower)
  );
}

/** What `first + second` lost when it was rounded to `sum`, exactly. */
export function sumError(first: number, second: number, sum: number): number {
  const shadow = sum - first;
  return first - (sum - shadow) + (second - shadow);
}

/**
 * `first·second − third·fourth` to within two units in the last place, whatever cancels
 * (W. Kahan's determinant; Jeannerod, Louvet and Muller, Math. Comp. 82, 2013).
 */
export function differenceOfProducts(first: number, second: number, third: number, fourth: number): number {
  const left = first * second;
  const right = third * fourth;
  return left - right + (productError(first, second, left) - productError(third, fourth, right));
}

/** The sum of `first[i]·second[i]`, rounded once from about twice the working precision. */
export function compensatedDot(first: ArrayLike<number>, second: ArrayLike<number>): number {
  let sum = 0;
  let lost = 0;
  for (let index = 0; index < first.length; index++) {
    const product = first[index]! * second[index]!;
    const next = sum + product;
    lost += productError(first[index]!, second[index]!, product) + sumError(sum, product, next);
    sum = next;
  }
  return sum + lost;
}

/**
 * Value of a real polynomial at a real point, accurate to its last digits also beside a root.
 *
 * @param coefficients ascending powers; those above `degree` are not read.
 */
export function compensatedReal(coefficients: ArrayLike<number>, degree: number, point: number): number {
  let value = coefficients[degree]!;
  let lost = 0;
  for (let power = degree - 1; power >= 0; power--) {
    const product = value * point;
    const sum = product + coefficients[power]!;
    const error = productError(value, point, product) + sumError(product, coefficients[power]!, sum);
    lost = lost * point + error;
    value = sum;
  }
  return value + lost;
}

/**
 * Value of a real polynomial at a complex point, accurate to its last digits also beside a root
 * (the complex form: Graillat and Ménissier-Morain, NOLTA 2008).
 *
 * @param out receives the real and the imaginary part.
 */
export function compensatedComplex(
  coefficients: ArrayLike<number>,
  degree: number,
  re: number,
  im: number,
  out: Float64Array,
): void {
  let valueRe = coefficients[degree]!;
  let valueIm = 0;
  let lostRe = 0;
  let lostIm = 0;
  for (let power = degree - 1; power >= 0; power--) {
    const reRe = valueRe * re;
    const imIm = valueIm * im;
    const reIm = valueRe * im;
    const imRe = valueIm * re;
    const difference = reRe - imIm;
    const nextRe = difference + coefficients[power]!;
    const nextIm = reIm + imRe;
    const errorRe =
      productError(valueRe, re, reRe) -
      productError(valueIm, im, imIm) +
      sumError(reRe, -imIm, difference) +
      sumError(difference, coefficients[power]!, nextRe);
    const errorIm =
      productError(valueRe, im, reIm) + productError(valueIm, re, imRe) + sumError(reIm, imRe, nextIm);
    const carried = lostRe * re - lostIm * im + errorRe;
    lostIm = lostRe * im + lostIm * re + errorIm;
    lostRe = carried;
    valueRe = nextRe;
    valueIm = nextIm;
  }
  out[0] = valueRe + lostRe;
  out[1] = valueIm + lostIm;
}
