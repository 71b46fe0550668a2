import { describe, expect, it } from 'vitest';
import {
  readToleranceLetter,
  TOLERANCE_LETTERS,
  toleranceLetter,
} from '../../../src/parts/tolerance-code.ts';

describe('tolerance letters', () => {
  it('are read and written alike, each only once', () => {
    expect(new Set(TOLERANCE_LETTERS).size).toBe(TOLERANCE_LETTERS.length);
    const spans = TOLERANCE_LETTERS.map(readToleranceLetter);
    expect(spans.map(toleranceLetter)).toEqual(TOLERANCE_LETTERS);
    expect(new Set(spans.map(({ minus, plus }) => `${minus}/${plus}`)).size).toBe(TOLERANCE_LETTERS.length);
  });

  it('never mean a part that may be short of everything', () => {
    for (const { minus, plus } of TOLERANCE_LETTERS.map(readToleranceLetter)) {
      expect(minus).toBeGreaterThan(0);
      expect(minus).toBeLessThan(100);
      expect(plus).toBeGreaterThanOrEqual(minus);
    }
  });

  it('do not exist for every tolerance', () => {
    expect(toleranceLetter({ minus: 7, plus: 7 })).toBeUndefined();
    expect(toleranceLetter({ minus: 5, plus: 10 })).toBeUndefined();
    expect(toleranceLetter({ minus: Number.NaN, plus: Number.NaN })).toBeUndefined();
  });
});
