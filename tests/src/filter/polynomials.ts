import type { Complex } from '../../../src/filter/complex.ts';
import type { TransferFunction } from '../../../src/transfer-function.ts';

/*
 * Plain tools for the filter tests, written apart from the code under test: no scaling, no
 * compensation, no splitting into even and odd parts.
 */

/** A generator of numbers in [0, 1) that gives the same ones in every run (D. H. Lehmer, modulus 2³¹ − 1). */
export function seeded(seed: number): () => number {
  let state = seed % 2147483647 || 1;
  return () => {
    state = (state * 48271) % 2147483647;
    return state / 2147483647;
  };
}

/** Product of polynomials, ascending powers. */
export function product(...factors: readonly (readonly number[])[]): number[] {
  return factors.reduce<number[]>(
    (left, right) => {
      const grown = new Array<number>(left.length + right.length - 1).fill(0);
      left.forEach((a, i) => {
        right.forEach((b, j) => {
          grown[i + j]! += a * b;
        });
      });
      return grown;
    },
    [1],
  );
}

export function times(a: Complex, b: Complex): Complex {
  return { re: a.re * b.re - a.im * b.im, im: a.re * b.im + a.im * b.re };
}

export function over(a: Complex, b: Complex): Complex {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
}

/** |a − b| / |b|. */
export function relativeError(a: Complex, b: Complex): number {
  return Math.hypot(a.re - b.re, a.im - b.im) / Math.hypot(b.re, b.im);
}

/** A polynomial at a complex point. */
export function at(coefficients: readonly number[], point: Complex): Complex {
  return coefficients.reduceRight<Complex>(
    (sum, coefficient) => {
      const turned = times(sum, point);
      return { re: turned.re + coefficient, im: turned.im };
    },
    { re: 0, im: 0 },
  );
}

/** A transfer function at jω. */
export function transferAt(transfer: TransferFunction, omega: number): Complex {
  const point = { re: 0, im: omega };
  return over(at(transfer.numerator, point), at(transfer.denominator, point));
}

/** The product of transfer functions at jω. */
export function cascadeAt(sections: readonly TransferFunction[], omega: number): Complex {
  return sections.reduce<Complex>((sum, section) => times(sum, transferAt(section, omega)), { re: 1, im: 0 });
}

/** `count` frequencies in rad/s, evenly spread over 10 Hz to 40 kHz on a logarithmic scale. */
export function audibleOmegas(count: number): number[] {
  return Array.from({ length: count }, (_, index) => 2 * Math.PI * 10 * 4000 ** (index / (count - 1)));
}
