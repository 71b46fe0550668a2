/**
 * Every error this project throws on purpose. The `code` is stable and safe to branch on; the
 * message is written for the person at the bench: what is wrong, where, and what to do.
 */
export type ErrorCode =
  | 'value-unreadable'
  | 'value-out-of-range'
  | 'netlist-syntax'
  | 'netlist-topology'
  | 'netlist-too-large'
  | 'circuit-unsolvable'
  | 'filter-unstable'
  | 'filter-invalid'
  | 'clip-unreadable'
  | 'clip-empty'
  | 'clip-too-large'
  | 'clip-unsupported'
  | 'audio-unavailable'
  | 'design-invalid'
  | 'design-too-new'
  | 'storage-failed'
  | 'usage';

/** Where in a text an error was found; both counted from 1. */
export interface TextPlace {
  readonly line: number;
  readonly column: number;
}

/** An error with a stable code, a message for people, and (where there is one) a place in a text. */
export class NotchworkError extends Error {
  override readonly name = 'NotchworkError';
  readonly code: ErrorCode;
  readonly place: TextPlace | undefined;

  constructor(code: ErrorCode, message: string, options: { place?: TextPlace; cause?: unknown } = {}) {
    super(message, options.cause === undefined ? undefined : { cause: options.cause });
    this.code = code;
    this.place = options.place;
  }
}

/** Throws `value-out-of-range` unless `value` is finite and within `[min, max]`. */
export function assertRange(name: string, value: number, min: number, max: number): void {
  if (!(value >= min && value <= max)) {
    throw new NotchworkError(
      'value-out-of-range',
      `${name} is ${value}; it must be a number from ${min} to ${max}.`,
    );
  }
}

/** Message of anything thrown, for showing to a person. */
export function messageOf(thrown: unknown): string {
  return thrown instanceof Error ? thrown.message : String(thrown);
}
