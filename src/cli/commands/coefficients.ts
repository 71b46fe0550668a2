import { readKnobs } from '../arguments.ts';
import { type Command, KNOB_OPTION, OUTPUT_OPTION } from '../command.ts';
import { loadSubject, subjectSections } from '../subject.ts';

/** Product of two polynomials, ascending powers. */
function product(a: readonly number[], b: readonly number[]): number[] {
  const out = new Array<number>(a.length + b.length - 1).fill(0);
  a.forEach((x, i) => {
    b.forEach((y, j) => {
      out[i + j] = out[i + j]! + x * y;
    });
  });
  return out;
}

/** `coefficients`: the transfer function, and the digital sections, as JSON on standard output. */
export const coefficientsCommand: Command = {
  name: 'coefficients',
  summary: 'The transfer function and its digital sections, as JSON.',
  files: ['FILE'],
  options: [
    KNOB_OPTION,
    { name: 'sample-rate', value: 'HZ', help: 'adds the digital sections at this rate' },
    OUTPUT_OPTION,
  ],
  notes: [
    'numerator and denominator are in ascending powers of s (rad/s); sections are in the order of the',
    'signal, feedforward and feedback in ascending powers of z⁻¹, feedback beginning with 1.',
  ],
  async run(args) {
    const rate =
      args.text('sample-rate') === undefined ? undefined : args.number('sample-rate', 48_000, 1000, 1e7);
    const subject = await loadSubject(
      args.positionals[0]!,
      readKnobs(args.texts('knob')),
      args.text('output'),
    );
    const answer = {
      numerator: subject.transfers.map((transfer) => transfer.numerator).reduce(product, [1]),
      denominator: subject.transfers.map((transfer) => transfer.denominator).reduce(product, [1]),
      ...(rate === undefined ? {} : { sections: subjectSections(subject, rate) }),
    };
    process.stdout.write(`${JSON.stringify(answer, undefined, 2)}\n`);
  },
};
