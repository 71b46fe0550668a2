import type { BaseContext } from 'tone';
import { NotchworkError } from '../errors.ts';
import type { Hertz, Seconds } from '../units.ts';
import type { AudioClock } from './clock.ts';
import type { Region } from './engine-types.ts';
import { EDGE, LEAD } from './fade.ts';
import { loopBuffer } from './loop-buffer.ts';
import { type Pass, Voice } from './voice.ts';

/** What the player works with. */
export interface PlayerParts {
  readonly tone: BaseContext;
  readonly clock: AudioClock;
  /** Where its voices connect. */
  readonly target: AudioNode;
  /** Called when a clip that does not loop has come to its end. */
  readonly onEnded: () => void;
}

/** The shortest region: below it a loop is a tone of its own, and no room is left for the fades. */
const SHORTEST_REGION: Seconds = 0.02;

interface Frames {
  readonly start: number;
  readonly end: number;
}

/**
 * Plays a clip or a region of it. Loops are turned by the audio thread over a buffer whose seam was
 * faded beforehand, so they are exact to the sample and need no timer; starts, stops and jumps fade for
 * 5 ms, and a jump is one equal-gain fade between two voices. Positions are computed from the
 * context's clock.
 */
export class Player {
  readonly #parts: PlayerParts;
  #buffer: AudioBuffer | undefined;
  #region: Frames | undefined;
  #loop = true;
  #looped: AudioBuffer | undefined;
  #voice: Voice | undefined;
  /** The present voice and those that still fade. */
  readonly #voices = new Set<Voice>();
  /** When the last stop begins to be heard; a start before it would add up with what still plays. */
  #releasedAt: Seconds = 0;
  /** Where to start next, in seconds of the clip. */
  #place: Seconds = 0;

  constructor(parts: PlayerParts) {
    this.#parts = parts;
  }

  /** Whether a voice sounds that was not stopped. */
  get playing(): boolean {
    return this.#voice !== undefined;
  }

  /** Length of the clip; 0 without one. */
  get duration(): Seconds {
    return this.#buffer?.duration ?? 0;
  }

  /** Puts a clip in: stopped, at its beginning, without a region. */
  load(buffer: AudioBuffer | undefined): void {
    this.stop();
    this.#buffer = buffer;
    this.#region = undefined;
    this.#looped = undefined;
    this.#place = 0;
  }

  /**
   * Plays from the present place, or from the region's start where the place lies outside it.
   *
   * @param earliest not before this time of the context.
   * @throws NotchworkError `clip-empty` without a clip.
   */
  play(earliest: Seconds = 0): void {
    if (this.#buffer === undefined || this.#buffer.length === 0) {
      throw new NotchworkError(
        'clip-empty',
        'There is no clip to play. Open a recording or choose a demo clip.',
      );
    }
    if (this.#voice !== undefined) return;
    const at = this.#onGrid(Math.max(this.#parts.clock.now + LEAD, earliest, this.#releasedAt));
    this.#start(at, this.#inside(this.#place));
  }

  /** Stops, and stays at the place reached. */
  stop(): void {
    if (this.#voice === undefined) return;
    this.#place = this.position();
    this.#releasedAt = this.#onGrid(this.#voice.stopsAt);
    this.#voice.stop(this.#releasedAt);
    this.#voice = undefined;
  }

  /** Goes to a place, held inside the region; plays on if it plays. */
  seek(place: Seconds): void {
    this.#place = this.#inside(place);
    if (this.#voice !== undefined) this.#jump(this.#place);
  }

  /**
   * Limits playing to a region; undefined gives the whole clip.
   *
   * @throws NotchworkError `value-out-of-range` for a region outside the clip or shorter than 20 ms.
   */
  setRegion(region: Region | undefined): void {
    this.#region = region === undefined ? undefined : this.#framesOf(region);
    this.#rebuild();
  }

  /** Whether it starts over at the end. */
  setLoop(on: boolean): void {
    if (on === this.#loop) return;
    this.#loop = on;
    this.#rebuild();
  }

  /** Place in the clip that sounds at the context's present time. */
  position(): Seconds {
    return this.#voice?.placeAt(this.#parts.clock.now) ?? this.#place;
  }

  dispose(): void {
    for (const voice of this.#voices) voice.dispose();
    this.#voice = undefined;
    this.#buffer = undefined;
    this.#looped = undefined;
  }

  #frames(): Frames {
    return this.#region ?? { start: 0, end: this.#buffer?.length ?? 0 };
  }

  #rate(): Hertz {
    return this.#buffer?.sampleRate ?? 1;
  }

  /** The nearest time on the grid of samples; between two samples the browser would draw lines. */
  #onGrid(time: Seconds): Seconds {
    return Math.round(time * this.#rate()) / this.#rate();
  }

  #framesOf({ start, end }: Region): Frames {
    const rate = this.#rate();
    const length = this.#buffer?.length ?? 0;
    const frames = {
      start: Math.max(0, Math.round(start * rate)),
      end: Math.min(length, Math.round(end * rate)),
    };
    if (!(frames.end - frames.start >= SHORTEST_REGION * rate)) {
      throw new NotchworkError(
        'value-out-of-range',
        `The region from ${start} s to ${end} s is too short to play; move its ends at least ${SHORTEST_REGION} s apart, inside the clip's ${this.duration.toFixed(2)} s.`,
      );
    }
    return frames;
  }

  /** A place inside the region with room to play; anything else becomes its start. */
  #inside(place: Seconds): Seconds {
    const { start, end } = this.#frames();
    const from = start / this.#rate();
    const room = this.#loop ? 0 : 3 * EDGE;
    return place >= from && place < end / this.#rate() - room ? place : from;
  }

  /** After the region or the loop changed: plays on where it is, or as near as it may. */
  #rebuild(): void {
    this.#looped = undefined;
    if (this.#voice !== undefined) this.#jump(undefined);
    else this.#place = this.#inside(this.#place);
  }

  /** Fades from the present voice to a new one, at another place or (undefined) where it is. */
  #jump(place: Seconds | undefined): void {
    const old = this.#voice!;
    const at = this.#onGrid(old.stopsAt);
    old.stop(at);
    this.#start(at, place ?? this.#inside(old.placeAt(at)));
  }

  #start(at: Seconds, place: Seconds): void {
    const buffer = this.#buffer!;
    const { start, end } = this.#frames();
    const rate = this.#rate();
    const from = this.#onGrid(place);
    let pass: Pass;
    if (this.#loop) {
      this.#looped ??= loopBuffer(this.#parts.tone.rawContext, buffer, start, end, Math.round(EDGE * rate));
      pass = {
        buffer: this.#looped,
        origin: start / rate,
        at,
        offset: from - start / rate,
        length: undefined,
      };
    } else {
      pass = { buffer, origin: 0, at, offset: from, length: end / rate - from };
    }
    const voice = new Voice(this.#parts.tone, this.#parts.clock, this.#parts.target, pass, {
      ended: () => {
        if (this.#voice !== voice) return;
        this.#voice = undefined;
        this.#place = this.#frames().start / this.#rate();
        this.#parts.onEnded();
      },
      released: () => this.#voices.delete(voice),
    });
    this.#voices.add(voice);
    this.#voice = voice;
  }
}
