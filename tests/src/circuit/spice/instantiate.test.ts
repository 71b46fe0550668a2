import { describe, expect, it } from 'vitest';
import { compile } from '../../../../src/circuit/compile.ts';
import { instantiate, netlistNodes, writtenPosition } from '../../../../src/circuit/spice/instantiate.ts';
import { parseNetlist } from '../../../../src/circuit/spice/parse-netlist.ts';
import { AUDIO, trackRatio } from '../../../../src/parts/taper.ts';
import { rotation } from '../../../../src/units.ts';

const VOLUME = parseNetlist(`Volume
*@ label="Volume" taper=audio
.param Volume=0.15
.param pot=1meg
V1 in 0 AC 1
Rtop in OUT {pot*(1-volume)}
Rbottom Out 0 {pot*VOLUME}
Cstray out gnd 100p
`);

describe('instantiate', () => {
  it('gives a wiring and values that the engine solves', () => {
    const { wiring, values } = instantiate(VOLUME);
    expect(wiring.source).toEqual(['in', '0']);
    expect(wiring.outputs).toEqual([['out', '0']]);
    const { numerator, denominator } = compile(wiring).transfer(values);
    expect(numerator[0]! / denominator[0]!).toBeCloseTo(0.15, 12);
    expect(denominator[1]! / denominator[0]!).toBeCloseTo(1e6 * 0.15 * 0.85 * 100e-12, 18);
  });

  it('leaves the value in the file as it is, as other SPICE programs do, and turns positions by the taper', () => {
    expect(writtenPosition(VOLUME.params[0]!)).toBeCloseTo(0.5, 12); // 15 % of the track at half rotation
    expect([...instantiate(VOLUME).values.slice(0, 2)]).toEqual([850e3, 150e3]);
    expect(instantiate(VOLUME, { volume: 0.5 }).values[1]).toBeCloseTo(150e3, 6);
    expect(instantiate(VOLUME, { VOLUME: 0.8 }).values[1]).toBe(1e6 * trackRatio(AUDIO, rotation(0.8)));
  });

  it('takes a map as well as a record, and end stops of exactly 0 Ω', () => {
    expect([...instantiate(VOLUME, new Map([['Volume', 0]])).values]).toEqual([1e6, 0, 100e-12]);
    expect([...instantiate(VOLUME, { volume: 1 }).values]).toEqual([0, 1e6, 100e-12]);
  });

  it('turns knobs without a taper straight', () => {
    const netlist = parseNetlist('t\n.param k=0.5\nV1 in 0 AC 1\nR1 in out {100*k}\nR2 out 0 1');
    expect(instantiate(netlist, { k: 0.25 }).values[0]).toBe(25);
    expect(writtenPosition(netlist.params[0]!)).toBe(0.5);
  });

  it('carries a knob through parameters that depend on it', () => {
    const netlist = parseNetlist(
      't\n.param low={k*pot} k=0.5 pot=10k\nV1 in 0 AC 1\nR1 in out {low}\nR2 out 0 1',
    );
    expect(instantiate(netlist).values[0]).toBe(5000);
    expect(instantiate(netlist, { k: 1 }).values[0]).toBe(10_000);
  });

  it('allows 0 everywhere and negative controlled sources', () => {
    const netlist = parseNetlist(
      't\nV1 in 0 AC 1\nR1 in a 0\nC1 a 0 0\nL1 a out 0\nE1 out 0 a 0 -50\nG1 out 0 a 0 {-1m}',
    );
    expect([...instantiate(netlist).values]).toEqual([0, 0, 0, -50, -1e-3]);
  });

  it('reads any node as output, in any case', () => {
    expect(netlistNodes(VOLUME)).toEqual(['in', 'out']);
    expect(instantiate(VOLUME, {}, 'IN').wiring.outputs).toEqual([['in', '0']]);
  });

  it('keeps the source reversed if the netlist has it so', () => {
    const { wiring, values } = instantiate(parseNetlist('t\nV1 0 in AC 1\nR1 in out 1\nR2 out 0 1'));
    const { numerator, denominator } = compile(wiring).transfer(values);
    expect(numerator[0]! / denominator[0]!).toBe(-0.5);
  });
});
