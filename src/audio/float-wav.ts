import type { Clip } from '../clip/clip.ts';
import { pause } from './pause.ts';

const HEADER = 58; // RIFF 12, fmt 8 + 18, fact 8 + 4, data 8
const FLOAT_FORMAT = 3;
const BYTES = 4;
const STRIDE = 1 << 18; // frames between two pauses

function writeHeader(view: DataView, clip: Clip): void {
  const channels = clip.channels.length;
  const data = clip.frames * channels * BYTES;
  const tag = (offset: number, text: string): void => {
    for (const [index, letter] of [...text].entries()) view.setUint8(offset + index, letter.charCodeAt(0));
  };
  tag(0, 'RIFF');
  view.setUint32(4, HEADER - 8 + data, true);
  tag(8, 'WAVEfmt ');
  view.setUint32(16, 18, true);
  view.setUint16(20, FLOAT_FORMAT, true);
  view.setUint16(22, channels, true);
  view.setUint32(24, clip.sampleRate, true);
  view.setUint32(28, clip.sampleRate * channels * BYTES, true);
  view.setUint16(32, channels * BYTES, true);
  view.setUint16(34, 8 * BYTES, true);
  view.setUint16(36, 0, true);
  tag(38, 'fact');
  view.setUint32(42, 4, true);
  view.setUint32(46, clip.frames, true);
  tag(50, 'data');
  view.setUint32(54, data, true);
}

/**
 * A clip as a 32-bit float WAV in memory, for the browser's decoder (which resamples). Files for the
 * user are written elsewhere.
 *
 * @throws AbortError when called off.
 */
export async function floatWav(clip: Clip, signal?: AbortSignal): Promise<ArrayBuffer> {
  const channels = clip.channels.length;
  const bytes = new ArrayBuffer(HEADER + clip.frames * channels * BYTES);
  const view = new DataView(bytes);
  writeHeader(view, clip);
  for (let from = 0; from < clip.frames; from += STRIDE) {
    const end = Math.min(from + STRIDE, clip.frames);
    for (const [channel, samples] of clip.channels.entries()) {
      let offset = HEADER + (from * channels + channel) * BYTES;
      for (let frame = from; frame < end; frame += 1) {
        view.setFloat32(offset, samples[frame]!, true);
        offset += channels * BYTES;
      }
    }
    await pause(signal);
  }
  return bytes;
}
