import { describe, expect, it } from 'vitest';
import { setKnob } from '../../../src/design/changes.ts';
import { activeVoicing, type Design, defaultDesign, VOICING_LETTERS } from '../../../src/design/design.ts';
import {
  chooseVoicing,
  deleteVoicing,
  freeLetter,
  keepVoicing,
  LONGEST_VOICING_NAME,
  moveVoicing,
  recolourVoicing,
  renameVoicing,
} from '../../../src/design/voicings.ts';
import { rotation } from '../../../src/units.ts';

const letters = (design: Design) => design.voicings.map((voicing) => voicing.letter).join('');
const one = defaultDesign();
const three = keepVoicing('Dark')(keepVoicing('Bright')(one));

describe('voicings', () => {
  it('are kept under the next free letter, with the line as it stands', () => {
    const edited = setKnob('tone', 'treble', rotation(0.9))(one);
    const kept = keepVoicing('Bright')(edited);
    expect(letters(kept)).toBe('AB');
    expect(kept.active).toBe('B');
    expect(activeVoicing(kept).line).toBe(activeVoicing(edited).line);
  });

  it('are eight at the most', () => {
    let design = one;
    for (let index = 0; index < 12; index += 1) design = keepVoicing('')(design);
    expect(letters(design)).toBe(VOICING_LETTERS.join(''));
    expect(freeLetter(design)).toBeUndefined();
    expect(keepVoicing('ninth')(design)).toBe(design);
  });

  it('edit only the active one', () => {
    const edited = setKnob('tone', 'treble', rotation(0.1))(chooseVoicing('B')(three));
    const position = (index: number) =>
      edited.voicings[index]!.line.tone.variants['three-knob']!.knobs['treble'];
    expect([position(0), position(1), position(2)]).toEqual([0.6, 0.1, 0.6]);
  });

  it('can be renamed, never to nothing and never without end', () => {
    const name = (text: string) => renameVoicing('B', text)(three).voicings[1]!.name;
    expect(name('  Bigger treble cap ')).toBe('Bigger treble cap');
    expect(name('   ')).toBe('Voicing B');
    expect(name('x'.repeat(500))).toHaveLength(LONGEST_VOICING_NAME);
    expect(renameVoicing('H', 'x')(three)).toBe(three);
  });

  it('can be recoloured', () => {
    expect(recolourVoicing('B', 'F')(three).voicings[1]!.colour).toBe('F');
  });

  it('move within the row and stop at its ends', () => {
    expect(letters(moveVoicing('A', 1)(three))).toBe('BAC');
    expect(letters(moveVoicing('A', 99)(three))).toBe('BCA');
    expect(letters(moveVoicing('C', -1)(three))).toBe('ACB');
    expect(moveVoicing('A', -1)(three)).toBe(three);
  });

  it('are deleted, the last one never; a neighbour becomes active', () => {
    expect(three.active).toBe('C');
    const two = deleteVoicing('C')(three);
    expect([letters(two), two.active]).toEqual(['AB', 'B']);
    const first = deleteVoicing('A')(chooseVoicing('A')(two));
    expect([letters(first), first.active]).toEqual(['B', 'B']);
    expect(deleteVoicing('B')(first)).toBe(first);
    expect(freeLetter(first)).toBe('A');
  });

  it('are chosen only where they exist', () => {
    expect(chooseVoicing('H')(three)).toBe(three);
    expect(chooseVoicing('A')(three).active).toBe('A');
  });
});
