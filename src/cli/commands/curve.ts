import { digitalMagnitudeInto } from '../../filter/digital-response.ts';
import { responseAt } from '../../response/curve.ts';
import { gridOf, perDecadeGrid } from '../../response/grid.ts';
import { type CurveRow, curveCsv } from '../../sheet/curve-csv.ts';
import { decibels, type Hertz } from '../../units.ts';
import { type CommandArguments, readFrequencies, readKnobs } from '../arguments.ts';
import { type Command, KNOB_OPTION, OUTPUT_OPTION } from '../command.ts';
import { loadSubject, type Subject, subjectSections } from '../subject.ts';

function frequenciesOf(args: CommandArguments): Float64Array {
  const list = args.text('at');
  if (list !== undefined) return gridOf(readFrequencies('at', list)).frequencies;
  const from = args.number('from', 10, 1e-6, 1e9);
  const to = args.number('to', 40_000, 1e-6, 1e9);
  return perDecadeGrid(from, to, args.number('per-decade', 100, 1, 10_000)).frequencies;
}

function rowAt({ transfers }: Subject, frequency: Hertz): CurveRow {
  let magnitude = 0;
  let phase = 0;
  for (const transfer of transfers) {
    const { re, im } = responseAt(transfer, frequency);
    magnitude += decibels(Math.hypot(re, im));
    phase += Math.atan2(im, re);
  }
  const wrapped = phase - 2 * Math.PI * Math.ceil((phase - Math.PI) / (2 * Math.PI));
  return { frequency, magnitude, phase: (wrapped * 180) / Math.PI + 0 };
}

/** `curve`: the response against frequency as CSV on standard output. */
export const curveCommand: Command = {
  name: 'curve',
  summary: 'The response against frequency, as CSV.',
  files: ['FILE'],
  options: [
    KNOB_OPTION,
    { name: 'from', value: 'HZ', help: 'lowest frequency (default 10)' },
    { name: 'to', value: 'HZ', help: 'highest frequency (default 40000)' },
    { name: 'per-decade', value: 'N', help: 'points a decade (default 100)' },
    { name: 'at', value: 'HZ,HZ,…', help: 'these frequencies instead' },
    { name: 'sample-rate', value: 'HZ', help: 'adds the level of the digital filter at this rate' },
    OUTPUT_OPTION,
  ],
  notes: [
    'Columns: frequency_hz, magnitude_db, phase_deg (−180 to 180), and given a sample rate',
    'digital_magnitude_db (empty above half of it). Numbers keep full double precision.',
  ],
  async run(args) {
    const rate =
      args.text('sample-rate') === undefined ? undefined : args.number('sample-rate', 48_000, 1000, 1e7);
    const frequencies = frequenciesOf(args);
    const subject = await loadSubject(
      args.positionals[0]!,
      readKnobs(args.texts('knob')),
      args.text('output'),
    );
    const rows = Array.from(frequencies, (frequency) => rowAt(subject, frequency));
    if (rate === undefined) {
      process.stdout.write(curveCsv(rows, false));
      return;
    }
    const digital = new Float64Array(frequencies.length);
    digitalMagnitudeInto(digital, subjectSections(subject, rate), frequencies, rate);
    process.stdout.write(
      curveCsv(
        rows.map((row, index) => ({ ...row, digital: digital[index] })),
        true,
      ),
    );
  },
};
