import { describe, expect, it } from 'vitest';
import { logicalLines, MOST_CHARACTERS } from '../../../../src/circuit/spice/logical-lines.ts';

describe('logicalLines', () => {
  it('joins continuations across comments and blank lines, and keeps every place', () => {
    const lines = logicalLines('title\nR1 in ; a comment\n* between\n\n  + out 10k\n.end');
    expect(lines.map((line) => line.kind)).toEqual(['card', 'card', 'comment', 'blank', 'card']);
    const card = lines[1]!;
    expect(card.text.split(/\s+/)).toEqual(['R1', 'in', 'out', '10k']);
    expect(card.placeOf(0)).toEqual({ line: 2, column: 1 });
    expect(card.placeOf(card.text.indexOf('in'))).toEqual({ line: 2, column: 4 });
    expect(card.placeOf(card.text.indexOf('out'))).toEqual({ line: 5, column: 5 });
    expect(card.placeOf(card.text.indexOf('10k'))).toEqual({ line: 5, column: 9 });
  });

  it.each(['\n', '\r\n', '\r'])('takes the line ending %j', (ending) => {
    expect(logicalLines(['a', 'b', ''].join(ending)).map((line) => line.text)).toEqual(['a', 'b', '']);
  });

  it('drops a byte order mark and knows comments of our own form', () => {
    expect(
      logicalLines('\uFEFF* title\n *@ label="x;y"\n; all comment').map(({ kind, text }) => [kind, text]),
    ).toEqual([
      ['comment', '* title'],
      ['label', ' *@ label="x;y"'],
      ['blank', '; all comment'],
    ]);
  });

  it('refuses what is too long and a continuation of nothing', () => {
    expect(() => logicalLines('x'.repeat(MOST_CHARACTERS))).not.toThrow();
    expect(() => logicalLines('x'.repeat(MOST_CHARACTERS + 1))).toThrow(
      expect.objectContaining({ code: 'netlist-too-large' }),
    );
    expect(() => logicalLines('* only a comment\n  + more')).toThrow(
      expect.objectContaining({ code: 'netlist-syntax', place: { line: 2, column: 3 } }),
    );
  });
});
