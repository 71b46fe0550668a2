import { compile } from '../circuit/compile.ts';
import type { Network } from '../circuit/network.ts';
import type { Element, NodeName, NodePair } from '../circuit/wiring.ts';
import { GROUND } from '../circuit/wiring.ts';
import { magnitudeAt, type TransferFunction } from '../transfer-function.ts';
import { type Rotation, radiansPerSecond } from '../units.ts';
import type { Block, BlockElement, BlockSettings, BlockValues, Neighbours } from './block.ts';
import { valuesOf } from './settings.ts';

/** A block with the settings it has in one line. */
export interface PlacedBlock {
  readonly block: Block;
  readonly settings: BlockSettings;
}

/** An element of the joined netlist, with the block that its value is read from. */
export interface SpanElement {
  readonly element: Element;
  readonly source: BlockElement;
  /** Index into the span's blocks. */
  readonly owner: number;
}

/** The first `length` blocks of a span as one compiled circuit, nothing attached behind them. */
export interface SpanCircuit {
  readonly elements: readonly SpanElement[];
  readonly network: Network;
}

/**
 * A span is a run of blocks from one grid (or the source) to the next grid: inside it everything
 * loads everything, between spans nothing does, so spans cascade exactly.
 */
export interface Span {
  /** Same for the same blocks and wiring, whatever the values. */
  readonly key: string;
  readonly blocks: readonly PlacedBlock[];
  /** `circuits[k]` holds the blocks 0 … k; the last one is the whole span. */
  readonly circuits: readonly SpanCircuit[];
}

const choiceText = new WeakMap<object, string>();

function textOfChoices(choices: BlockSettings['choices']): string {
  let text = choiceText.get(choices);
  if (text === undefined) {
    text = JSON.stringify(choices);
    choiceText.set(choices, text);
  }
  return text;
}

/** Cuts the blocks present in a line at every grid. */
function runsOf(placed: readonly PlacedBlock[]): PlacedBlock[][] {
  const runs: PlacedBlock[][] = [];
  for (const entry of placed) {
    const current = runs.at(-1);
    if (current === undefined || entry.block.input === 'grid') runs.push([entry]);
    else current.push(entry);
  }
  return runs;
}

function joinedNode(run: readonly PlacedBlock[], index: number, node: NodeName): NodeName {
  if (node === GROUND) return GROUND;
  if (node === 'in') return index === 0 ? 'in' : `${run[index - 1]!.block.slot}.out`;
  return `${run[index]!.block.slot}.${node}`;
}

/** Joins the first `count` blocks of a run into one netlist, node and element names made unique by slot. */
function joinElements(run: readonly PlacedBlock[], count: number, around: Neighbours): SpanElement[] {
  return run.slice(0, count).flatMap(({ block, settings }, owner) => {
    const neighbours: Neighbours = {
      before: owner === 0 ? around.before : run[owner - 1]!.block,
      after: owner === count - 1 ? (count === run.length ? around.after : undefined) : run[owner + 1]!.block,
    };
    const place = (pair: NodePair): NodePair => [
      joinedNode(run, owner, pair[0]),
      joinedNode(run, owner, pair[1]),
    ];
    return block.elements(settings, neighbours).map((source): SpanElement => {
      const name = `${block.slot}.${source.name}`;
      const element: Element =
        source.kind === 'transconductance' || source.kind === 'voltage-gain'
          ? { kind: source.kind, name, nodes: place(source.nodes), control: place(source.control!) }
          : { kind: source.kind, name, nodes: place(source.nodes) };
      return { element, source, owner };
    });
  });
}

function compileSpan(run: readonly PlacedBlock[], around: Neighbours): readonly SpanCircuit[] {
  return run.map((_, index) => {
    const elements = joinElements(run, index + 1, around);
    const output: NodePair = [`${run[index]!.block.slot}.out`, GROUND];
    const network = compile({
      elements: elements.map((entry) => entry.element),
      source: ['in', GROUND],
      outputs: [output],
    });
    return { elements, network };
  });
}

/** Compiled circuits by wiring; a session sees a few dozen wirings, so nothing is ever dropped. */
const compiled = new Map<string, readonly SpanCircuit[]>();

function spanKey(run: readonly PlacedBlock[], around: Neighbours): string {
  const side = (block: Block | undefined): string => (block ? `${block.slot}/${block.variant}` : '-');
  const own = run.map(
    ({ block, settings }) =>
      `${block.slot}/${block.variant}${textOfChoices(settings.choices)}${settings.netlist ?? ''}`,
  );
  return [side(around.before), ...own, side(around.after)].join('|');
}

function makeSpan(run: readonly PlacedBlock[], around: Neighbours): Span {
  const key = spanKey(run, around);
  let circuits = compiled.get(key);
  if (circuits === undefined) {
    circuits = compileSpan(run, around);
    compiled.set(key, circuits);
  }
  return { key, blocks: run, circuits };
}

/**
 * Spans of a row of blocks, in the order of the signal.
 *
 * @param placed the blocks present, in the order of their slots.
 * @throws NotchworkError from the compiler when a netlist (the user's own) cannot be compiled.
 */
export function spansOf(placed: readonly PlacedBlock[]): readonly Span[] {
  const runs = runsOf(placed);
  return runs.map((run, index) =>
    makeSpan(run, { before: runs[index - 1]?.at(-1)?.block, after: runs[index + 1]?.[0]?.block }),
  );
}

function elementValue(
  source: BlockElement['value'],
  values: BlockValues,
  parts: BlockSettings['parts'],
  block: Block,
): number {
  if ('part' in source) return values.part(source.part);
  if ('knob' in source) {
    const total = parts[block.knobs[source.knob]!.part]!;
    const ratio = values.ratio(source.knob);
    return total * (source.side === 'lower' ? ratio : 1 - ratio);
  }
  return source.compute(values);
}

/** Values of a circuit's elements for given settings, one `BlockSettings` for each block of the span. */
export function elementValues(
  circuit: SpanCircuit,
  blocks: readonly PlacedBlock[],
  settings: readonly BlockSettings[] = blocks.map((entry) => entry.settings),
): Float64Array {
  const readers = settings.map(valuesOf);
  return Float64Array.from(circuit.elements, ({ source, owner }) =>
    elementValue(source.value, readers[owner]!, settings[owner]!.parts, blocks[owner]!.block),
  );
}

function transferAt(span: Span, index: number, settings?: readonly BlockSettings[]): TransferFunction {
  const circuit = span.circuits[index]!;
  return circuit.network.transfer(elementValues(circuit, span.blocks, settings));
}

function referenceOf(span: Span, index: number, reference: Readonly<Record<string, Rotation>>): number {
  const omega = radiansPerSecond(1000);
  const settings = span.blocks.map((entry, position) =>
    position === index
      ? { ...entry.settings, knobs: { ...entry.settings.knobs, ...reference } }
      : entry.settings,
  );
  const before = index === 0 ? 1 : magnitudeAt(transferAt(span, index - 1, settings), omega);
  const own = magnitudeAt(transferAt(span, index, settings), omega) / before;
  return own > 0 ? own : 1; // a block that passes nothing stays silent
}

/** What a span does, for its present values. */
export interface SpanTransfer {
  readonly span: Span;
  /**
   * `cumulative[k]` is from the span's input to the output of block k with nothing attached behind
   * it, divided by the reference gains so far; a block's own share is `cumulative[k]/cumulative[k−1]`.
   */
  readonly cumulative: readonly TransferFunction[];
  /** The whole span, its last cumulative function. */
  readonly transfer: TransferFunction;
  /** Product of the reference gains taken out, in V/V; 1 where no block asks for one. */
  readonly reference: number;
}

function scaled(transfer: TransferFunction, gain: number): TransferFunction {
  return gain === 1 ? transfer : { ...transfer, numerator: transfer.numerator.map((value) => value * gain) };
}

/**
 * Exact transfer functions of a span at its present values.
 *
 * @throws NotchworkError `circuit-unsolvable` where the values leave the circuit without an answer.
 */
export function spanTransfer(span: Span): SpanTransfer {
  let reference = 1;
  const cumulative = span.blocks.map(({ block }, index) => {
    if (block.referenceKnobs !== undefined) reference *= referenceOf(span, index, block.referenceKnobs);
    return scaled(transferAt(span, index), 1 / reference);
  });
  return { span, cumulative, transfer: cumulative.at(-1)!, reference };
}
