import { describe, expect, it } from 'vitest';
import type { Branch, Diagram, Step } from '../../../src/circuit/diagram.ts';
import { END } from '../../../src/circuit/diagram.ts';
import { Evaluator } from '../../../src/circuit/evaluator.ts';
import type { ElementKind } from '../../../src/circuit/wiring.ts';

const to = (next: number, sign: 1 | -1 = 1): Branch => ({ next, sign });
const NOWHERE = { from: 0, to: 1 };

function step(
  element: number,
  kind: ElementKind,
  without: Branch | undefined,
  ...including: (Branch | undefined)[]
): Step {
  const inclusions = including.map(() => ({ current: NOWHERE, voltage: NOWHERE }));
  return { edge: { element, kind, optional: without !== undefined, inclusions }, without, including };
}

const run = (diagram: Diagram, values: readonly number[]): number[][] =>
  new Evaluator(diagram, values.length).evaluate(values);

describe('Evaluator', () => {
  it.each<[string, Step, number[]]>([
    ['R weighs when it is out', step(0, 'resistor', to(END), to(END)), [1 + 5]],
    ['L weighs with s when it is out', step(0, 'inductor', to(END), to(END)), [1, 5]],
    ['C weighs with s when it is in', step(0, 'capacitor', to(END), to(END)), [1, 5]],
    ['G weighs when it is in', step(0, 'transconductance', to(END), to(END)), [1 + 5]],
    [
      'E weighs 1 as itself, −gain by its control',
      step(0, 'voltage-gain', undefined, to(END), to(END)),
      [1 - 5],
    ],
    ['a sign on a branch turns its weight', step(0, 'transconductance', to(END), to(END, -1)), [1 - 5]],
    ['a way that leads nowhere counts nothing', step(0, 'capacitor', undefined, to(END)), [0, 5]],
  ])('%s', (_, only, expected) => {
    expect(run({ steps: [only], roots: [to(0)] }, [5])).toEqual([expected]);
  });

  it('multiplies along the steps and adds across them: (1 + 2s)(3 + 7s)', () => {
    const steps = [step(0, 'capacitor', to(END), to(END)), step(1, 'capacitor', to(0), to(0))];
    expect(run({ steps, roots: [to(1)] }, [2, 7])).toEqual([[1, 9, 14]]);
    const shared = [step(0, 'capacitor', to(END), to(END)), step(1, 'resistor', to(0), to(END))];
    expect(run({ steps: shared, roots: [to(1), to(0), to(1, -1)] }, [2, 3])).toEqual([
      [4, 6],
      [1, 2],
      [-4, -6],
    ]);
  });

  it('starts afresh with every set of values', () => {
    const evaluator = new Evaluator({ steps: [step(0, 'capacitor', to(END), to(END))], roots: [to(0)] }, 1);
    const first = evaluator.evaluate([5]);
    expect(evaluator.evaluate([6])).toEqual([[1, 6]]);
    expect(first).toEqual([[1, 5]]); // and what it gave before stays as it was
    expect(evaluator.evaluate([5])).toEqual(first);
  });

  it('gives 0 for a sum of no trees, 1 for the empty product, and no minus zero', () => {
    const diagram: Diagram = {
      steps: [step(0, 'resistor', to(END), undefined)],
      roots: [to(0, -1), undefined, to(END)],
    };
    expect(run(diagram, [0])).toEqual([[0], [0], [1]]);
    expect(Object.is(run(diagram, [0])[0]![0], 0)).toBe(true);
  });
});
