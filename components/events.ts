import type { ContextRate, PlotView, ThemeChoice } from '../src/bench/preferences.ts';
import type { SlotName } from '../src/blocks/block.ts';
import type { VoicingLetter } from '../src/design/design.ts';
import type { SeriesName } from '../src/parts/series.ts';
import type { Taper } from '../src/parts/taper.ts';
import type { Hertz, Rotation, Seconds } from '../src/units.ts';

/** A knob is being turned (`settled` false) or was let go. */
export interface KnobMove {
  readonly slot: SlotName;
  readonly knob: string;
  readonly position: Rotation;
  readonly settled: boolean;
}

/** What the elements of this project say, and with which detail. */
export interface BenchEvents {
  'nw-knob-move': CustomEvent<KnobMove>;
  'nw-part-choose': CustomEvent<{ readonly slot: SlotName; readonly part: string }>;
  'nw-part-set': CustomEvent<{ readonly slot: SlotName; readonly part: string; readonly value: number }>;
  'nw-choice-set': CustomEvent<{ readonly slot: SlotName; readonly choice: string; readonly value: string }>;
  'nw-taper-set': CustomEvent<{ readonly slot: SlotName; readonly knob: string; readonly taper: Taper }>;
  'nw-present-set': CustomEvent<{ readonly slot: SlotName; readonly present: boolean }>;
  'nw-variant-set': CustomEvent<{ readonly slot: SlotName; readonly variant: string }>;
  'nw-series-set': CustomEvent<{ readonly series: SeriesName }>;
  'nw-drawer-open': CustomEvent<{ readonly slot: SlotName }>;
  'nw-play-toggle': CustomEvent<undefined>;
  'nw-seek': CustomEvent<{ readonly seconds: Seconds }>;
  'nw-region-set': CustomEvent<{ readonly start: Seconds; readonly end: Seconds; readonly settled: boolean }>;
  'nw-loop-set': CustomEvent<{ readonly loop: boolean }>;
  'nw-clip-choose': CustomEvent<{ readonly id: string }>;
  'nw-clip-open': CustomEvent<{ readonly file: File }>;
  'nw-bypass-set': CustomEvent<{ readonly bypass: boolean }>;
  'nw-choose': CustomEvent<{ readonly id: string }>;
  'nw-title-set': CustomEvent<{ readonly title: string }>;
  'nw-undo': CustomEvent<undefined>;
  'nw-redo': CustomEvent<undefined>;
  'nw-theme-set': CustomEvent<{ readonly theme: ThemeChoice }>;
  'nw-view-set': CustomEvent<{ readonly view: PlotView }>;
  'nw-blocks-set': CustomEvent<{ readonly show: boolean }>;
  'nw-table-set': CustomEvent<{ readonly show: boolean }>;
  'nw-pin-set': CustomEvent<{ readonly pinned: boolean }>;
  'nw-cursor-set': CustomEvent<{ readonly frequency: Hertz }>;
  'nw-voicing-choose': CustomEvent<{ readonly letter: VoicingLetter }>;
  'nw-voicing-keep': CustomEvent<undefined>;
  'nw-voicing-rename': CustomEvent<{ readonly letter: VoicingLetter; readonly name: string }>;
  'nw-voicing-recolour': CustomEvent<{ readonly letter: VoicingLetter; readonly colour: VoicingLetter }>;
  'nw-voicing-move': CustomEvent<{ readonly letter: VoicingLetter; readonly places: number }>;
  'nw-voicing-delete': CustomEvent<{ readonly letter: VoicingLetter }>;
  'nw-swap-try': CustomEvent<{ readonly value: number }>;
  'nw-swap-keep': CustomEvent<{ readonly value: number; readonly into: 'present' | 'voicing' }>;
  'nw-swap-end': CustomEvent<undefined>;
  'nw-matched-set': CustomEvent<{ readonly matched: boolean }>;
  'nw-rate-set': CustomEvent<{ readonly rate: ContextRate }>;
  'nw-hearing-read': CustomEvent<undefined>;
  'nw-dismiss': CustomEvent<undefined>;
}

declare global {
  interface HTMLElementEventMap extends BenchEvents {}
}

/** Sends an event of {@link BenchEvents} up through every shadow root. */
export function send<Name extends keyof BenchEvents>(
  from: EventTarget,
  name: Name,
  detail: BenchEvents[Name]['detail'],
): void {
  from.dispatchEvent(new CustomEvent(name, { detail, bubbles: true, composed: true }));
}
