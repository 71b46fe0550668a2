import { writeFile } from 'node:fs/promises';
import { messageOf, NotchworkError } from '../../errors.ts';
import { formatValue } from '../../parts/value-text.ts';
import { responseAt } from '../../response/curve.ts';
import { readFigures } from '../../response/figures.ts';
import { DEFAULT_GRID } from '../../response/grid.ts';
import {
  buildSheet,
  type SheetContent,
  type SheetPart,
  sheetKnobs,
  sheetParts,
} from '../../sheet/build-sheet.ts';
import { plotNumber } from '../../sheet/plot-model.ts';
import { plotSvg } from '../../sheet/plot-svg.ts';
import { type Decibels, decibels, type Hertz, type UnitSymbol } from '../../units.ts';
import { readKnobs } from '../arguments.ts';
import { type Command, KNOB_OPTION } from '../command.ts';
import { loadSubject, type Subject } from '../subject.ts';

/** Preferred frequencies of ISO 266 (octaves, from memory) at which a build is checked. */
const CHECKS: readonly Hertz[] = [31.5, 63, 125, 250, 500, 1000, 2000, 4000, 8000, 16_000];

const UNITS: Readonly<Record<string, UnitSymbol>> = {
  resistor: 'Ω',
  capacitor: 'F',
  inductor: 'H',
  transconductance: 'S',
  'voltage-gain': 'ratio',
};

function levelOf({ transfers }: Subject): (frequency: Hertz) => Decibels {
  return (frequency) =>
    transfers.reduce((sum, transfer) => {
      const { re, im } = responseAt(transfer, frequency);
      return sum + decibels(Math.hypot(re, im));
    }, 0);
}

function netlistParts(subject: Extract<Subject, { kind: 'netlist' }>): readonly SheetPart[] {
  return subject.netlist.cards
    .map((card, index) => ({ card, value: subject.values[index]! }))
    .filter(({ card }) => card.kind === 'resistor' || card.kind === 'capacitor' || card.kind === 'inductor')
    .map(({ card, value }) => ({
      designator: card.name,
      what: card.label ?? `${card.kind} from ${card.nodes[0]} to ${card.nodes[1]}`,
      value: formatValue(value, UNITS[card.kind]!),
      note: '',
    }));
}

function contentOf(subject: Subject): SheetContent {
  const level = levelOf(subject);
  const { levelAt1k, midDip, liftAt100, liftAt5k } = readFigures(level);
  const text = (value: number): string => `${plotNumber(value, 'magnitude')} dB`;
  const isDesign = subject.kind === 'design';
  const reference = isDesign
    ? '0 dB is the driver’s unloaded output; a power stage counts from its own gain at 1 kHz with presence down.'
    : '0 dB is the source of the netlist.';
  return {
    title: subject.title,
    author: isDesign ? subject.design.author : '',
    revision: isDesign ? `revision ${subject.design.revision}` : '',
    date: new Date().toISOString().slice(0, 10),
    notes: isDesign ? subject.design.notes : '',
    plot: plotSvg(
      [
        {
          id: 'line',
          letter: 'A',
          label: 'as set',
          colour: 'a',
          dash: [],
          strength: 'strong',
          frequencies: DEFAULT_GRID.frequencies,
          values: DEFAULT_GRID.frequencies.map(level),
        },
      ],
      { title: subject.title, quantity: 'magnitude', reference },
    ),
    reference,
    figures: [
      { label: 'Level at 1 kHz', value: text(levelAt1k) },
      midDip === undefined
        ? { label: 'Mid dip', value: 'none' }
        : { label: 'Mid dip', value: text(midDip.level), note: `at ${Math.round(midDip.frequency)} Hz` },
      { label: '100 Hz over 1 kHz', value: text(liftAt100) },
      { label: '5 kHz over 1 kHz', value: text(liftAt5k) },
    ],
    parts: isDesign ? sheetParts(subject.placed) : netlistParts(subject),
    knobs: isDesign ? sheetKnobs(subject.placed) : [],
    checks: CHECKS.map((frequency) => ({ frequency, level: level(frequency) })),
    method: [
      'The response is computed from the circuit with its source and load, by Kirchhoff’s spanning trees, without approximation; parts are taken as ideal.',
      'Check frequencies are preferred ones of ISO 266.',
    ],
  };
}

/** `sheet`: the build sheet as one HTML file. */
export const sheetCommand: Command = {
  name: 'sheet',
  summary: 'The build sheet, as one HTML file.',
  files: ['FILE', 'OUT.html'],
  options: [KNOB_OPTION],
  notes: ['The sheet holds nothing from outside itself and can be printed on A4 or Letter.'],
  async run(args) {
    const [file, output] = args.positionals as [string, string];
    const subject = await loadSubject(file, readKnobs(args.texts('knob')));
    try {
      await writeFile(output, buildSheet(contentOf(subject)));
    } catch (cause) {
      if (cause instanceof NotchworkError) throw cause;
      throw new NotchworkError(
        'storage-failed',
        `${output}: cannot be written (${messageOf(cause)}). Choose another place.`,
        { cause },
      );
    }
  },
};
