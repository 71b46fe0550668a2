import { type Signal, signal } from '@preact/signals-core';

/** How the page looks: as the system does, or fixed. */
export type ThemeChoice = 'system' | 'light' | 'dark';

/** What the plot shows: the level, the phase, or how far the digital filter is from the circuit. */
export type PlotView = 'magnitude' | 'phase' | 'difference';

/** Rates offered for the audio context, in hertz. */
export const CONTEXT_RATES = [48_000, 96_000, 192_000] as const;

/** One rate of {@link CONTEXT_RATES}. */
export type ContextRate = (typeof CONTEXT_RATES)[number];

/**
 * What the user chose about the tool, not about the design. Where each key goes is said by
 * {@link PREFERENCE_HOME}; a key left out there does not compile.
 */
export interface Preferences {
  readonly theme: ThemeChoice;
  readonly contextRate: ContextRate;
  /** Whether everything is heard at the same loudness. */
  readonly matched: boolean;
  /** What the plot shows. */
  readonly plotView: PlotView;
  /** Whether each block's share is drawn under the line's curve. */
  readonly showBlocks: boolean;
  /** Whether the table stands in for the plot. */
  readonly showTable: boolean;
  /** Whether the note about hearing was read and put away. */
  readonly hearingNoteRead: boolean;
}

const FIRST: Preferences = {
  theme: 'system',
  contextRate: 48_000,
  matched: true,
  plotView: 'magnitude',
  showBlocks: false,
  showTable: false,
  hearingNoteRead: false,
};

/** Where each preference is kept: in this browser, or nowhere (a fresh page starts over). */
const PREFERENCE_HOME: { readonly [Key in keyof Preferences]: 'browser' | 'nowhere' } = {
  theme: 'browser',
  contextRate: 'browser',
  matched: 'nowhere',
  plotView: 'nowhere',
  showBlocks: 'nowhere',
  showTable: 'browser',
  hearingNoteRead: 'browser',
};

const KEY = 'notchwork-preferences';

/** The part of Web Storage that is used; `undefined` where the browser refuses it. */
export type PreferenceStorage = Pick<Storage, 'getItem' | 'setItem'> | undefined;

function isAcceptable<Key extends keyof Preferences>(key: Key, value: unknown): value is Preferences[Key] {
  switch (key) {
    case 'theme':
      return value === 'system' || value === 'light' || value === 'dark';
    case 'contextRate':
      return CONTEXT_RATES.some((rate) => rate === value);
    case 'plotView':
      return value === 'magnitude' || value === 'phase' || value === 'difference';
    default:
      return typeof value === 'boolean';
  }
}

/** Reads what was kept; anything unreadable or out of range falls back, silently: nothing of the user's is lost. */
export function readPreferences(storage: PreferenceStorage): Preferences {
  let kept: unknown;
  try {
    kept = JSON.parse(storage?.getItem(KEY) ?? '{}');
  } catch {
    kept = {};
  }
  const record = typeof kept === 'object' && kept !== null ? (kept as Record<string, unknown>) : {};
  const entries = (Object.keys(FIRST) as (keyof Preferences)[]).map((key) => {
    const value = Object.hasOwn(record, key) ? record[key] : undefined;
    return [key, PREFERENCE_HOME[key] === 'browser' && isAcceptable(key, value) ? value : FIRST[key]];
  });
  return Object.fromEntries(entries) as Preferences;
}

/** Keeps the preferences that belong to the browser; a full or refused storage is no reason to stop. */
export function keepPreferences(storage: PreferenceStorage, preferences: Preferences): void {
  const kept = Object.entries(preferences).filter(
    ([key]) => PREFERENCE_HOME[key as keyof Preferences] === 'browser',
  );
  try {
    storage?.setItem(KEY, JSON.stringify(Object.fromEntries(kept)));
  } catch {
    // Private windows refuse storage; the choice then lasts as long as the page.
  }
}

/** The browser's storage, or `undefined` where even touching it throws. */
export function browserStorage(): PreferenceStorage {
  try {
    return globalThis.localStorage;
  } catch {
    return undefined;
  }
}

/** A signal of the preferences that keeps itself. */
export function createPreferences(storage: PreferenceStorage): {
  readonly value: Signal<Preferences>;
  set(change: Partial<Preferences>): void;
} {
  const value = signal(readPreferences(storage));
  return {
    value,
    set(change) {
      value.value = { ...value.peek(), ...change };
      keepPreferences(storage, value.peek());
    },
  };
}
