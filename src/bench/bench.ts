import { computed, type ReadonlySignal, type Signal, signal } from '@preact/signals-core';
import { defaultDesign, type VoicingLetter } from '../design/design.ts';
import { createDesignStore, type DesignStore } from '../design/store.ts';
import { DEFAULT_GRID } from '../response/grid.ts';
import type { Hertz } from '../units.ts';
import { type LineAnalysis, LineAnalyser } from './line-analysis.ts';
import { browserStorage, createPreferences } from './preferences.ts';

/** A curve that was pinned to compare with; it stays as it is while the design changes. */
export interface PinnedCurve {
  readonly name: string;
  readonly analysis: LineAnalysis;
}

/** A voicing with what is known of its line. */
export interface VoicingAnalysis {
  readonly letter: VoicingLetter;
  readonly name: string;
  readonly analysis: LineAnalysis;
}

/** The running bench without its sound: the design, what is derived from it, and what the page shows. */
export interface Bench {
  readonly store: DesignStore;
  readonly preferences: ReturnType<typeof createPreferences>;
  /** All voicings, in the design's order. */
  readonly voicings: ReadonlySignal<readonly VoicingAnalysis[]>;
  /** The voicing that is edited and heard. */
  readonly active: ReadonlySignal<VoicingAnalysis>;
  readonly pinned: Signal<PinnedCurve | undefined>;
  /** Where the reading cursor stands. */
  readonly cursor: Signal<Hertz>;
  /** Whether a control is being moved right now (the axis then holds still). */
  readonly moving: ReadonlySignal<boolean>;
}

/** Makes a bench with a new design on it. */
export function createBench(store: DesignStore = createDesignStore(defaultDesign())): Bench {
  const analysers = new Map<VoicingLetter, LineAnalyser>();
  const analyserOf = (letter: VoicingLetter): LineAnalyser => {
    let analyser = analysers.get(letter);
    if (analyser === undefined) {
      analyser = new LineAnalyser(DEFAULT_GRID);
      analysers.set(letter, analyser);
    }
    return analyser;
  };
  const voicings = computed(() =>
    store.design.value.voicings.map(
      ({ letter, name, line }): VoicingAnalysis => ({ letter, name, analysis: analyserOf(letter).of(line) }),
    ),
  );
  return {
    store,
    preferences: createPreferences(browserStorage()),
    voicings,
    active: computed(() => {
      const letter = store.voicing.value.letter;
      return voicings.value.find((entry) => entry.letter === letter) ?? voicings.value[0]!;
    }),
    pinned: signal(undefined),
    cursor: signal(1000),
    moving: computed(() => store.history.value.moving !== undefined),
  };
}
