import type { Design } from './design.ts';

/** One step that can be undone: the design before it and what the step was. */
export interface HistoryStep {
  readonly design: Design;
  /** As shown to the user: "Treble to 6.4". */
  readonly name: string;
}

/** The designs before and after the present one. A value: every operation returns a new history. */
export interface History {
  readonly past: readonly HistoryStep[];
  readonly present: Design;
  readonly future: readonly HistoryStep[];
  /**
   * While a control is being moved: the design before the move. The move becomes one step when it
   * settles.
   */
  readonly moving: Design | undefined;
}

/** Steps kept at the least; older ones are dropped in blocks so that a step stays cheap. */
export const HISTORY_STEPS = 1000;

/** A history with nothing to undo. */
export function startHistory(design: Design): History {
  return { past: [], present: design, future: [], moving: undefined };
}

/** Shows a design on the way (a knob being dragged); not a step until {@link settle} is called. */
export function move(history: History, design: Design): History {
  return { ...history, present: design, moving: history.moving ?? history.present };
}

/** Makes `design` the present one and everything since the last settled design one step. */
export function settle(history: History, design: Design, name: string): History {
  const before = history.moving ?? history.present;
  if (design === before) return { ...history, present: design, moving: undefined };
  const past = [...history.past.slice(-HISTORY_STEPS), { design: before, name }];
  return { past, present: design, future: [], moving: undefined };
}

/** Puts back the design as it was before the move that is going on. */
export function cancel(history: History): History {
  return history.moving === undefined ? history : { ...history, present: history.moving, moving: undefined };
}

/** Goes one step back; the same history where there is none. */
export function undo(history: History): History {
  const step = history.past.at(-1);
  if (step === undefined) return history;
  return {
    past: history.past.slice(0, -1),
    present: step.design,
    future: [{ design: history.moving ?? history.present, name: step.name }, ...history.future],
    moving: undefined,
  };
}

/** Goes one step forward again; the same history where there is none. */
export function redo(history: History): History {
  const [step, ...rest] = history.future;
  if (step === undefined) return history;
  return {
    past: [...history.past, { design: history.present, name: step.name }],
    present: step.design,
    future: rest,
    moving: undefined,
  };
}
