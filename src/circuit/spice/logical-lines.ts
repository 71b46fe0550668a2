import { NotchworkError, type TextPlace } from '../../errors.ts';

/** Longest netlist read, in characters; a large hand-written one has a few thousand. */
export const MOST_CHARACTERS = 200_000;

/** What a line is for. `label` is a comment of our own form, `*@ …` (see `label-comment.ts`). */
export type LineKind = 'card' | 'comment' | 'label' | 'blank';

/** One physical line, or a card together with its continuation lines; comments behind `;` are gone. */
export interface LogicalLine {
  readonly kind: LineKind;
  /** Text of the line; continuation lines follow after one blank each, without their `+`. */
  readonly text: string;
  /** Where in the netlist the character at `offset` of {@link text} stands. */
  placeOf(offset: number): TextPlace;
}

interface Segment {
  readonly start: number;
  readonly line: number;
  readonly column: number;
}

function kindOf(line: string): LineKind | 'continuation' {
  const text = line.trimStart();
  if (text === '' || text.startsWith(';')) return 'blank';
  if (text.startsWith('*@')) return 'label';
  if (text.startsWith('*')) return 'comment';
  return text.startsWith('+') ? 'continuation' : 'card';
}

class Line implements LogicalLine {
  readonly kind: LineKind;
  text: string;
  readonly #segments: Segment[];

  constructor(kind: LineKind, text: string, line: number) {
    this.kind = kind;
    this.text = text;
    this.#segments = [{ start: 0, line, column: 1 }];
  }

  append(text: string, line: number, column: number): void {
    this.#segments.push({ start: this.text.length + 1, line, column });
    this.text = `${this.text} ${text}`;
  }

  placeOf(offset: number): TextPlace {
    const segment = this.#segments.findLast((entry) => entry.start <= offset)!;
    return { line: segment.line, column: segment.column + offset - segment.start };
  }
}

function assertContinues(open: Line | undefined, place: TextPlace): asserts open is Line {
  if (open !== undefined) return;
  throw new NotchworkError(
    'netlist-syntax',
    `line ${place.line}, column ${place.column}: found “+”, expected a card; there is none above that it could continue.`,
    { place },
  );
}

/**
 * Splits a netlist into lines, joins what `+` continues (comments and blank lines may stand between,
 * as SPICE allows), and cuts off comments behind `;`. A byte order mark at the start is dropped.
 *
 * @returns the lines, empty ones and comments too, in their order; the first one is always the first physical line.
 * @throws NotchworkError `netlist-too-large` beyond {@link MOST_CHARACTERS}, `netlist-syntax` for a
 *   continuation of nothing.
 */
export function logicalLines(text: string): readonly LogicalLine[] {
  if (text.length > MOST_CHARACTERS) {
    throw new NotchworkError(
      'netlist-too-large',
      `This netlist has ${text.length} characters; at most ${MOST_CHARACTERS} are read. Leave out what is not part of the circuit.`,
    );
  }
  const lines: Line[] = [];
  let open: Line | undefined;
  text
    .replace(/^\uFEFF/, '')
    .split(/\r\n|\r|\n/)
    .forEach((physical, index) => {
      const kind = kindOf(physical);
      const withoutComment = physical.replace(/;.*$/s, '');
      if (kind === 'continuation') {
        const column = physical.indexOf('+') + 1;
        assertContinues(open, { line: index + 1, column });
        open.append(withoutComment.slice(column), index + 1, column + 1);
        return;
      }
      const line = new Line(kind, kind === 'card' ? withoutComment : physical, index + 1);
      if (kind === 'card') open = line;
      lines.push(line);
    });
  return lines;
}
