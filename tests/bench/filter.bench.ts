import { bilinear } from '../../src/filter/bilinear.ts';
import { factor } from '../../src/filter/factor.ts';
import type { TransferFunction } from '../../src/transfer-function.ts';
import { bareLoop } from './bare-loop.ts';
import { type Row, ratio } from './harness.ts';

/** A loaded tone network's shape: four real poles, a zero at 0 and a pair of zeros. */
const fourth: TransferFunction = {
  numerator: [0, 1e-4, 2e-8, 1e-12],
  denominator: [1, 0.0332, 1.9e-4, 1.8e-8, 5.4e-14],
};

/** Order 8 with complex poles, as a loop around an output transformer has them. */
const eighth: TransferFunction = {
  numerator: [1, 3e-2, 1e-4],
  denominator: [1, 0.0352, 0.000271, 4.6e-7, 2.2e-10, 3.1e-14, 1.2e-18, 1.1e-23, 2e-29],
};

function sections(transfer: TransferFunction): number {
  let sum = 0;
  for (const section of factor(transfer)) sum += bilinear(section, 48000).feedback[1] ?? 0;
  return sum;
}

/** Sections from coefficients: roots, pairing and the bilinear transform. */
export function rows(): readonly Row[] {
  return [
    {
      what: 'factor and bilinear, order 4, against the bare cubic loop',
      ratio: ratio(() => sections(fourth), bareLoop),
      aim: 1,
    },
    {
      what: 'factor and bilinear, order 8, against the bare cubic loop',
      ratio: ratio(() => sections(eighth), bareLoop),
      aim: 4,
    },
  ];
}
