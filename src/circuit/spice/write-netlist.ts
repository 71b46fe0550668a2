import { NotchworkError } from '../../errors.ts';
import type { Taper } from '../../parts/taper.ts';
import { type ElementKind, GROUND, type NodeName, type NodePair } from '../wiring.ts';
import { writeLabelComment } from './label-comment.ts';
import { plainText } from './plain-text.ts';

/** SPICE takes no resistor of 0 Ω; this one is as good as none, in ohms. */
export const LEAST_RESISTANCE = 1e-6;

/** An element to be written. */
export interface WrittenElement {
  readonly kind: ElementKind;
  /** Any text; characters that SPICE does not take are replaced, and the kind's letter put before it. */
  readonly name: string;
  readonly nodes: NodePair;
  readonly control?: NodePair;
  /** A number, or an expression over the parameters (without braces). */
  readonly value: number | string;
  /** Written as a comment above the card. */
  readonly label?: string;
}

/** A parameter to be written; a knob's value is the share of the track, its taper already applied. */
export interface WrittenParam {
  /** A letter or `_`, then letters, digits and `_`. */
  readonly name: string;
  readonly value: number;
  readonly label?: string;
  readonly taper?: Taper;
}

/** Everything a netlist file holds. */
export interface WrittenNetlist {
  readonly title: string;
  readonly elements: readonly WrittenElement[];
  readonly params?: readonly WrittenParam[];
  /** Terminals of the AC source of 1 V. */
  readonly source: NodePair;
  /** The node that becomes `out`. */
  readonly output: NodeName;
  /** Lines of remarks under the title. */
  readonly comments?: readonly string[];
}

const LETTERS: Readonly<Record<ElementKind, string>> = {
  resistor: 'R',
  capacitor: 'C',
  inductor: 'L',
  transconductance: 'G',
  'voltage-gain': 'E',
};

/** Gives every text a name that SPICE takes and that differs from all others by more than case. */
class Namer {
  readonly #used = new Set<string>();
  readonly #given = new Map<string, string>();

  reserve(key: string, name: string): void {
    this.#given.set(key, name);
    this.#used.add(name.toLowerCase());
  }

  name(key: string, wish: string): string {
    const known = this.#given.get(key);
    if (known !== undefined) return known;
    const base = wish.replace(/[^A-Za-z0-9_]+/g, '_') || 'n';
    let name = base;
    for (let number = 2; this.#used.has(name.toLowerCase()); number += 1) name = `${base}_${number}`;
    this.reserve(key, name);
    return name;
  }
}

/** The shortest digits that give the same double again: up to 17 of them. */
function numberText(owner: string, value: number): string {
  if (Number.isFinite(value)) return String(value + 0);
  throw new NotchworkError(
    'value-out-of-range',
    `${owner} is ${value}; a netlist takes finite numbers only.`,
  );
}

interface ValueText {
  readonly text: string;
  /** Whether a resistance was raised to {@link LEAST_RESISTANCE}. */
  readonly raised: boolean;
}

function valueText({ kind, name, value }: WrittenElement): ValueText {
  const isResistor = kind === 'resistor';
  if (typeof value === 'string') {
    return isResistor
      ? { text: `{${LEAST_RESISTANCE}+${value}}`, raised: true }
      : { text: `{${value}}`, raised: false };
  }
  const raised = isResistor && value < LEAST_RESISTANCE;
  return { text: numberText(name, raised ? LEAST_RESISTANCE : value), raised };
}

function nodeNamer({ source, output }: WrittenNetlist): (node: NodeName) => string {
  const namer = new Namer();
  namer.reserve(GROUND, GROUND);
  namer.reserve('gnd', GROUND);
  namer.reserve(output, 'out');
  return (node) => namer.name(node, node === source[0] ? 'in' : node);
}

function cardLines(
  netlist: WrittenNetlist,
  nodeOf: (node: NodeName) => string,
): { lines: string[]; anyRaised: boolean } {
  const namer = new Namer();
  let anyRaised = false;
  const lines = netlist.elements.flatMap((element, index) => {
    const letter = LETTERS[element.kind];
    const wish = element.name.toUpperCase().startsWith(letter) ? element.name : `${letter}${element.name}`;
    const { text, raised } = valueText(element);
    anyRaised ||= raised;
    const nodes = [...element.nodes, ...(element.control ?? [])].map(nodeOf);
    const comment = writeLabelComment(element.label === undefined ? {} : { label: plainText(element.label) });
    const card = [namer.name(String(index), wish), ...nodes, text].join(' ');
    return comment === undefined ? [card] : [comment, card];
  });
  return { lines, anyRaised };
}

function paramLines(params: readonly WrittenParam[]): string[] {
  return params.flatMap(({ name, value, label, taper }) => {
    if (!/^[a-z_]\w*$/i.test(name)) {
      throw new NotchworkError(
        'value-out-of-range',
        `“${name}” cannot name a parameter; use letters, digits and _.`,
      );
    }
    const comment = writeLabelComment({
      ...(label !== undefined && { label: plainText(label) }),
      ...(taper !== undefined && { taper }),
    });
    const line = `.param ${name}=${numberText(name, value)}`;
    return comment === undefined ? [line] : [comment, line];
  });
}

/**
 * A netlist as text that an unmodified SPICE program runs, and that `parseNetlist` reads back:
 * values with all their digits, the output node named `out`, the source's `in`, an AC analysis from
 * 10 Hz to 40 kHz. All text is plain ASCII (see `plain-text.ts`). A resistor below {@link LEAST_RESISTANCE} is written as that, and one given as an
 * expression has it added; the file then says so.
 *
 * @throws NotchworkError `value-out-of-range` for a value that is not finite or a parameter's name
 *   that SPICE would not take.
 */
export function writeNetlist(netlist: WrittenNetlist): string {
  const nodeOf = nodeNamer(netlist);
  const source = `V1 ${netlist.source.map(nodeOf).join(' ')} DC 0 AC 1`;
  const cards = cardLines(netlist, nodeOf);
  const remarks = (netlist.comments ?? []).flatMap((comment) => comment.split(/\r\n|\r|\n/));
  if (cards.anyRaised) {
    remarks.push(
      `SPICE takes no resistor of 0 ohms: where one could be 0, ${LEAST_RESISTANCE} ohms stand in.`,
    );
  }
  return [
    `* ${plainText(netlist.title) || 'Circuit'}`,
    ...remarks.map((remark) => `* ${plainText(remark)}`),
    ...paramLines(netlist.params ?? []),
    source,
    ...cards.lines,
    '.ac dec 100 10 40k',
    '.print ac vdb(out) vp(out)',
    '.end',
    '',
  ].join('\n');
}
