import { NotchworkError } from '../errors.ts';

/**
 * A forced-choice listening trial: the hidden X is one of two, and the listener says which. Pure
 * values; the order comes from a seed, so that a log can be checked afterwards.
 */

/** Which of the two compared things. */
export type Side = 'first' | 'second';

/** One answered trial. */
export interface TrialAnswer {
  /** What X was. */
  readonly hidden: Side;
  readonly answer: Side;
}

/** A run of trials, before, during and after. */
export interface BlindTrial {
  readonly seed: number;
  readonly trials: number;
  readonly answers: readonly TrialAnswer[];
}

/** Most trials in one run: far more than anyone's ears stand. */
export const MOST_TRIALS = 200;

/**
 * Pseudo-random numbers in [0, 1) from a 32-bit seed: the mulberry32 generator (public domain, from
 * memory). Not for secrets; it only has to be even, repeatable and free of short cycles.
 */
export function seededRandom(seed: number): () => number {
  let state = seed >>> 0;
  return () => {
    state = (state + 0x6d2b79f5) >>> 0;
    let mixed = Math.imul(state ^ (state >>> 15), state | 1);
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61);
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 2 ** 32;
  };
}

/** Starts a run of `trials` (1 to {@link MOST_TRIALS}) with an order fixed by `seed`. */
export function startTrial(trials: number, seed: number): BlindTrial {
  if (!Number.isInteger(trials) || trials < 1 || trials > MOST_TRIALS) {
    throw new NotchworkError(
      'value-out-of-range',
      `${trials} trials were asked for; a run has 1 to ${MOST_TRIALS}.`,
    );
  }
  return { seed: seed >>> 0, trials, answers: [] };
}

/** What X is in trial `index` (from 0): an independent, even draw for each trial. */
export function hiddenSide(trial: Pick<BlindTrial, 'seed'>, index: number): Side {
  const random = seededRandom(trial.seed);
  let draw = random();
  for (let skipped = 0; skipped < index; skipped += 1) draw = random();
  return draw < 0.5 ? 'first' : 'second';
}

/** Whether every trial was answered. */
export function isFinished(trial: BlindTrial): boolean {
  return trial.answers.length >= trial.trials;
}

/** Takes the answer to the present trial; a finished run stays as it is. */
export function answerTrial(trial: BlindTrial, answer: Side): BlindTrial {
  if (isFinished(trial)) return trial;
  const hidden = hiddenSide(trial, trial.answers.length);
  return { ...trial, answers: [...trial.answers, { hidden, answer }] };
}

/** Number of right answers so far. */
export function score(trial: BlindTrial): number {
  return trial.answers.filter((entry) => entry.answer === entry.hidden).length;
}

/**
 * Probability of `hits` or more right answers in `trials` by guessing alone: the upper tail of the
 * binomial distribution with p = ½, `Σ_{k=hits}^{n} C(n, k) / 2ⁿ`, summed exactly in integers.
 */
export function guessingProbability(hits: number, trials: number): number {
  if (hits <= 0) return 1;
  if (hits > trials) return 0;
  let choose = 1n;
  let tail = 0n;
  for (let k = 0n; k <= BigInt(trials); k += 1n) {
    if (k >= BigInt(hits)) tail += choose;
    choose = (choose * (BigInt(trials) - k)) / (k + 1n);
  }
  return Number((tail * 10n ** 18n) >> BigInt(trials)) / 1e18;
}

/** The result in words that do not claim more than it shows. */
export function trialVerdict(trial: BlindTrial): string {
  const hits = score(trial);
  const count = trial.answers.length;
  const chance = guessingProbability(hits, count);
  const odds = chance < 0.001 ? 'less than 0.1 %' : `${(100 * chance).toFixed(chance < 0.1 ? 1 : 0)} %`;
  const opening = `${hits} of ${count} right. Guessing alone does as well or better in ${odds} of such runs.`;
  if (count < 8) return `${opening} With so few trials not much can be said; ten or more say more.`;
  if (chance <= 0.01)
    return `${opening} It is hard to explain this by luck: you very probably heard a difference.`;
  if (chance <= 0.05)
    return `${opening} That suggests a difference you can hear; another run would make it firmer.`;
  return `${opening} This does not show that you heard a difference, nor that there is none.`;
}
