import { computed, type ReadonlySignal, type Signal, signal } from '@preact/signals-core';
import { activeVoicing, defaultDesign, type VoicingLetter } from '../design/design.ts';
import { createDesignStore, type DesignStore } from '../design/store.ts';
import { DEFAULT_GRID } from '../response/grid.ts';
import type { Hertz } from '../units.ts';
import { LineAnalyser, type LineAnalysis } from './line-analysis.ts';
import type { DrawnVoicing } from './plot-curves.ts';
import { browserStorage, createPreferences } from './preferences.ts';
import { BenchSound } from './sound.ts';

/** A curve that was pinned to compare with; it stays as it is while the design changes. */
export interface PinnedCurve {
  readonly name: string;
  readonly analysis: LineAnalysis;
}

/** The running bench: the design, what is derived from it, and what the page shows. */
export interface Bench {
  readonly store: DesignStore;
  readonly preferences: ReturnType<typeof createPreferences>;
  /** All voicings, in the design's order. */
  readonly voicings: ReadonlySignal<readonly DrawnVoicing[]>;
  /** The voicing that is edited and heard. */
  readonly active: ReadonlySignal<DrawnVoicing>;
  /** Its line as it was before the move that is going on, if one is. */
  readonly settled: ReadonlySignal<LineAnalysis>;
  readonly pinned: Signal<PinnedCurve | undefined>;
  /** Where the reading cursor stands. */
  readonly cursor: Signal<Hertz>;
  /** Whether a control is being moved right now (the axis then holds still). */
  readonly moving: ReadonlySignal<boolean>;
  readonly sound: BenchSound;
}

/** Makes a bench with a new design on it. */
export function createBench(store: DesignStore = createDesignStore(defaultDesign())): Bench {
  const settledAnalyser = new LineAnalyser(DEFAULT_GRID);
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
      ({ letter, name, colour, line }): DrawnVoicing => ({
        letter,
        name,
        colour,
        analysis: analyserOf(letter).of(line),
      }),
    ),
  );
  const preferences = createPreferences(browserStorage());
  const active = computed(() => {
    const letter = store.voicing.value.letter;
    return voicings.value.find((entry) => entry.letter === letter) ?? voicings.value[0]!;
  });
  const sound = new BenchSound({
    line: computed(() => active.value.analysis),
    contextRate: computed(() => preferences.value.value.contextRate),
    matched: computed(() => preferences.value.value.matched),
  });
  return {
    store,
    preferences,
    sound,
    voicings,
    active,
    settled: computed(() => {
      const { moving, present } = store.history.value;
      return settledAnalyser.of(activeVoicing(moving ?? present).line);
    }),
    pinned: signal(undefined),
    cursor: signal(1000),
    moving: computed(() => store.history.value.moving !== undefined),
  };
}
