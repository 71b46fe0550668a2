import { writeFile } from 'node:fs/promises';
import { type Clip, peakOf } from '../../clip/clip.ts';
import { measureLoudness } from '../../clip/loudness.ts';
import { readWav } from '../../clip/wav-reader.ts';
import { messageOf, NotchworkError } from '../../errors.ts';
import { Cascade } from '../../filter/cascade.ts';
import { renderTail } from '../../filter/render-tail.ts';
import type { DigitalSection } from '../../filter/section.ts';
import { writeWav } from '../../sheet/wav.ts';
import { amplitude, type Decibels } from '../../units.ts';
import { readKnobs, usageError } from '../arguments.ts';
import { type Command, KNOB_OPTION, OUTPUT_OPTION } from '../command.ts';
import { loadSubject, readBytes, subjectSections } from '../subject.ts';

/** A clip through sections in double precision, its tail appended. */
function renderClip(clip: Clip, sections: readonly DigitalSection[]): Float64Array[] {
  const frames = clip.frames + renderTail(sections, clip.sampleRate);
  const cascade = new Cascade(sections, clip.channels.length);
  return clip.channels.map((samples, channel) => {
    const block = new Float64Array(frames);
    block.set(samples);
    cascade.process(block, channel);
    return block;
  });
}

function asClip(channels: readonly Float64Array[], sampleRate: number, frames: number, gain: number): Clip {
  return {
    sampleRate,
    frames,
    channels: channels.map((samples) =>
      Float32Array.from(samples.subarray(0, frames), (value) => value * gain),
    ),
  };
}

/** Gain that makes the rendering as loud as the clip (ITU-R BS.1770). */
function matchedGain(clip: Clip, rendered: Clip): Decibels {
  const [before, after] = [measureLoudness(clip), measureLoudness(rendered)];
  if (before.kind === 'silent' || after.kind === 'silent') {
    throw new NotchworkError(
      'clip-empty',
      'There is nothing to match: the clip or what comes of it is silent. Leave --matched out.',
    );
  }
  return before.lufs - after.lufs;
}

async function writeOut(path: string, bytes: Uint8Array): Promise<void> {
  try {
    await writeFile(path, bytes);
  } catch (cause) {
    throw new NotchworkError(
      'storage-failed',
      `${path}: cannot be written (${messageOf(cause)}). Choose another place.`,
      { cause },
    );
  }
}

/** `render`: a WAV file through the circuit, at its own rate and channel count. */
export const renderCommand: Command = {
  name: 'render',
  summary: 'A WAV file through the circuit.',
  files: ['FILE', 'IN.wav', 'OUT.wav'],
  options: [
    KNOB_OPTION,
    { name: 'matched', help: 'as loud as the clip (ITU-R BS.1770); unity level otherwise' },
    { name: 'bits', value: '24|32', help: '24-bit PCM, or 32-bit floating point (default)' },
    OUTPUT_OPTION,
  ],
  notes: ['What still rings after the end of the clip is appended, at most 2 s.'],
  async run(args) {
    const bits = args.text('bits') ?? '32';
    if (bits !== '24' && bits !== '32') throw usageError(`--bits is “${bits}”; it takes 24 or 32.`);
    const [file, input, output] = args.positionals as [string, string, string];
    const subject = await loadSubject(file, readKnobs(args.texts('knob')), args.text('output'));
    const bytes = await readBytes(input);
    let clip: Clip;
    try {
      clip = readWav(bytes);
    } catch (error) {
      throw error instanceof NotchworkError
        ? new NotchworkError(error.code, `${input}: ${error.message}`)
        : error;
    }
    const sections = subjectSections(subject, clip.sampleRate);
    const channels = renderClip(clip, sections);
    const frames = channels[0]!.length;
    const gain = args.flag('matched')
      ? amplitude(matchedGain(clip, asClip(channels, clip.sampleRate, clip.frames, 1)))
      : 1;
    const rendered = asClip(channels, clip.sampleRate, frames, gain);
    if (bits === '24' && peakOf(rendered) > 1) {
      process.stderr.write(`${output}: peaks above full scale were cut; use --bits 32 to keep them.\n`);
    }
    await writeOut(output, writeWav(rendered, bits === '24' ? 24 : 32));
  },
};
