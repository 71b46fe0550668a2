import { describe, expect, it } from 'vitest';
import { WaveFile } from 'wavefile';
import { readWav, sniff } from '../../../src/clip/wav-reader.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { writeWav } from '../../../src/sheet/wav.ts';
import { sine } from './signals.ts';

/** A WAV file made by the npm package `wavefile`, a general-purpose library. */
function made(bits: string, samples: number[][], rate = 44_100): Uint8Array {
  const file = new WaveFile();
  file.fromScratch(samples.length, rate, bits, samples.length === 1 ? samples[0]! : samples);
  return file.toBuffer();
}

function errorOf(bytes: Uint8Array, options?: Parameters<typeof readWav>[1]): NotchworkError {
  try {
    readWav(bytes, options);
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error('the file was accepted');
}

const text = (words: string) => new TextEncoder().encode(words);

describe('reading WAV files of another library', () => {
  it.each([
    ['8', [128, 255, 0], [0, 127 / 128, -1]],
    ['16', [0, 32767, -32768], [0, 32767 / 32768, -1]],
    ['24', [0, 8388607, -8388608], [0, 8388607 / 8388608, -1]],
    ['32', [0, 2147483647, -2147483648], [0, 1, -1]],
    ['32f', [0, 0.25, -1.5], [0, 0.25, -1.5]],
    ['64', [0, 0.1, -0.7], [0, Math.fround(0.1), Math.fround(-0.7)]],
  ])('%s bits', (bits, samples, expected) => {
    const clip = readWav(made(bits, [samples]));
    expect(clip.sampleRate).toBe(44_100);
    expect([...clip.channels[0]!]).toEqual(expected.map(Math.fround));
  });

  it('keeps the channels apart', () => {
    const clip = readWav(
      made(
        '16',
        [
          [1, 2, 3],
          [-1, -2, -3],
        ],
        8000,
      ),
    );
    expect(clip.channels.map((channel) => [...channel].map((value) => value * 32768))).toEqual([
      [1, 2, 3],
      [-1, -2, -3],
    ]);
  });

  it('skips chunks it does not know, odd ones with their padding', () => {
    const plain = made('16', [[5, 6, 7]]);
    const extra = new Uint8Array(12 + 8 + 4 + plain.length - 12);
    extra.set(plain.subarray(0, 12));
    extra.set([...text('LIST'), 3, 0, 0, 0, 1, 2, 3, 0], 12);
    extra.set(plain.subarray(12), 24);
    expect(readWav(extra).frames).toBe(3);
  });

  it('tells containers by their first bytes', () => {
    expect(sniff(made('16', [[1]]))).toBe('wav');
    expect([
      sniff(text('fLaC....')),
      sniff(text('OggS')),
      sniff(text('....ftypM4A ')),
      sniff(text('ID3...')),
      sniff(text('FORM....AIFF')),
      sniff(text('hello')),
    ]).toEqual(['flac', 'ogg', 'mp4', 'mp3', 'aiff', 'unknown']);
  });
});

describe('a WAV file that cannot be used', () => {
  const good = made('16', [Array.from({ length: 1000 }, (_, index) => index)], 1000 * 8);

  it('empty', () => expect(errorOf(new Uint8Array(0)).code).toBe('clip-empty'));

  it('a text with the name of a WAV', () => {
    expect(errorOf(text('Dear diary, this is no sound at all.')).message).toMatch(/whatever its name says/);
  });

  it('cut off: says by how much, and can be read up to there', () => {
    const cut = good.slice(0, good.length - 800);
    expect(errorOf(cut).message).toMatch(/ends 0\.05 s early/);
    expect(readWav(cut, { allowTruncated: true }).frames).toBe(600);
  });

  it('cut off within its header', () => {
    for (const length of [3, 12, 20, 30, 43])
      expect(['clip-unreadable', 'clip-empty']).toContain(errorOf(good.slice(0, length)).code);
  });

  it('another codec, by name', () => {
    const file = new WaveFile();
    file.fromScratch(1, 8000, '16', [1, 2, 3, 4]);
    file.toMuLaw();
    const error = errorOf(file.toBuffer());
    expect([error.code, error.message]).toEqual(['clip-unsupported', expect.stringContaining('µ-law')]);
  });

  it('no samples', () => expect(errorOf(made('16', [[]])).code).toBe('clip-empty'));

  it('a rate or a count of channels that cannot be', () => {
    const broken = (offset: number, value: number) => {
      const bytes = good.slice();
      new DataView(bytes.buffer).setUint16(offset, value, true);
      return bytes;
    };
    expect(errorOf(broken(22, 0)).message).toMatch(/0 channels/);
    expect(errorOf(broken(24, 0)).message).toMatch(/rate of 0/);
    expect(errorOf(broken(24, 100)).code).toBe('clip-unsupported');
  });

  it('never anything but a NotchworkError, whatever the bytes', () => {
    let state = 1;
    for (let round = 0; round < 3000; round += 1) {
      const bytes = good.slice(0, 120);
      for (let change = 0; change < 3; change += 1) {
        state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
        bytes[12 + (state % 60)] = state >>> 24;
      }
      try {
        readWav(bytes);
      } catch (error) {
        expect(error).toBeInstanceOf(NotchworkError);
      }
    }
  });

  it('not a number: samples that are none become 0', () => {
    expect([...readWav(made('32f', [[Number.NaN, Number.POSITIVE_INFINITY, 0.5]])).channels[0]!]).toEqual([
      0, 0, 0.5,
    ]);
  });
});

describe('writing WAV', () => {
  const clip = { ...sine(440, -6, 0.01, 2), sampleRate: 44_100 };

  it('is read back by another library, 32-bit float exactly', () => {
    const file = new WaveFile(writeWav(clip, 32));
    const samples = file.getSamples(false, Float32Array) as unknown as Float32Array[];
    expect([...samples[0]!]).toEqual([...clip.channels[0]!]);
    expect((file.fmt as { sampleRate: number }).sampleRate).toBe(44_100);
  });

  it('is within half a step at 24 bits, and clipped at full scale', () => {
    const hot = { ...clip, channels: [Float32Array.of(0.1, 2, -2)], frames: 3 };
    const samples = new WaveFile(writeWav(hot, 24)).getSamples(false, Int32Array) as unknown as Int32Array;
    expect(Math.abs(samples[0]! - 0.1 * 2 ** 23)).toBeLessThanOrEqual(0.5);
    expect([samples[1], samples[2]]).toEqual([2 ** 23 - 1, -(2 ** 23)]);
  });

  it('is read back by our own reader', () => {
    for (const bits of [24, 32] as const) {
      const back = readWav(writeWav(clip, bits));
      expect(back.frames).toBe(clip.frames);
      for (const [index, value] of back.channels[1]!.entries()) {
        expect(Math.abs(value - clip.channels[1]![index]!)).toBeLessThanOrEqual(2 ** -24);
      }
    }
  });
});
