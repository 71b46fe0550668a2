import { expect } from '@open-wc/testing';
import { prepareBuffer } from '../../../src/audio/prepare-buffer.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { sine } from './offline-rig.ts';

const context = (sampleRate = 48_000): OfflineAudioContext => new OfflineAudioContext(1, 1, sampleRate);

/** Amplitude of one frequency in the middle of a signal, by the Fourier sum under a Hann window. */
function amplitudeAt(samples: Float32Array, frequency: number, sampleRate: number): number {
  let real = 0;
  let imaginary = 0;
  samples.forEach((value, index) => {
    const window = 1 - Math.cos((2 * Math.PI * index) / samples.length);
    real += window * value * Math.cos((2 * Math.PI * frequency * index) / sampleRate);
    imaginary += window * value * Math.sin((2 * Math.PI * frequency * index) / sampleRate);
  });
  return (2 * Math.hypot(real, imaginary)) / samples.length;
}

describe('prepareBuffer', () => {
  it('keeps every sample of a clip at the same rate, but for 5 ms at either end', async () => {
    const samples = new Float32Array(4800).fill(0.5);
    const { buffer, peak } = await prepareBuffer(context(), {
      sampleRate: 48_000,
      channels: [samples],
      frames: 4800,
    });
    const prepared = buffer.getChannelData(0);
    expect(prepared[0]).to.equal(0);
    expect(prepared.at(-1)).to.equal(0);
    expect(prepared[120]).to.be.closeTo(0.25, 1e-6);
    expect(prepared.subarray(240, 4560).every((value) => value === 0.5)).to.equal(true);
    expect(peak).to.equal(0.5);
    expect(samples[0], 'the clip itself is not touched').to.equal(0.5);
  });

  for (const rate of [8000, 44_100, 96_000, 192_000]) {
    it(`brings ${rate} Hz to 48000 Hz: the tone stays, nothing much is added`, async () => {
      const frames = rate / 2;
      const { buffer } = await prepareBuffer(context(), {
        sampleRate: rate,
        channels: [sine(1000, 0.5, rate)],
        frames,
      });
      expect(buffer.sampleRate).to.equal(48_000);
      // The browser's resampler may give a few samples more or fewer at the end.
      expect(buffer.length).to.be.closeTo(24_000, 64);
      const middle = buffer.getChannelData(0).subarray(2400, 21_600);
      expect(amplitudeAt(middle, 1000, 48_000)).to.be.closeTo(0.5, 0.5e-3);
      // What straight lines between samples would add at 8 kHz: 2 % at 7 kHz.
      expect(amplitudeAt(middle, 7000, 48_000)).to.be.below(0.5e-3);
    });
  }

  it('takes out what is not a number, which would silence a filter for good', async () => {
    const samples = new Float32Array(4800).fill(0.25);
    samples[1000] = Number.NaN;
    samples[2000] = Number.POSITIVE_INFINITY;
    const { buffer, peak } = await prepareBuffer(context(), {
      sampleRate: 48_000,
      channels: [samples],
      frames: 4800,
    });
    const prepared = buffer.getChannelData(0);
    expect([prepared[1000], prepared[2000], prepared[1001], peak]).to.deep.equal([0, 0, 0.25, 0.25]);
  });

  it('counts on the mixing down of more than two channels', async () => {
    const channels = Array.from({ length: 6 }, () => new Float32Array(4800).fill(0.5));
    const { buffer, peak } = await prepareBuffer(context(), { sampleRate: 48_000, channels, frames: 4800 });
    expect(buffer.numberOfChannels).to.equal(6);
    expect(peak).to.be.closeTo(0.5 * (1 + Math.SQRT2), 1e-6);
  });

  it('finds the largest peak of all channels, and 0 for silence', async () => {
    const channels = [new Float32Array(4800).fill(-0.75), new Float32Array(4800).fill(0.5)];
    expect((await prepareBuffer(context(), { sampleRate: 48_000, channels, frames: 4800 })).peak).to.equal(
      0.75,
    );
    const silent = [new Float32Array(10)];
    expect(
      (await prepareBuffer(context(), { sampleRate: 48_000, channels: silent, frames: 10 })).peak,
    ).to.equal(0);
  });

  it('is called off', async () => {
    const clip = { sampleRate: 48_000, channels: [new Float32Array(10_000_000)], frames: 10_000_000 };
    const controller = new AbortController();
    setTimeout(() => controller.abort());
    const outcome = await prepareBuffer(context(), clip, controller.signal).catch(
      (error: Error) => error.name,
    );
    expect(outcome).to.equal('AbortError');
  });

  it('says so when the browser cannot hold the clip', async () => {
    const clip = { sampleRate: 48_000, channels: [], frames: 0 };
    const outcome = await prepareBuffer(context(), clip).catch((error: unknown) => error);
    expect(outcome).to.be.instanceOf(NotchworkError);
    expect((outcome as NotchworkError).code).to.equal('clip-unsupported');
  });
});
