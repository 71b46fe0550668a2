/** A note of a plucked string; see `plucked-string.mjs`. */
export interface Note {
  readonly frequency: number | ((seconds: number) => number);
  readonly decay: number;
  readonly bright: number;
  readonly pick: number;
  readonly force: number;
  readonly seed: number;
}

export function noise(seed: number): () => number;
export function pluck(out: Float32Array | Float64Array, rate: number, start: number, length: number, note: Note): void;
