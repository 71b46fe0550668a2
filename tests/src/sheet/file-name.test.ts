import { describe, expect, it } from 'vitest';
import { fileName } from '../../../src/sheet/file-name.ts';

const day = new Date(2026, 2, 4);

describe('file names', () => {
  it.each([
    ['Attic amplifier', 'curve', 'csv', 'attic-amplifier-curve-2026-03-04.csv'],
    ['  Größe / “18” ', '', 'json', 'große-18-2026-03-04.json'],
    ['', 'plot', 'png', 'design-plot-2026-03-04.png'],
    ['../../etc', 'plot', 'svg', 'etc-plot-2026-03-04.svg'],
    ['CON', '', 'json', 'design-con-2026-03-04.json'],
    ['低音', 'curve', 'csv', '低音-curve-2026-03-04.csv'],
  ])('%s', (title, what, ending, name) => {
    expect(fileName(title, what, day, ending)).toBe(name);
  });

  it('stay short', () => {
    expect(fileName('x'.repeat(500), 'curve', day, 'csv').length).toBeLessThan(100);
  });
});
