import { describe, expect, it } from 'vitest';
import { NotchworkError } from '../../../src/errors.ts';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { Cascade } from '../../../src/filter/cascade.ts';
import { factor } from '../../../src/filter/factor.ts';
import { impulseTail } from '../../../src/filter/impulse-tail.ts';
import { polynomialRoots } from '../../../src/filter/roots.ts';
import { assertPlayable } from '../../../src/filter/section.ts';
import { product } from './polynomials.ts';

/** One case per rule: what is done, the code of the error, and words that its message must hold. */
function refuses(what: string, action: () => unknown, code: string, words: RegExp): void {
  it(`${what}: ${code}`, () => {
    let thrown: unknown;
    try {
      action();
    } catch (error) {
      thrown = error;
    }
    expect(thrown).toBeInstanceOf(NotchworkError);
    expect((thrown as NotchworkError).code).toBe(code);
    expect((thrown as NotchworkError).message).toMatch(words);
  });
}

const ones = (count: number) => [1, ...new Array<number>(count - 1).fill(0)];

describe('a node is not built of', () => {
  const play = (feedforward: number[], feedback: number[]) => () => assertPlayable({ feedforward, feedback });
  refuses('no feedforward coefficients', play([], [1]), 'filter-invalid', /0 feedforward/);
  refuses('no feedback coefficients', play([1], []), 'filter-invalid', /0 feedback/);
  refuses('21 coefficients', play(ones(21), ones(21)), 'filter-invalid', /21 feedforward.*1 to 20/);
  refuses('21 feedback coefficients', play(ones(20), ones(21)), 'filter-invalid', /21 feedback/);
  refuses('a NaN', play([1, Number.NaN], [1, 0]), 'filter-invalid', /feedforward coefficient 1 .* NaN/);
  refuses(
    'an infinity',
    play([1, 0], [1, Number.POSITIVE_INFINITY]),
    'filter-invalid',
    /feedback coefficient 1 .* Infinity/,
  );
  refuses('unequal lengths', play([1], [1, 0]), 'filter-invalid', /1 feedforward and 2 feedback/);
  refuses('a leading 0', play([1, 0], [0, 1]), 'filter-invalid', /first feedback coefficient is 0/);
  refuses('a leading 2', play([1, 0], [2, 1]), 'filter-invalid', /first feedback coefficient is 2/);
  refuses('feedforward all 0', play([0, 0], [1, 0]), 'filter-invalid', /passes nothing/);
  refuses('a pole on the circle at z = 1', play([1, 0], [1, -1]), 'filter-unstable', /unit circle/);
  refuses('a pole on the circle at z = −1', play([1, 0], [1, 1]), 'filter-unstable', /unit circle/);
  refuses('a pair on the circle', play([1, 0, 0], [1, -1, 1]), 'filter-unstable', /unit circle/);
  refuses('a pole just outside', play([1, 0], [1, -(1 + 2 ** -52)]), 'filter-unstable', /unit circle/);
  refuses(
    'a pair outside, order 3',
    play(ones(4), product([1, -0.5], [1, -1.2, 1.0001])),
    'filter-unstable',
    /run away/,
  );
  refuses(
    'a pole outside, order 7',
    play(ones(8), product([1, -1.01], ...new Array<number[]>(6).fill([1, -0.3]))),
    'filter-unstable',
    /run away/,
  );
});

describe('a transfer function is not factored with', () => {
  const split = (numerator: number[], denominator: number[]) => () => factor({ numerator, denominator });
  refuses('a denominator of 0', split([1], [0, 0]), 'filter-invalid', /denominator .* 0 throughout/);
  refuses('no denominator', split([1], []), 'filter-invalid', /denominator/);
  refuses('a NaN above', split([1, Number.NaN], [1, 1]), 'filter-invalid', /Coefficient 1 .* NaN/);
  refuses('an infinity below', split([1], [1, Number.POSITIVE_INFINITY]), 'filter-invalid', /Infinity/);
  refuses('a numerator of higher order', split([0, 1], [1]), 'filter-invalid', /rises without limit/);
  refuses('a pole on the right', split([1], [-1, 1]), 'filter-unstable', /right half-plane/);
  refuses('a pole at 0', split([1], [0, 1]), 'filter-unstable', /imaginary axis/);
  refuses('a pair on the axis', split([1], [1, 0, 1]), 'filter-unstable', /imaginary axis/);
  refuses(
    'a real pole on the right in order 5',
    split([1], product([1, -1e-3], [1, 1e-2], [1, 1e-4], [1, 1e-5], [1, 1])),
    'filter-unstable',
    /right half-plane/,
  );
  refuses(
    'a pair on the right in order 5',
    split([1], product([1, -1e-4, 1e-6], [1, 1e-2], [1, 1e-4], [1, 1e-5])),
    'filter-unstable',
    /right half-plane/,
  );
  refuses(
    'a pole at 0 in order 4',
    split([1], product([0, 1], [1, 1e-2], [1, 1e-4], [1, 1e-5])),
    'filter-unstable',
    /right half-plane/,
  );
});

describe('the bilinear transform refuses', () => {
  const low = { numerator: [1], denominator: [1, 1e-3] };
  refuses(
    'order 4',
    () => bilinear({ numerator: [1], denominator: [1, 4, 6, 4, 1] }, 48000),
    'filter-invalid',
    /order 4.*Factor/,
  );
  refuses(
    'a denominator of 0',
    () => bilinear({ numerator: [1], denominator: [0] }, 48000),
    'filter-invalid',
    /order -1/,
  );
  refuses(
    'a numerator of higher order',
    () => bilinear({ numerator: [0, 0, 1], denominator: [1, 1] }, 48000),
    'filter-invalid',
    /no higher/,
  );
  refuses('a sample rate of 0', () => bilinear(low, 0), 'value-out-of-range', /sample rate/);
  refuses('a sample rate of NaN', () => bilinear(low, Number.NaN), 'value-out-of-range', /sample rate/);
  refuses(
    'pre-warping at 0 Hz',
    () => bilinear(low, 48000, { prewarp: 0 }),
    'value-out-of-range',
    /pre-warp/,
  );
  refuses(
    'pre-warping at half the sample rate',
    () => bilinear(low, 48000, { prewarp: 24000 }),
    'value-out-of-range',
    /24000/,
  );
  refuses(
    'numbers beyond double precision',
    () => bilinear({ numerator: [1, 1e308], denominator: [1, 1e-3] }, 48000),
    'filter-invalid',
    /double precision/,
  );
});

describe('roots are not sought of', () => {
  refuses('nothing', () => polynomialRoots([]), 'filter-invalid', /all 0/);
  refuses('zero', () => polynomialRoots([0, 0, 0]), 'filter-invalid', /all 0/);
  refuses('a NaN', () => polynomialRoots([1, Number.NaN, 1]), 'filter-invalid', /Coefficient 1 .* NaN/);
  refuses(
    'what no double can span',
    () => polynomialRoots([1e300, 1, 1e-300, 1, 1e-300]),
    'filter-invalid',
    /too far apart/,
  );
});

describe('a cascade refuses', () => {
  refuses(
    'order 4',
    () => new Cascade([{ feedforward: ones(5), feedback: ones(5) }]),
    'filter-invalid',
    /order 0 to 3/,
  );
  refuses(
    'coefficients not normalised',
    () => new Cascade([{ feedforward: [1], feedback: [2] }]),
    'filter-invalid',
    /is 2/,
  );
  refuses(
    'a channel it does not have',
    () => new Cascade([], 2).process(new Float64Array(1), 2),
    'filter-invalid',
    /no channel 2/,
  );
});

describe('a tail is not told for', () => {
  refuses('a floor of 0', () => impulseTail([], 48000, 0), 'value-out-of-range', /floor/i);
  refuses('a floor above 1', () => impulseTail([], 48000, 1.5), 'value-out-of-range', /floor/i);
  refuses('a sample rate of 0', () => impulseTail([], 0, 1e-6), 'value-out-of-range', /sample rate/);
});
