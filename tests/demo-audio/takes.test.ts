import { readFileSync, statSync } from 'node:fs';
import FFT from 'fft.js';
import { describe, expect, it } from 'vitest';
import { pluck } from '../../demo-audio/plucked-string.mjs';
import { TAKES } from '../../demo-audio/takes.mjs';
import { peakOf } from '../../src/clip/clip.ts';
import { readWav } from '../../src/clip/wav-reader.ts';

const path = (file: string) => new URL(`../../demo-audio/${file}`, import.meta.url);

describe('demo clips', () => {
  it.each(TAKES.map(({ file, make }) => [file, make] as const))(
    '%s is what the script makes',
    (file, make) => {
      const clip = readWav(readFileSync(path(file)));
      const steps = make();
      expect([clip.sampleRate, clip.frames, clip.channels.length]).toEqual([48_000, steps.length, 1]);
      let worst = 0;
      steps.forEach((step: number, index: number) => {
        worst = Math.max(worst, Math.abs(step - Math.round(clip.channels[0]![index]! * 32768)));
      });
      // Engines may round sine and power differently in the last bit; the string feeds that back.
      expect(worst).toBeLessThanOrEqual(2);
    },
  );

  it.each(TAKES.map(({ file }) => file))(
    '%s is at most 1.5 MB, peaks at −3 dBFS, and begins and ends in silence',
    (file) => {
      expect(statSync(path(file)).size).toBeLessThan(1.5e6);
      const clip = readWav(readFileSync(path(file)));
      const samples = clip.channels[0]!;
      expect(20 * Math.log10(peakOf(clip))).toBeCloseTo(-3, 2);
      expect(Math.abs(samples[0]!)).toBeLessThan(1e-3);
      expect(Math.abs(samples.at(-1)!)).toBeLessThan(1e-3);
      expect(Math.abs(samples.reduce((sum, value) => sum + value, 0) / samples.length)).toBeLessThan(1e-4);
    },
  );
});

describe('plucked string', () => {
  // Expected pitch: what was asked for; the ear tells about 5 cents (common practice, no source).
  it.each([82.41, 196, 440, 659.26, 1000])('is in tune at %d Hz', (frequency) => {
    const size = 65_536;
    const out = new Float64Array(size + 8000);
    pluck(out, 48_000, 0, out.length, { frequency, decay: 6, bright: 0.2, pick: 0.13, force: 0.8, seed: 5 });
    const fft = new FFT(size);
    const spectrum = fft.createComplexArray();
    fft.realTransform(
      spectrum,
      out.subarray(8000).map((value, index) => value * (0.5 - 0.5 * Math.cos((2 * Math.PI * index) / size))),
    );
    const level = (bin: number) => Math.log(Math.hypot(spectrum[2 * bin]!, spectrum[2 * bin + 1]!));
    let best = Math.round((frequency * size) / 48_000) - 8;
    for (let bin = best; bin < best + 17; bin += 1) if (level(bin) > level(best)) best = bin;
    const [a, b, c] = [level(best - 1), level(best), level(best + 1)];
    const found = ((best + (0.5 * (a - c)) / (a - 2 * b + c)) * 48_000) / size;
    expect(Math.abs(1200 * Math.log2(found / frequency))).toBeLessThan(1);
  });

  it('decays in the time asked for', () => {
    const out = new Float64Array(3 * 48_000);
    pluck(out, 48_000, 0, out.length, {
      frequency: 220,
      decay: 2,
      bright: 0.9,
      pick: 0.2,
      force: 0.8,
      seed: 9,
    });
    const power = (from: number) =>
      out.subarray(from, from + 9600).reduce((sum, value) => sum + value * value, 0);
    const decibels = 10 * Math.log10(power(96_000 + 24_000) / power(24_000));
    // Two seconds apart the fundamental is 60 dB lower; the averaging takes a little more.
    expect(decibels).toBeLessThan(-50);
    expect(decibels).toBeGreaterThan(-75);
  });
});
