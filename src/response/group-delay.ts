import type { TransferFunction } from '../transfer-function.ts';
import type { FrequencyGrid } from './grid.ts';

/**
 * `Re(P′(jω)/P(jω))`, by which the phase of a polynomial grows with ω, in seconds; from its own
 * derivative, so that no step has to be chosen. NaN where P vanishes.
 */
function phaseSlope(coefficients: readonly number[], omega: number): number {
  let valueRe = 0;
  let valueIm = 0;
  let slopeRe = 0;
  let slopeIm = 0;
  for (let power = coefficients.length - 1; power >= 0; power--) {
    const turnedSlope = -slopeIm * omega + valueRe;
    slopeIm = slopeRe * omega + valueIm;
    slopeRe = turnedSlope;
    const turned = -valueIm * omega + coefficients[power]!;
    valueIm = valueRe * omega;
    valueRe = turned;
  }
  const size = Math.hypot(valueRe, valueIm);
  return (slopeRe / size) * (valueRe / size) + (slopeIm / size) * (valueIm / size);
}

/**
 * Group delay in seconds on a grid, `−dφ/dω = Re(D′/D) − Re(N′/N)` at jω. Negative values are right
 * where the phase rises; NaN where the response is 0.
 *
 * @param out receives the seconds; as long as the grid.
 */
export function groupDelayInto(out: Float64Array, transfer: TransferFunction, grid: FrequencyGrid): void {
  grid.omega.forEach((omega, point) => {
    out[point] = phaseSlope(transfer.denominator, omega) - phaseSlope(transfer.numerator, omega);
  });
}
