import { describe, expect, it } from 'vitest';
import { TOLERANCE_CLASSES, type TolerancedKind, USUAL_TOLERANCE } from '../../../src/parts/tolerance.ts';
import { toleranceLetter } from '../../../src/parts/tolerance-code.ts';

const KINDS = Object.keys(TOLERANCE_CLASSES) as TolerancedKind[];

describe('tolerance classes', () => {
  it.each(KINDS)('of a %s go from tight to wide and have a letter to be printed with', (kind) => {
    const percents = TOLERANCE_CLASSES[kind].map(({ percent }) => percent);
    expect(percents).toEqual([...new Set(percents)].sort((a, b) => a - b));
    for (const percent of percents) expect(toleranceLetter({ minus: percent, plus: percent })).toBeDefined();
  });

  it.each(KINDS)('of a %s contain the one assumed', (kind) => {
    expect(TOLERANCE_CLASSES[kind].map(({ percent }) => percent)).toContain(USUAL_TOLERANCE[kind]);
  });

  it('are the ones on sale (common practice, no source)', () => {
    const percents = (kind: TolerancedKind): number[] =>
      TOLERANCE_CLASSES[kind].map(({ percent }) => percent);
    expect(percents('resistor')).toEqual(expect.arrayContaining([1, 5]));
    expect(percents('capacitor')).toEqual(expect.arrayContaining([5, 10, 20]));
    expect(percents('potentiometer')).toContain(20);
  });
});
