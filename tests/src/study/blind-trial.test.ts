import { describe, expect, it } from 'vitest';
import {
  answerTrial,
  guessingProbability,
  hiddenSide,
  isFinished,
  MOST_TRIALS,
  score,
  seededRandom,
  startTrial,
  trialVerdict,
} from '../../../src/study/blind-trial.ts';

describe('blind trial', () => {
  it('has an order that the seed fixes', () => {
    const order = (seed: number) =>
      Array.from({ length: 50 }, (_, index) => hiddenSide({ seed }, index)).join();
    expect(order(7)).toBe(order(7));
    expect(order(7)).not.toBe(order(8));
  });

  it('draws both sides evenly and without pattern', () => {
    const count = 4000;
    const sides = Array.from({ length: count }, (_, index) => hiddenSide({ seed: 3 }, (index % 40) + 40 * 0));
    expect(new Set(sides).size).toBe(2);
    const random = seededRandom(12345);
    const draws = Array.from({ length: count }, () => (random() < 0.5 ? 1 : 0) as number);
    const ones = draws.reduce((sum, value) => sum + value, 0);
    const repeats = draws.slice(1).filter((value, index) => value === draws[index]).length;
    // Four standard deviations of a fair coin: 4 · √(n/4) = 126.
    expect(Math.abs(ones - count / 2)).toBeLessThan(126);
    expect(Math.abs(repeats - count / 2)).toBeLessThan(126);
  });

  it('counts right answers and ends', () => {
    let trial = startTrial(10, 99);
    for (let index = 0; index < 10; index += 1) {
      const hidden = hiddenSide(trial, index);
      const wrong = hidden === 'first' ? 'second' : 'first';
      trial = answerTrial(trial, index < 7 ? hidden : wrong);
    }
    expect(isFinished(trial)).toBe(true);
    expect(score(trial)).toBe(7);
    expect(answerTrial(trial, 'first')).toBe(trial);
  });

  it.each([0, -1, 1.5, MOST_TRIALS + 1, Number.NaN])('refuses %s trials', (trials) => {
    expect(() => startTrial(trials, 1)).toThrow(/trials/);
  });

  // Exact values: number of ways over 2^n, worked by hand from Pascal's triangle.
  it.each([
    [10, 10, 1 / 1024],
    [9, 10, 11 / 1024],
    [8, 10, 56 / 1024],
    [5, 10, 638 / 1024],
    [12, 16, 2517 / 65536],
    [0, 10, 1],
    [11, 10, 0],
  ])('%i or more of %i by guessing', (hits, trials, probability) => {
    expect(guessingProbability(hits, trials)).toBeCloseTo(probability, 12);
  });

  it('stays exact for long runs', () => {
    expect(guessingProbability(100, 200)).toBeCloseTo(0.5281742395046037, 12); // ½ + C(200,100)/2^201
  });

  it('claims no more than the score shows', () => {
    const answered = (hits: number, count: number) => {
      let trial = startTrial(count, 5);
      for (let index = 0; index < count; index += 1) {
        const hidden = hiddenSide(trial, index);
        trial = answerTrial(trial, index < hits ? hidden : hidden === 'first' ? 'second' : 'first');
      }
      return trialVerdict(trial);
    };
    expect(answered(10, 10)).toMatch(/very probably/);
    expect(answered(9, 10)).toMatch(/suggests/);
    expect(answered(6, 10)).toMatch(/does not show.*nor that there is none/);
    expect(answered(4, 4)).toMatch(/few trials/);
  });
});
