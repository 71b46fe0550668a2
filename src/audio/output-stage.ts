import type { Seconds } from '../units.ts';
import { amplitude } from '../units.ts';
import { fade } from './fade.ts';

/** Nothing that is played exceeds this: the largest single-precision number not above −1 dBFS. */
export const CEILING = Math.fround(amplitude(-1) * (1 - 2 ** -24));

/**
 * The last stage before the loudspeakers. Its first part is headroom: one gain for everything, which
 * the chain sets low enough that the clip's peak times the most that the filters can raise it stays
 * under the ceiling, so that in normal use nothing has to be cut. Its second part is a limiter of last
 * resort: a shaper that is a straight line up to the ceiling and flat beyond it. That bound holds for
 * any input and without look-ahead, delay or state; a compressor node promises no bound at all, and a
 * worklet would bring a file of its own for something that should never act. What it cuts is reported.
 *
 * It always runs in two channels: clips with more are mixed down before the bound, and the end of a
 * stereo clip does not change the channel count under filters that still ring.
 */
export class OutputStage {
  readonly input: GainNode;
  /** Where the meter listens: after the headroom, before the limiter. */
  readonly tap: AudioNode;
  readonly #shaper: WaveShaperNode;
  readonly #drive: GainNode;
  #level = 1;

  constructor(context: BaseAudioContext, destination: AudioNode) {
    this.input = context.createGain();
    this.input.channelCount = 2;
    this.input.channelCountMode = 'explicit';
    this.tap = this.input;
    this.#drive = context.createGain();
    this.#drive.gain.value = 1 / CEILING;
    this.#shaper = context.createWaveShaper();
    this.#shaper.curve = Float32Array.of(-CEILING, 0, CEILING);
    this.input.connect(this.#drive);
    this.#drive.connect(this.#shaper);
    this.#shaper.connect(destination);
  }

  /** Headroom as an amplitude ratio, 0 to 1: what it is or is fading to. */
  get level(): number {
    return this.#level;
  }

  /** Sets the headroom, by a fade from a time ahead, or at once where nothing is heard. */
  setLevel(level: number, at: Seconds | undefined): void {
    if (level === this.#level) return;
    if (at === undefined) this.input.gain.value = level;
    else fade(this.input.gain, this.#level, level, at);
    this.#level = level;
  }

  dispose(): void {
    this.input.disconnect();
    this.#drive.disconnect();
    this.#shaper.disconnect();
  }
}
