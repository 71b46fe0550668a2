import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { fileName } from '../../../src/sheet/file-name.ts';

const day = new Date(2026, 2, 4);

describe('file names', () => {
  it.each([
    ['Attic amplifier', 'curve', 'csv', 'attic-amplifier-curve-2026-03-04.csv'],
    ['  Größe / “18” ', '', 'json', 'größe-18-2026-03-04.json'],
    ['', 'plot', 'png', 'design-plot-2026-03-04.png'],
    ['../../etc', 'plot', 'svg', 'etc-plot-2026-03-04.svg'],
    ['CON', '', 'json', 'design-con-2026-03-04.json'],
    ['低音', 'curve', 'csv', '低音-curve-2026-03-04.csv'],
    ['ガラス 한글', 'curve', 'csv', 'ガラス-한글-curve-2026-03-04.csv'],
    ['a\u0000b\nc', '', 'wav', 'a-b-c-2026-03-04.wav'],
  ])('of “%s”', (title, what, ending, name) => {
    expect(fileName(title, what, day, ending)).toBe(name);
  });

  it('write an accent the same way however it was typed', () => {
    expect(fileName('cafe\u0301', '', day, 'csv')).toBe(fileName('caf\u00e9', '', day, 'csv'));
  });

  it('leave out a date that is none', () => {
    expect(fileName('Attic', 'curve', new Date(Number.NaN), 'csv')).toBe('attic-curve.csv');
  });

  it('are short and free of what any system forbids, whatever the title', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'binary', maxLength: 400 }), (title) => {
        const name = fileName(title, 'curve', day, 'csv');
        // 255 bytes is the limit of the usual file systems (common practice, no source).
        expect(new TextEncoder().encode(name).length).toBeLessThanOrEqual(255);
        expect(name).toMatch(/^[^\\/:*?"<>|\p{Cc}\p{Cs}\s.][^\\/:*?"<>|\p{Cc}\p{Cs}\s.]*\.csv$/u);
      }),
    );
  });

  it('stay under the limit with the widest letters there are', () => {
    const bytes = new TextEncoder().encode(fileName('𠮷'.repeat(500), 'curve', day, 'csv')).length;
    expect(bytes).toBeLessThanOrEqual(255);
  });
});
