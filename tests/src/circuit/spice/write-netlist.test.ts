import * as fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { compile } from '../../../../src/circuit/compile.ts';
import { instantiate } from '../../../../src/circuit/spice/instantiate.ts';
import { parseNetlist } from '../../../../src/circuit/spice/parse-netlist.ts';
import {
  LEAST_RESISTANCE,
  type WrittenElement,
  writeNetlist,
} from '../../../../src/circuit/spice/write-netlist.ts';
import { seededRandom } from '../../../../src/study/blind-trial.ts';
import { runAc } from '../../../reference/netlist-run.ts';
import { randomCircuit } from '../random-wiring.ts';

const resistor = (name: string, a: string, b: string, value: number | string): WrittenElement => ({
  kind: 'resistor',
  name,
  nodes: [a, b],
  value,
});

describe('writeNetlist', () => {
  it('writes a file that reads as it should', () => {
    const text = writeNetlist({
      title: 'Volume control',
      comments: ['Made for a test.\nSecond line.'],
      params: [{ name: 'volume', value: 0.15, label: 'Volume', taper: { law: 'audio', midpoint: 0.15 } }],
      elements: [
        { ...resistor('volume.upper', 'in', 'wiper', '1e6*(1-volume)'), label: 'Upper half' },
        resistor('volume.lower', 'wiper', '0', '1e6*volume'),
        { kind: 'capacitor', name: 'Cstray', nodes: ['wiper', '0'], value: 22e-12 },
      ],
      source: ['in', '0'],
      output: 'wiper',
    });
    expect(text.split('\n')).toEqual([
      '* Volume control',
      '* Made for a test.',
      '* Second line.',
      '* SPICE takes no resistor of 0 ohms: where one could be 0, 0.000001 ohms stand in.',
      '*@ label="Volume" taper=audio midpoint=0.15',
      '.param volume=0.15',
      'V1 in 0 DC 0 AC 1',
      '*@ label="Upper half"',
      'Rvolume_upper in out {0.000001+1e6*(1-volume)}',
      'Rvolume_lower out 0 {0.000001+1e6*volume}',
      'Cstray out 0 2.2e-11',
      '.ac dec 100 10 40k',
      '.print ac vdb(out) vp(out)',
      '.end',
      '',
    ]);
  });

  it('raises a resistor of 0 Ω, says so, and leaves other zeros', () => {
    const of = (value: number) =>
      writeNetlist({
        title: '',
        elements: [
          resistor('R1', 'in', 'out', value),
          { kind: 'capacitor', name: 'C1', nodes: ['out', '0'], value: 0 },
        ],
        source: ['in', '0'],
        output: 'out',
      });
    expect(of(0)).toContain(`R1 in out ${LEAST_RESISTANCE}`);
    expect(of(0)).toMatch(/takes no resistor of 0/);
    expect(of(5)).not.toMatch(/takes no resistor/);
    expect(of(5)).toContain('C1 out 0 0\n');
  });

  it('keeps names apart that SPICE would take for one', () => {
    const text = writeNetlist({
      title: 'x',
      elements: [
        resistor('a.b', 'tone.in', 'tone-in', 1),
        resistor('A_B', 'tone-in', 'out', 2),
        resistor('RA_b', 'OUT', 'end', 3),
        resistor('Ω', 'end', '0', 4),
      ],
      source: ['tone.in', '0'],
      output: 'end',
    });
    const { cards } = parseNetlist(text);
    expect(cards.map((card) => card.name)).toEqual(['Ra_b', 'RA_B_2', 'RA_b_3', 'R_']);
    expect(cards.map((card) => card.nodes)).toEqual([
      ['in', 'tone_in'],
      ['tone_in', 'out_2'],
      ['out_3', 'out'],
      ['out', '0'],
    ]);
  });

  it('lets no title, remark or label break out of its line', () => {
    const text = writeNetlist({
      title: 'one\nR9 in 0 1',
      comments: ['x\rR8 in 0 1'],
      elements: [{ ...resistor('R1', 'in', 'out', 1), label: '"\nR7 in 0 1' }],
      source: ['in', '0'],
      output: 'out',
    });
    expect(parseNetlist(text).cards.map((card) => card.name)).toEqual(['R1']);
  });

  it('refuses values and names that no netlist takes', () => {
    const of = (value: number, name: string) => () =>
      writeNetlist({
        title: '',
        elements: [resistor('R1', 'in', 'out', value)],
        params: [{ name, value: 1 }],
        source: ['in', '0'],
        output: 'out',
      });
    expect(of(1, 'ok')).not.toThrow();
    expect(of(Number.NaN, 'ok')).toThrow(expect.objectContaining({ code: 'value-out-of-range' }));
    expect(of(1, 'not ok')).toThrow(expect.objectContaining({ code: 'value-out-of-range' }));
  });

  it('gives back every bit of every value', () => {
    fc.assert(
      fc.property(fc.double({ min: LEAST_RESISTANCE, max: 1e15, noNaN: true }), (value) => {
        const text = writeNetlist({
          title: 't',
          elements: [resistor('R', 'in', 'out', value)],
          source: ['in', '0'],
          output: 'out',
        });
        expect(instantiate(parseNetlist(text)).values[0]).toBe(value);
      }),
      { seed: 1 },
    );
  });

  it('gives back the same circuit, bit for bit, on random ones', () => {
    fc.assert(
      fc.property(fc.integer({ min: 1, max: 1e6 }), fc.integer({ min: 3, max: 9 }), (seed, nodes) => {
        const { wiring, values } = randomCircuit(seededRandom(seed), nodes, {
          inductors: true,
          controlled: true,
        });
        const text = writeNetlist({
          title: 'Round trip',
          elements: wiring.elements.map((element, index) => ({ ...element, value: values[index]! })),
          source: wiring.source,
          output: 'out',
        });
        const read = instantiate(parseNetlist(text));
        expect([...read.values]).toEqual(values);
        const first = { ...wiring, outputs: [['out', '0'] as const] };
        expect(compile(read.wiring).evaluate(read.values)).toEqual(compile(first).evaluate(values));
      }),
      { seed: 2, numRuns: 60 },
    );
  });

  it('runs unchanged in a SPICE engine: parameters, 0 Ω, a capacitor and an inductor of 0', async () => {
    const text = writeNetlist({
      title: 'With "odd" characters; µ Ω',
      params: [{ name: 'k', value: 0.25, label: 'Knob', taper: { law: 'audio', midpoint: 0.15 } }],
      elements: [
        resistor('wire', 'in', 'a', 0),
        resistor('upper', 'a', 'b.out', '1e4*(1-k)'),
        resistor('lower', 'b.out', 'c', '1e4*k'),
        { kind: 'inductor', name: 'nothing', nodes: ['c', '0'], value: 0 },
        { kind: 'capacitor', name: 'none', nodes: ['b.out', '0'], value: 0 },
      ],
      source: ['in', '0'],
      output: 'b.out',
    });
    const { levels } = await runAc(text, 'out', { from: 100, to: 1000, perDecade: 2 });
    expect(levels.length).toBe(3);
    // 1 µΩ beside 1 kΩ: 1e-10 of the voltage, and SPICE's own rounding.
    for (const level of levels) expect(level).toBeCloseTo(20 * Math.log10(0.25), 6);
  });
});
