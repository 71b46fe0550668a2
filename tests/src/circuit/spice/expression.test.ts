import { describe, expect, it } from 'vitest';
import {
  DEEPEST_EXPRESSION,
  evaluateExpression,
  LONGEST_EXPRESSION,
  readBraced,
  readExpression,
  readValue,
} from '../../../../src/circuit/spice/expression.ts';
import { logicalLines } from '../../../../src/circuit/spice/logical-lines.ts';
import { Tokens } from '../../../../src/circuit/spice/tokenise.ts';
import { seededRandom } from '../../../../src/study/blind-trial.ts';

const PARAMETERS: Readonly<Record<string, number>> = { t: 0.25, pot: 250e3, x_1: 3 };
const tokensOf = (text: string) => new Tokens(logicalLines(text)[0]!);
const calculate = (text: string) => {
  const tokens = tokensOf(text);
  const expression = readExpression(tokens);
  tokens.end();
  return evaluateExpression(expression, (name) => PARAMETERS[name]!, 'R1');
};

describe('expressions', () => {
  it.each<[string, number]>([
    ['1+2*3', 7],
    ['(1+2)*3', 9],
    ['10-4-3', 3],
    ['100/10/5', 2],
    ['2*3/4', 1.5],
    ['-2*-3', 6],
    ['--2', 2],
    ['2--3', 5],
    ['(+2)-+3', -1],
    ['pot*(1-t)', 187500],
    ['POT*T', 62500],
    ['x_1 * 2k', 6000],
    ['1e-3+1', 1.001],
    ['1e3-1', 999],
    ['22n*2', 44e-9],
    ['((((1))))', 1],
    ['0*-1', 0],
  ])('%s', (text, value) => {
    expect(calculate(text)).toBeCloseTo(value, 12);
  });

  it('agrees with the arithmetic of the language on random expressions', () => {
    const random = seededRandom(8);
    const make = (depth: number): string => {
      const draw = random();
      if (depth === 0 || draw < 0.2) return (random() * 9 + 1).toFixed(2);
      if (draw < 0.3) return `(-${make(depth - 1)})`;
      const operator = '+-*/'[Math.floor(random() * 4)]!;
      return `(${make(depth - 1)}) ${operator} ${make(depth - 1)}`;
    };
    for (let index = 0; index < 300; index += 1) {
      const text = make(5);
      const expected = Function(`return ${text}`)() as number;
      if (Number.isFinite(expected)) expect(calculate(text)).toBe(expected + 0);
    }
  });

  it('never gives −0, and keeps its text', () => {
    expect(Object.is(calculate('-0'), 0)).toBe(true);
    const tokens = tokensOf('{ pot * t } rest');
    expect(readBraced(tokens).text).toBe('pot * t');
    expect(tokens.peekWord()).toBe('rest');
  });

  it('knows a literal from a calculation', () => {
    expect(readExpression(tokensOf('0.5')).literal).toBe('plain');
    expect(readExpression(tokensOf('22n')).literal).toBe('scaled');
    expect(readExpression(tokensOf('1-0.5')).literal).toBe('none');
    expect(readExpression(tokensOf('t')).literal).toBe('none');
    expect(readValue(tokensOf('-4.7k'))).toMatchObject({ literal: 'scaled', program: [{ number: -4700 }] });
  });

  it.each<[string, number, string]>([
    ['1+', 3, 'the end of the line'],
    ['1+*2', 3, '*2'],
    ['(1', 3, 'the end of the line'],
    ['1 2', 3, '2'],
    ['1)', 2, ')'],
    ['2^3', 2, '^3'],
    ['sqrt(2)', 5, '('],
    ['4k7', 1, '4k7'],
    ['1.2.3', 1, '1.2.3'],
    ['', 1, 'the end of the line'],
  ])('refuses %j, saying where', (text, column, found) => {
    expect(() => calculate(text)).toThrow(
      expect.objectContaining({
        code: 'netlist-syntax',
        place: { line: 1, column },
        message: expect.stringContaining(found),
      }),
    );
  });

  it('refuses division by zero, even where it would vanish again, and what overflows', () => {
    for (const text of ['1/0', '1/(1/0)', '1/(t-0.25)', '1e300*1e300']) {
      expect(() => calculate(text)).toThrow(
        expect.objectContaining({ code: 'value-out-of-range', message: expect.stringContaining('R1') }),
      );
    }
  });

  it('has limits instead of overflowing the stack', () => {
    const nested = (depth: number) => `${'('.repeat(depth)}1${')'.repeat(depth)}`;
    expect(calculate(nested(DEEPEST_EXPRESSION))).toBe(1);
    for (const text of [
      nested(DEEPEST_EXPRESSION + 1),
      nested(90_000),
      '-'.repeat(90_000),
      '1+'.repeat(50_000),
    ]) {
      expect(() => calculate(text)).toThrow(expect.objectContaining({ code: 'netlist-too-large' }));
    }
    const terms = (LONGEST_EXPRESSION + 1) / 2;
    expect(calculate(Array(Math.floor(terms)).fill('1').join('+'))).toBe(Math.floor(terms));
  });
});
