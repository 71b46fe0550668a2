import { compensatedComplex, compensatedReal } from './compensated.ts';
import type { Couple, RootStructure } from './root-structure.ts';

const MOST_ROUNDS = 80; // two suffice for roots apart; a root of multiplicity m closes in by 1 − 1/m a round
const PATIENCE = 6; // rounds without a smaller step before rounding is taken to have won
const SETTLED = 4 * Number.EPSILON;

/** All roots of a structure, singles first, then both of each couple. */
function placesOf({ singles, couples }: RootStructure, degree: number): [Float64Array, Float64Array] {
  const re = new Float64Array(degree);
  const im = new Float64Array(degree);
  re.set(singles);
  couples.forEach(({ middle, spread }, index) => {
    const at = singles.length + 2 * index;
    const half = Math.sqrt(Math.abs(spread));
    re[at] = spread < 0 ? middle : middle + half;
    re[at + 1] = spread < 0 ? middle : middle - half;
    im[at] = spread < 0 ? half : 0;
    im[at + 1] = -im[at]!;
  });
  return [re, im];
}

/** Refines all roots of one polynomial together. */
class Polisher {
  readonly #coefficients: Float64Array;
  readonly #degree: number;
  readonly #value = new Float64Array(2);
  #re: Float64Array = new Float64Array(0);
  #im: Float64Array = new Float64Array(0);
  /** Largest relative step of the round under way. */
  #largest = 0;

  constructor(coefficients: Float64Array, degree: number) {
    this.#coefficients = coefficients;
    this.#degree = degree;
  }

  /** Weierstrass' correction of one root, `p(z) / (c_n·Π(z − z_j))`. */
  #correction(index: number): { re: number; im: number } {
    const re = this.#re[index]!;
    const im = this.#im[index]!;
    if (im === 0) {
      this.#value[0] = compensatedReal(this.#coefficients, this.#degree, re);
      this.#value[1] = 0;
    } else {
      compensatedComplex(this.#coefficients, this.#degree, re, im, this.#value);
    }
    let productRe = this.#coefficients[this.#degree]!;
    let productIm = 0;
    for (let other = 0; other < this.#degree; other++) {
      if (other === index) continue;
      const alongRe = re - this.#re[other]!;
      const alongIm = im - this.#im[other]!;
      const next = productRe * alongRe - productIm * alongIm;
      productIm = productRe * alongIm + productIm * alongRe;
      productRe = next;
    }
    const size = productRe * productRe + productIm * productIm;
    if (size === 0) return { re: 0, im: 0 };
    const [valueRe, valueIm] = [this.#value[0]!, this.#value[1]!];
    return {
      re: (valueRe * productRe + valueIm * productIm) / size,
      im: (valueIm * productRe - valueRe * productIm) / size,
    };
  }

  #note(step: number, size: number): void {
    const relative = Math.abs(step) / size;
    if (relative > this.#largest) this.#largest = relative;
  }

  #single(root: number, index: number): number {
    const step = this.#correction(index).re;
    this.#note(step, Math.abs(root));
    return root - step;
  }

  /**
   * Newton's step on the couple's quadratic: with the two corrections written as A ± B and √spread
   * as h, the middle moves by −A and the spread becomes `h² − 2hB + A²`, free of cancellation.
   */
  #couple({ middle, spread }: Couple, at: number): Couple {
    const half = Math.sqrt(Math.abs(spread));
    const first = this.#correction(at);
    if (spread < 0) {
      this.#note(Math.hypot(first.re, first.im), Math.hypot(middle, half));
      return { middle: middle - first.re, spread: spread + 2 * half * first.im + first.re ** 2 };
    }
    const second = this.#correction(at + 1);
    const mean = (first.re + second.re) / 2;
    const difference = (first.re - second.re) / 2;
    this.#note(mean, Math.abs(middle));
    this.#note(difference, Math.abs(middle));
    return { middle: middle - mean, spread: spread - 2 * half * difference + mean ** 2 };
  }

  /** One round over all roots, every correction taken from the places of the round before. */
  round(structure: RootStructure): { structure: RootStructure; largest: number } {
    const apart = structure.couples.map(({ middle, spread }) => ({
      middle,
      // Two roots in exactly one place have no correction: part them by about half the digits.
      spread: spread === 0 ? Number.EPSILON * middle ** 2 : spread,
    }));
    const from = { singles: structure.singles, couples: apart };
    [this.#re, this.#im] = placesOf(from, this.#degree);
    this.#largest = 0;
    const singles = from.singles.map((root, index) => this.#single(root, index));
    const couples = from.couples.map((couple, index) => this.#couple(couple, singles.length + 2 * index));
    return { structure: { singles, couples }, largest: this.#largest };
  }
}

/**
 * Refines roots to the last digits of what the coefficients determine: Weierstrass corrections, which
 * are Newton's method on Viète's equations, with values of the polynomial in twice the precision.
 */
export function polishRoots(coefficients: Float64Array, degree: number, rough: RootStructure): RootStructure {
  const polisher = new Polisher(coefficients, degree);
  let best = rough;
  let smallest = Number.POSITIVE_INFINITY;
  let current = rough;
  let idle = 0;
  for (let round = 0; round < MOST_ROUNDS; round++) {
    const { structure, largest } = polisher.round(current);
    current = structure;
    if (largest < smallest) {
      best = structure;
      smallest = largest;
      idle = 0;
    } else {
      idle += 1;
    }
    if (largest <= SETTLED || idle === PATIENCE) break;
  }
  return best;
}
