import { describe, expect, it } from 'vitest';
import { readLabelComment, writeLabelComment } from '../../../../src/circuit/spice/label-comment.ts';
import { logicalLines } from '../../../../src/circuit/spice/logical-lines.ts';

const read = (text: string) => readLabelComment(logicalLines(text)[0]!);

describe('label comments', () => {
  it('reads all keys, in any order and case', () => {
    expect(read('*@ label="Treble" taper=audio midpoint=0.1')).toEqual({
      label: 'Treble',
      taper: { law: 'audio', midpoint: 0.1 },
    });
    expect(read('  *@  MIDPOINT=0.2 Taper=Reverse-Audio')).toEqual({
      taper: { law: 'reverse-audio', midpoint: 0.2 },
    });
    expect(read('*@ taper=audio')).toEqual({ taper: { law: 'audio', midpoint: 0.15 } });
    expect(read('*@ taper=linear')).toEqual({ taper: { law: 'linear', midpoint: 0.5 } });
    expect(read('*@ label=Bass knob=no')).toEqual({ label: 'Bass', isKnob: false });
    expect(read('*@ knob = yes')).toEqual({ isKnob: true });
    expect(read('*@')).toEqual({});
  });

  it('keeps what stands between quotes, semicolons too', () => {
    expect(read('*@ label="Höhen; 250 kΩ = laut"')).toEqual({ label: 'Höhen; 250 kΩ = laut' });
  });

  it.each([
    '*@ colour=red',
    '*@ label="open',
    '*@ label=""',
    '*@ label="a" label="b"',
    '*@ taper=square',
    '*@ midpoint=0.2',
    '*@ taper=audio midpoint=1.5',
    '*@ taper=audio midpoint=loud',
    '*@ knob=perhaps',
    '*@ Treble',
    `*@ label="${'x'.repeat(81)}"`,
  ])('refuses %s', (text) => {
    expect(() => read(text)).toThrow(
      expect.objectContaining({ code: 'netlist-syntax', place: expect.anything() }),
    );
  });

  it('writes what it reads', () => {
    for (const comment of [
      { label: 'Treble', taper: { law: 'audio', midpoint: 0.12 } as const },
      { taper: { law: 'linear', midpoint: 0.5 } as const },
      { label: 'Stray', isKnob: false },
    ]) {
      expect(read(writeLabelComment(comment)!)).toEqual(comment);
    }
    expect(writeLabelComment({})).toBeUndefined();
    expect(writeLabelComment({ label: ' ' })).toBeUndefined();
    expect(read(writeLabelComment({ label: 'a "b"\nc' })!)).toEqual({ label: "a 'b' c" });
  });
});
