import { assertRange } from '../errors.ts';
import { amplitude, type Decibels, decibels, type Seconds } from '../units.ts';
import { Branch } from './branch.ts';
import type { AudioClock } from './clock.ts';
import type { LineFilter, LineSetting } from './engine-types.ts';
import { FADE, fade, LEAD, WARM_UP } from './fade.ts';
import { CEILING, OutputStage } from './output-stage.ts';
import { peakGain } from './peak-gain.ts';
import { Rack } from './rack.ts';
import { Scope } from './scope.ts';
import { checkSections } from './section-nodes.ts';

/** What the chain is made of; handed in, so that a test can run it in an offline context. */
export interface ChainParts {
  readonly context: BaseAudioContext;
  readonly clock: AudioClock;
  /** Where the sound goes. */
  readonly destination: AudioNode;
}

/** Everything that can be asked of the chain; levels as amplitude ratios. */
interface Setting {
  readonly line: readonly LineFilter[];
  readonly gain: number;
  readonly bypass: boolean;
  readonly muted: boolean;
  /** Largest sample that the source will send. */
  readonly peak: number;
  /** Counts the sources, as a new one may have the headroom back. */
  readonly source: number;
}

const SILENT_START: Setting = { line: [], gain: 1, bypass: false, muted: false, peak: 1, source: 0 };
const SETTLE: Seconds = 0.005; // after a fade, before anything is taken apart
const WIDEST_GAIN: Decibels = 60;

/**
 * The one owner of the live chain: input → filters of the line → gain → output stage, with a bypass
 * beside it. Every change is one equal-gain raised cosine, made so that nothing but that cosine is
 * heard: filters that change are built beside the old ones and warmed on the signal; a gain that
 * changes together with one slot's filters is folded into that slot, and together with several slots
 * the whole rack is replaced, so that at any moment the output is `(1 − w)·old + w·new` and never a
 * product of two half-finished changes. One change at a time: what is asked for meanwhile waits, and
 * only the newest wish of each kind is carried out.
 */
export class LiveChain {
  readonly #parts: ChainParts;
  readonly #scope = new Scope();
  /** Where sources connect. */
  readonly input: GainNode;
  readonly #line: GainNode;
  readonly #wet: GainNode;
  readonly #dry: GainNode;
  readonly #output: OutputStage;
  #rack: Rack;
  #rackBranch: Branch;
  /** Gain of `#line`; the rest of the line's gain may sit in the rack. */
  #lineLevel = 1;
  #setting = SILENT_START;
  #wanted = SILENT_START;
  #busyUntil: Seconds | undefined;
  #callOff = (): void => {};

  constructor(parts: ChainParts) {
    this.#parts = parts;
    const { context } = parts;
    const gain = (level: number): GainNode => {
      const node = context.createGain();
      node.gain.value = level;
      this.#scope.add(() => node.disconnect());
      return node;
    };
    this.input = gain(1);
    this.input.channelCount = 2;
    this.input.channelCountMode = 'explicit';
    this.#line = gain(1);
    this.#wet = gain(1);
    this.#dry = gain(0);
    this.#output = new OutputStage(context, parts.destination);
    this.#scope.add(() => this.#output.dispose());
    this.#rack = new Rack(context, []);
    this.#rackBranch = new Branch(context, this.input, this.#line, this.#rack);
    this.#rackBranch.set(1);
    this.#scope.add(() => this.#rackBranch.dispose());
    this.#scope.add(() => this.#callOff());
    this.#line.connect(this.#wet);
    this.#wet.connect(this.#output.input);
    this.input.connect(this.#dry);
    this.#dry.connect(this.#output.input);
  }

  /** Where a meter listens: what comes out, before the limiter of last resort. */
  get tap(): AudioNode {
    return this.#output.tap;
  }

  /** How much everything is turned down for the ceiling, 0 dB or less. */
  get headroom(): Decibels {
    return decibels(this.#output.level);
  }

  /** Time from which everything asked for so far is in force; the present where nothing is under way. */
  get readyAt(): Seconds {
    const { now } = this.#parts.clock;
    if (this.#busyUntil === undefined) return now;
    const end = Math.max(this.#busyUntil, now);
    return this.#wanted === this.#setting ? end : end + WARM_UP + FADE + SETTLE;
  }

  /**
   * Changes the filters of the line, and its gain along with them where one is given.
   *
   * @throws NotchworkError `filter-invalid` or `filter-unstable` (the line then stays as it was), or
   *   `value-out-of-range` for a gain beyond ±60 dB.
   */
  setLine({ filters, gain }: LineSetting): void {
    for (const { sections } of filters) checkSections(sections);
    this.#want(gain === undefined ? { line: filters } : { line: filters, gain: gainOf(gain) });
  }

  /** Changes the gain of the line, in dB within ±60. @throws NotchworkError `value-out-of-range` */
  setGain(gain: Decibels): void {
    this.#want({ gain: gainOf(gain) });
  }

  /** True lets the source past the line. */
  setBypass(bypass: boolean): void {
    this.#want({ bypass });
  }

  /** True silences the line; the bypass stays audible. */
  setMuted(muted: boolean): void {
    this.#want({ muted });
  }

  /**
   * Tells the chain of a new source, so that the headroom starts afresh.
   *
   * @param peak the largest sample it will send, as an amplitude.
   */
  setSource(peak: number): void {
    this.#want({ peak, source: this.#wanted.source + 1 });
  }

  /** Takes everything apart. */
  dispose(): void {
    this.#scope.dispose();
  }

  #want(wish: Partial<Setting>): void {
    this.#wanted = { ...this.#wanted, ...wish };
    if (this.#busyUntil === undefined && !this.#scope.disposed) this.#begin();
  }

  /** The headroom a setting needs. It only ever falls while a source lasts: levels stay comparable. */
  #headroomFor({ line, gain, peak, source }: Setting): number {
    const most = line.reduce((product, { sections }) => product * peakGain(sections), gain);
    const needed = Math.min(1, CEILING / (peak * Math.max(1, most)));
    return source === this.#setting.source ? Math.min(needed, this.#output.level) : needed;
  }

  #begin(): void {
    const { context, clock } = this.#parts;
    const was = this.#setting;
    const next = this.#wanted;
    const headroom = this.#headroomFor(next);
    if (headroom === this.#output.level && isSame(was, next)) {
      this.#setting = next;
      return;
    }
    const lowers = headroom < this.#output.level;
    const build = this.#build(context, next, next.gain / was.gain);
    // Only now, with everything built and connected, is it time to look at the clock.
    const start = clock.running ? clock.now : undefined;
    const wait = Math.max(build.changesFilters ? WARM_UP : LEAD, lowers ? LEAD + FADE : 0);
    const at = start === undefined ? undefined : start + wait;
    this.#output.setLevel(headroom, lowers && start !== undefined ? start + LEAD : at);
    const settle = build.commit(at);
    this.#move(this.#wet, wetLevel(was), wetLevel(next), at);
    this.#move(this.#dry, Number(was.bypass), Number(next.bypass), at);
    this.#setting = next;
    if (at === undefined) {
      settle();
      return;
    }
    this.#busyUntil = at + FADE + SETTLE;
    const finish = (): void => {
      settle();
      this.#busyUntil = undefined;
      if (this.#wanted !== this.#setting) this.#begin();
    };
    this.#callOff = clock.at(this.#busyUntil, finish);
  }

  /** Builds what a change needs, and says how to move over to it and how to clear up after it. */
  #build(
    context: BaseAudioContext,
    { line, gain }: Setting,
    ratio: number,
  ): { changesFilters: boolean; commit: (at: Seconds | undefined) => () => void } {
    const changes = this.#rack.fits(line) ? this.#rack.changes(line) : undefined;
    const only = changes?.[0];
    if (changes?.length === 0) {
      return {
        changesFilters: false,
        commit: (at) => {
          this.#move(this.#line, this.#lineLevel, this.#lineLevel * ratio, at);
          this.#lineLevel *= ratio;
          return () => {};
        },
      };
    }
    if (changes?.length === 1 && only !== undefined) {
      only.slot.prepare(only.sections);
      return {
        changesFilters: true,
        commit: (at) => {
          only.slot.commit(only.slot.level * ratio, at);
          return () => only.slot.settle();
        },
      };
    }
    const rack = new Rack(context, line);
    const branch = new Branch(context, this.input, this.#line, rack);
    return {
      changesFilters: true,
      commit: (at) => {
        const old = this.#rackBranch;
        const level = gain / this.#lineLevel;
        if (at === undefined) {
          old.set(0);
          branch.set(level);
        } else {
          old.fadeTo(0, at);
          branch.fadeTo(level, at);
        }
        this.#rack = rack;
        this.#rackBranch = branch;
        return this.#scope.add(() => old.dispose());
      },
    };
  }

  #move(node: GainNode, from: number, to: number, at: Seconds | undefined): void {
    if (from === to) return;
    if (at === undefined) node.gain.value = to;
    else fade(node.gain, from, to, at);
  }
}

/** Whether two settings sound the same, the headroom apart. */
function isSame(one: Setting, other: Setting): boolean {
  return (
    one.gain === other.gain &&
    one.bypass === other.bypass &&
    one.muted === other.muted &&
    one.line.length === other.line.length &&
    one.line.every(
      ({ key, sections }, index) =>
        key === other.line[index]!.key && sections === other.line[index]!.sections,
    )
  );
}

function wetLevel({ bypass, muted }: Setting): number {
  return bypass || muted ? 0 : 1;
}

function gainOf(gain: Decibels): number {
  assertRange('The gain of the line in dB', gain, -WIDEST_GAIN, WIDEST_GAIN);
  return amplitude(gain);
}
