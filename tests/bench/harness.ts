/**
 * Times two things side by side and tells how many times longer the first takes. Seconds differ from
 * machine to machine and from minute to minute; a ratio of two loops run in turn hardly does.
 */

/** One line of the table. */
export interface Row {
  readonly what: string;
  /** How many times as long as what it is compared with. */
  readonly ratio: number;
  /** The ratio to stay at or under; `undefined` where there is none. */
  readonly aim?: number;
}

/** What a benchmark file exports: its rows, measured when called. */
export type Rows = () => readonly Row[] | Promise<readonly Row[]>;

/** A piece of work; returns some number that depends on it, so that it cannot be optimised away. */
export type Work = () => number;

const BATCH_MILLISECONDS = 4; // long against the clock's step, short against the scheduler's
const BATCHES = 101; // odd, so that the median is one of them
const WARMING_MILLISECONDS = 300;

/** Everything computed flows into this; it is printed by no one. */
let sink = 0;

function runFor(work: Work, repetitions: number): number {
  const start = performance.now();
  for (let count = 0; count < repetitions; count++) sink += work();
  return performance.now() - start;
}

/** Lets the compiler see the work, then finds how often it fits into a batch. */
function repetitionsOf(work: Work): number {
  let repetitions = 1;
  let spent = 0;
  for (;;) {
    const elapsed = runFor(work, repetitions);
    spent += elapsed;
    if (elapsed >= BATCH_MILLISECONDS && spent >= WARMING_MILLISECONDS) {
      return Math.max(1, Math.round((repetitions * BATCH_MILLISECONDS) / elapsed));
    }
    if (elapsed < BATCH_MILLISECONDS) repetitions *= 2;
  }
}

function median(values: readonly number[]): number {
  return [...values].sort((a, b) => a - b)[values.length >> 1]!;
}

/**
 * How many times as long as `base` the work takes: the median over pairs of batches run one right after
 * the other, so that whatever else the machine does in those milliseconds meets both.
 */
export function ratio(work: Work, base: Work): number {
  const count = repetitionsOf(work);
  const baseCount = repetitionsOf(base);
  const ratios: number[] = [];
  for (let batch = 0; batch < BATCHES; batch++) {
    const time = runFor(work, count) / count;
    ratios.push(time / (runFor(base, baseCount) / baseCount));
  }
  if (!Number.isFinite(sink)) sink = 0;
  return median(ratios);
}
