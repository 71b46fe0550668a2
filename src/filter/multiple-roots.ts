import { compensatedReal } from './compensated.ts';
import type { Couple, RootStructure } from './root-structure.ts';

const CLUSTER = 0.05; // relative; rounding spreads a root of multiplicity 8 over about 1e-16^(1/8) = 0.01
const LEAST = 3; // two roots are held together as a couple already
const MOST_STEPS = 20;
const UNCHANGED = 128 * Number.EPSILON; // relative change of a coefficient that the sums it came from explain

interface Place {
  readonly re: number;
  readonly im: number;
}

function placesOf({ singles, couples }: RootStructure): Place[] {
  const places: Place[] = singles.map((re) => ({ re, im: 0 }));
  for (const { middle, spread } of couples) {
    const half = Math.sqrt(Math.abs(spread));
    if (spread < 0) places.push({ re: middle, im: half }, { re: middle, im: -half });
    else places.push({ re: middle - half, im: 0 }, { re: middle + half, im: 0 });
  }
  return places.sort((a, b) => a.re - b.re);
}

/** Runs of three or more roots close to each other and to the real axis, and everything else. */
function clustersOf(structure: RootStructure): Place[][] {
  const clusters: Place[][] = [];
  let current: Place[] = [];
  for (const place of placesOf(structure)) {
    if (Math.abs(place.im) > CLUSTER * Math.abs(place.re)) continue;
    const last = current.at(-1);
    if (last !== undefined && place.re - last.re > CLUSTER * Math.abs(last.re)) {
      clusters.push(current);
      current = [];
    }
    current.push(place);
  }
  clusters.push(current);
  return clusters.filter((cluster) => cluster.length >= LEAST);
}

/** Coefficients of the `count`-th derivative. */
function derivative(coefficients: Float64Array, count: number): Float64Array {
  let current = coefficients;
  for (let turn = 0; turn < count; turn++) {
    current = Float64Array.from(
      { length: current.length - 1 },
      (_, power) => (power + 1) * current[power + 1]!,
    );
  }
  return current;
}

/** The simple root of a derivative next to `start`: where an m-fold root of the polynomial must be. */
function simpleRoot(coefficients: Float64Array, start: number): number {
  const slope = derivative(coefficients, 1);
  let root = start;
  for (let turn = 0; turn < MOST_STEPS; turn++) {
    const step =
      compensatedReal(coefficients, coefficients.length - 1, root) /
      compensatedReal(slope, slope.length - 1, root);
    root -= step;
    if (!(Math.abs(step) > Number.EPSILON * Math.abs(root))) break;
  }
  return root;
}

/** The structure with a cluster replaced by one root as many times. */
function merged({ singles, couples }: RootStructure, cluster: readonly Place[], root: number): RootStructure {
  const low = cluster[0]!.re;
  const high = cluster.at(-1)!.re;
  const within = (re: number): boolean => re >= low && re <= high;
  const flat = ({ middle, spread }: Couple): boolean => spread >= -((CLUSTER * middle) ** 2);
  return {
    singles: [...singles.filter((re) => !within(re)), ...new Array<number>(cluster.length).fill(root)],
    couples: couples.filter((couple) => !(within(couple.middle) && flat(couple))),
  };
}

/** Whether the roots multiply out to the polynomial, up to the rounding of its coefficients. */
function reproduces(coefficients: Float64Array, { singles, couples }: RootStructure): boolean {
  let product = [coefficients.at(-1)!];
  let sizes = [Math.abs(product[0]!)];
  const multiply = (list: readonly number[], factor: readonly number[]): number[] => {
    const grown = new Array<number>(list.length + factor.length - 1).fill(0);
    list.forEach((value, index) => {
      factor.forEach((other, power) => {
        grown[index + power]! += value * other;
      });
    });
    return grown;
  };
  const factors = [
    ...singles.map((root) => [-root, 1]),
    ...couples.map(({ middle, spread }) => [middle * middle - spread, -2 * middle, 1]),
  ];
  for (const factor of factors) {
    product = multiply(product, factor);
    sizes = multiply(sizes, factor.map(Math.abs));
  }
  return (
    product.length === coefficients.length &&
    product.every((value, power) => Math.abs(value - coefficients[power]!) <= UNCHANGED * sizes[power]!)
  );
}

/**
 * Takes real roots that rounding has parted for what they are: one root, several times. Three or more
 * equal stages in a row give such a polynomial, and its roots searched one by one are good only to the
 * m-th root of the precision. The merged root is found where it is simple, in the (m − 1)-th
 * derivative, and kept only if the polynomial multiplies out again to the last digits.
 *
 * @param coefficients ascending powers, exactly as many as the degree asks for.
 */
export function mergeMultipleRoots(coefficients: Float64Array, structure: RootStructure): RootStructure {
  let best = structure;
  for (const cluster of clustersOf(structure)) {
    const mean = cluster.reduce((sum, { re }) => sum + re, 0) / cluster.length;
    const root = simpleRoot(derivative(coefficients, cluster.length - 1), mean);
    const candidate = merged(best, cluster, root);
    if (reproduces(coefficients, candidate)) best = candidate;
  }
  return best;
}
