import { magnitudeInto } from '../../src/response/curve.ts';
import { DEFAULT_GRID } from '../../src/response/grid.ts';
import type { TransferFunction } from '../../src/transfer-function.ts';
import { bareLoop } from './bare-loop.ts';
import { type Row, ratio } from './harness.ts';

const out = new Float64Array(DEFAULT_GRID.frequencies.length);

/** A product of first-order terms over another, of one order. */
function transferOf(order: number): TransferFunction {
  const numerator = [1];
  const denominator = [1];
  for (let index = 0; index < order; index++) {
    const tau = 10 ** (-1 - (5 * index) / order);
    multiply(numerator, 0.4 * tau);
    multiply(denominator, tau);
  }
  return { numerator, denominator };
}

/** Multiplies a polynomial by `1 + tau·s`, in place. */
function multiply(polynomial: number[], tau: number): void {
  polynomial.push(0);
  for (let power = polynomial.length - 1; power > 0; power--)
    polynomial[power]! += tau * polynomial[power - 1]!;
}

/** A curve of 512 points by order of the block, against the bare cubic loop. */
export function rows(): readonly Row[] {
  return [
    { order: 3, aim: 1.5 },
    { order: 4, aim: 1.75 },
    { order: 5, aim: 1.75 },
    { order: 9, aim: 2 },
    { order: 14, aim: 5 },
  ].map(({ order, aim }) => {
    const transfer = transferOf(order);
    const work = () => {
      magnitudeInto(out, transfer, DEFAULT_GRID);
      return out[0]! + out[511]!;
    };
    return {
      what: `curve of 512 points, order ${order}, against the bare cubic loop`,
      ratio: ratio(work, bareLoop),
      aim,
    };
  });
}
