import { NotchworkError } from '../errors.ts';
import type { Clip } from './clip.ts';
import { assertUsableClip } from './limits.ts';

/** What a recording is stored in, told by its first bytes. */
export type Container = 'wav' | 'flac' | 'ogg' | 'mp3' | 'mp4' | 'aiff' | 'unknown';

/** Sample formats of WAV, by their tags (RFC 2361 and the multichannel extension of 1999). */
const PCM = 1;
const FLOAT = 3;
const EXTENSIBLE = 0xfffe;

/** Names of codecs that a WAV file may hold but this reader does not decode. */
const CODECS: Readonly<Record<number, string>> = {
  2: 'ADPCM',
  6: 'A-law',
  7: 'µ-law',
  17: 'IMA ADPCM',
  80: 'MPEG',
  85: 'MP3',
  353: 'WMA',
};

function textAt(bytes: Uint8Array, offset: number, length: number): string {
  return String.fromCharCode(...bytes.subarray(offset, offset + length));
}

/** Tells the container by the first bytes; `unknown` for anything else, a text file too. */
export function sniff(bytes: Uint8Array): Container {
  const head = textAt(bytes, 0, 4);
  if (head === 'RIFF' || head === 'RF64') return textAt(bytes, 8, 4) === 'WAVE' ? 'wav' : 'unknown';
  if (head === 'fLaC') return 'flac';
  if (head === 'OggS') return 'ogg';
  if (head === 'FORM') return 'aiff';
  if (textAt(bytes, 4, 4) === 'ftyp') return 'mp4';
  if (head.startsWith('ID3') || (bytes[0] === 0xff && ((bytes[1] ?? 0) & 0xe0) === 0xe0)) return 'mp3';
  return 'unknown';
}

interface Chunk {
  readonly id: string;
  readonly offset: number;
  /** Bytes that the header promises. */
  readonly promised: number;
  /** Bytes that are there. */
  readonly present: number;
}

/** Walks the chunks after the RIFF header; sizes of RF64 come from its `ds64` chunk. */
function chunksOf(bytes: Uint8Array, view: DataView): readonly Chunk[] {
  const chunks: Chunk[] = [];
  let longData: number | undefined;
  for (let offset = 12; offset + 8 <= bytes.length; ) {
    const id = textAt(bytes, offset, 4);
    const size = view.getUint32(offset + 4, true);
    const start = offset + 8;
    if (id === 'ds64' && start + 16 <= bytes.length) longData = Number(view.getBigUint64(start + 8, true));
    // A recorder that was cut off leaves 0 or all ones in the size; what follows is then the data.
    const unknown = size === 0xffffffff || (size === 0 && id === 'data');
    const promised = id === 'data' && unknown ? (longData ?? bytes.length - start) : size;
    const present = Math.max(0, Math.min(promised, bytes.length - start));
    chunks.push({ id, offset: start, promised, present });
    offset = start + promised + (promised % 2);
  }
  return chunks;
}

interface Format {
  readonly tag: number;
  readonly channels: number;
  readonly sampleRate: number;
  readonly bits: number;
}

function formatOf(view: DataView, chunk: Chunk): Format {
  if (chunk.present < 16) throw unreadable('its format chunk is cut off');
  const tag = view.getUint16(chunk.offset, true);
  const isExtended = tag === EXTENSIBLE && chunk.present >= 26;
  return {
    tag: isExtended ? view.getUint16(chunk.offset + 24, true) : tag,
    channels: view.getUint16(chunk.offset + 2, true),
    sampleRate: view.getUint32(chunk.offset + 4, true),
    bits: view.getUint16(chunk.offset + 14, true),
  };
}

function unreadable(why: string): NotchworkError {
  return new NotchworkError(
    'clip-unreadable',
    `This WAV file cannot be read: ${why}. Save it again, or choose another.`,
  );
}

type SampleReader = (offset: number) => number;

/** A function that reads the sample at a byte offset, scaled to ±1. */
function sampleReader(view: DataView, { tag, bits }: Format): SampleReader {
  if (tag === FLOAT && bits === 32) return (offset) => view.getFloat32(offset, true);
  if (tag === FLOAT && bits === 64) return (offset) => view.getFloat64(offset, true);
  if (tag === PCM && bits === 8) return (offset) => (view.getUint8(offset) - 128) / 128;
  if (tag === PCM && bits === 16) return (offset) => view.getInt16(offset, true) / 2 ** 15;
  if (tag === PCM && bits === 24) {
    return (offset) => (view.getUint8(offset) | (view.getInt16(offset + 1, true) << 8)) / 2 ** 23;
  }
  if (tag === PCM && bits === 32) return (offset) => view.getInt32(offset, true) / 2 ** 31;
  throw new NotchworkError(
    'clip-unsupported',
    `This WAV file holds ${CODECS[tag] ?? `a codec with tag ${tag}`}${tag === PCM || tag === FLOAT ? ` with ${bits} bits` : ''}; PCM of 8, 16, 24 or 32 bits and floating point of 32 or 64 bits can be read. Save it as one of these.`,
  );
}

/** Choices for {@link readWav}. */
export interface WavReadOptions {
  /** Read what is there of a file that ends before its header says. @default false */
  readonly allowTruncated?: boolean;
}

/**
 * Reads a WAV file: PCM of 8 to 32 bits, floating point of 32 or 64; any number of channels to 8.
 *
 * @throws NotchworkError `clip-empty` for a file without samples, `clip-unreadable` where it is not a
 *   WAV file or ends early (the message says by how much), `clip-unsupported` for another codec,
 *   `clip-too-large` beyond the limits of `clip.ts`.
 */
export function readWav(bytes: Uint8Array, options: WavReadOptions = {}): Clip {
  if (bytes.length === 0) throw new NotchworkError('clip-empty', 'This file is empty. Choose another.');
  if (sniff(bytes) !== 'wav') {
    throw unreadable('it does not begin as a WAV file does, whatever its name says');
  }
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  const chunks = chunksOf(bytes, view);
  const formatChunk = chunks.find((chunk) => chunk.id === 'fmt ');
  const data = chunks.find((chunk) => chunk.id === 'data');
  if (formatChunk === undefined) throw unreadable('it says nothing of its format');
  const format = formatOf(view, formatChunk);
  if (format.channels < 1 || format.channels > 8) throw unreadable(`it claims ${format.channels} channels`);
  if (format.sampleRate === 0) throw unreadable('it claims a sample rate of 0');
  const read = sampleReader(view, format);
  if (data === undefined)
    throw new NotchworkError('clip-empty', 'This WAV file has no samples in it. Choose another.');

  const width = format.bits / 8;
  const step = width * format.channels;
  const frames = Math.floor(data.present / step);
  const missing = Math.floor((data.promised - data.present) / step);
  if (missing > 0 && options.allowTruncated !== true) {
    throw unreadable(
      `it ends ${(missing / format.sampleRate).toFixed(2)} s early (${(frames / format.sampleRate).toFixed(2)} s are there, ${((frames + missing) / format.sampleRate).toFixed(2)} s were announced)`,
    );
  }
  const channels = Array.from({ length: format.channels }, (_, channel) => {
    const samples = new Float32Array(frames);
    for (let frame = 0; frame < frames; frame += 1) {
      const value = read(data.offset + frame * step + channel * width);
      samples[frame] = Number.isFinite(value) ? value : 0;
    }
    return samples;
  });
  const clip: Clip = { sampleRate: format.sampleRate, channels, frames };
  assertUsableClip(clip);
  return clip;
}
