import { readFile } from 'node:fs/promises';
import { basename, extname } from 'node:path';
import { SLOTS, type SlotName } from '../blocks/block.ts';
import { withKnob } from '../blocks/settings.ts';
import { type PlacedBlock, type SpanTransfer, spansOf, spanTransfer } from '../blocks/span.ts';
import { compile } from '../circuit/compile.ts';
import { instantiate } from '../circuit/spice/instantiate.ts';
import type { SpiceNetlist } from '../circuit/spice/netlist.ts';
import { parseNetlist } from '../circuit/spice/parse-netlist.ts';
import { activeVoicing, type Design } from '../design/design.ts';
import { placedLine } from '../design/placed-line.ts';
import { readDesign } from '../design/read-design.ts';
import { messageOf, NotchworkError } from '../errors.ts';
import { bilinear } from '../filter/bilinear.ts';
import { factor } from '../filter/factor.ts';
import type { DigitalSection } from '../filter/section.ts';
import type { TransferFunction } from '../transfer-function.ts';
import { type Hertz, rotation } from '../units.ts';
import { usageError } from './arguments.ts';

/** What a command works on: a file with its knobs set, as a cascade of transfer functions. */
export type Subject = {
  readonly title: string;
  /** In the order of the signal; their product is the response. */
  readonly transfers: readonly TransferFunction[];
} & (
  | {
      readonly kind: 'design';
      readonly design: Design;
      readonly placed: readonly PlacedBlock[];
      readonly spans: readonly SpanTransfer[];
    }
  | { readonly kind: 'netlist'; readonly netlist: SpiceNetlist; readonly values: Float64Array }
);

/** Reads a file as bytes; what the system says of a failure is put in plain words. */
export async function readBytes(path: string): Promise<Uint8Array> {
  try {
    return await readFile(path);
  } catch (cause) {
    throw new NotchworkError(
      'storage-failed',
      `${path}: cannot be read (${messageOf(cause)}). Check the name.`,
      { cause },
    );
  }
}

/** Adds the file's name in front of what went wrong inside it. */
function inFile<Value>(path: string, action: () => Value): Value {
  try {
    return action();
  } catch (error) {
    if (!(error instanceof NotchworkError) || error.code === 'usage') throw error;
    throw new NotchworkError(
      error.code,
      `${path}: ${error.message}`,
      error.place ? { place: error.place, cause: error } : { cause: error },
    );
  }
}

/** Sets knobs named `treble`, or `tone.treble` where two blocks have one of that name. */
function turnKnobs(
  placed: readonly PlacedBlock[],
  knobs: ReadonlyMap<string, number>,
): readonly PlacedBlock[] {
  const names = placed.flatMap(({ block }) =>
    Object.keys(block.knobs).map((knob) => ({ slot: block.slot, knob })),
  );
  let turned = placed;
  for (const [name, position] of knobs) {
    const wanted = name.toLowerCase();
    const found = names.filter(({ slot, knob }) =>
      [knob, `${slot}.${knob}`].some((entry) => entry.toLowerCase() === wanted),
    );
    const [first] = found;
    if (first === undefined || found.length > 1) {
      const list = names.map(({ slot, knob }) => `${slot}.${knob}`).join(', ') || 'none';
      throw usageError(
        `${found.length > 1 ? 'More than one knob is' : 'There is no knob'} called “${name}”; this line has ${list}.`,
      );
    }
    turned = turned.map((entry) =>
      entry.block.slot === first.slot
        ? { ...entry, settings: withKnob(entry.settings, first.knob, rotation(position)) }
        : entry,
    );
  }
  return turned;
}

/** Transfer functions from the line's input to the output of one block, or of the whole line. */
function upTo(spans: readonly SpanTransfer[], output: string | undefined): readonly TransferFunction[] {
  if (output === undefined || output === 'out') return spans.map((span) => span.transfer);
  const transfers: TransferFunction[] = [];
  for (const { span, cumulative, transfer } of spans) {
    const index = span.blocks.findIndex(({ block }) => block.slot === (output as SlotName));
    if (index >= 0) return [...transfers, cumulative[index]!];
    transfers.push(transfer);
  }
  const slots = spans.flatMap(({ span }) => span.blocks.map(({ block }) => block.slot));
  throw usageError(
    `There is no output “${output}”; a design has out and its blocks ${slots.join(', ')} (of ${SLOTS.join(', ')}).`,
  );
}

function designSubject(
  text: string,
  knobs: ReadonlyMap<string, number>,
  output: string | undefined,
): Subject {
  const design = readDesign(text);
  const placed = turnKnobs(placedLine(activeVoicing(design).line), knobs);
  const spans = spansOf(placed).map(spanTransfer);
  return { kind: 'design', title: design.title, design, placed, spans, transfers: upTo(spans, output) };
}

function netlistSubject(
  path: string,
  text: string,
  knobs: ReadonlyMap<string, number>,
  output: string | undefined,
): Subject {
  const netlist = parseNetlist(text);
  const { wiring, values } = instantiate(netlist, knobs, output ?? 'out');
  const title = netlist.title === '' ? basename(path, extname(path)) : netlist.title;
  return { kind: 'netlist', title, netlist, values, transfers: [compile(wiring).transfer(values)] };
}

/**
 * Reads a design (`.json`) or a SPICE netlist (`.cir`) and sets its knobs.
 *
 * @param output the output node of a netlist, or a block of a design; the end of either by default.
 * @throws NotchworkError naming the file and what to do; `usage` for knobs and outputs that are not there.
 */
export async function loadSubject(
  path: string,
  knobs: ReadonlyMap<string, number>,
  output?: string,
): Promise<Subject> {
  const ending = extname(path).toLowerCase();
  if (ending !== '.json' && ending !== '.cir') {
    throw usageError(`${path} ends in neither .json (a design) nor .cir (a SPICE netlist).`);
  }
  const text = new TextDecoder().decode(await readBytes(path));
  return inFile(path, () =>
    ending === '.json' ? designSubject(text, knobs, output) : netlistSubject(path, text, knobs, output),
  );
}

/** The digital sections of a subject at a sample rate, in the order of the signal. */
export function subjectSections({ transfers }: Subject, sampleRate: Hertz): readonly DigitalSection[] {
  return transfers.flatMap((transfer) => factor(transfer).map((section) => bilinear(section, sampleRate)));
}
