import { describe, expect, it } from 'vitest';
import type { NodePair } from '../../../src/circuit/wiring.ts';
import { DirectCase, type DirectElement } from '../../../src/study/direct-case.ts';

const resistor = (name: string, nodes: NodePair, value: number): DirectElement => ({
  kind: 'resistor',
  name,
  nodes,
  value,
});
const capacitor = (name: string, nodes: NodePair, value = 1e-8): DirectElement => ({
  kind: 'capacitor',
  name,
  nodes,
  value,
});
const source = (volts: number) => [{ nodes: ['in', '0'] as const, volts }];

describe('direct voltages of a passive network', () => {
  it('divide by resistance, and capacitors stand what is left across them', () => {
    const upper = resistor('upper', ['in', 'mid'], 300e3);
    const lower = resistor('lower', ['mid', '0'], 100e3);
    const across = capacitor('across', ['mid', '0']);
    const direct = new DirectCase([upper, lower, across], source(200));
    expect(direct.at('mid')).toBeCloseTo(50, 9);
    expect(direct.across(upper)).toEqual({ volts: expect.closeTo(150, 9), byLeakage: false });
    expect(direct.across(across)).toEqual({ volts: expect.closeTo(50, 9), byLeakage: false });
  });

  it('a capacitor in the way stands all of it, and what is behind stands nothing', () => {
    const coupling = capacitor('coupling', ['in', 'out']);
    const leak = resistor('leak', ['out', '0'], 1e6);
    const direct = new DirectCase([coupling, leak], source(-250));
    expect(direct.across(coupling)).toEqual({ volts: 250, byLeakage: false });
    expect(direct.across(leak)).toEqual({ volts: 0, byLeakage: false });
    expect(direct.at('in')).toBe(-250);
  });

  it('of two capacitors in series each is taken to stand all, as either may leak', () => {
    const first = capacitor('first', ['in', 'mid'], 1e-6);
    const second = capacitor('second', ['mid', 'out'], 1e-9);
    const leak = resistor('leak', ['out', '0'], 1e6);
    const direct = new DirectCase([first, second, leak], source(300));
    expect(direct.across(first)).toEqual({ volts: 300, byLeakage: true });
    expect(direct.across(second)).toEqual({ volts: 300, byLeakage: true });
    expect(direct.at('mid')).toBe(300);
    expect(direct.at('out')).toBe(0);
  });

  it('of three in series too, the middle one held by nothing at either end', () => {
    const chain = [
      capacitor('a', ['in', 'x']),
      capacitor('b', ['x', 'y']),
      capacitor('c', ['y', 'out']),
    ] as const;
    const direct = new DirectCase([...chain, resistor('leak', ['out', '0'], 1e6)], source(300));
    for (const element of chain) expect(direct.across(element)).toEqual({ volts: 300, byLeakage: true });
  });

  it('counts only voltages that can get there', () => {
    // The floating node hangs between 120 V and 100 V; never at 0 V.
    const elements = [
      resistor('a', ['in', 'tap'], 20e3),
      resistor('b', ['tap', '0'], 100e3),
      capacitor('one', ['in', 'x']),
      capacitor('two', ['x', 'tap']),
    ];
    const direct = new DirectCase(elements, source(120));
    expect(direct.across(elements[2]!)).toEqual({ volts: expect.closeTo(20, 9), byLeakage: true });
    expect(direct.at('x')).toBe(120);
  });

  it('a capacitor that hangs on nothing else stands nothing, nor do resistors in a part without a path', () => {
    const loose = capacitor('loose', ['in', 'x']);
    const beyond = resistor('beyond', ['x', 'y'], 1e4);
    const around = capacitor('around', ['x', 'y']);
    const direct = new DirectCase([loose, beyond, around], source(100));
    expect(direct.across(loose).volts).toBe(0);
    expect(direct.across(beyond)).toEqual({ volts: 0, byLeakage: false });
    expect(direct.across(around)).toEqual({ volts: 0, byLeakage: false });
  });

  it('does not reach through the capacitor itself for what it might stand', () => {
    // Its near end hangs on it alone, and its far end between 120 V and 100 V: it only follows.
    const elements = [
      resistor('a', ['in', 'tap'], 20e3),
      resistor('b', ['tap', '0'], 100e3),
      capacitor('one', ['in', 'x']),
      capacitor('two', ['x', 'tap']),
      capacitor('loose', ['x', 'y']),
    ];
    expect(new DirectCase(elements, source(120)).across(elements[4]!).volts).toBe(0);
  });

  it('takes inductors and resistors of no ohms, and all but none, for wires', () => {
    for (const wire of [
      { kind: 'inductor' as const, name: 'choke', nodes: ['in', 'x'] as const, value: 10 },
      resistor('stop', ['in', 'x'], 0),
      resistor('nearly', ['in', 'x'], 1e-30),
    ]) {
      const direct = new DirectCase([wire, resistor('load', ['x', '0'], 1e6)], source(100));
      expect(direct.at('x')).toBe(100);
      expect(direct.across(wire).volts).toBe(0);
    }
  });

  it('refuses sources that contradict each other', () => {
    const twice = [...source(100), ...source(200)];
    expect(() => new DirectCase([resistor('load', ['in', '0'], 1e6)], twice)).toThrow(
      expect.objectContaining({ code: 'circuit-unsolvable' }),
    );
  });
});

describe('resistance for direct current', () => {
  it('is that of the resistors, capacitors open', () => {
    const elements = [
      resistor('series', ['in', 'x'], 47e3),
      resistor('a', ['x', '0'], 100e3),
      resistor('b', ['x', '0'], 25e3),
      capacitor('c', ['in', '0']),
    ];
    // A meter of 1 MΩ beside 67 kΩ keeps all but two of its digits.
    expect(DirectCase.resistance(elements, 'in') / 67e3).toBeCloseTo(1, 12);
  });

  it('is infinite where capacitors bar every way, and where there is nothing', () => {
    const barred = [capacitor('c', ['in', 'x']), resistor('r', ['x', '0'], 1e3)];
    expect(DirectCase.resistance(barred, 'in')).toBe(Number.POSITIVE_INFINITY);
    expect(DirectCase.resistance([], 'in')).toBe(Number.POSITIVE_INFINITY);
  });
});
