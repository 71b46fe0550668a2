import { NotchworkError, type TextPlace } from '../../errors.ts';
import { readBraced, readExpression } from './expression.ts';
import { type LabelComment, readLabelComment } from './label-comment.ts';
import { type LogicalLine, logicalLines } from './logical-lines.ts';
import type { NetlistCard, NetlistSource, SpiceNetlist } from './netlist.ts';
import { CARD_LETTERS, readCard, readSource } from './read-card.ts';
import { type ParamDefinition, resolveParams } from './resolve-params.ts';
import { syntaxError, Tokens } from './tokenise.ts';

/** Most cards and parameters in one netlist, each. */
export const MOST_CARDS = 500;

/** Lines that ask for analyses or printing: they change nothing in a linear circuit and are read over. */
const READ_OVER = new Set(
  '.ac .dc .tran .op .noise .tf .print .plot .probe .save .option .options .width .temp .meas .measure'.split(
    ' ',
  ),
);

class NetlistReader {
  title = '';
  readonly cards: NetlistCard[] = [];
  readonly definitions: ParamDefinition[] = [];
  source: NetlistSource | undefined;
  readonly #names = new Set<string>();
  #pending: { readonly line: LogicalLine; readonly comment: LabelComment } | undefined;
  #inControl = false;

  #useName(kind: string, name: string, line: LogicalLine, offset: number): void {
    const key = `${kind} ${name.toLowerCase()}`;
    if (this.#names.has(key))
      throw syntaxError(line, offset, `another name; ${name} is taken (case does not count)`);
    this.#names.add(key);
  }

  #checkCount(count: number, what: string, place: TextPlace): void {
    if (count < MOST_CARDS) return;
    throw new NotchworkError(
      'netlist-too-large',
      `line ${place.line}: this netlist has more than ${MOST_CARDS} ${what}; that is more than can be solved exactly.`,
      { place },
    );
  }

  #takeComment(): LabelComment {
    const comment = this.#pending?.comment ?? {};
    this.#pending = undefined;
    return comment;
  }

  #refusePending(): void {
    if (this.#pending === undefined) return;
    const { line } = this.#pending;
    throw syntaxError(line, line.text.indexOf('*@'), 'a card or .param on the line directly below *@');
  }

  /** Whether a first line is the title: SPICE always says yes; here a line that could do something is used. */
  isTitle(line: LogicalLine): boolean {
    if (line.kind !== 'card' || line.text.trimStart().startsWith('.')) return line.kind === 'blank';
    try {
      return (readCard(new Tokens(line)) ?? readSource(new Tokens(line))) === undefined;
    } catch (error) {
      if (error instanceof NotchworkError) return true;
      throw error;
    }
  }

  /** Takes one line; returns false at `.end`. */
  take(line: LogicalLine): boolean {
    if (this.#inControl) {
      if (/^\s*\.endc\b/i.test(line.text)) this.#inControl = false;
      return true;
    }
    if (line.kind === 'card') return this.#takeCard(line);
    this.#refusePending();
    if (line.kind === 'label') this.#pending = { line, comment: readLabelComment(line) };
    return true;
  }

  #takeCard(line: LogicalLine): boolean {
    const tokens = new Tokens(line);
    if (tokens.next === '.') return this.#takeDot(tokens);
    const source = readSource(tokens);
    if (source !== undefined) {
      this.#refusePending();
      if (this.source !== undefined) {
        throw syntaxError(
          line,
          0,
          `one source only; ${this.source.name} in line ${this.source.place.line} is the input`,
        );
      }
      this.source = source;
      return true;
    }
    const card = readCard(tokens);
    if (card === undefined) throw syntaxError(line, tokens.offset, CARD_LETTERS);
    this.#checkCount(this.cards.length, 'cards', card.place);
    this.#useName('card', card.name, line, line.text.indexOf(card.name));
    const labelLine = this.#pending?.line;
    const { label, taper, isKnob } = this.#takeComment();
    if (labelLine !== undefined && (taper !== undefined || isKnob !== undefined)) {
      throw syntaxError(
        labelLine,
        labelLine.text.indexOf('*@'),
        'only a label here; taper, midpoint and knob belong above a .param',
      );
    }
    this.cards.push(label === undefined ? card : { ...card, label });
    return true;
  }

  #takeDot(tokens: Tokens): boolean {
    const { offset } = tokens;
    const word = tokens.word(CARD_LETTERS).toLowerCase();
    if (word === '.param' || word === '.params') {
      this.#takeParams(tokens);
      return true;
    }
    this.#refusePending();
    if (word === '.end') return false;
    if (word === '.control') this.#inControl = true;
    else if (word === '.title') this.title = tokens.line.text.slice(tokens.offset).trim();
    else if (!READ_OVER.has(word))
      tokens.refuse(`${CARD_LETTERS}; nothing else of SPICE is read here`, offset);
    return true;
  }

  #takeParams(tokens: Tokens): void {
    const labelled = this.#pending !== undefined;
    const comment = this.#takeComment();
    let count = 0;
    do {
      if (labelled && count === 1) tokens.refuse('one parameter only below *@, each on a line of its own');
      const { place, offset } = tokens;
      const name = tokens.identifier('a parameter, as in .param treble=0.5');
      this.#checkCount(this.definitions.length, 'parameters', place);
      this.#useName('param', name, tokens.line, offset);
      if (!tokens.takeSymbol('=')) tokens.refuse('“=” and a value');
      const expression = tokens.next === '{' ? readBraced(tokens) : readExpression(tokens);
      this.definitions.push({ name, place, expression, comment });
      count += 1;
      tokens.takeSymbol(',');
    } while (!tokens.isAtEnd);
  }

  finish(lastPlace: TextPlace): SpiceNetlist {
    this.#refusePending();
    const { source } = this;
    const missing =
      source === undefined
        ? 'a source, V1 in 0 AC 1'
        : this.cards.length === 0
          ? 'at least one card R, C, L, G or E'
          : undefined;
    if (source === undefined || missing !== undefined) {
      throw new NotchworkError(
        'netlist-syntax',
        `line ${lastPlace.line}, column ${lastPlace.column}: found the end of the netlist, expected ${missing}.`,
        { place: lastPlace },
      );
    }
    const params = resolveParams(this.definitions, this.cards);
    return { title: this.title, cards: this.cards, params, source };
  }
}

/**
 * Reads a netlist in the part of SPICE that this program knows: cards R, C, L, G and E, one source V
 * with `AC 1`, `.param`, expressions in braces, scale suffixes, comments (`*` at the start of a line,
 * `;` anywhere), continuation lines (`+`), `.end`. Names of parts, nodes and parameters are compared
 * without regard to case; ground is `0` or `gnd`. Analysis and print lines and `.control` blocks are
 * read over; anything else is refused, never skipped.
 *
 * The first line: SPICE takes it as the title whatever it says. Here it is the title unless it starts
 * with `*` (then its text is), with `.`, or is a complete card: so no part of a netlist without a
 * title is lost. Whoever wants the title "Ripple across 100" puts a `*` before it.
 *
 * A parameter is a knob if it is written as one number from 0 to 1 without a scale suffix, being 0 or
 * at least 1e-6 (so that `22n` or `4.7e-9` are parts' values); `*@ knob=yes` or `no` above it decides
 * otherwise. See `label-comment.ts` for labels and tapers.
 *
 * @throws NotchworkError `netlist-syntax` with a place; `netlist-too-large`; `value-out-of-range` for
 *   a parameter that cannot be calculated.
 * @example parseNetlist('Low pass\nV1 in 0 AC 1\nR1 in out 10k\nC1 out 0 22n\n.end')
 */
export function parseNetlist(text: string): SpiceNetlist {
  const lines = logicalLines(text);
  const reader = new NetlistReader();
  const [first, ...rest] = lines;
  let goesOn = true;
  if (first!.kind === 'comment') reader.title = first!.text.trim().replace(/^\*+\s*/, '');
  else if (reader.isTitle(first!)) reader.title = first!.kind === 'blank' ? '' : first!.text.trim();
  else goesOn = reader.take(first!);
  for (const line of rest) {
    if (!goesOn) break;
    goesOn = reader.take(line);
  }
  const last = lines.at(-1)!;
  return reader.finish(last.placeOf(last.text.length));
}
