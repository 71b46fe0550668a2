import { raisedCosine } from './fade.ts';

/**
 * Copies a part of a buffer so that it can be looped by the audio thread, exact to the sample and
 * without a click: its last few milliseconds fade over into what comes just before its beginning, so
 * that the first sample follows the last one as it does in the original.
 *
 * @param start first frame.
 * @param end frame after the last one; the whole of the buffer is returned as it is, its ends being
 *   faded already.
 * @param fadeFrames length of the seam, cut to half of the part.
 */
export function loopBuffer(
  context: BaseAudioContext,
  buffer: AudioBuffer,
  start: number,
  end: number,
  fadeFrames: number,
): AudioBuffer {
  if (start === 0 && end === buffer.length) return buffer;
  const length = end - start;
  const seam = Math.min(fadeFrames, length >> 1);
  const copy = context.createBuffer(buffer.numberOfChannels, length, buffer.sampleRate);
  for (let channel = 0; channel < buffer.numberOfChannels; channel += 1) {
    const source = buffer.getChannelData(channel);
    const part = source.slice(start, end);
    for (let index = 0; index < seam; index += 1) {
      const share = raisedCosine((index + 1) / seam);
      const place = length - seam + index;
      const before = source[start - seam + index] ?? 0;
      part[place] = part[place]! * (1 - share) + before * share;
    }
    copy.copyToChannel(part, channel);
  }
  return copy;
}
