import { describe, expect, it } from 'vitest';
import { setWords } from '../../../src/design/changes.ts';
import { defaultDesign } from '../../../src/design/design.ts';
import {
  cancel,
  HISTORY_STEPS,
  move,
  redo,
  settle,
  startHistory,
  undo,
} from '../../../src/design/history.ts';

const first = defaultDesign();
const titled = (title: string) => setWords({ title })(first);

describe('history', () => {
  it('makes one step of a whole move', () => {
    let history = startHistory(first);
    for (const title of ['a', 'b', 'c']) history = move(history, titled(title));
    expect(history.past).toHaveLength(0);
    const last = titled('d');
    history = settle(history, last, 'Title to d');
    expect(history.past).toEqual([{ design: first, name: 'Title to d' }]);
    expect(history.present).toBe(last);
    expect(undo(history).present).toBe(first);
  });

  it('makes no step of a move that came back to where it began', () => {
    const history = settle(move(startHistory(first), titled('a')), first, 'nothing');
    expect(history.past).toHaveLength(0);
    expect(history.moving).toBeUndefined();
  });

  it('gives back the very same designs on undo and redo', () => {
    const designs = Array.from({ length: 600 }, (_, index) => titled(`t${index}`));
    let history = startHistory(first);
    for (const design of designs) history = settle(history, design, design.title);
    for (let index = designs.length - 2; index >= 0; index -= 1) {
      history = undo(history);
      expect(history.present).toBe(designs[index]);
    }
    history = undo(history);
    expect(history.present).toBe(first);
    for (const design of designs) {
      history = redo(history);
      expect(history.present).toBe(design);
    }
  });

  it('stays as it is where there is nothing to undo or redo', () => {
    const history = startHistory(first);
    expect(undo(history)).toBe(history);
    expect(redo(history)).toBe(history);
  });

  it('forgets the future once something new is done', () => {
    let history = settle(startHistory(first), titled('a'), 'a');
    history = settle(undo(history), titled('b'), 'b');
    expect(redo(history)).toBe(history);
  });

  it('keeps a bounded number of steps', () => {
    let history = startHistory(first);
    for (let index = 0; index < HISTORY_STEPS + 50; index += 1) {
      history = settle(history, titled(`t${index}`), 'step');
    }
    expect(history.past.length).toBeLessThanOrEqual(HISTORY_STEPS + 1);
    expect(history.past.length).toBeGreaterThanOrEqual(500);
  });

  it('puts back what was only shown, without a step', () => {
    const history = cancel(move(startHistory(first), titled('a')));
    expect([history.present, history.past, history.moving]).toEqual([first, [], undefined]);
    expect(cancel(history)).toBe(history);
  });

  it('undoes a move in flight together with the step before it', () => {
    const settled = titled('settled');
    const history = move(settle(startHistory(first), settled, 'settled'), titled('moving'));
    const back = undo(history);
    expect(back.present).toBe(first);
    expect(redo(back).present).toBe(settled);
  });
});
