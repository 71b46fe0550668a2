import { DEFAULT_GRID } from '../../src/response/grid.ts';
import type { Work } from './harness.ts';

const out = new Float64Array(DEFAULT_GRID.omega.length);
const squares = DEFAULT_GRID.omegaSquared;

/**
 * The yardstick: a cubic over a cubic in dB at the plot's 512 points, with nothing around it. Written as
 * well as it can be (real arithmetic only, one logarithm a point), so that ratios to it flatter nobody.
 */
export const bareLoop: Work = () => {
  const [n0, n1, n2, n3] = [0.1, 2e-3, 3e-7, 1e-11];
  const [d0, d1, d2, d3] = [1, 2.5e-2, 2e-5, 1.5e-10];
  for (let point = 0; point < squares.length; point++) {
    const x = squares[point]!;
    const above = n0 - x * n2;
    const aboveOdd = n1 - x * n3;
    const below = d0 - x * d2;
    const belowOdd = d1 - x * d3;
    const ratio = (above * above + x * aboveOdd * aboveOdd) / (below * below + x * belowOdd * belowOdd);
    out[point] = 10 * Math.log10(ratio);
  }
  return out[0]! + out[511]!;
};
