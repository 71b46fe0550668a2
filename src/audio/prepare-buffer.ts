import type { Clip } from '../clip/clip.ts';
import { messageOf, NotchworkError } from '../errors.ts';
import { EDGE, raisedCosine } from './fade.ts';
import { floatWav } from './float-wav.ts';
import { pause } from './pause.ts';

const STRIDE = 1 << 21; // frames between two pauses: some 10 ms of work

/** A clip as the player needs it. */
export interface PreparedClip {
  /** At the context's rate; its first and last 5 ms are faded, so that neither end clicks. */
  readonly buffer: AudioBuffer;
  /** Largest amplitude, after mixing down to two channels; 0 for silence. */
  readonly peak: number;
}

/** More than two channels are mixed down by the browser: front + 0.707·(centre + surround) at the most. */
const MIX_DOWN = 1 + 2 * Math.SQRT1_2;

async function atContextRate(
  context: BaseAudioContext,
  clip: Clip,
  signal?: AbortSignal,
): Promise<AudioBuffer> {
  if (clip.sampleRate !== context.sampleRate) {
    // The browser's decoder resamples with a long filter; playing at another rate would only draw lines
    // between samples. So the clip goes through the decoder as a WAV.
    const decoded = await context.decodeAudioData(await floatWav(clip, signal));
    signal?.throwIfAborted();
    return decoded;
  }
  const buffer = context.createBuffer(clip.channels.length, clip.frames, clip.sampleRate);
  for (const [channel, samples] of clip.channels.entries()) {
    for (let from = 0; from < clip.frames; from += STRIDE) {
      buffer.copyToChannel(samples.subarray(from, from + STRIDE) as Float32Array<ArrayBuffer>, channel, from);
      await pause(signal);
    }
  }
  return buffer;
}

/** Replaces what is not a number (one such sample would silence a filter for good) and finds the peak. */
async function clean(samples: Float32Array, signal?: AbortSignal): Promise<number> {
  let peak = 0;
  for (let from = 0; from < samples.length; from += STRIDE) {
    const end = Math.min(from + STRIDE, samples.length);
    for (let index = from; index < end; index += 1) {
      const size = Math.abs(samples[index]!);
      if (size > peak && size < Number.POSITIVE_INFINITY) peak = size;
      else if (!(size <= peak)) samples[index] = 0;
    }
    await pause(signal);
  }
  return peak;
}

function fadeEnds(samples: Float32Array, length: number): void {
  const count = Math.min(length, samples.length >> 1);
  for (let index = 0; index < count; index += 1) {
    const share = raisedCosine(index / count);
    samples[index]! *= share;
    samples[samples.length - 1 - index]! *= share;
  }
}

/**
 * Brings a clip to the context's rate and makes it safe to play. Long clips are worked on in pieces, so
 * that the page stays alive.
 *
 * @throws NotchworkError `clip-unsupported` where the browser cannot hold or resample it; AbortError.
 */
export async function prepareBuffer(
  context: BaseAudioContext,
  clip: Clip,
  signal?: AbortSignal,
): Promise<PreparedClip> {
  signal?.throwIfAborted();
  let buffer: AudioBuffer;
  try {
    buffer = await atContextRate(context, clip, signal);
  } catch (error) {
    if (signal?.aborted) throw error;
    throw new NotchworkError(
      'clip-unsupported',
      `The browser could not bring this clip from ${clip.sampleRate / 1000} kHz to the ${context.sampleRate / 1000} kHz at which the sound runs (${messageOf(error)}). Try a shorter clip or another rate.`,
      { cause: error },
    );
  }
  let peak = 0;
  for (let channel = 0; channel < buffer.numberOfChannels; channel += 1) {
    const samples = buffer.getChannelData(channel);
    peak = Math.max(peak, await clean(samples, signal));
    fadeEnds(samples, Math.round(EDGE * buffer.sampleRate));
  }
  return { buffer, peak: buffer.numberOfChannels > 2 ? peak * MIX_DOWN : peak };
}
