import type { Clip } from '../clip/clip.ts';
import { assertFileSize, assertUsableClip, CLIP_RATES, LONGEST_CLIP } from '../clip/limits.ts';
import { sniff } from '../clip/wav-reader.ts';
import { NotchworkError } from '../errors.ts';
import type { Hertz } from '../units.ts';
import { readCompressedHeader } from './compressed-header.ts';
import { pause } from './pause.ts';
import type { WavQuestion } from './wav.worker.ts';
import { WorkerPort } from './worker-port.ts';

const FALLBACK_RATE = 48_000; // where a file does not tell its own
const READING_SHARE = 0.5; // of the progress shown; decoding cannot be watched from outside
const SILENT_BELOW = 10 ** (-90 / 20);
const STRIDE = 1 << 22; // samples looked at between two pauses

/** Choices for {@link decodeClip}. */
export interface DecodeOptions {
  readonly signal?: AbortSignal;
  /** Called with the share that is done, 0 to 1, in order; the last call is 1. */
  readonly onProgress?: (share: number) => void;
  /** Take what is there of a WAV file that ends early. @default false */
  readonly allowTruncated?: boolean;
  /** Decodes what is no WAV, at a rate. @default the browser's decoder */
  readonly decode?: (bytes: ArrayBuffer, sampleRate: Hertz) => Promise<AudioBuffer>;
}

/** A recording that was read, with a word about it where one is due. */
export interface DecodedClip {
  readonly clip: Clip;
  /** A sentence for the person at the bench, or undefined where there is nothing to say. */
  readonly notice: string | undefined;
}

async function browserDecode(bytes: ArrayBuffer, sampleRate: Hertz): Promise<AudioBuffer> {
  const { OfflineAudioContext } = await import('standardized-audio-context');
  const context = new OfflineAudioContext({ numberOfChannels: 1, length: 1, sampleRate });
  return (await context.decodeAudioData(bytes)) as unknown as AudioBuffer;
}

/** Reads a file piece by piece, so that there is progress and it can be called off. */
async function readBytes(
  file: Blob,
  { signal, onProgress }: DecodeOptions,
): Promise<Uint8Array<ArrayBuffer>> {
  const bytes = new Uint8Array(file.size);
  const reader = file.stream().getReader();
  let filled = 0;
  try {
    for (;;) {
      signal?.throwIfAborted();
      const { done, value } = await reader.read();
      if (done) break;
      bytes.set(value, filled);
      filled += value.length;
      onProgress?.((READING_SHARE * filled) / file.size);
    }
  } catch (error) {
    if (signal?.aborted) throw signal.reason;
    throw new NotchworkError(
      'clip-unreadable',
      'This file could not be read to its end; it may have been moved or changed meanwhile. Choose it again.',
      { cause: error },
    );
  } finally {
    reader.cancel().catch(() => {});
  }
  return bytes;
}

/** In a worker: a long file takes a second, and the page must stay alive. The bytes are given away. */
async function readWavInWorker(bytes: ArrayBuffer, options: DecodeOptions): Promise<Clip> {
  const worker = new Worker(new URL('./wav.worker.ts', import.meta.url), { type: 'module' });
  const port = new WorkerPort(worker, options.signal);
  try {
    const question: WavQuestion = { bytes, allowTruncated: options.allowTruncated ?? false };
    return await port.ask<Clip>(question, [bytes]);
  } finally {
    port.close();
  }
}

function tooLong(seconds: number): NotchworkError {
  return new NotchworkError(
    'clip-too-large',
    `This recording is ${(seconds / 60).toFixed(1)} minutes long; at most ${LONGEST_CLIP / 60} are taken. Cut the part you want to compare.`,
  );
}

async function decodeOther(bytes: Uint8Array<ArrayBuffer>, options: DecodeOptions): Promise<Clip> {
  const container = sniff(bytes);
  const { sampleRate, duration } = readCompressedHeader(bytes, container);
  if (duration !== undefined && duration > LONGEST_CLIP) throw tooLong(duration);
  const [lowest, highest] = CLIP_RATES;
  const rate =
    sampleRate !== undefined && sampleRate >= lowest && sampleRate <= highest ? sampleRate : FALLBACK_RATE;
  let buffer: AudioBuffer;
  try {
    // The decoder takes its input away; nobody needs it any more.
    buffer = await callOff((options.decode ?? browserDecode)(bytes.buffer, rate), options.signal);
  } catch (error) {
    if (options.signal?.aborted) throw options.signal.reason;
    throw undecodable(container, error);
  }
  const channels = Array.from({ length: buffer.numberOfChannels }, (_, channel) =>
    buffer.getChannelData(channel),
  );
  return { sampleRate: buffer.sampleRate, channels, frames: buffer.length };
}

function undecodable(container: string, cause: unknown): NotchworkError {
  if (container === 'unknown') {
    return new NotchworkError(
      'clip-unreadable',
      'This is not a sound file that can be read here, whatever its name says. WAV, FLAC, MP3, OGG and M4A usually can.',
      { cause },
    );
  }
  return new NotchworkError(
    'clip-unsupported',
    `This browser cannot decode this ${container.toUpperCase()} file: it is damaged, or its codec is not supported. Convert it to WAV and try again.`,
    { cause },
  );
}

/** Stops waiting for something that itself cannot be stopped. */
function callOff<Value>(promise: Promise<Value>, signal: AbortSignal | undefined): Promise<Value> {
  if (signal === undefined) return promise;
  return new Promise((resolve, reject) => {
    const abort = (): void => reject(signal.reason);
    signal.addEventListener('abort', abort, { once: true });
    promise.then(resolve, reject).finally(() => signal.removeEventListener('abort', abort));
  });
}

async function isSilent(clip: Clip, signal: AbortSignal | undefined): Promise<boolean> {
  for (const samples of clip.channels) {
    for (let from = 0; from < samples.length; from += STRIDE) {
      const part = samples.subarray(from, from + STRIDE);
      if (part.some((value) => Math.abs(value) >= SILENT_BELOW)) return false;
      await pause(signal);
    }
  }
  return true;
}

async function decodeFile(file: Blob, options: DecodeOptions): Promise<Clip> {
  const bytes = await readBytes(file, options);
  if (sniff(bytes) !== 'wav') return decodeOther(bytes, options);
  try {
    return await readWavInWorker(bytes.buffer, options);
  } catch (error) {
    // A WAV with a codec that is not read here: the browser may know it. The bytes went to the worker.
    if (!(error instanceof NotchworkError) || error.code !== 'clip-unsupported') throw error;
    return decodeOther(await readBytes(file, options), options).catch((second: unknown) => {
      throw options.signal?.aborted ? second : error;
    });
  }
}

/**
 * Makes a clip of a file: WAV with our own reader (at its own rate, and it says when a file is cut
 * off), everything else with the browser's decoder. Limits are checked before and after.
 *
 * @throws NotchworkError `clip-empty` for an empty file, `clip-unreadable` for a text file or a WAV that
 *   ends early, `clip-unsupported` for an unknown codec, `clip-too-large` over 20 minutes or 300 MB;
 *   AbortError when called off.
 */
export async function decodeClip(file: Blob, options: DecodeOptions = {}): Promise<DecodedClip> {
  options.signal?.throwIfAborted();
  if (file.size === 0) {
    throw new NotchworkError('clip-empty', 'This file is empty. Choose another.');
  }
  assertFileSize(file.size);
  const clip = await decodeFile(file, options);
  options.signal?.throwIfAborted();
  assertUsableClip(clip);
  const silent = await isSilent(clip, options.signal);
  options.onProgress?.(1);
  return {
    clip,
    notice: silent
      ? 'This recording is silent: it plays, but there is nothing to hear and no loudness to match.'
      : undefined,
  };
}
