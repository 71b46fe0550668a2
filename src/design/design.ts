import { SLOTS, type SlotName } from '../blocks/block.ts';
import { defaultVariant } from '../blocks/catalogue.ts';
import type { LineSettings, SlotSettings } from '../blocks/line.ts';
import { defaultSettings } from '../blocks/settings.ts';

/** Letters of voicings, in the order in which they are given out. */
export const VOICING_LETTERS = ['A', 'B', 'C', 'D', 'E', 'F', 'G', 'H'] as const;

/** Letter of a voicing; each letter has a colour and a dash of its own. */
export type VoicingLetter = (typeof VOICING_LETTERS)[number];

/** One full set of knob positions and part values. */
export interface Voicing {
  readonly letter: VoicingLetter;
  readonly name: string;
  /** Whose colour and dash its curve has; its own letter's unless the user chose another. */
  readonly colour: VoicingLetter;
  readonly line: LineSettings;
}

/** Version of the design document that this code writes. */
export const DESIGN_VERSION = 1;

/** Everything the user decides: one immutable plain value that is also the file. */
export interface Design {
  /** Says what the file is, whatever its name. */
  readonly format: 'notchwork-design';
  readonly version: typeof DESIGN_VERSION;
  readonly title: string;
  readonly author: string;
  /** Counted by the user, from 1. */
  readonly revision: number;
  readonly notes: string;
  /** One to eight, each letter at most once, in the order shown. */
  readonly voicings: readonly Voicing[];
  /** Letter of the voicing that is edited and heard. */
  readonly active: VoicingLetter;
}

/** Slots that a new design has in its line: a source, the tone network and the power stage. */
const DEFAULT_LINE: readonly SlotName[] = ['driver', 'tone', 'power'];

function defaultSlot(slot: SlotName): SlotSettings {
  const block = defaultVariant(slot);
  return {
    present: DEFAULT_LINE.includes(slot),
    variant: block.variant,
    variants: { [block.variant]: defaultSettings(block) },
  };
}

/** The line of a new design: every slot with its default block, three of them in the signal path. */
export function defaultLine(): LineSettings {
  return Object.fromEntries(SLOTS.map((slot) => [slot, defaultSlot(slot)])) as LineSettings;
}

/** A new design with one voicing. */
export function defaultDesign(): Design {
  return {
    format: 'notchwork-design',
    version: DESIGN_VERSION,
    title: 'Untitled',
    author: '',
    revision: 1,
    notes: '',
    voicings: [{ letter: 'A', name: 'Stock', colour: 'A', line: defaultLine() }],
    active: 'A',
  };
}

/** The voicing that is edited and heard. */
export function activeVoicing(design: Design): Voicing {
  return design.voicings.find((voicing) => voicing.letter === design.active) ?? design.voicings[0]!;
}
