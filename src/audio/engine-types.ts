import type { ReadonlySignal } from '@preact/signals-core';
import type { Clip } from '../clip/clip.ts';
import type { DigitalSection } from '../filter/section.ts';
import type { Decibels, Hertz, Seconds } from '../units.ts';

/** The digital filters of one span of the line. */
export interface LineFilter {
  /** Same for the same place in the line, so that a change replaces only what changed. */
  readonly key: string;
  /** Compared by identity: the very same list means that nothing changed. */
  readonly sections: readonly DigitalSection[];
}

/**
 * What the audio context does: `suspended` until it is started, `running`, `interrupted` by the
 * system (a call, another program), `stalled` when it claims to run and no time passes (the device
 * went away), `closed` for good.
 */
export type SoundState = 'suspended' | 'running' | 'interrupted' | 'stalled' | 'closed';

/** What the engine does, and what stands in its way. */
export interface EngineState {
  readonly sound: SoundState;
  readonly playing: boolean;
  /** A sentence for the person at the bench, or undefined while all is well. */
  readonly problem: string | undefined;
}

/** A part of a clip, from its beginning. */
export interface Region {
  readonly start: Seconds;
  readonly end: Seconds;
}

/** What the meter shows. */
export interface MeterReading {
  /** Level now, falling at the meter's own pace; −Infinity for silence. */
  readonly level: Decibels;
  /** Highest level of the last seconds. */
  readonly hold: Decibels;
  /** Whether the limiter had to cut something lately. */
  readonly limited: boolean;
  /** How much everything is turned down so that nothing exceeds −1 dBFS; 0 or less. */
  readonly headroom: Decibels;
}

/** What {@link Engine.setLine} and `createEngine` can be told about the line. */
export interface LineSetting {
  readonly filters: readonly LineFilter[];
  /** Gain of the line, for loudness matching. @default unchanged (0 dB at first) */
  readonly gain?: Decibels;
}

/** The sound of the bench, made by `createEngine` of `engine.ts`. Times are places in the clip. */
export interface Engine {
  readonly state: ReadonlySignal<EngineState>;
  /** Rate of the context: what the line's filters must be made for. */
  readonly sampleRate: Hertz;
  /**
   * Makes a clip the one that plays, from its beginning, whole, stopped.
   *
   * @throws NotchworkError where the browser cannot hold it; AbortError when called off.
   */
  load(clip: Clip, signal?: AbortSignal): Promise<void>;
  /**
   * Plays from the present place, inside the region. Call it in the user's own click.
   *
   * @throws NotchworkError `audio-unavailable` when the browser does not let sound start in 5 s;
   *   `clip-empty` without a clip.
   */
  play(): Promise<void>;
  stop(): void;
  /** Goes to a place in the clip, playing on if it plays. */
  seek(place: Seconds): void;
  /** Plays only a part of the clip; undefined plays all. @throws NotchworkError `value-out-of-range` */
  setRegion(region: Region | undefined): void;
  setLoop(on: boolean): void;
  /** Place in the clip that is heard now. */
  position(): Seconds;
  /**
   * Changes the line without a click; changes that come during a change wait, the newest wins.
   *
   * @throws NotchworkError `filter-invalid` or `filter-unstable`; the line then stays as it was.
   */
  setLine(setting: LineSetting): void;
  setGain(gain: Decibels): void;
  /** True plays the clip without the line. */
  setBypass(on: boolean): void;
  /** True silences the line (not the bypass), for instance while its circuit is unstable. */
  setMuted(on: boolean): void;
  /** What the meter shows now; call it once a frame. */
  meter(): MeterReading;
  /** Stops and releases everything. */
  dispose(): Promise<void>;
}

/** What `createEngine` needs to know. */
export interface EngineOptions {
  /** Rate of the audio context, 8000 to 192000. @default 48000 */
  readonly sampleRate?: Hertz;
}
