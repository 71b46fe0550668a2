import { describe, expect, it } from 'vitest';
import { LineTransfer } from '../../../src/blocks/line-transfer.ts';
import { withPart } from '../../../src/blocks/settings.ts';
import { defaultLine } from '../../../src/design/design.ts';
import { placedLine } from '../../../src/design/placed-line.ts';
import { lineLevel } from '../../../src/response/line-response.ts';
import { lineWithPart, swapPart } from '../../../src/study/swap.ts';

const line = defaultLine();
const placed = placedLine(line);
const places = { low: 100, dip: 560, middle: 1000, high: 5000 };

describe('swap', () => {
  it('says what a value would change, against the line computed afresh', () => {
    const [smaller, present, larger] = swapPart(
      placed,
      'tone',
      'trebleCap',
      [220e-12, 390e-12, 680e-12],
      places,
    );
    expect(present).toMatchObject({ present: true, change: { low: 0, dip: 0, middle: 0, high: 0 } });
    const level = (value: number, frequency: number) =>
      lineLevel(
        new LineTransfer().of(
          placed.map((entry) =>
            entry.block.slot === 'tone'
              ? { ...entry, settings: withPart(entry.settings, 'trebleCap', value) }
              : entry,
          ),
        ),
        frequency,
      );
    for (const [candidate, value] of [
      [smaller, 220e-12],
      [larger, 680e-12],
    ] as const) {
      // Both sides evaluate the same formula; only the order of additions differs.
      expect(candidate!.change.middle).toBeCloseTo(level(value, 1000) - level(390e-12, 1000), 9);
      expect(candidate!.change.high).toBeCloseTo(level(value, 5000) - level(390e-12, 5000), 9);
    }
    // Common practice, no source: a larger treble capacitor lets more of the upper middle through.
    expect(larger!.change.middle).toBeGreaterThan(0.3);
    expect(smaller!.change.middle).toBeLessThan(-0.3);
  });

  it('leaves the dip open where there is none', () => {
    const [candidate] = swapPart(placed, 'tone', 'slope', [33e3], { ...places, dip: undefined });
    expect(candidate?.change.dip).toBeUndefined();
  });

  it('has nothing to say of a block that is not in the line', () => {
    expect(swapPart(placed, 'speaker', 'anything', [1], places)).toEqual([]);
  });

  it('makes the line that a voicing would hold', () => {
    const next = lineWithPart(line, 'tone', 'slope', 33e3);
    expect(next.tone.variants['three-knob']?.parts['slope']).toBe(33e3);
    expect(next.power).toBe(line.power);
  });
});
