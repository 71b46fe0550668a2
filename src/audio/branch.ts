import type { Seconds } from '../units.ts';
import { fade } from './fade.ts';

/** Something with an entry, an exit and a way to take it apart: a slot's filters, or a whole rack. */
export interface BranchContent {
  /** Nodes that the source must be connected to; empty means straight through. */
  readonly entry: AudioNode | undefined;
  readonly exit: AudioNode | undefined;
  dispose(): void;
}

/**
 * One of the ways that lie side by side between two points, and that a change fades between. It is
 * built at gain 0, so that connecting it changes nothing.
 *
 * The order matters and was measured: the gain is set to 0 before it is connected; the time is read
 * after everything is made and connected (making filters takes milliseconds); and at the end the source
 * is disconnected *from* the branch too, or the browser frees nothing of it.
 */
export class Branch {
  readonly #source: AudioNode;
  readonly #content: BranchContent;
  readonly #gain: GainNode;
  readonly #head: AudioNode;
  #level = 0;

  constructor(context: BaseAudioContext, source: AudioNode, target: AudioNode, content: BranchContent) {
    this.#source = source;
    this.#content = content;
    this.#gain = context.createGain();
    this.#gain.gain.value = 0;
    this.#gain.connect(target);
    content.exit?.connect(this.#gain);
    this.#head = content.entry ?? this.#gain;
    source.connect(this.#head);
  }

  /** The gain it has, or is fading to. */
  get level(): number {
    return this.#level;
  }

  /** Sets the gain at once; only where nothing is heard. */
  set(level: number): void {
    this.#level = level;
    this.#gain.gain.value = level;
  }

  /** Fades to a gain, from a time that lies ahead. */
  fadeTo(level: number, at: Seconds): void {
    fade(this.#gain.gain, this.#level, level, at);
    this.#level = level;
  }

  dispose(): void {
    this.#source.disconnect(this.#head);
    this.#content.dispose();
    this.#gain.disconnect();
  }
}
