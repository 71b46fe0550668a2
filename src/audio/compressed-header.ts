import type { Container } from '../clip/wav-reader.ts';
import type { Hertz, Seconds } from '../units.ts';

/** What the first bytes of a compressed recording tell; undefined where they do not. */
export interface CompressedHeader {
  readonly sampleRate: Hertz | undefined;
  /** Length; for a variable bit rate without an index, an estimate. */
  readonly duration: Seconds | undefined;
}

const UNKNOWN: CompressedHeader = { sampleRate: undefined, duration: undefined };
const SEARCHED = 4 << 20; // bytes at either end that are looked through for a box or a page

function findText(bytes: Uint8Array, text: string, from: number, to: number): number {
  const codes = [...text].map((letter) => letter.charCodeAt(0));
  for (let index = from; index <= to - codes.length; index += 1) {
    if (codes.every((code, place) => bytes[index + place] === code)) return index;
  }
  return -1;
}

/** First place of a text near the beginning or, failing that, near the end. */
function findAtEnds(bytes: Uint8Array, text: string): number {
  const near = findText(bytes, text, 0, Math.min(bytes.length, SEARCHED));
  return near >= 0 ? near : findText(bytes, text, Math.max(0, bytes.length - SEARCHED), bytes.length);
}

/** FLAC's STREAMINFO (RFC 9639, section 8.2): 20 bits of rate and 36 bits of length, from byte 18. */
function flac(bytes: Uint8Array, view: DataView): CompressedHeader {
  if (bytes.length < 26) return UNKNOWN;
  const sampleRate = view.getUint32(18) >>> 12;
  const frames = (bytes[21]! & 0x0f) * 2 ** 32 + view.getUint32(22);
  return {
    sampleRate: sampleRate || undefined,
    duration: frames && sampleRate ? frames / sampleRate : undefined,
  };
}

/** Ogg pages (RFC 3533) with Opus (RFC 7845, always 48 kHz) or Vorbis I (Xiph specification, 4.2.2). */
function ogg(bytes: Uint8Array, view: DataView): CompressedHeader {
  const end = Math.min(bytes.length, 512);
  const opus = findText(bytes, 'OpusHead', 0, end);
  const vorbis = findText(bytes, '\u0001vorbis', 0, end);
  const isVorbis = vorbis >= 0 && vorbis + 16 <= bytes.length;
  const sampleRate = opus >= 0 ? 48_000 : isVorbis ? view.getUint32(vorbis + 12, true) : undefined;
  if (!sampleRate) return UNKNOWN;
  // The last page says how many samples have been completed.
  let last = -1;
  for (let from = Math.max(0, bytes.length - 65_536 - 282); ; from = last + 1) {
    const found = findText(bytes, 'OggS', from, bytes.length);
    if (found < 0) break;
    last = found;
  }
  const granules = last >= 0 && last + 14 <= bytes.length ? Number(view.getBigInt64(last + 6, true)) : 0;
  return { sampleRate, duration: granules > 0 ? granules / sampleRate : undefined };
}

const MPEG1_RATES = [44_100, 48_000, 32_000];
const MPEG1_LAYER3 = [0, 32, 40, 48, 56, 64, 80, 96, 112, 128, 160, 192, 224, 256, 320]; // kbit/s
const MPEG2_LAYER3 = [0, 8, 16, 24, 32, 40, 48, 56, 64, 80, 96, 112, 128, 144, 160]; // kbit/s

/** Where the first frame begins: after an ID3v2 tag, whose size has seven bits in every byte. */
function firstFrame(bytes: Uint8Array): number {
  let offset = 0;
  if (findText(bytes, 'ID3', 0, 3) === 0 && bytes.length > 10) {
    offset = 10 + ((bytes[6]! << 21) | (bytes[7]! << 14) | (bytes[8]! << 7) | bytes[9]!);
  }
  const end = Math.min(bytes.length - 4, offset + 65_536);
  while (offset < end && !(bytes[offset] === 0xff && (bytes[offset + 1]! & 0xe6) === 0xe2)) offset += 1;
  return offset < end ? offset : -1;
}

/** MPEG audio layer III (ISO/IEC 11172-3, 2.4.1.3): rate and bit rate stand in every frame's header. */
function mp3(bytes: Uint8Array, view: DataView): CompressedHeader {
  const offset = firstFrame(bytes);
  if (offset < 0) return UNKNOWN;
  const version = (bytes[offset + 1]! >> 3) & 3; // 3: MPEG 1, 2: MPEG 2, 0: MPEG 2.5
  const base = MPEG1_RATES[(bytes[offset + 2]! >> 2) & 3];
  const isFirst = version === 3;
  if (base === undefined || version === 1) return UNKNOWN;
  const sampleRate = isFirst ? base : version === 2 ? base / 2 : base / 4;
  const isMono = bytes[offset + 3]! >> 6 === 3;
  const index = offset + 4 + (isFirst ? (isMono ? 17 : 32) : isMono ? 9 : 17);
  const hasIndex =
    findText(bytes, 'Xing', index, index + 4) === index ||
    findText(bytes, 'Info', index, index + 4) === index;
  if (hasIndex && index + 12 <= bytes.length && (bytes[index + 7]! & 1) === 1) {
    const perFrame = isFirst ? 1152 : 576;
    return { sampleRate, duration: (view.getUint32(index + 8) * perFrame) / sampleRate };
  }
  const rate = (isFirst ? MPEG1_LAYER3 : MPEG2_LAYER3)[bytes[offset + 2]! >> 4];
  return { sampleRate, duration: rate ? (8 * (bytes.length - offset)) / (1000 * rate) : undefined };
}

/** MP4 (ISO/IEC 14496-12): the movie header has the length, the sound's sample entry the rate. */
function mp4(bytes: Uint8Array, view: DataView): CompressedHeader {
  const entry = findAtEnds(bytes, 'mp4a');
  const sampleRate = entry >= 0 && entry + 30 <= bytes.length ? view.getUint16(entry + 28) : 0;
  const header = findAtEnds(bytes, 'mvhd');
  let duration: Seconds | undefined;
  if (header >= 0 && header + 36 <= bytes.length) {
    const isLong = bytes[header + 4] === 1;
    const scale = view.getUint32(header + (isLong ? 24 : 16));
    const units = isLong ? Number(view.getBigUint64(header + 28)) : view.getUint32(header + 20);
    duration = scale > 0 ? units / scale : undefined;
  }
  return { sampleRate: sampleRate || undefined, duration };
}

/**
 * Reads rate and length off a compressed recording before anything is decoded: so that it is decoded at
 * its own rate, and one of many hours is refused before it fills the memory.
 */
export function readCompressedHeader(bytes: Uint8Array, container: Container): CompressedHeader {
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.byteLength);
  switch (container) {
    case 'flac':
      return flac(bytes, view);
    case 'ogg':
      return ogg(bytes, view);
    case 'mp3':
      return mp3(bytes, view);
    case 'mp4':
      return mp4(bytes, view);
    default:
      return UNKNOWN;
  }
}
