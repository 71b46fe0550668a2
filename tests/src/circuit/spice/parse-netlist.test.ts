import { describe, expect, it } from 'vitest';
import { parseNetlist } from '../../../../src/circuit/spice/parse-netlist.ts';

const SOURCE = 'V1 in 0 AC 1';
const of = (...lines: string[]) => parseNetlist(['title', SOURCE, ...lines].join('\n'));

describe('parseNetlist', () => {
  it('reads every kind of card', () => {
    const netlist = of(
      'R1 in a 10k',
      'c2 a 0 22n',
      'L3 a out 1H',
      'Gm out GND a 0 1.6m',
      'E5 x 0 in a {2*3} ; behind it a comment',
      'R6 x out',
      '+ 47k',
    );
    expect(netlist.cards.map(({ kind, name, nodes, control }) => [kind, name, nodes, control])).toEqual([
      ['resistor', 'R1', ['in', 'a'], undefined],
      ['capacitor', 'c2', ['a', '0'], undefined],
      ['inductor', 'L3', ['a', 'out'], undefined],
      ['transconductance', 'Gm', ['out', '0'], ['a', '0']],
      ['voltage-gain', 'E5', ['x', '0'], ['in', 'a']],
      ['resistor', 'R6', ['x', 'out'], undefined],
    ]);
    expect(netlist.cards[2]!.place).toEqual({ line: 5, column: 1 });
    expect(netlist.source).toEqual({ name: 'V1', nodes: ['in', '0'], place: { line: 2, column: 1 } });
  });

  it('compares nodes without regard to case and takes odd names', () => {
    const { cards } = of('R1 IN n-1 1k', 'R2 N-1 tone.out 1k', 'R3 Tone.Out Gnd 1k', 'R4 12 0 1');
    expect(cards.map((card) => card.nodes)).toEqual([
      ['in', 'n-1'],
      ['n-1', 'tone.out'],
      ['tone.out', '0'],
      ['12', '0'],
    ]);
  });

  it.each<[string, string]>([
    ['Low pass', 'Low pass'],
    ['* Low pass', 'Low pass'],
    ['R1 in out', 'R1 in out'],
    ['Ripple check', 'Ripple check'],
    ['', ''],
    ['.param k=1', ''],
    ['R9 in 0 5', ''],
    ['; nothing', ''],
  ])('takes the first line %j for the title %j', (first, title) => {
    const netlist = parseNetlist(`${first}\n${SOURCE}\nR1 in out 1k\nR2 out 0 1k\n`);
    expect(netlist.title).toBe(title);
    expect(netlist.cards.length).toBe(first === 'R9 in 0 5' ? 3 : 2);
    expect(netlist.params.length).toBe(first.startsWith('.param') ? 1 : 0);
  });

  it('takes the source itself as a first line', () => {
    expect(parseNetlist(`${SOURCE}\nR1 in out 1k\nR2 out 0 1`)).toMatchObject({
      title: '',
      source: { name: 'V1' },
    });
  });

  it.each([
    'V1 in 0 AC 1',
    'vin in gnd ac',
    'V1 in 0 DC 0 AC 1',
    'V1 in 0 5 AC 1 0',
    'V1 in 0 AC 1 DC 2',
    'V1 in 0 AC {1}',
  ])('takes the source %s', (source) => {
    expect(parseNetlist(`t\n${source}\nR1 in out 1k`).source.nodes).toEqual(['in', '0']);
  });

  it('reads parameters in any order, several in a line, with and without braces', () => {
    const { params } = of(
      '.param top={total*(1-t)}, total=250k t=0.3',
      '.PARAM Half = total/2',
      'R1 in out {top}',
    );
    expect(params.map(({ name, value, isKnob }) => [name, value, isKnob])).toEqual([
      ['top', 175000, false],
      ['total', 250000, false],
      ['t', 0.3, true],
      ['Half', 125000, false],
    ]);
  });

  it.each<[string, boolean]>([
    ['0', true],
    ['1', true],
    ['0.5', true],
    ['{0.5}', true],
    ['1e-3', true],
    ['1.01', false],
    ['22n', false],
    ['500m', false],
    ['4.7e-10', false],
    ['1-0.5', false],
    ['-0.5', false],
  ])('decides whether %s is a knob: %s', (text, isKnob) => {
    expect(of(`.param k=${text}`, 'R1 in out 1k').params[0]!.isKnob).toBe(isKnob);
  });

  it('reads labels and tapers from the comment directly above', () => {
    const { params, cards } = of(
      '*@ label="Treble" taper=audio midpoint=0.1',
      '.param treble=0.5',
      '*@ knob=no',
      '.param ratio=0.5',
      '*@ label="Slope resistor"',
      'R1 in out 47k',
    );
    expect(params[0]).toMatchObject({
      label: 'Treble',
      taper: { law: 'audio', midpoint: 0.1 },
      isKnob: true,
    });
    expect(params[1]).toMatchObject({ isKnob: false });
    expect(cards[0]!.label).toBe('Slope resistor');
  });

  it('reads over analyses and control blocks, and stops at .end', () => {
    const netlist = of(
      '.ac dec 10 10 40k',
      '.control',
      'run',
      '*@ this is no label',
      'quit',
      '.endc',
      'R1 in out 1k',
      '.END',
      'Q1 a b c model',
    );
    expect(netlist.cards.length).toBe(1);
    expect(of('.title Another name', 'R1 in out 1').title).toBe('Another name');
  });
});
