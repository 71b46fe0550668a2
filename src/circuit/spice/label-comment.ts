import type { Taper } from '../../parts/taper.ts';
import type { LogicalLine } from './logical-lines.ts';
import { syntaxError } from './tokenise.ts';

/**
 * What a comment of our own form says about the card or `.param` on the line below it. To a SPICE
 * program it is a comment like any other:
 *
 *     *@ label="Treble" taper=audio midpoint=0.15
 *     .param treble=0.5
 *
 * `label="…"` names a part or a knob as people say it. For a `.param` alone: `taper=` linear, audio
 * or reverse-audio; `midpoint=` the share of the track at half rotation (0.15 unless given);
 * `knob=` yes or no, where the rule of `parse-netlist.ts` would decide otherwise.
 */
export interface LabelComment {
  readonly label?: string;
  readonly taper?: Taper;
  readonly isKnob?: boolean;
}

const ENTRY = /\s*([a-z]+)\s*=\s*(?:"([^"]*)"|([^\s"]+))(?=\s|$)/iy;
const LAWS = ['linear', 'audio', 'reverse-audio'] as const;
const USUAL_MIDPOINT = 0.15;
const LONGEST_LABEL = 80;

interface Entry {
  readonly value: string;
  readonly offset: number;
}

function readEntries(line: LogicalLine): ReadonlyMap<string, Entry> {
  const entries = new Map<string, Entry>();
  let at = line.text.indexOf('*@') + 2;
  while (line.text.slice(at).trim() !== '') {
    ENTRY.lastIndex = at;
    const match = ENTRY.exec(line.text);
    const start = at + /^\s*/.exec(line.text.slice(at))![0].length;
    if (match === null) throw syntaxError(line, start, 'key=value or key="some words" behind *@');
    const key = match[1]!.toLowerCase();
    if (!['label', 'taper', 'midpoint', 'knob'].includes(key)) {
      throw syntaxError(line, start, 'label, taper, midpoint or knob behind *@');
    }
    if (entries.has(key)) throw syntaxError(line, start, `${key} only once`);
    const value = match[2] ?? match[3]!;
    at += match[0].length;
    entries.set(key, { value, offset: start });
  }
  return entries;
}

function readTaper(line: LogicalLine, entries: ReadonlyMap<string, Entry>): Taper | undefined {
  const law = entries.get('taper');
  const midpoint = entries.get('midpoint');
  if (law === undefined) {
    if (midpoint !== undefined)
      throw syntaxError(line, midpoint.offset, 'taper=audio or taper=reverse-audio beside midpoint');
    return undefined;
  }
  const known = LAWS.find((name) => name === law.value.toLowerCase());
  if (known === undefined) throw syntaxError(line, law.offset, `taper=${LAWS.join(', taper=')}`);
  const share = midpoint === undefined ? USUAL_MIDPOINT : Number(midpoint.value);
  if (!(share > 0 && share < 1))
    throw syntaxError(line, midpoint!.offset, 'a midpoint between 0 and 1, such as 0.15');
  return { law: known, midpoint: known === 'linear' ? 0.5 : share };
}

/**
 * Reads a comment of the form above.
 *
 * @throws NotchworkError `netlist-syntax` for an unknown key, a key used twice or a value out of place.
 */
export function readLabelComment(line: LogicalLine): LabelComment {
  const entries = readEntries(line);
  const label = entries.get('label');
  if (label !== undefined && (label.value.trim() === '' || label.value.length > LONGEST_LABEL)) {
    throw syntaxError(line, label.offset, `a label of 1 to ${LONGEST_LABEL} characters`);
  }
  const knob = entries.get('knob');
  if (knob !== undefined && !/^(yes|no)$/i.test(knob.value))
    throw syntaxError(line, knob.offset, 'knob=yes or knob=no');
  const taper = readTaper(line, entries);
  return {
    ...(label === undefined ? {} : { label: label.value.trim() }),
    ...(taper === undefined ? {} : { taper }),
    ...(knob === undefined ? {} : { isKnob: knob.value.toLowerCase() === 'yes' }),
  };
}

/** The comment line for {@link readLabelComment}; double quotes in a label become single ones. */
export function writeLabelComment({ label, taper, isKnob }: LabelComment): string | undefined {
  const entries: string[] = [];
  if (label !== undefined) {
    const tidy = label.replace(/"/g, "'").replace(/\s+/g, ' ').trim().slice(0, LONGEST_LABEL).trim();
    if (tidy !== '') entries.push(`label="${tidy}"`);
  }
  if (taper !== undefined) {
    entries.push(`taper=${taper.law}`);
    if (taper.law !== 'linear') entries.push(`midpoint=${taper.midpoint}`);
  }
  if (isKnob !== undefined) entries.push(`knob=${isKnob ? 'yes' : 'no'}`);
  return entries.length === 0 ? undefined : `*@ ${entries.join(' ')}`;
}
