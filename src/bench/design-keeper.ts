import { effect } from '@preact/signals-core';
import { readDesign, writeDesign } from '../design/read-design.ts';
import type { DesignStore } from '../design/store.ts';
import { messageOf } from '../errors.ts';
import type { PreferenceStorage } from './preferences.ts';

const KEY = 'notchwork-design';

/** What came of looking for the design that was on the bench last time. */
export type Restored = 'restored' | 'none' | { readonly problem: string };

/**
 * Puts the design kept in this browser back on the bench. One that cannot be read stays where it is
 * kept, under another key, so that nothing is lost.
 */
export function restoreDesign(store: DesignStore, storage: PreferenceStorage): Restored {
  let text: string | null = null;
  try {
    text = storage?.getItem(KEY) ?? null;
  } catch {
    return 'none';
  }
  if (text === null) return 'none';
  try {
    store.open(readDesign(text));
    return 'restored';
  } catch (error) {
    try {
      storage?.setItem(`${KEY}-unreadable`, text);
    } catch {
      // No room for a copy; the original is replaced only when the design changes.
    }
    return { problem: `The design of last time could not be read: ${messageOf(error)}` };
  }
}

/**
 * Keeps the design in this browser at every settled change.
 *
 * @param onProblem is told, once, when the browser refuses.
 * @returns a function that stops keeping it.
 */
export function keepDesign(
  store: DesignStore,
  storage: PreferenceStorage,
  onProblem: (message: string) => void,
): () => void {
  let kept = store.design.peek();
  let refused = false;
  return effect(() => {
    const { present, moving } = store.history.value;
    if (moving !== undefined || present === kept) return;
    kept = present;
    try {
      storage?.setItem(KEY, writeDesign(present));
    } catch {
      if (!refused) onProblem('This browser has no room to keep the design; save it as a file.');
      refused = true;
    }
  });
}
