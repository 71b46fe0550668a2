import { describe, expect, it } from 'vitest';
import { logicalLines } from '../../../../src/circuit/spice/logical-lines.ts';
import { syntaxError, Tokens } from '../../../../src/circuit/spice/tokenise.ts';

const tokensOf = (text: string) => new Tokens(logicalLines(text)[0]!);

describe('Tokens', () => {
  it('reads what is asked for, blanks between', () => {
    const tokens = tokensOf('  R1\tn-1  0 {2k*x}');
    expect([tokens.word('a name'), tokens.peekWord(), tokens.word('a node'), tokens.word('a node')]).toEqual([
      'R1',
      'n-1',
      'n-1',
      '0',
    ]);
    expect(tokens.takeSymbol('(')).toBe(false);
    expect(tokens.takeSymbol('{')).toBe(true);
    expect(tokens.number('a number').value).toBe(2000);
    expect(tokens.takeSymbol('*')).toBe(true);
    expect(tokens.isAtIdentifier).toBe(true);
    expect(tokens.identifier('a name')).toBe('x');
    expect(tokens.isAtEnd).toBe(false);
    tokens.takeSymbol('}');
    expect([tokens.isAtEnd, tokens.next, tokens.peekWord()]).toEqual([true, '', '']);
    expect(() => tokens.end()).not.toThrow();
  });

  it('knows where it is', () => {
    const tokens = tokensOf('R1  in');
    tokens.word('a name');
    expect([tokens.offset, tokens.place]).toEqual([4, { line: 1, column: 5 }]);
  });

  it('refuses with what was found, what was expected and where', () => {
    const tokens = tokensOf('R1 ={');
    tokens.word('a name');
    expect(() => tokens.word('a node')).toThrow('line 1, column 4: found “=”, expected a node.');
    expect(() => tokens.number('a number')).toThrow('line 1, column 4: found “=”, expected a number.');
    expect(() => tokens.identifier('a parameter')).toThrow('found “=”, expected a parameter.');
    expect(() => tokens.end()).toThrow('found “=”, expected the end of the card.');
  });

  it('quotes a long text in part, and the end as such', () => {
    const [line] = logicalLines('x'.repeat(500));
    expect(syntaxError(line!, 0, 'less').message).toBe(
      `line 1, column 1: found “${'x'.repeat(30)}…”, expected less.`,
    );
    expect(syntaxError(line!, 500, 'more').message).toContain('found the end of the line, expected more');
  });
});
