import { computed, type ReadonlySignal, signal } from '@preact/signals-core';
import type { DesignChange } from './changes.ts';
import { activeVoicing, type Design, type Voicing } from './design.ts';
import { cancel, type History, move, redo, settle, startHistory, undo } from './history.ts';

/** The one store of a bench: readers get signals, writers call these actions. */
export interface DesignStore {
  readonly design: ReadonlySignal<Design>;
  /** The voicing that is edited and heard. */
  readonly voicing: ReadonlySignal<Voicing>;
  readonly history: ReadonlySignal<History>;
  /** Shows a change that is still going on (a drag); it becomes a step when applied. */
  preview(change: DesignChange): void;
  /** Makes a change; `name` is what undo will call it. */
  apply(change: DesignChange, name: string): void;
  /** Puts back what was only shown. */
  cancel(): void;
  undo(): void;
  redo(): void;
  /** Replaces the whole design (a file was opened); nothing before it can be undone. */
  open(design: Design): void;
  /** Takes over a whole history, as kept by the autosave. */
  restore(history: History): void;
}

/** Makes a store around a first design. */
export function createDesignStore(first: Design): DesignStore {
  const history = signal<History>(startHistory(first));
  const design = computed(() => history.value.present);
  return {
    design,
    voicing: computed(() => activeVoicing(design.value)),
    history,
    preview(change) {
      const next = change(design.peek());
      if (next !== design.peek()) history.value = move(history.peek(), next);
    },
    apply(change, name) {
      history.value = settle(history.peek(), change(design.peek()), name);
    },
    cancel() {
      history.value = cancel(history.peek());
    },
    undo() {
      history.value = undo(history.peek());
    },
    redo() {
      history.value = redo(history.peek());
    },
    open(opened) {
      history.value = startHistory(opened);
    },
    restore(kept) {
      history.value = { ...kept, moving: undefined };
    },
  };
}
