import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { regionOf } from '../../../src/clip/clip.ts';
import { gatedLoudness } from '../../../src/clip/gating.ts';
import { channelWeight, measureLoudness } from '../../../src/clip/loudness.ts';
import { readWav } from '../../../src/clip/wav-reader.ts';
import { sine, whiteNoise } from './signals.ts';

describe('loudness', () => {
  it('moves by as much as the level', () => {
    const at = (level: number) => measureLoudness(sine(440, level, 2));
    const [loud, soft] = [at(-10), at(-30)];
    if (loud.kind !== 'measured' || soft.kind !== 'measured') throw new Error('not measured');
    expect(loud.lufs - soft.lufs).toBeCloseTo(20, 4); // single-precision samples
  });

  it('is by 3.01 LU higher in two equal channels', () => {
    const [one, two] = [measureLoudness(sine(440, -10, 2)), measureLoudness(sine(440, -10, 2, 2))];
    if (one.kind !== 'measured' || two.kind !== 'measured') throw new Error('not measured');
    expect(two.lufs - one.lufs).toBeCloseTo(10 * Math.log10(2), 6);
  });

  it('says when a clip is shorter than a block, and measures it whole', () => {
    const short = measureLoudness(sine(997, 0, 0.2));
    expect(short.kind).toBe('short');
    if (short.kind === 'short') expect(Math.abs(short.lufs + 3.01)).toBeLessThan(0.5); // the filters have not settled
  });

  it('calls silence silence', () => {
    for (const seconds of [0.1, 2]) expect(measureLoudness(sine(440, -200, seconds)).kind).toBe('silent');
    expect(measureLoudness({ sampleRate: 48_000, channels: [new Float32Array(0)], frames: 0 }).kind).toBe(
      'silent',
    );
  });

  it('leaves blocks under the relative gate out', () => {
    expect(gatedLoudness([1, 1, 0.05])).toBeCloseTo(-0.691, 9); // −13 dB: gated out
    expect(gatedLoudness([1, 1, 0.5])).toBeCloseTo(-0.691 + 10 * Math.log10(2.5 / 3), 9);
    expect(gatedLoudness([1e-9, 1e-9])).toBeUndefined();
    expect(gatedLoudness([])).toBeUndefined();
  });

  it('weighs surround channels', () => {
    expect([0, 1, 2, 3, 4, 5].map((channel) => channelWeight(channel, 6))).toEqual([1, 1, 1, 0, 1.41, 1.41]);
    expect([0, 1, 2, 3, 4].map((channel) => channelWeight(channel, 5))).toEqual([1, 1, 1, 1.41, 1.41]);
  });

  it('measures noise and the demo clips as something sensible', () => {
    const noise = measureLoudness(whiteNoise(1, 3));
    expect(noise.kind).toBe('measured');
    for (const name of ['ringing-chords', 'single-notes', 'damped-lows']) {
      const clip = readWav(readFileSync(new URL(`../../../demo-audio/${name}.wav`, import.meta.url)));
      const result = measureLoudness(regionOf(clip, 0, 8));
      expect(result.kind).toBe('measured');
      if (result.kind === 'measured') expect(result.lufs).toBeGreaterThan(-30);
    }
  });
});
