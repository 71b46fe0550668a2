import { SLOTS } from '../blocks/block.ts';
import type { LineSettings } from '../blocks/line.ts';
import { LineTransfer } from '../blocks/line-transfer.ts';
import type { PlacedBlock, SpanTransfer } from '../blocks/span.ts';
import { placedLine } from '../design/placed-line.ts';
import { messageOf } from '../errors.ts';
import type { FrequencyGrid } from '../response/grid.ts';
import { type LineResponse, lineResponse } from '../response/line-response.ts';

/** Everything the plot and the sound need to know of one line. */
export interface LineAnalysis {
  readonly line: LineSettings;
  readonly placed: readonly PlacedBlock[];
  readonly spans: readonly SpanTransfer[];
  readonly response: LineResponse;
  /** Why the curve shown is the last one that could be computed; `undefined` when all is well. */
  readonly problem: string | undefined;
}

/** Analyses one line again and again as it changes, computing only what its change touches. */
export class LineAnalyser {
  readonly #grid: FrequencyGrid;
  readonly #transfer = new LineTransfer();
  #last: LineAnalysis | undefined;

  constructor(grid: FrequencyGrid) {
    this.#grid = grid;
  }

  /** The analysis of a line; where it cannot be computed, the last good curves with the problem named. */
  of(line: LineSettings): LineAnalysis {
    if (this.#last !== undefined && SLOTS.every((slot) => line[slot] === this.#last?.line[slot])) {
      return this.#last;
    }
    try {
      const placed = placedLine(line);
      const spans = this.#transfer.of(placed);
      this.#last = { line, placed, spans, response: lineResponse(spans, this.#grid), problem: undefined };
    } catch (error) {
      const kept = this.#last ?? {
        placed: [],
        spans: [],
        response: lineResponse([], this.#grid),
      };
      this.#last = { ...kept, line, problem: messageOf(error) };
    }
    return this.#last;
  }
}
