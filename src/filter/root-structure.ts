import type { RoughRoots } from './complex-roots.ts';

/**
 * Two roots `middle ± √spread` of a real quadratic: two real ones where `spread` is positive or 0,
 * conjugates where it is negative. Held like this, two roots that nearly meet keep all their digits,
 * and may pass from real to complex while they are refined.
 */
export interface Couple {
  readonly middle: number;
  readonly spread: number;
}

/** Roots of a real polynomial, sorted into real ones that stand alone and couples. */
export interface RootStructure {
  readonly singles: readonly number[];
  readonly couples: readonly Couple[];
}

const CLOSE = 1e-3; // relative distance under which two real roots are refined together

/** The quadratic of two roots that should be conjugates, or both real, up to rounding. */
function coupleOf(firstRe: number, firstIm: number, secondRe: number, secondIm: number): Couple {
  const halfRe = (firstRe - secondRe) / 2;
  const halfIm = (firstIm - secondIm) / 2;
  return { middle: (firstRe + secondRe) / 2, spread: halfRe * halfRe - halfIm * halfIm };
}

/** Joins neighbours on the real line that are too close to be refined one by one. */
function joinNeighbours(reals: readonly number[]): RootStructure {
  const singles: number[] = [];
  const couples: Couple[] = [];
  const sorted = [...reals].sort((a, b) => a - b);
  for (let index = 0; index < sorted.length; index++) {
    const here = sorted[index]!;
    const next = sorted[index + 1];
    if (next !== undefined && next - here <= CLOSE * Math.abs(here)) {
      couples.push(coupleOf(here, 0, next, 0));
      index += 1;
    } else {
      singles.push(here);
    }
  }
  return { singles, couples };
}

/**
 * Makes the roots of a real polynomial exactly what they must be: real, or in conjugate couples.
 * Each root is matched with the one nearest to its mirror image; a root nearest to its own is real.
 */
export function structureOf({ re, im }: RoughRoots): RootStructure {
  const order = [...re.keys()].sort(
    (a, b) => Math.abs(im[b]!) * Math.hypot(re[a]!, im[a]!) - Math.abs(im[a]!) * Math.hypot(re[b]!, im[b]!),
  );
  const taken = new Set<number>();
  const reals: number[] = [];
  const couples: Couple[] = [];
  for (const index of order) {
    if (taken.has(index)) continue;
    taken.add(index);
    let mate = -1;
    let nearest = 2 * Math.abs(im[index]!);
    for (const other of order) {
      if (taken.has(other)) continue;
      const distance = Math.hypot(re[other]! - re[index]!, im[other]! + im[index]!);
      if (distance < nearest) {
        nearest = distance;
        mate = other;
      }
    }
    if (mate < 0) {
      reals.push(re[index]!);
    } else {
      taken.add(mate);
      couples.push(coupleOf(re[index]!, im[index]!, re[mate]!, im[mate]!));
    }
  }
  const joined = joinNeighbours(reals);
  return { singles: joined.singles, couples: [...couples, ...joined.couples] };
}
