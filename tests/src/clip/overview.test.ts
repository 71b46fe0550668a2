import { describe, expect, it } from 'vitest';
import { overviewOf } from '../../../src/clip/overview.ts';

const clip = (...channels: number[][]) => ({
  sampleRate: 48_000,
  frames: channels[0]!.length,
  channels: channels.map((channel) => Float32Array.from(channel)),
});

describe('overview', () => {
  it('keeps the extremes of every bucket over all channels', () => {
    const { low, high } = overviewOf(clip([0, 0.5, -1, 0.25], [0, 0, 0, 0.75]), 2);
    expect([[...low], [...high]]).toEqual([
      [0, -1],
      [0.5, 0.75],
    ]);
  });

  it('misses no sample, whatever the number of buckets', () => {
    const samples = Array.from({ length: 1009 }, (_, index) => (index === 700 ? 1 : index === 701 ? -1 : 0));
    for (const buckets of [1, 7, 100, 1008]) {
      const { low, high } = overviewOf(clip(samples), buckets);
      expect([Math.max(...high), Math.min(...low), high.length]).toEqual([1, -1, buckets]);
    }
  });

  it('has no more buckets than samples', () => {
    expect(overviewOf(clip([0.1, 0.2]), 50).low).toHaveLength(2);
    expect(overviewOf(clip([]), 50).low).toHaveLength(0);
  });
});
