import { DEMO_CLIPS } from '../../demo-audio/clips.ts';
import type { Bench } from '../../src/bench/bench.ts';
import { loadFiltering } from '../../src/bench/filtering.ts';
import type { PageKey } from '../../src/bench/keyboard.ts';
import { browserStorage } from '../../src/bench/preferences.ts';
import type { SwapSession } from '../../src/bench/swap-session.ts';
import {
  setChoice,
  setKnob,
  setPart,
  setPresent,
  setTaper,
  setVariant,
  setWords,
} from '../../src/design/changes.ts';
import { placedBlock } from '../../src/design/placed-line.ts';
import {
  chooseVoicing,
  deleteVoicing,
  keepVoicing,
  moveVoicing,
  recolourVoicing,
  renameVoicing,
} from '../../src/design/voicings.ts';
import { messageOf } from '../../src/errors.ts';
import { formatValue } from '../../src/parts/value-text.ts';
import type { BenchEvents } from '../events.ts';

type Handlers = { readonly [Name in keyof BenchEvents]?: (detail: BenchEvents[Name]['detail']) => void };

/** What each thing that the elements say does to the bench. */
export class AppActions {
  readonly #bench: Bench;
  readonly #swap: SwapSession;

  constructor(bench: Bench, swap: SwapSession) {
    this.#bench = bench;
    this.#swap = swap;
  }

  #placed(slot: Parameters<typeof placedBlock>[0]): ReturnType<typeof placedBlock> {
    return placedBlock(slot, this.#bench.store.voicing.peek().line[slot]);
  }

  readonly #handlers: Handlers = {
    'nw-title-set': ({ title }) => this.#bench.store.apply(setWords({ title }), `title “${title}”`),
    'nw-undo': () => this.key({ kind: 'undo' }),
    'nw-redo': () => this.key({ kind: 'redo' }),
    'nw-theme-set': ({ theme }) => this.#bench.preferences.set({ theme }),
    'nw-knob-move': ({ slot, knob, position, settled }) => {
      const change = setKnob(slot, knob, position);
      const { label } = this.#placed(slot).block.knobs[knob]!;
      this.#swap.end();
      if (settled) this.#bench.store.apply(change, `${label.toLowerCase()} to ${(position * 10).toFixed(1)}`);
      else this.#bench.store.preview(change);
    },
    'nw-part-choose': ({ slot, part }) => this.#swap.choose(slot, part),
    'nw-part-set': ({ slot, part, value }) => {
      this.#swap.end();
      const { block, settings } = this.#placed(slot);
      const spec = block.parts[part]!;
      const from = formatValue(settings.parts[part]!, spec.unit);
      this.#bench.store.apply(
        setPart(slot, part, value),
        `${spec.label.toLowerCase()} ${from} to ${formatValue(value, spec.unit)}`,
      );
    },
    'nw-choice-set': ({ slot, choice, value }) => {
      this.#swap.end();
      const { label } = this.#placed(slot).block.choices[choice]!;
      this.#bench.store.apply(setChoice(slot, choice, value), label.toLowerCase());
    },
    'nw-taper-set': ({ slot, knob, taper }) => {
      this.#swap.end();
      const { label } = this.#placed(slot).block.knobs[knob]!;
      this.#bench.store.apply(setTaper(slot, knob, taper), `taper of ${label.toLowerCase()}`);
    },
    'nw-present-set': ({ slot, present }) => {
      this.#swap.end();
      this.#bench.store.apply(setPresent(slot, present), `${slot} ${present ? 'into' : 'out of'} the line`);
    },
    'nw-variant-set': ({ slot, variant }) => {
      this.#swap.end();
      this.#bench.store.apply(setVariant(slot, variant), `${slot}: ${variant.replaceAll('-', ' ')}`);
    },
    'nw-view-set': ({ view }) => {
      this.#bench.preferences.set({ plotView: view });
      if (view !== 'magnitude') void loadFiltering();
    },
    'nw-blocks-set': ({ show }) => this.#bench.preferences.set({ showBlocks: show }),
    'nw-table-set': ({ show }) => this.#bench.preferences.set({ showTable: show }),
    'nw-pin-set': ({ pinned }) => {
      const { name, letter, analysis } = this.#bench.active.peek();
      this.#bench.pinned.value = pinned ? { name: `${letter} ${name} as pinned`, analysis } : undefined;
    },
    'nw-cursor-set': ({ frequency }) => {
      this.#bench.cursor.value = frequency;
    },
    'nw-voicing-choose': ({ letter }) => {
      this.#swap.end();
      this.#bench.store.apply(chooseVoicing(letter), `voicing ${letter}`);
    },
    'nw-voicing-keep': () => {
      this.#swap.end();
      this.#bench.store.apply(keepVoicing(''), 'another voicing');
    },
    'nw-voicing-rename': ({ letter, name }) =>
      this.#bench.store.apply(renameVoicing(letter, name), `name of voicing ${letter}`),
    'nw-voicing-recolour': ({ letter, colour }) =>
      this.#bench.store.apply(recolourVoicing(letter, colour), `colour of voicing ${letter}`),
    'nw-voicing-move': ({ letter, places }) =>
      this.#bench.store.apply(moveVoicing(letter, places), `place of voicing ${letter}`),
    'nw-voicing-delete': ({ letter }) => {
      this.#swap.end();
      this.#bench.store.apply(deleteVoicing(letter), `voicing ${letter} deleted`);
    },
    'nw-swap-try': ({ value }) => this.#swap.try(value),
    'nw-swap-keep': ({ value, into }) => this.#swap.keep(value, into),
    'nw-swap-end': () => this.#swap.end(),
    'nw-matched-set': ({ matched }) => this.#bench.preferences.set({ matched }),
    'nw-rate-set': ({ rate }) => {
      this.#bench.preferences.set({ contextRate: rate });
      this.#bench.sound.changeRate();
    },
    'nw-hearing-read': () => this.#bench.preferences.set({ hearingNoteRead: true }),
    'nw-play-toggle': () => this.key({ kind: 'play' }),
    'nw-seek': ({ seconds }) => this.#bench.sound.seek(seconds),
    'nw-region-set': ({ start, end, settled }) => this.#bench.sound.setRegion(start, end, settled),
    'nw-loop-set': ({ loop }) => this.#bench.sound.setLoop(loop),
    'nw-bypass-set': ({ bypass }) => this.#bench.sound.setBypass(bypass),
    'nw-clip-choose': ({ id }) => this.chooseClip(id),
    'nw-clip-open': ({ file }) => this.openFile(file),
  };

  /** Does what an element's event asks for. */
  readonly handle = (event: Event): void => {
    const handler = this.#handlers[event.type as keyof BenchEvents] as
      | ((detail: unknown) => void)
      | undefined;
    handler?.((event as CustomEvent<unknown>).detail);
  };

  /** Every event that {@link handle} answers. */
  get names(): readonly string[] {
    return Object.keys(this.#handlers);
  }

  /** Does what a key pressed anywhere on the page means. */
  key(meaning: PageKey): void {
    const { store, sound } = this.#bench;
    if (meaning.kind === 'play') void sound.toggle();
    else if (meaning.kind === 'undo' || meaning.kind === 'redo') {
      this.#swap.end();
      store[meaning.kind]();
    } else {
      const voicing = store.design.peek().voicings[meaning.index];
      if (voicing !== undefined) this.#handlers['nw-voicing-choose']?.({ letter: voicing.letter });
    }
  }

  /** Takes one of the demo clips. */
  async chooseClip(id: string): Promise<void> {
    const demo = DEMO_CLIPS.find((entry) => entry.id === id);
    if (demo === undefined) return;
    try {
      const answer = await fetch(demo.url);
      if (!answer.ok) throw new Error(`the clip could not be fetched (${answer.status})`);
      await this.#bench.sound.open(await answer.blob(), demo.title, demo.id);
    } catch (error) {
      this.#bench.sound.say({
        kind: 'error',
        text: `${demo.title}: ${messageOf(error)}. Open a recording of your own.`,
      });
    }
  }

  /** Puts the design kept in this browser back on the bench, and keeps it from then on. */
  async keepDesign(): Promise<() => void> {
    const { keepDesign, restoreDesign } = await import('../../src/bench/design-keeper.ts');
    const storage = browserStorage();
    const { store, sound } = this.#bench;
    const restored = store.history.peek().past.length === 0 ? restoreDesign(store, storage) : 'none';
    if (typeof restored === 'object') sound.say({ kind: 'error', text: restored.problem });
    return keepDesign(store, storage, (text) => sound.say({ kind: 'caution', text }));
  }

  async #openDesign(file: File): Promise<void> {
    try {
      const { readDesign } = await import('../../src/design/read-design.ts');
      const design = readDesign(await file.text());
      this.#swap.end();
      this.#bench.store.apply(() => design, `opening “${design.title}”`);
    } catch (error) {
      this.#bench.sound.say({ kind: 'error', text: `${file.name}: ${messageOf(error)}` });
    }
  }

  /** Takes a design (.json) or a recording of the user's own. */
  openFile(file: File): void {
    if (/\.json$/i.test(file.name)) {
      void this.#openDesign(file);
      return;
    }
    void this.#bench.sound.open(file, file.name.replace(/\.[^.]+$/, ''));
  }
}
