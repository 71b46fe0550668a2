import { NotchworkError, type TextPlace } from '../../errors.ts';
import type { Tokens } from './tokenise.ts';

/** Deepest nesting of brackets and signs in one expression. */
export const DEEPEST_EXPRESSION = 50;
/** Most numbers, parameters and operators in one expression. */
export const LONGEST_EXPRESSION = 1000;

type Operator = '+' | '-' | '*' | '/' | 'negate';

/** One instruction of a stack machine: push a number, push a parameter, or combine what is on top. */
export type Instruction =
  | { readonly number: number }
  | { readonly parameter: string; readonly place: TextPlace }
  | { readonly operator: Operator };

/**
 * An expression over + − × ÷, brackets and parameters. It is kept in postfix order, so that no length
 * of `1+1+1+…` can exhaust the call stack.
 */
export interface Expression {
  readonly program: readonly Instruction[];
  /** As written, without the braces. */
  readonly text: string;
  readonly place: TextPlace;
  /** Whether it is one number as it stands, and if so whether it has a scale suffix. */
  readonly literal: 'none' | 'plain' | 'scaled';
}

const OPERAND = 'a number, a parameter or “(”';

class ExpressionParser {
  readonly #tokens: Tokens;
  readonly program: Instruction[] = [];
  scaled = false;

  constructor(tokens: Tokens) {
    this.#tokens = tokens;
  }

  #tooLarge(what: string): never {
    const { place } = this.#tokens;
    throw new NotchworkError(
      'netlist-too-large',
      `line ${place.line}, column ${place.column}: this expression ${what}; split it with .param.`,
      { place },
    );
  }

  #emit(instruction: Instruction): void {
    if (this.program.length >= LONGEST_EXPRESSION)
      this.#tooLarge(`has more than ${LONGEST_EXPRESSION} terms`);
    this.program.push(instruction);
  }

  sum(depth: number): void {
    this.#product(depth);
    for (
      let operator = this.#tokens.next;
      operator === '+' || operator === '-';
      operator = this.#tokens.next
    ) {
      this.#tokens.takeSymbol(operator);
      this.#product(depth);
      this.#emit({ operator });
    }
  }

  #product(depth: number): void {
    this.#factor(depth);
    for (
      let operator = this.#tokens.next;
      operator === '*' || operator === '/';
      operator = this.#tokens.next
    ) {
      this.#tokens.takeSymbol(operator);
      this.#factor(depth);
      this.#emit({ operator });
    }
  }

  #factor(depth: number): void {
    const tokens = this.#tokens;
    if (depth > DEEPEST_EXPRESSION) this.#tooLarge(`is nested more than ${DEEPEST_EXPRESSION} deep`);
    const { place } = tokens;
    if (tokens.takeSymbol('-')) {
      this.#factor(depth + 1);
      this.#emit({ operator: 'negate' });
    } else if (tokens.takeSymbol('+')) {
      this.#factor(depth + 1);
    } else if (tokens.takeSymbol('(')) {
      this.sum(depth + 1);
      if (!tokens.takeSymbol(')')) tokens.refuse('an operator (+ - * /) or “)”');
    } else if (tokens.isAtIdentifier) {
      this.#emit({ parameter: tokens.identifier(OPERAND).toLowerCase(), place });
    } else {
      const { value, isScaled } = tokens.number(OPERAND);
      this.scaled ||= isScaled;
      this.#emit({ number: value });
    }
  }
}

function finished(parser: ExpressionParser, text: string, place: TextPlace): Expression {
  const isNumber = parser.program.length === 1 && 'number' in parser.program[0]!;
  const literal = !isNumber ? 'none' : parser.scaled ? 'scaled' : 'plain';
  return { program: parser.program, text: text.trim(), place, literal };
}

/**
 * Reads an expression: `sum = product {(+|-) product}`, `product = factor {(*|/) factor}`,
 * `factor = number | parameter | ( sum ) | -factor | +factor`. It ends where no operator follows.
 *
 * @throws NotchworkError `netlist-syntax` with its place; `netlist-too-large` beyond
 *   {@link DEEPEST_EXPRESSION} or {@link LONGEST_EXPRESSION}.
 */
export function readExpression(tokens: Tokens): Expression {
  const { place, offset } = tokens;
  const parser = new ExpressionParser(tokens);
  parser.sum(0);
  return finished(parser, tokens.line.text.slice(offset, tokens.offset), place);
}

/** Reads an expression in braces, the opening brace being next. */
export function readBraced(tokens: Tokens): Expression {
  if (!tokens.takeSymbol('{')) tokens.refuse('“{”');
  const expression = readExpression(tokens);
  if (!tokens.takeSymbol('}')) tokens.refuse('an operator (+ - * /) or “}”');
  return expression;
}

/** Reads a card's value: one number, with or without a sign, or an expression in braces. */
export function readValue(tokens: Tokens): Expression {
  if (tokens.next === '{') return readBraced(tokens);
  const { place, offset } = tokens;
  if (tokens.isAtIdentifier) tokens.refuse('a value: a number, or an expression in braces such as {2*name}');
  const negative = tokens.takeSymbol('-');
  if (!negative) tokens.takeSymbol('+');
  const { value, isScaled } = tokens.number('a value: a number, or an expression in braces');
  return {
    program: [{ number: negative ? -value : value }],
    text: tokens.line.text.slice(offset, tokens.offset).trim(),
    place,
    literal: isScaled ? 'scaled' : 'plain',
  };
}

function combine(operator: Operator, left: number, right: number): number {
  switch (operator) {
    case '+':
      return left + right;
    case '-':
      return left - right;
    case '*':
      return left * right;
    default:
      return left / right;
  }
}

/**
 * Value of an expression.
 *
 * @param lookUp value of a parameter, its name in lower case.
 * @param owner what it is the value of, for the message: "R1" or "parameter t".
 * @throws NotchworkError `value-out-of-range` for a division by zero or a result that is not finite.
 */
export function evaluateExpression(
  expression: Expression,
  lookUp: (name: string) => number,
  owner: string,
): number {
  const { program, text, place } = expression;
  const stack: number[] = [];
  const fail = (what: string): never => {
    throw new NotchworkError('value-out-of-range', `line ${place.line}: ${owner} = {${text}} ${what}.`, {
      place,
    });
  };
  for (const instruction of program) {
    if ('number' in instruction) stack.push(instruction.number);
    else if ('parameter' in instruction) stack.push(lookUp(instruction.parameter));
    else {
      const right = stack.pop()!;
      if (instruction.operator === 'negate') stack.push(-right);
      else {
        if (instruction.operator === '/' && right === 0)
          fail('divides by zero; add a small value below the line');
        stack.push(combine(instruction.operator, stack.pop()!, right));
      }
    }
  }
  const value = stack.pop()!;
  if (!Number.isFinite(value)) fail('is beyond every number; bring its parts closer together');
  return value + 0; // a plain zero instead of −0
}
