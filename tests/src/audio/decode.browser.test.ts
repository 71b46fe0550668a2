import { expect } from '@open-wc/testing';
import { type DecodeOptions, decodeClip } from '../../../src/audio/decode.ts';
import { floatWav } from '../../../src/audio/float-wav.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { sine } from './offline-rig.ts';

async function wavOf(samples: Float32Array, sampleRate: number): Promise<ArrayBuffer> {
  return floatWav({ sampleRate, channels: [samples], frames: samples.length });
}

async function problemOf(file: Blob, options?: DecodeOptions): Promise<NotchworkError> {
  const outcome = await decodeClip(file, options).catch((error: unknown) => error);
  expect(outcome).to.be.instanceOf(NotchworkError);
  return outcome as NotchworkError;
}

/** A recording in a compressed format, made by the browser itself; undefined where it makes none. */
async function recorded(mimeType: string): Promise<Blob | undefined> {
  if (!MediaRecorder.isTypeSupported(mimeType)) return undefined;
  const context = new AudioContext();
  await context.resume();
  const oscillator = context.createOscillator();
  const sink = context.createMediaStreamDestination();
  oscillator.connect(sink);
  oscillator.start();
  const recorder = new MediaRecorder(sink.stream, { mimeType });
  const parts: Blob[] = [];
  recorder.ondataavailable = ({ data }) => parts.push(data);
  const stopped = new Promise((resolve) => {
    recorder.onstop = resolve;
  });
  recorder.start();
  await new Promise((resolve) => setTimeout(resolve, 500));
  recorder.stop();
  await stopped;
  await context.close();
  return new Blob(parts, { type: mimeType });
}

describe('decodeClip', () => {
  for (const rate of [8000, 44_100, 192_000]) {
    it(`reads a WAV at its own rate of ${rate} Hz, sample for sample`, async () => {
      const samples = sine(440, 0.1, rate);
      const { clip, notice } = await decodeClip(new Blob([await wavOf(samples, rate)]));
      expect(clip.sampleRate).to.equal(rate);
      expect(clip.frames).to.equal(samples.length);
      expect([...clip.channels[0]!]).to.deep.equal([...samples]);
      expect(notice).to.equal(undefined);
    });
  }

  it('reads what only the browser can decode, at the rate of the context', async () => {
    const file = await recorded('audio/webm;codecs=opus');
    expect(file, 'this browser records Opus').not.to.equal(undefined);
    const { clip } = await decodeClip(file!);
    expect(clip.sampleRate).to.equal(48_000);
    expect(clip.frames / clip.sampleRate).to.be.within(0.2, 1);
    const peak = clip.channels[0]!.reduce((most, value) => Math.max(most, Math.abs(value)), 0);
    expect(peak).to.be.within(0.5, 1.5);
  });

  it('asks for the rate that a FLAC file tells of itself', async () => {
    const head = Uint8Array.of(
      ...[0x66, 0x4c, 0x61, 0x43, 0x80, 0, 0, 0x22, 0x10, 0, 0x10, 0, 0, 0, 0x0f, 0, 0, 0x0f],
      ...[0x17, 0x70, 0x02, 0xf0, 0, 0, 0, 1],
    );
    let asked = 0;
    await decodeClip(new Blob([head]), {
      decode: async (_bytes, rate) => {
        asked = rate;
        return new AudioBuffer({ length: 1, sampleRate: rate });
      },
    });
    expect(asked).to.equal(96_000);
  });

  it('tells its progress in order, ending with 1', async () => {
    const shares: number[] = [];
    const file = new Blob([await wavOf(sine(440, 5), 48_000)]);
    await decodeClip(file, { onProgress: (share) => shares.push(share) });
    expect(shares).to.deep.equal([...shares].sort((first, second) => first - second));
    expect(shares.at(-1)).to.equal(1);
  });

  it('says of a silent clip that it is silent, and takes it', async () => {
    const { clip, notice } = await decodeClip(new Blob([await wavOf(new Float32Array(4800), 48_000)]));
    expect(clip.frames).to.equal(4800);
    expect(notice).to.contain('silent');
  });
});

describe('a file that is no good', () => {
  it('is empty', async () => {
    const { code, message } = await problemOf(new File([], 'take.wav'));
    expect(code).to.equal('clip-empty');
    expect(message).to.contain('empty');
  });

  it('is a text named .wav', async () => {
    const { code, message } = await problemOf(new File(['Take two, with more treble.'], 'take.wav'));
    expect(code).to.equal('clip-unreadable');
    expect(message).to.contain('not a sound file');
  });

  it('is a WAV that ends early: said, and read as far as it goes when asked to', async () => {
    const file = new Blob([(await wavOf(sine(440, 1), 48_000)).slice(0, 58 + 4 * 24_000)]);
    const { code, message } = await problemOf(file);
    expect(code).to.equal('clip-unreadable');
    expect(message).to.contain('0.50 s');
    const { clip } = await decodeClip(file, { allowTruncated: true });
    expect(clip.frames).to.equal(24_000);
  });

  it('is a WAV with a codec that nobody here knows', async () => {
    const bytes = await wavOf(sine(440, 0.1), 48_000);
    new DataView(bytes).setUint16(20, 0x1234, true);
    const { code, message } = await problemOf(new Blob([bytes]));
    expect(code).to.equal('clip-unsupported');
    expect(message).to.contain('codec');
  });

  it('is a compressed file that the browser cannot decode', async () => {
    const bytes = new Uint8Array(2000);
    bytes.set([0x66, 0x4c, 0x61, 0x43]);
    const { code, message } = await problemOf(new Blob([bytes]));
    expect(code).to.equal('clip-unsupported');
    expect(message).to.contain('FLAC');
  });

  it('is over 300 MB: refused before a byte is read', async () => {
    let read = false;
    const huge = {
      size: 300_000_001,
      stream: () => {
        read = true;
        return new ReadableStream();
      },
    } as unknown as Blob;
    const { code, message } = await problemOf(huge);
    expect(code).to.equal('clip-too-large');
    expect(message).to.contain('300 MB');
    expect(read).to.equal(false);
  });

  it('is compressed and many hours long: refused before it is decoded', async () => {
    const head = Uint8Array.of(
      ...[0x66, 0x4c, 0x61, 0x43, 0x80, 0, 0, 0x22, 0x10, 0, 0x10, 0, 0, 0, 0x0f, 0, 0, 0x0f],
      ...[0x0b, 0xb8, 0x02, 0xf1, 0, 0, 0, 0],
    );
    let decoded = false;
    const { code, message } = await problemOf(new Blob([head]), {
      decode: async (_bytes, sampleRate) => {
        decoded = true;
        return new AudioBuffer({ length: 1, sampleRate });
      },
    });
    expect(code).to.equal('clip-too-large');
    expect(message).to.contain('1491.3 minutes');
    expect(decoded).to.equal(false);
  });

  it('turns out to be over 20 minutes long after decoding', async () => {
    const { code } = await problemOf(new Blob(['????????????????']), {
      decode: async () => new AudioBuffer({ length: 8000 * 1201, sampleRate: 8000 }),
    });
    expect(code).to.equal('clip-too-large');
  });
});

describe('calling off', () => {
  it('works before the start', async () => {
    const outcome = await decodeClip(new Blob(['x']), { signal: AbortSignal.abort() }).catch(
      (error) => error.name,
    );
    expect(outcome).to.equal('AbortError');
  });

  it('works while the browser decodes, which itself cannot be stopped', async () => {
    const controller = new AbortController();
    const pending = decodeClip(new Blob(['????????????????']), {
      signal: controller.signal,
      decode: () => {
        setTimeout(() => controller.abort());
        return new Promise(() => {});
      },
    });
    expect(await pending.catch((error) => error.name)).to.equal('AbortError');
  });

  it('works while a WAV is read', async () => {
    const controller = new AbortController();
    const file = new Blob([await wavOf(new Float32Array(2_000_000), 48_000)]);
    const outcome = await decodeClip(file, {
      signal: controller.signal,
      onProgress: () => controller.abort(),
    }).catch((error) => error.name);
    expect(outcome).to.equal('AbortError');
  });
});
