import { describe, expect, it } from 'vitest';
import { BlockRenderer } from '../../../src/audio/render-blocks.ts';

const pole = { feedforward: [1, 0], feedback: [1, -0.5] };

describe('BlockRenderer', () => {
  it('keeps the state of every channel from block to block: 0.5ⁿ for one pole', () => {
    const renderer = new BlockRenderer({ sections: [pole], channels: 2, gain: 1 });
    const first = renderer.process([Float32Array.of(1, 0, 0), Float32Array.of(0, 0, -4)]);
    const second = renderer.process([Float32Array.of(0, 0), Float32Array.of(0, 0)]);
    expect([...first[0]!, ...second[0]!]).toEqual([1, 0.5, 0.25, 0.125, 0.0625]);
    expect([...first[1]!, ...second[1]!]).toEqual([0, 0, -4, -2, -1]);
  });

  it('applies the gain after the filters and leaves its input alone', () => {
    const renderer = new BlockRenderer({ sections: [pole], channels: 1, gain: 2 });
    const input = Float32Array.of(1, 1);
    expect([...renderer.process([input])[0]!]).toEqual([2, 3]);
    expect([...input]).toEqual([1, 1]);
  });

  it('rounds once: gains of 1e-30 and 1e30 cancel within double precision', () => {
    const tiny = { feedforward: [1e-30], feedback: [1] };
    const renderer = new BlockRenderer({ sections: [tiny, tiny], channels: 1, gain: 1e60 });
    expect([...renderer.process([Float32Array.of(0.1)])[0]!]).toEqual([Math.fround(0.1)]);
  });
});
