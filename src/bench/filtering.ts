import { type ReadonlySignal, signal } from '@preact/signals-core';

/** What the first screen does without: phase, filters and their difference from the circuit, loudness matching. */
export type Filtering = typeof import('./filtering-parts.ts');

const loaded = signal<Filtering | undefined>(undefined);

/**
 * These parts once they are loaded. The first screen draws the level only and does without them;
 * reading this signal is enough to be told when they have come.
 */
export const filtering: ReadonlySignal<Filtering | undefined> = loaded;

/** Loads them; calling it again costs nothing. */
export async function loadFiltering(): Promise<Filtering> {
  loaded.value ??= await import('./filtering-parts.ts');
  return loaded.value;
}
