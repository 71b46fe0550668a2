import { describe, expect, it } from 'vitest';
import { kWeighting } from '../../src/clip/k-weighting.ts';
import { measureLoudness } from '../../src/clip/loudness.ts';
import { joined, sine } from '../src/clip/signals.ts';

/** Loudness as a number; a signal without one fails the test. */
function lufs(clip: Parameters<typeof measureLoudness>[0]): number {
  const result = measureLoudness(clip);
  if (result.kind === 'silent') throw new Error('no loudness');
  return result.lufs;
}

describe('ITU-R BS.1770', () => {
  // Tables 1 and 2 of Annex 1 (from memory): coefficients at 48 kHz.
  it('has the printed K-weighting coefficients at 48 kHz', () => {
    const [shelf, highPass] = kWeighting(48_000);
    const printed = [
      1.53512485958697, -2.69169618940638, 1.19839281085285, -1.69065929318241, 0.73248077421585,
    ];
    [...shelf.feedforward, shelf.feedback[1], shelf.feedback[2]].forEach((value, index) => {
      expect(value).toBeCloseTo(printed[index]!, 10);
    });
    expect(highPass.feedforward).toEqual([1, -2, 1]);
    expect(highPass.feedback[1]).toBeCloseTo(-1.99004745483398, 10);
    expect(highPass.feedback[2]).toBeCloseTo(0.99007225036621, 10);
  });

  // Annex 1: a 997 Hz sine of 0 dBFS in one of left, right or centre reads −3.01 LKFS.
  it.each([44_100, 48_000, 96_000, 192_000])('reads −3.01 for a 997 Hz sine at %i Hz', (rate) => {
    expect(lufs(sine(997, 0, 5, 1, rate))).toBeCloseTo(-3.01, 1);
  });
});

describe('EBU Tech 3341, minimum requirements (from memory), tolerance 0.1 LU', () => {
  const tone = (level: number, seconds: number) => sine(1000, level, seconds, 2);

  it.each([
    ['case 1', [[-23, 20]], -23],
    ['case 2', [[-33, 20]], -33],
    [
      'case 3',
      [
        [-36, 10],
        [-23, 60],
        [-36, 10],
      ],
      -23,
    ],
    [
      'case 4',
      [
        [-72, 10],
        [-36, 10],
        [-23, 60],
        [-36, 10],
        [-72, 10],
      ],
      -23,
    ],
    [
      'case 5',
      [
        [-26, 20],
        [-20, 20.1],
        [-26, 20],
      ],
      -23,
    ],
  ] as const)('%s', (_, parts, expected) => {
    const clip = joined(parts.map(([level, seconds]) => tone(level, seconds)));
    expect(Math.abs(lufs(clip) - expected)).toBeLessThanOrEqual(0.1);
  });
});
