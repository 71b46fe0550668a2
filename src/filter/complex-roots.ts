/** Roots as two parallel arrays, in no order; conjugates are close to each other, not exact. */
export interface RoughRoots {
  readonly re: Float64Array;
  readonly im: Float64Array;
}

const MOST_SWEEPS = 120; // a root of multiplicity m gains only a factor of about m/(m−1) each sweep
const SETTLED = 1e-9; // relative step; of third order, so what is left is rounding

/**
 * Radii of the roots read off the Newton polygon: the upper convex hull of the points
 * `(k, log|c[k]|)`. Every edge from k to l holds l − k roots of modulus about `|c[k]/c[l]|^(1/(l−k))`.
 */
function startingRadii(coefficients: Float64Array, degree: number): Float64Array {
  const heights = Array.from({ length: degree + 1 }, (_, power) => Math.log(Math.abs(coefficients[power]!)));
  const hull: number[] = [];
  for (let power = 0; power <= degree; power++) {
    if (heights[power] === Number.NEGATIVE_INFINITY) continue;
    while (hull.length > 1) {
      const middle = hull[hull.length - 1]!;
      const first = hull[hull.length - 2]!;
      const before = (heights[middle]! - heights[first]!) * (power - middle);
      const after = (heights[power]! - heights[middle]!) * (middle - first);
      if (before > after) break;
      hull.pop();
    }
    hull.push(power);
  }
  const radii = new Float64Array(degree);
  for (let edge = 1; edge < hull.length; edge++) {
    const from = hull[edge - 1]!;
    const to = hull[edge]!;
    radii.fill(Math.exp((heights[from]! - heights[to]!) / (to - from)), from, to);
  }
  return radii;
}

/** Starting points on the circles of {@link startingRadii}, turned so that none is another's conjugate. */
function startingPoints(coefficients: Float64Array, degree: number): RoughRoots {
  const radii = startingRadii(coefficients, degree);
  const re = new Float64Array(degree);
  const im = new Float64Array(degree);
  for (let index = 0; index < degree; index++) {
    const angle = 2 * Math.PI * index * 0.618 + 0.7; // golden section: neighbours on any circle stay apart
    re[index] = radii[index]! * Math.cos(angle);
    im[index] = radii[index]! * Math.sin(angle);
  }
  return { re, im };
}

/** One Ehrlich–Aberth step of one root, `1/(p′/p − Σ 1/(z − z_j))`; its relative length, 0 when at rounding level. */
function step(coefficients: Float64Array, degree: number, { re, im }: RoughRoots, index: number): number {
  const x = re[index]!;
  const y = im[index]!;
  const modulus = Math.hypot(x, y);
  let valueRe = coefficients[degree]!;
  let valueIm = 0;
  let slopeRe = 0;
  let slopeIm = 0;
  let bound = Math.abs(coefficients[degree]!);
  for (let power = degree - 1; power >= 0; power--) {
    const nextSlope = slopeRe * x - slopeIm * y + valueRe;
    slopeIm = slopeRe * y + slopeIm * x + valueIm;
    slopeRe = nextSlope;
    const nextValue = valueRe * x - valueIm * y + coefficients[power]!;
    valueIm = valueRe * y + valueIm * x;
    valueRe = nextValue;
    bound = bound * modulus + Math.abs(coefficients[power]!);
  }
  const size = valueRe * valueRe + valueIm * valueIm;
  if (Math.sqrt(size) <= Number.EPSILON * degree * bound) return 0;
  let inverseRe = (slopeRe * valueRe + slopeIm * valueIm) / size;
  let inverseIm = (slopeIm * valueRe - slopeRe * valueIm) / size;
  for (let other = 0; other < degree; other++) {
    const alongRe = x - re[other]!;
    const alongIm = y - im[other]!;
    const distance = alongRe * alongRe + alongIm * alongIm;
    if (other === index || distance === 0) continue;
    inverseRe -= alongRe / distance;
    inverseIm += alongIm / distance;
  }
  const length = inverseRe * inverseRe + inverseIm * inverseIm;
  re[index] = x - inverseRe / length;
  im[index] = y + inverseIm / length;
  return 1 / (Math.sqrt(length) * modulus);
}

/**
 * All roots of a real polynomial of degree 3 or more, to about the accuracy that evaluating it in
 * double precision allows: the Ehrlich–Aberth iteration (O. Aberth, Math. Comp. 27, 1973) from
 * Newton-polygon starting points (D. A. Bini, Numer. Algorithms 13, 1996).
 *
 * @param coefficients ascending powers, neither end zero, scaled so that powers neither overflow nor vanish.
 */
export function complexRoots(coefficients: Float64Array, degree: number): RoughRoots {
  const roots = startingPoints(coefficients, degree);
  for (let sweep = 0; sweep < MOST_SWEEPS; sweep++) {
    let largest = 0;
    for (let index = 0; index < degree; index++) {
      largest = Math.max(largest, step(coefficients, degree, roots, index));
    }
    if (largest <= SETTLED) break;
  }
  return roots;
}
