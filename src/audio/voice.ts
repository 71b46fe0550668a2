import { type BaseContext, connect, ToneBufferSource } from 'tone';
import type { Seconds } from '../units.ts';
import type { AudioClock } from './clock.ts';
import { EDGE, fade, LEAD } from './fade.ts';

/** One pass of the player, from a start to a stop. Times lie on the grid of samples. */
export interface Pass {
  readonly buffer: AudioBuffer;
  /** Place in the clip of the buffer's first sample. */
  readonly origin: Seconds;
  /** When it starts, in the context's time. */
  readonly at: Seconds;
  /** Where in the buffer it starts. */
  readonly offset: Seconds;
  /** How long it plays, at least three fades; undefined loops the whole buffer until it is stopped. */
  readonly length: Seconds | undefined;
}

/** What happens to a voice. */
export interface VoiceEvents {
  /** It has played to its end without being stopped. */
  readonly ended: () => void;
  /** It is taken apart; nothing of it is left in the context. */
  readonly released: () => void;
}

const RELEASE: Seconds = 0.05; // after a voice fell silent
const MARGIN: Seconds = 0.001; // between two fades, which may not overlap, whatever the rounding

/** A buffer that plays once or loops, with short fades at its start and end. */
export class Voice {
  readonly #tone: BaseContext;
  readonly #clock: AudioClock;
  readonly #pass: Pass;
  readonly #events: VoiceEvents;
  readonly #source: ToneBufferSource;
  readonly #envelope: GainNode;
  #callOff: () => void = () => {};
  #disposed = false;

  constructor(tone: BaseContext, clock: AudioClock, target: AudioNode, pass: Pass, events: VoiceEvents) {
    this.#tone = tone;
    this.#clock = clock;
    this.#pass = pass;
    this.#events = events;
    const { buffer, at, offset, length } = pass;
    this.#envelope = tone.rawContext.createGain();
    this.#envelope.gain.value = 0;
    this.#envelope.connect(target);
    this.#source = new ToneBufferSource({ context: tone, url: buffer, loop: length === undefined });
    connect(this.#source, this.#envelope);
    fade(this.#envelope.gain, 0, 1, at, EDGE);
    this.#source.start(at, offset);
    if (length !== undefined) {
      const end = at + length;
      fade(this.#envelope.gain, 1, 0, end - EDGE, EDGE);
      this.#source.stop(end);
      this.#callOff = clock.at(end, () => {
        this.#releaseAt(end + RELEASE);
        events.ended();
      });
    }
  }

  /** Place in the clip that sounds at a time of the context. */
  placeAt(time: Seconds): Seconds {
    const { origin, at, offset, length, buffer } = this.#pass;
    const run = Math.max(time - at, 0);
    if (length === undefined) return origin + ((offset + run) % buffer.duration);
    return origin + offset + Math.min(run, length);
  }

  /** When a stop asked for now would begin to be heard: ahead of the present, and after its own rise. */
  get stopsAt(): Seconds {
    return Math.max(this.#clock.now + LEAD, this.#pass.at + EDGE + MARGIN);
  }

  /** Fades out from a time not before {@link stopsAt}, then goes. */
  stop(at: Seconds): void {
    this.#callOff();
    const { length } = this.#pass;
    const end = length === undefined ? Number.POSITIVE_INFINITY : this.#pass.at + length;
    // In its last moments it is fading already, and two fades may not overlap.
    if (at < end - EDGE) {
      this.#envelope.gain.cancelScheduledValues(at);
      fade(this.#envelope.gain, 1, 0, at, EDGE);
      this.#source.stop(at + EDGE);
    }
    this.#releaseAt(at + EDGE + RELEASE);
  }

  /** Takes it apart at once. */
  dispose(): void {
    if (this.#disposed) return;
    this.#disposed = true;
    this.#callOff();
    // The browser keeps a source alive that was never stopped, even with nothing connected to it.
    if (this.#source.state === 'started') this.#source.stop(this.#tone.immediate());
    this.#source.dispose();
    this.#envelope.disconnect();
    this.#events.released();
  }

  #releaseAt(time: Seconds): void {
    this.#callOff = this.#clock.at(time, () => this.dispose());
  }
}
