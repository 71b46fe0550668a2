import type { Clip } from '../clip/clip.ts';

/** Sample formats that can be written. */
export type WavBits = 24 | 32;

function putText(view: DataView, offset: number, text: string): void {
  for (let index = 0; index < text.length; index += 1) view.setUint8(offset + index, text.charCodeAt(index));
}

/** Nearest 24-bit step, ends of the range included. */
function to24(sample: number): number {
  return Math.min(Math.max(Math.round(sample * 2 ** 23), -(2 ** 23)), 2 ** 23 - 1);
}

/**
 * A clip as a WAV file: 24-bit PCM (rounded to the nearest step, clipped at full scale) or 32-bit
 * floating point (as it is).
 */
export function writeWav(clip: Clip, bits: WavBits): Uint8Array<ArrayBuffer> {
  const width = bits / 8;
  const channels = clip.channels.length;
  const isFloat = bits === 32;
  const formatSize = isFloat ? 18 : 16;
  const factSize = isFloat ? 12 : 0; // floating point asks for a fact chunk
  const dataSize = clip.frames * channels * width;
  const dataOffset = 12 + 8 + formatSize + factSize + 8;
  const bytes = new Uint8Array(dataOffset + dataSize + (dataSize % 2));
  const view = new DataView(bytes.buffer);
  putText(view, 0, 'RIFF');
  view.setUint32(4, bytes.length - 8, true);
  putText(view, 8, 'WAVEfmt ');
  view.setUint32(16, formatSize, true);
  view.setUint16(20, isFloat ? 3 : 1, true);
  view.setUint16(22, channels, true);
  view.setUint32(24, clip.sampleRate, true);
  view.setUint32(28, clip.sampleRate * channels * width, true);
  view.setUint16(32, channels * width, true);
  view.setUint16(34, bits, true);
  if (isFloat) {
    putText(view, 38, 'fact');
    view.setUint32(42, 4, true);
    view.setUint32(46, clip.frames, true);
  }
  putText(view, dataOffset - 8, 'data');
  view.setUint32(dataOffset - 4, dataSize, true);
  let offset = dataOffset;
  for (let frame = 0; frame < clip.frames; frame += 1) {
    for (const channel of clip.channels) {
      const sample = channel[frame]!;
      if (isFloat) view.setFloat32(offset, sample, true);
      else {
        const step = to24(sample);
        view.setUint8(offset, step & 0xff);
        view.setInt16(offset + 1, step >> 8, true);
      }
      offset += width;
    }
  }
  return bytes;
}
