import { describe, expect, it } from 'vitest';
import { WaveFile } from 'wavefile';
import { floatWav } from '../../../src/audio/float-wav.ts';
import { readWav } from '../../../src/clip/wav-reader.ts';

const clip = {
  sampleRate: 44_100,
  channels: [Float32Array.of(0, 0.5, -1.25), Float32Array.of(1e-9, -0.25, 3)],
  frames: 3,
};

describe('floatWav', () => {
  it('is read back sample for sample by another library (wavefile)', async () => {
    const wave = new WaveFile(new Uint8Array(await floatWav(clip)));
    const samples = wave.getSamples(false, Float32Array as never) as unknown as Float32Array[];
    expect((wave.fmt as { sampleRate: number }).sampleRate).toBe(44_100);
    expect(samples.map((channel) => [...channel])).toEqual(clip.channels.map((channel) => [...channel]));
  });

  it('is read back by our own reader', async () => {
    expect(readWav(new Uint8Array(await floatWav(clip)))).toEqual(clip);
  });

  it('is called off', async () => {
    await expect(floatWav(clip, AbortSignal.abort())).rejects.toMatchObject({ name: 'AbortError' });
  });
});
