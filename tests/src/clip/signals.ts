import type { Clip } from '../../../src/clip/clip.ts';

/** A sine of so many seconds in `channels` equal channels; level is the peak in dBFS. */
export function sine(
  frequency: number,
  level: number,
  seconds: number,
  channels = 1,
  sampleRate = 48_000,
): Clip {
  const frames = Math.round(seconds * sampleRate);
  const amplitude = 10 ** (level / 20);
  const samples = Float32Array.from(
    { length: frames },
    (_, frame) => amplitude * Math.sin((2 * Math.PI * frequency * frame) / sampleRate),
  );
  return { sampleRate, frames, channels: Array.from({ length: channels }, () => samples) };
}

/** Clips of one rate one after the other. */
export function joined(clips: readonly Clip[]): Clip {
  const frames = clips.reduce((sum, clip) => sum + clip.frames, 0);
  const channels = clips[0]!.channels.map((_, channel) => {
    const out = new Float32Array(frames);
    let at = 0;
    for (const clip of clips) {
      out.set(clip.channels[channel]!, at);
      at += clip.frames;
    }
    return out;
  });
  return { sampleRate: clips[0]!.sampleRate, frames, channels };
}

/** White noise from a seed, for signals without structure. */
export function whiteNoise(seed: number, seconds: number, sampleRate = 48_000): Clip {
  let state = seed;
  const frames = Math.round(seconds * sampleRate);
  const samples = Float32Array.from({ length: frames }, () => {
    state = (Math.imul(state, 1_664_525) + 1_013_904_223) >>> 0;
    return (state / 2 ** 31 - 1) * 0.5;
  });
  return { sampleRate, frames, channels: [samples] };
}
