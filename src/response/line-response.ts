import type { SlotName } from '../blocks/block.ts';
import type { SpanTransfer } from '../blocks/span.ts';
import { magnitudeAtSquares } from '../filter/magnitude.ts';
import { magnitudeAt, type TransferFunction } from '../transfer-function.ts';
import { type Decibels, decibels, type Hertz, radiansPerSecond } from '../units.ts';
import type { FrequencyGrid } from './grid.ts';

/** What one block adds to the line: its response with everything before it, over theirs without it. */
export interface BlockShare {
  readonly slot: SlotName;
  /** Decibels, one value for each frequency of the grid. */
  readonly magnitude: Float64Array;
}

/** Sampled magnitudes of a line and of each block in it. */
export interface LineResponse {
  readonly blocks: readonly BlockShare[];
  /** The whole line in decibels: the sum of the blocks' shares. */
  readonly magnitude: Float64Array;
}

const sampled = new WeakMap<TransferFunction, { grid: FrequencyGrid; magnitude: Float64Array }>();

/** Magnitude in dB on a grid, remembered for as long as the (immutable) transfer function lives. */
function magnitudeOf(transfer: TransferFunction, grid: FrequencyGrid): Float64Array {
  const known = sampled.get(transfer);
  if (known?.grid === grid) return known.magnitude;
  const magnitude = new Float64Array(grid.frequencies.length);
  magnitudeAtSquares(magnitude, transfer, grid.omegaSquared);
  sampled.set(transfer, { grid, magnitude });
  return magnitude;
}

/** Samples a line on a grid. Spans that did not change (same objects) are not evaluated again. */
export function lineResponse(spans: readonly SpanTransfer[], grid: FrequencyGrid): LineResponse {
  const magnitude = new Float64Array(grid.frequencies.length);
  const blocks = spans.flatMap(({ span, cumulative }) =>
    cumulative.map((transfer, index): BlockShare => {
      const upToHere = magnitudeOf(transfer, grid);
      const before = index === 0 ? undefined : magnitudeOf(cumulative[index - 1]!, grid);
      const share = before ? upToHere.map((value, point) => value - before[point]!) : upToHere;
      return { slot: span.blocks[index]!.block.slot, magnitude: share };
    }),
  );
  for (const { transfer } of spans) {
    const share = magnitudeOf(transfer, grid);
    for (let point = 0; point < magnitude.length; point += 1)
      magnitude[point] = magnitude[point]! + share[point]!;
  }
  return { blocks, magnitude };
}

/** The line's level in dB at one frequency, exact. */
export function lineLevel(spans: readonly SpanTransfer[], frequency: Hertz): Decibels {
  const omega = radiansPerSecond(frequency);
  return spans.reduce((sum, { transfer }) => sum + decibels(magnitudeAt(transfer, omega)), 0);
}
