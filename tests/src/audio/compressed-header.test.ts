import { describe, expect, it } from 'vitest';
import { readCompressedHeader } from '../../../src/audio/compressed-header.ts';

/** Bytes from numbers and texts, in order. */
function bytes(...parts: (number | string | number[])[]): Uint8Array {
  return Uint8Array.from(
    parts.flatMap((part) =>
      typeof part === 'string' ? [...part].map((letter) => letter.charCodeAt(0)) : part,
    ),
  );
}

const zeros = (count: number): number[] => new Array<number>(count).fill(0);
const big32 = (value: number): number[] => [24, 16, 8, 0].map((shift) => (value >>> shift) & 255);
const little32 = (value: number): number[] => big32(value).reverse();

describe('readCompressedHeader', () => {
  it('reads FLAC: the example of RFC 9639, appendix D.1 (44.1 kHz, one sample)', () => {
    const file = bytes(
      'fLaC',
      0x80,
      0,
      0,
      0x22,
      0x10,
      0,
      0x10,
      0,
      0,
      0,
      0x0f,
      0,
      0,
      0x0f,
      [0x0a, 0xc4, 0x42, 0xf0, 0, 0, 0, 1],
    );
    expect(readCompressedHeader(file, 'flac')).toEqual({ sampleRate: 44_100, duration: 1 / 44_100 });
  });

  it('reads FLAC of many hours: 36 bits of length', () => {
    const file = bytes('fLaC', zeros(14), [0x0b, 0xb8, 0x02, 0xf1, ...big32(0)]);
    expect(readCompressedHeader(file, 'flac')).toEqual({ sampleRate: 48_000, duration: 2 ** 32 / 48_000 });
  });

  it('reads Ogg Vorbis, with the length from the last page', () => {
    const first = bytes(
      'OggS',
      0,
      2,
      zeros(8),
      zeros(12),
      1,
      30,
      '\u0001vorbis',
      little32(0),
      2,
      little32(44_100),
    );
    const last = bytes('OggS', 0, 4, little32(441_000), little32(0), zeros(12));
    const file = bytes([...first], zeros(300), [...last]);
    expect(readCompressedHeader(file, 'ogg')).toEqual({ sampleRate: 44_100, duration: 10 });
  });

  it('reads Opus at 48 kHz, whatever it was recorded at', () => {
    const file = bytes('OggS', 0, 2, zeros(20), 1, 19, 'OpusHead', 1, 2, [56, 1], little32(16_000), zeros(3));
    expect(readCompressedHeader(file, 'ogg').sampleRate).toBe(48_000);
  });

  it('reads MP3 of constant rate behind an ID3 tag: 128 kbit/s are 16,000 bytes a second', () => {
    const tag = bytes('ID3', 4, 0, 0, [0, 0, 1, 0], zeros(128));
    const file = bytes([...tag], [0xff, 0xfb, 0x90, 0x00], zeros(32_000 - 4));
    expect(readCompressedHeader(file, 'mp3')).toEqual({ sampleRate: 44_100, duration: 2 });
  });

  it('reads MP3 with an index: frames of 1152 samples', () => {
    const file = bytes([0xff, 0xfb, 0x94, 0x00], zeros(32), 'Xing', big32(1), big32(1000), zeros(64));
    expect(readCompressedHeader(file, 'mp3')).toEqual({ sampleRate: 48_000, duration: 1_152_000 / 48_000 });
  });

  it('reads MPEG 2 at half the rate', () => {
    const file = bytes([0xff, 0xf3, 0x84, 0xc0], zeros(9), 'Info', big32(1), big32(100), zeros(64));
    expect(readCompressedHeader(file, 'mp3')).toEqual({ sampleRate: 24_000, duration: 57_600 / 24_000 });
  });

  it('reads MP4, with the movie header at the end', () => {
    const entry = bytes('mp4a', zeros(6), [0, 1], zeros(8), [0, 2, 0, 16], zeros(4), [0xac, 0x44, 0, 0]);
    const header = bytes('mvhd', zeros(4), zeros(8), big32(1000), big32(90_500), zeros(80));
    expect(readCompressedHeader(bytes([...entry], zeros(50), [...header]), 'mp4')).toEqual({
      sampleRate: 44_100,
      duration: 90.5,
    });
  });

  for (const container of ['flac', 'ogg', 'mp3', 'mp4', 'aiff', 'unknown'] as const) {
    it(`knows nothing of an empty or cut-off file, and does not fail: ${container}`, () => {
      for (const file of [bytes(), bytes('fLaC'), bytes('OggS'), bytes([0xff, 0xfb]), bytes(zeros(40))]) {
        expect(readCompressedHeader(file, container)).toEqual({ sampleRate: undefined, duration: undefined });
      }
    });
  }
});
