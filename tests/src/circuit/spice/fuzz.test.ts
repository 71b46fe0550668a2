import { describe, expect, it } from 'vitest';
import { compile } from '../../../../src/circuit/compile.ts';
import { instantiate } from '../../../../src/circuit/spice/instantiate.ts';
import { parseNetlist } from '../../../../src/circuit/spice/parse-netlist.ts';
import { NotchworkError } from '../../../../src/errors.ts';
import { seededRandom } from '../../../../src/study/blind-trial.ts';

const SEEDS = [
  `Tone network
*@ label="Treble" taper=audio midpoint=0.15
.param treble=0.5
.param mid=0.3 pot=25k low={mid*pot}
V1 in 0 DC 0 AC 1
C1 in a 390p
R1 a out {250k*(1-treble)}
R2 out b {250k*treble}
R3 in s 47kOhm ; slope
C2 s b 33nF
R4 b c
+ 500k
C3 s c 22n
R5 c gnd {low}
.ac dec 10 10 40k
.end`,
  `* Feedback amplifier
V1 in 0 AC 1
E1 p 0 in t 60
RO p out 40
L1 out x 1m
R2 x 0 8
R3 out t 27k
R4 t 0 4.7k
G1 t 0 out 0 -1u
C1 t 0 {1/(2*3.14159*1k*1k)}
.end`,
];

const PIECES = [
  '{',
  '}',
  '(',
  ')',
  '+',
  '-',
  '*',
  '/',
  '=',
  ',',
  ';',
  '"',
  '.',
  '*@ ',
  '\n',
  '\n+ ',
  '\r',
  '\t',
  ' ',
  '0',
  '1e999',
  '1e-320',
  'meg',
  '{1/0}',
  '-5 ',
  '{1-2}',
  '-',
  'gnd',
  'in',
  'out',
  '.param ',
  'R1 ',
  'V2 x 0 AC 1',
  'label="',
  'taper=',
  '\u0000',
  '\ud800',
  '\u00b5',
  '\u2028',
  '((((((((',
  '--------',
  'E9 a 0 a 0 1\n',
  'L9 in out 0\n',
  'R9 in 0 0\n',
  '__proto__',
  'constructor',
];

/** Whole fields, so that texts come out that are well formed and still wrong. */
const FIELDS = [
  '-5',
  '0',
  '{-treble}',
  '{1/(1-1)}',
  '{1e300*1e300}',
  '1e-300',
  'gnd',
  'in',
  'out',
  'a',
  't',
  '10\n',
];

/** Changes a text in one to eight places: cuts, doubles, swaps and inserts. */
function mutate(text: string, random: () => number): string {
  const at = (length: number): number => Math.floor(random() * (length + 1));
  let result = text;
  for (let count = 1 + Math.floor(8 * random() ** 3); count > 0; count -= 1) {
    const place = at(result.length);
    const length = at(12);
    const rest = result.slice(place + length);
    const way = random();
    if (random() < 0.4) {
      const fields = result.split(/(\s+)/);
      fields[2 * at((fields.length - 1) / 2)] = FIELDS[at(FIELDS.length - 1)]!;
      result = fields.join('');
      continue;
    }
    if (way < 0.35) result = result.slice(0, place) + PIECES[at(PIECES.length - 1)]! + result.slice(place);
    else if (way < 0.55) result = result.slice(0, place) + rest;
    else if (way < 0.75) result = result.slice(0, place) + PIECES[at(PIECES.length - 1)]! + rest;
    else if (way < 0.9)
      result =
        result.slice(0, place) + result.slice(at(result.length), at(result.length)) + result.slice(place);
    else {
      const lines = result.split('\n');
      lines.splice(at(lines.length - 1), 0, lines[at(lines.length - 1)]!);
      result = lines.join('\n');
    }
  }
  return result;
}

/** Reads, sets and solves a text; what comes of it. */
function outcome(text: string): string {
  try {
    const netlist = parseNetlist(text);
    const knobs = Object.fromEntries(
      netlist.params.filter((param) => param.isKnob).map((param) => [param.name, 1]),
    );
    const { wiring, values } = instantiate(netlist, knobs);
    compile(wiring).transfer(values);
    return 'solved';
  } catch (error) {
    if (!(error instanceof NotchworkError))
      throw new Error(`not a NotchworkError for ${JSON.stringify(text)}`, { cause: error });
    return error.code;
  }
}

describe('netlists changed at random', () => {
  it('10,000 of them end in an answer or a NotchworkError, none within more than a second', () => {
    const random = seededRandom(10_000);
    const outcomes = new Map<string, number>();
    let slowest = 0;
    for (const text of SEEDS) expect(outcome(text)).toBe('solved');
    for (let index = 0; index < 10_000; index += 1) {
      const text = mutate(SEEDS[index % SEEDS.length]!, random);
      const start = performance.now();
      const result = outcome(text);
      slowest = Math.max(slowest, performance.now() - start);
      outcomes.set(result, (outcomes.get(result) ?? 0) + 1);
    }
    expect(slowest).toBeLessThan(1000);
    // The changes are such that all of these are met, or the test would see little.
    for (const code of ['solved', 'netlist-syntax', 'netlist-topology', 'value-out-of-range']) {
      expect(outcomes.get(code) ?? 0, code).toBeGreaterThan(50);
    }
  });

  it('long and hostile texts are refused at once', () => {
    const many = (text: string, count: number) => text.repeat(count);
    const texts = [
      many('(', 150_000),
      `t\nR1 a b {${many('(', 100_000)}`,
      `t\nR1 a b {${many('-', 100_000)}1}`,
      `t\nR1 a b {1${many('+1', 90_000)}}`,
      `t\n${many('+\n', 50_000)}`,
      `t\nR1 a b\n${many('+ ', 50_000)}`,
      `t\n${many('R1 ', 60_000)}`,
      `t\n${many('*@ label="', 15_000)}`,
      `t\n*@${many(' ', 150_000)}x`,
      `t\n.param a=${many('9', 150_000)}`,
      `t\n.param ${Array.from({ length: 400 }, (_, index) => `p${index}={p${index + 1}+p${index + 1}}`).join(' ')} p400=1\nV1 in 0 AC 1\nR1 in out {p0}`,
      many(';', 199_999),
      many('\n', 199_999),
    ];
    for (const text of texts) {
      const start = performance.now();
      outcome(text);
      expect(performance.now() - start, text.slice(0, 30)).toBeLessThan(1000);
    }
  });
});
