import type { Complex } from './complex.ts';
import type { PolynomialRoots } from './roots.ts';

/** Poles and zeros that one section will hold; the zeros never outnumber the poles. */
export interface RootGroup {
  /** Logarithm of the modulus of every pole, to measure distance by. */
  readonly places: number[];
  readonly poles: { readonly real: number[]; readonly pairs: Complex[] };
  readonly zeros: { readonly real: number[]; readonly pairs: Complex[] };
  /** How many more zeros it may take. */
  room: number;
}

const HIGHEST_ORDER = 3;
const ORIGIN = 1e3; // stands for the logarithmic distance to a zero at 0: beyond all others

function emptyGroup(): RootGroup {
  return { places: [], poles: { real: [], pairs: [] }, zeros: { real: [], pairs: [] }, room: 0 };
}

/**
 * Deals the poles out: one conjugate pair a group, then the real ones in ascending order, each to the
 * emptiest group. So neighbours land in different groups, which keeps the coefficients of a digital
 * section well conditioned: poles that crowd near z = 1 within one section cost digits.
 */
function dealPoles(poles: PolynomialRoots, count: number): RootGroup[] {
  const groups: RootGroup[] = [];
  for (let index = 0; index < count; index++) groups.push(emptyGroup());
  poles.pairs.forEach((pair, index) => {
    const group = groups[index]!;
    const place = Math.log(pair.re * pair.re + pair.im * pair.im) / 2;
    group.poles.pairs.push(pair);
    group.places.push(place, place);
    group.room = 2;
  });
  for (const pole of poles.real) {
    let emptiest = groups[0]!;
    for (const group of groups) if (group.room < emptiest.room) emptiest = group;
    emptiest.poles.real.push(pole);
    emptiest.places.push(Math.log(-pole));
    emptiest.room += 1;
  }
  return groups;
}

/** The fewest groups of at most three poles that also leave room for every conjugate pair of zeros. */
function groupsFor(poles: PolynomialRoots, zeroPairs: number): RootGroup[] {
  const pairs = poles.pairs.length;
  const spare = Math.max(0, poles.real.length - pairs);
  for (let count = Math.max(1, pairs + Math.ceil(spare / HIGHEST_ORDER)); ; count++) {
    const groups = dealPoles(poles, count);
    const places = groups.reduce((sum, { room }) => sum + Math.floor(room / 2), 0);
    if (places >= zeroPairs) return groups;
  }
}

/** Distance of a zero from the nearest pole of a group, as a ratio's logarithm; a zero at 0 is nearest to the lowest. */
function distance(place: number, group: RootGroup): number {
  const origin = place === Number.NEGATIVE_INFINITY;
  let nearest = Number.POSITIVE_INFINITY;
  for (const pole of group.places) {
    const far = origin ? pole + ORIGIN : Math.abs(pole - place);
    if (far < nearest) nearest = far;
  }
  return nearest;
}

/** Puts zeros into groups, nearest first; `size` is how much room each takes. */
function dealZeros<Zero>(
  zeros: readonly Zero[],
  places: number[],
  size: number,
  groups: readonly RootGroup[],
  put: (zero: Zero, group: RootGroup) => void,
): void {
  for (let count = 0; count < zeros.length; count++) {
    let chosen = 0;
    let home = groups[0]!;
    let nearest = Number.POSITIVE_INFINITY;
    for (let index = 0; index < zeros.length; index++) {
      if (Number.isNaN(places[index])) continue; // already put
      for (const group of groups) {
        if (group.room < size) continue;
        const far = distance(places[index]!, group);
        if (far >= nearest) continue;
        nearest = far;
        chosen = index;
        home = group;
      }
    }
    put(zeros[chosen]!, home);
    places[chosen] = Number.NaN;
    home.room -= size;
  }
}

/**
 * Shares poles and zeros out among as few sections of order 3 or less as hold them, every zero with a
 * pole close to it, so that no section on its own rises or falls far.
 *
 * @param poles all in the open left half-plane.
 * @param zeros no more than the poles.
 */
export function pairRoots(poles: PolynomialRoots, zeros: PolynomialRoots): readonly RootGroup[] {
  const groups = groupsFor(poles, zeros.pairs.length);
  const pairPlaces = zeros.pairs.map(({ re, im }) => Math.log(re * re + im * im) / 2);
  dealZeros(zeros.pairs, pairPlaces, 2, groups, (zero, group) => group.zeros.pairs.push(zero));
  const realPlaces = zeros.real.map((zero) => Math.log(Math.abs(zero)));
  dealZeros(zeros.real, realPlaces, 1, groups, (zero, group) => group.zeros.real.push(zero));
  return groups;
}
