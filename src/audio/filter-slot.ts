import type { DigitalSection } from '../filter/section.ts';
import type { Seconds } from '../units.ts';
import { Branch } from './branch.ts';
import { buildSections } from './section-nodes.ts';

/**
 * The place of one span in the chain: what comes in goes through its present filters. A change takes
 * three steps, all driven by the chain, which makes sure that only one is under way: {@link prepare}
 * builds the new filters beside the old ones (unheard, but already running on the signal),
 * {@link commit} fades over, {@link settle} takes the old ones away.
 */
export class FilterSlot {
  readonly #context: BaseAudioContext;
  readonly input: GainNode;
  readonly output: GainNode;
  #sections: readonly DigitalSection[];
  #current: Branch;
  #next: Branch | undefined;
  #old: Branch | undefined;

  /**
   * @param sections the filters to begin with; an empty list passes the signal as it is.
   * @throws NotchworkError `filter-invalid` or `filter-unstable`.
   */
  constructor(context: BaseAudioContext, sections: readonly DigitalSection[]) {
    this.#context = context;
    this.input = context.createGain();
    this.output = context.createGain();
    this.#sections = sections;
    this.#current = this.#build(sections);
    this.#current.set(1);
  }

  /** The filters in force, or being faded to. */
  get sections(): readonly DigitalSection[] {
    return this.#sections;
  }

  /** The gain of the filters in force, which a change of the line's gain may have left here. */
  get level(): number {
    return this.#current.level;
  }

  /** Builds the next filters, unheard. */
  prepare(sections: readonly DigitalSection[]): void {
    this.#next = this.#build(sections);
    this.#sections = sections;
  }

  /**
   * Moves over to the prepared filters.
   *
   * @param level their gain, 1 for none.
   * @param at when the fade begins; undefined moves at once, where nothing is heard.
   */
  commit(level: number, at: Seconds | undefined): void {
    if (this.#next === undefined) return;
    this.#old = this.#current;
    this.#current = this.#next;
    this.#next = undefined;
    if (at === undefined) {
      this.#old.set(0);
      this.#current.set(level);
    } else {
      this.#old.fadeTo(0, at);
      this.#current.fadeTo(level, at);
    }
  }

  /** Takes the old filters away, once their fade is over. */
  settle(): void {
    this.#old?.dispose();
    this.#old = undefined;
  }

  dispose(): void {
    this.settle();
    this.#next?.dispose();
    this.#next = undefined;
    this.#current.dispose();
    this.input.disconnect();
    this.output.disconnect();
  }

  #build(sections: readonly DigitalSection[]): Branch {
    const { nodes, dispose } = buildSections(this.#context, sections);
    return new Branch(this.#context, this.input, this.output, {
      entry: nodes[0],
      exit: nodes.at(-1),
      dispose,
    });
  }
}
