import { NotchworkError, type TextPlace } from '../../errors.ts';
import type { LogicalLine } from './logical-lines.ts';
import { NUMBER, type SpiceNumber, spiceNumber } from './number.ts';

/** Longest piece of the text that a message repeats. */
const LONGEST_QUOTE = 30;

const BLANKS = /\s*/y;
/** A field of a card: anything up to a blank or a character with a meaning of its own. */
const WORD = /[^\s{}()=,;"]+/y;
const IDENTIFIER = /[a-z_]\w*/iy;

/**
 * Reads one logical line from left to right, a token at a time. What a token is depends on where it
 * stands (`n-1` is one node but, in braces, a subtraction), so the parser asks for what it expects.
 */
export class Tokens {
  readonly line: LogicalLine;
  #at: number;

  constructor(line: LogicalLine) {
    this.line = line;
    this.#at = 0;
    this.#match(BLANKS);
  }

  /** Where the next token starts, in characters from the start of the line. */
  get offset(): number {
    return this.#at;
  }

  /** Where the next token starts in the netlist. */
  get place(): TextPlace {
    return this.line.placeOf(this.#at);
  }

  /** Whether nothing but blanks is left. */
  get isAtEnd(): boolean {
    return this.#at >= this.line.text.length;
  }

  /** The next character, '' at the end. */
  get next(): string {
    return this.line.text.charAt(this.#at);
  }

  #match(pattern: RegExp): RegExpExecArray | undefined {
    pattern.lastIndex = this.#at;
    const match = pattern.exec(this.line.text);
    if (match === null) return undefined;
    this.#at += match[0].length;
    return match;
  }

  #take(pattern: RegExp): RegExpExecArray | undefined {
    const match = this.#match(pattern);
    if (match !== undefined) this.#match(BLANKS);
    return match;
  }

  /** Takes the next character if it is this one. */
  takeSymbol(symbol: string): boolean {
    if (this.next !== symbol) return false;
    this.#at += 1;
    this.#match(BLANKS);
    return true;
  }

  /** Takes the next field of a card: a name, a node, a keyword. */
  word(expected: string): string {
    return this.#take(WORD)?.[0] ?? this.refuse(expected);
  }

  /** The next field without taking it; '' where there is none. */
  peekWord(): string {
    WORD.lastIndex = this.#at;
    return WORD.exec(this.line.text)?.[0] ?? '';
  }

  /** Takes a parameter's name. */
  identifier(expected: string): string {
    return this.#take(IDENTIFIER)?.[0] ?? this.refuse(expected);
  }

  /** Whether a parameter's name comes next. */
  get isAtIdentifier(): boolean {
    return /[a-z_]/i.test(this.next);
  }

  /** Takes an unsigned number with its suffix; nothing may be glued to its end but an operator or a bracket. */
  number(expected: string): SpiceNumber {
    const start = this.#at;
    const match = this.#match(NUMBER);
    if (match === undefined) this.refuse(expected);
    if (/[\w.]/.test(this.next)) {
      this.#at = start;
      this.refuse('a number such as 4.7k, 22n or 1e-9, with nothing behind its letters');
    }
    const read = spiceNumber(match[1]!, match[2]!);
    if ('expected' in read) {
      this.#at = start;
      this.refuse(read.expected);
    }
    this.#match(BLANKS);
    return read;
  }

  /** Throws unless the line is used up. */
  end(): void {
    if (!this.isAtEnd) this.refuse('the end of the card');
  }

  /** Throws a `netlist-syntax` error that says what stands here and what should. */
  refuse(expected: string, offset: number = this.#at): never {
    throw syntaxError(this.line, offset, expected);
  }
}

/** A `netlist-syntax` error with its place: "line 3, column 7: found “x”, expected …". */
export function syntaxError(line: LogicalLine, offset: number, expected: string): NotchworkError {
  const place = line.placeOf(offset);
  const found = /^(?:[^\s{}()=,;]+|\S)/.exec(line.text.slice(offset))?.[0];
  const quoted = found === undefined ? 'the end of the line' : `“${shortened(found)}”`;
  return new NotchworkError(
    'netlist-syntax',
    `line ${place.line}, column ${place.column}: found ${quoted}, expected ${expected}.`,
    { place },
  );
}

function shortened(text: string): string {
  return text.length > LONGEST_QUOTE ? `${text.slice(0, LONGEST_QUOTE)}…` : text;
}
