import { describe, expect, it } from 'vitest';
import { instantiate } from '../../../../src/circuit/spice/instantiate.ts';
import { MOST_CARDS, parseNetlist } from '../../../../src/circuit/spice/parse-netlist.ts';
import { NotchworkError } from '../../../../src/errors.ts';

function errorOf(action: () => unknown): NotchworkError {
  try {
    action();
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error('nothing was thrown');
}

const PRELUDE = 'title\nV1 in 0 AC 1\nR1 in out 1k\n';

/** One case for each rule: the lines from the fourth on, where, and what the message names. */
const SYNTAX: readonly [rule: string, lines: string, line: number, column: number, words: RegExp][] = [
  ['an unknown card', 'Q1 a b c', 4, 1, /found “Q1”, expected a card R, C, L, G, E or V/],
  ['an unknown dot card', '.subckt x', 4, 1, /found “\.subckt”/],
  ['a card without nodes', 'R2', 4, 3, /the end of the line, expected the first node/],
  ['a card with one node', 'C2 out', 4, 7, /second node/],
  ['a card without a value', 'R2 out 0', 4, 9, /expected a value/],
  ['a value that is a name', 'R2 out 0 pot', 4, 10, /\{2\*name\}/],
  ['a value with digits behind letters', 'R2 out 0 4k7', 4, 10, /“4k7”, expected a number such as 4\.7k/],
  ['a value in mil', 'R2 out 0 1mil', 4, 10, /mil/],
  ['a value with an a', 'R2 out 0 1A', 4, 10, /atto/],
  ['a value beyond every number', 'R2 out 0 1e999', 4, 10, /1e308/],
  ['more behind the value', 'R2 out 0 1k tc=1', 4, 13, /“tc”, expected the end of the card/],
  ['an open brace', 'R2 out 0 {1+2', 4, 14, /“}”/],
  ['an open bracket', 'R2 out 0 {(1+2}', 4, 15, /“\)”/],
  ['an empty expression', 'R2 out 0 {}', 4, 11, /a number, a parameter or “\(”/],
  ['an unknown operator', 'R2 out 0 {2^2}', 4, 12, /operator/],
  ['an unknown parameter', '.param t=0.5\nR2 out 0 {1k*u}', 5, 14, /“u”.*there are t/],
  ['a controlled source without control', 'E2 x 0 10', 4, 10, /controlling node/],
  ['a place on a continuation line', 'R2 out\n*\n+ 0 {1+}', 6, 8, /“}”/],
  ['a name used twice', 'C2 out 0 1n\nc2 out 0 1n', 5, 1, /c2 is taken/],
  ['a second source', 'V2 out 0 AC 1', 4, 1, /one source only; V1 in line 2/],
  ['a source of another amplitude', 'VX in 0 AC 2', 4, 12, /AC 1/],
  ['a source with a phase', 'VX in 0 AC 1 90', 4, 14, /no phase/],
  ['a source without AC', 'VX in 0 5', 4, 10, /AC 1/],
  ['a source with a waveform', 'VX in 0 SIN(0 1 1k)', 4, 9, /AC 1/],
  ['a parameter without a name', '.param', 4, 7, /a parameter/],
  ['a parameter without =', '.param t 0.5', 4, 10, /“=”/],
  ['a parameter without a value', '.param t=', 4, 10, /a number, a parameter/],
  ['a parameter defined twice', '.param t=0.5\n.param T=1', 5, 8, /T is taken/],
  ['parameters in a circle', '.param a={b} b={a}', 4, 8, /depends on itself/],
  ['a label above nothing', '*@ label="x"\n\nR2 out 0 1', 4, 1, /directly below/],
  ['a label at the end', '*@ label="x"', 4, 1, /directly below/],
  ['a taper above a card', '*@ taper=audio\nR2 out 0 1k', 4, 1, /only a label here/],
  ['a label above two parameters', '*@ label="x"\n.param a=1 b=2', 5, 12, /one parameter only/],
  ['a taper on a value that is no position', '*@ taper=audio\n.param a=5', 5, 8, /from 0 to 1/],
  ['a taper where knob=no', '*@ taper=audio knob=no\n.param a=0.5', 5, 8, /no knob/],
  ['a knob that is calculated', '*@ knob=yes\n.param a={1/2}', 5, 8, /one number from 0 to 1/],
];

describe('a netlist is refused for', () => {
  it.each(SYNTAX)('%s', (_, lines, line, column, words) => {
    const error = errorOf(() => parseNetlist(PRELUDE + lines));
    expect(error.message).toMatch(words);
    expect([error.code, error.place]).toEqual(['netlist-syntax', { line, column }]);
    expect(error.message).toMatch(new RegExp(`^line ${line}, column ${column}: `));
  });

  it('no source, and no parts', () => {
    expect(errorOf(() => parseNetlist('title\nR1 in out 1k\n.end')).message).toMatch(
      /expected a source, V1 in 0 AC 1/,
    );
    expect(errorOf(() => parseNetlist('title\nV1 in 0 AC 1')).message).toMatch(/at least one card/);
    expect(errorOf(() => parseNetlist('')).code).toBe('netlist-syntax');
  });

  it('a parameter divided by zero', () => {
    const error = errorOf(() => parseNetlist(`${PRELUDE}.param z=0 k={1/z}`));
    expect([error.code, error.message]).toEqual([
      'value-out-of-range',
      expect.stringMatching(/parameter k.*divides by zero/),
    ]);
  });

  it('too many cards or parameters', () => {
    const many = (card: (index: number) => string) =>
      Array.from({ length: MOST_CARDS + 1 }, (_, index) => card(index)).join('\n');
    expect(errorOf(() => parseNetlist(PRELUDE + many((index) => `C${index} in 0 1n`))).code).toBe(
      'netlist-too-large',
    );
    expect(errorOf(() => parseNetlist(PRELUDE + many((index) => `.param p${index}=1`))).code).toBe(
      'netlist-too-large',
    );
  });
});

describe('values are refused for', () => {
  const of = (lines: string) => parseNetlist(PRELUDE + lines);

  it.each<[string, string, RegExp]>([
    ['a negative resistance', 'R2 out 0 -5', /R2 comes out as -5; a resistance is zero or more/],
    ['a negative capacitance', 'C2 out 0 {-1n}', /C2/],
    ['a negative inductance', 'L2 out 0 {1-2}', /L2/],
    ['a division by zero', 'R2 out 0 {1/(1-1)}', /R2.*divides by zero/],
    ['an overflow', 'R2 out 0 {1e300*1e300}', /R2.*beyond every number/],
  ])('%s', (_, lines, words) => {
    const error = errorOf(() => instantiate(of(lines)));
    expect([error.code, error.message]).toEqual(['value-out-of-range', expect.stringMatching(words)]);
    expect(error.place).toMatchObject({ line: 4 });
  });

  it('an unknown knob, listing those there are', () => {
    const netlist = of('.param t=0.5 Mid=0.1 cap=22n\nR2 out 0 {1k*t*Mid}');
    const error = errorOf(() => instantiate(netlist, { bass: 1 }));
    expect([error.code, error.message]).toEqual([
      'usage',
      expect.stringMatching(/“bass”.*there are t, Mid\./),
    ]);
    expect(errorOf(() => instantiate(netlist, { cap: 1 })).code).toBe('usage');
    expect(errorOf(() => instantiate(of('R2 out 0 1k'), { t: 1 })).message).toMatch(/it has none/);
  });

  it.each([-0.1, 1.1, Number.NaN, Number.POSITIVE_INFINITY])('a knob at %s', (position) => {
    const error = errorOf(() => instantiate(of('.param t=0.5'), { T: position }));
    expect([error.code, error.message]).toEqual(['value-out-of-range', expect.stringContaining('Knob t')]);
  });

  it.each(['far', '0', 'gnd', ''])('the output %j, listing the nodes there are', (output) => {
    const error = errorOf(() => instantiate(of('C2 out 0 1n'), {}, output));
    expect([error.code, error.message]).toEqual(['netlist-topology', expect.stringContaining('in, out')]);
  });
});
