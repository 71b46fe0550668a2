import { describe, expect, it } from 'vitest';
import type { PlotCurve } from '../../../src/sheet/plot-model.ts';
import { plotSentences } from '../../../src/sheet/plot-words.ts';

const curve: PlotCurve = {
  id: 'a',
  letter: 'A',
  label: 'Stock',
  colour: 'a',
  dash: [],
  strength: 'strong',
  frequencies: Float64Array.of(100, 560, 1000, 5000),
  values: Float64Array.of(-4.7, -11.8, -9.8, -4.1),
};

describe('a plot in words', () => {
  it('states the axis, the quoted levels and the lowest point of each lettered curve', () => {
    expect(plotSentences([curve, { ...curve, letter: '', label: 'helping line' }], 'magnitude')).toBe(
      'Level in dB from 10 Hz to 40 kHz. A Stock: −4.7\u202fdB at 100\u202fHz, −9.8\u202fdB at 1\u202fkHz, ' +
        '−4.1\u202fdB at 5\u202fkHz; lowest −11.8\u202fdB at 560\u202fHz.',
    );
  });

  it('says degrees, and nothing of a lowest point where there is none', () => {
    const nothing = { ...curve, values: curve.values.map(() => Number.NaN) };
    expect(plotSentences([nothing], 'phase')).toBe(
      'Phase in degrees from 10 Hz to 40 kHz. A Stock: –° at 100\u202fHz, –° at 1\u202fkHz, –° at 5\u202fkHz.',
    );
    expect(plotSentences([], 'impedance')).toBe('Impedance in Ω from 10 Hz to 40 kHz.');
  });
});
