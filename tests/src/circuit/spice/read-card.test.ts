import { describe, expect, it } from 'vitest';
import { logicalLines } from '../../../../src/circuit/spice/logical-lines.ts';
import { nodeName, readCard, readSource } from '../../../../src/circuit/spice/read-card.ts';
import { Tokens } from '../../../../src/circuit/spice/tokenise.ts';

const tokens = (text: string): Tokens => new Tokens(logicalLines(text)[0]!);
const card = (text: string) => readCard(tokens(text));
const source = (text: string) => readSource(tokens(text));
const syntax = (message: RegExp) =>
  expect.objectContaining({ code: 'netlist-syntax', message: expect.stringMatching(message) });

describe('readCard', () => {
  it.each([
    ['R1 a b 4.7k', 'resistor', 4700],
    ['c22 a b 22nF', 'capacitor', 22e-9],
    ['Lchoke a b 3.3', 'inductor', 3.3],
  ])('reads %s', (text, kind, value) => {
    const read = card(text)!;
    expect(read).toMatchObject({ kind, nodes: ['a', 'b'], place: { line: 1, column: 1 } });
    expect(read).not.toHaveProperty('control');
    expect(read.value.program).toEqual([{ number: value }]);
  });

  it.each([
    ['G1 plate 0 grid cathode 1.6m', 'transconductance', 1.6e-3],
    ['E1 out 0 p n -60', 'voltage-gain', -60],
  ])('reads %s with its controlling nodes', (text, kind, value) => {
    const read = card(text)!;
    expect(read.kind).toBe(kind);
    expect([...read.nodes, ...read.control!]).toEqual(text.split(' ').slice(1, 5));
    expect(read.value.program).toEqual([{ number: value }]);
  });

  it('keeps the name as written, and compares nodes without case', () => {
    expect(card('rSlope IN Out 1')).toMatchObject({ name: 'rSlope', nodes: ['in', 'out'] });
  });

  it('takes no line that starts with another letter', () => {
    const line = tokens('Q1 c b e model');
    expect(readCard(line)).toBeUndefined();
    expect(line.offset).toBe(0);
  });

  it.each([
    ['R1', /column 3: found the end of the line, expected the first node/],
    ['R1 a', /expected the second node/],
    ['R1 a b', /column 7.*expected a value/],
    ['R1 a b value', /found “value”, expected a value/],
    ['R1 a b 1k 2k', /column 11: found “2k”, expected the end of the card/],
    ['G1 a b 1m', /found the end of the line, expected the second controlling node/],
    ['R1 a b {1+}', /expected a number, a parameter or “\(”/],
  ])('refuses %s and says where', (text, message) => {
    expect(() => card(text)).toThrow(syntax(message));
  });
});

describe('readSource', () => {
  it.each([
    'V1 in 0 AC 1',
    'vin in gnd ac',
    'V1 in 0 DC 0 AC 1',
    'V1 in 0 0 AC 1 0',
    'V1 in 0 AC 1 DC 2.5',
    'V1 in 0 dc {1/2} ac 1.0',
  ])('reads %s', (text) => {
    expect(source(text)).toMatchObject({ nodes: ['in', '0'] });
  });

  it('takes no other card', () => {
    expect(source('R1 a b 1')).toBeUndefined();
  });

  it.each([
    ['V1 in 0', /expected AC 1/],
    ['V1 in 0 DC 5', /expected AC 1/],
    ['V1 in 0 AC 2', /found “2”, expected AC 1/],
    ['V1 in 0 AC 1 90', /found “90”, expected no phase/],
    ['V1 in 0 SIN(0 1 1k)', /found “SIN”, expected AC 1/],
    ['V1 in 0 AC 1 AC 1', /expected AC 1/],
  ])('refuses %s', (text, message) => {
    expect(() => source(text)).toThrow(syntax(message));
  });
});

describe('nodeName', () => {
  it('calls ground 0 under both of its names', () => {
    expect(['0', 'gnd', 'GND', 'Gnd1', 'Out'].map(nodeName)).toEqual(['0', '0', '0', 'gnd1', 'out']);
  });
});
