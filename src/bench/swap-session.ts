import { computed, type ReadonlySignal, signal } from '@preact/signals-core';
import { SLOTS, type SlotName } from '../blocks/block.ts';
import type { LineSettings } from '../blocks/line.ts';
import { setPart } from '../design/changes.ts';
import { placedBlock } from '../design/placed-line.ts';
import type { DesignStore } from '../design/store.ts';
import { freeLetter, keepVoicing } from '../design/voicings.ts';
import { neighbours, type SeriesName } from '../parts/series.ts';
import { formatValue } from '../parts/value-text.ts';
import { readFigures } from '../response/figures.ts';
import { lineLevel } from '../response/line-response.ts';
import { lineWithPart, type SwapCandidate, swapPart } from '../study/swap.ts';
import type { LineAnalysis } from './line-analysis.ts';

/** The part being worked on. */
export interface SwapChoice {
  readonly slot: SlotName;
  readonly part: string;
}

/** Neighbours on each side that are offered. */
const EACH_SIDE = 3;

/**
 * A swap under way: which part, the values offered, and the one being tried. Trying is a preview of
 * the design: it is seen and heard, and becomes a step only when it is kept.
 */
export class SwapSession {
  readonly #store: DesignStore;
  readonly #chosen = signal<SwapChoice | undefined>(undefined);
  readonly #tried = signal<number | undefined>(undefined);
  readonly #series = signal<SeriesName>('E12');
  readonly chosen: ReadonlySignal<SwapChoice | undefined> = this.#chosen;
  readonly tried: ReadonlySignal<number | undefined> = this.#tried;
  readonly series: ReadonlySignal<SeriesName> = this.#series;
  /** Analysis of the line as it is without anything tried. */
  readonly #settled: ReadonlySignal<LineAnalysis>;

  /** @param settled the active line before anything tried. */
  constructor(store: DesignStore, settled: ReadonlySignal<LineAnalysis>) {
    this.#store = store;
    this.#settled = settled;
  }

  /** The line before anything was tried. */
  get #line(): LineSettings {
    return this.#settled.value.line;
  }

  /** The part with its value and the values offered; undefined where none is chosen. */
  readonly subject = computed(() => {
    const choice = this.#chosen.value;
    if (choice === undefined) return undefined;
    const { block, settings } = placedBlock(choice.slot, this.#line[choice.slot]);
    const spec = block.parts[choice.part];
    const value = settings.parts[choice.part];
    if (spec === undefined || value === undefined) return undefined;
    return { ...choice, spec, value, candidates: this.#candidates(choice, value, spec.range) };
  });

  #candidates(
    { slot, part }: SwapChoice,
    value: number,
    [min, max]: readonly [number, number],
  ): readonly SwapCandidate[] {
    const { placed, spans, problem } = this.#settled.value;
    if (!(value > 0) || problem !== undefined) return [];
    const values = neighbours(value, this.#series.value, EACH_SIDE).filter(
      (entry) => entry >= min && entry <= max,
    );
    const dip = readFigures((frequency) => lineLevel(spans, frequency)).midDip?.frequency;
    return swapPart(placed, slot, part, values, { low: 100, dip, middle: 1000, high: 5000 });
  }

  /** Works on another part; whatever was tried is put back. */
  choose(slot: SlotName, part: string): void {
    this.end();
    this.#chosen.value = SLOTS.includes(slot) ? { slot, part } : undefined;
  }

  setSeries(series: SeriesName): void {
    this.#series.value = series;
  }

  /** Shows and plays another value for now. */
  try(value: number): void {
    const choice = this.#chosen.peek();
    if (choice === undefined) return;
    this.#tried.value = value;
    this.#store.preview(setPart(choice.slot, choice.part, value));
  }

  /** Puts back what was tried. */
  end(): void {
    if (this.#tried.peek() === undefined) return;
    this.#tried.value = undefined;
    this.#store.cancel();
  }

  /** Keeps a value in the voicing, or the line with it as another voicing. */
  keep(value: number, into: 'present' | 'voicing'): void {
    const subject = this.subject.peek();
    if (subject === undefined) return;
    const { slot, part, spec } = subject;
    const text = formatValue(value, spec.unit);
    const line = lineWithPart(this.#settled.peek().line, slot, part, value);
    this.end();
    const label = `${spec.label.toLowerCase()} ${formatValue(subject.value, spec.unit)} to ${text}`;
    if (into === 'present') this.#store.apply(setPart(slot, part, value), label);
    else if (freeLetter(this.#store.design.peek()) !== undefined) {
      this.#store.apply(
        keepVoicing(`${spec.short} ${text}`, line),
        `voicing with ${spec.short.toLowerCase()} ${text}`,
      );
    }
  }
}
