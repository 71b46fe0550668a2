import { describe, expect, it } from 'vitest';
import { compile } from '../../../src/circuit/compile.ts';
import { formulaOf } from '../../../src/circuit/formula.ts';
import type { Element, Wiring } from '../../../src/circuit/wiring.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { seededRandom } from '../../../src/study/blind-trial.ts';
import { randomCircuit } from './random-wiring.ts';

const two = (kind: 'resistor' | 'capacitor' | 'inductor', name: string, a: string, b: string): Element => ({
  kind,
  name,
  nodes: [a, b],
});
const circuit = (elements: Element[]): Wiring => ({ elements, source: ['in', '0'], outputs: [['out', '0']] });

/** Reads a formula back as arithmetic, by means that the writer does not share. */
function evaluate(text: string, values: ReadonlyMap<string, number>): number {
  return text
    .replace(/− /g, '+ −')
    .split(' + ')
    .reduce((sum, product) => {
      const factors = product.replace('−', '').split('·');
      const size = factors.reduce((total, name) => total * (values.get(name) ?? Number(name)), 1);
      return sum + (product.startsWith('−') ? -size : size);
    }, 0);
}

describe('formulaOf', () => {
  it('writes the one-pole low pass, 1/(1 + s·R·C)', () => {
    expect(
      formulaOf(circuit([two('resistor', 'R1', 'in', 'out'), two('capacitor', 'C1', 'out', '0')])),
    ).toEqual({
      numerators: [['1']],
      denominator: ['1', 'R1·C1'],
    });
  });

  it('writes the divider and cancels what both sides share', () => {
    const across = two('resistor', 'R9', 'in', '0'); // across the source: no business of the output's
    const divider = [two('resistor', 'R1', 'in', 'out'), two('resistor', 'R2', 'out', '0'), across];
    expect(formulaOf(circuit(divider))).toEqual({ numerators: [['R2']], denominator: ['R1 + R2'] });
  });

  it('cancels powers of s that both sides share', () => {
    const divider = [two('capacitor', 'C1', 'in', 'out'), two('capacitor', 'C2', 'out', '0')];
    expect(formulaOf(circuit(divider))).toEqual({ numerators: [['C1']], denominator: ['C1 + C2'] });
  });

  it('writes the series resonant circuit', () => {
    const { denominator } = formulaOf(
      circuit([
        two('resistor', 'R', 'in', 'a'),
        two('inductor', 'L', 'a', 'out'),
        two('capacitor', 'C', 'out', '0'),
      ]),
    );
    expect(denominator).toEqual(['1', 'R·C', 'L·C']);
  });

  it('writes signs with controlled sources: a plate load gives −G·R', () => {
    const stage = formulaOf(
      circuit([
        { kind: 'transconductance', name: 'G', nodes: ['out', '0'], control: ['in', '0'] },
        two('resistor', 'R', 'out', '0'),
      ]),
    );
    expect(stage).toEqual({ numerators: [['−G·R']], denominator: ['1'] });
  });

  it('writes 0 for an output that nothing reaches', () => {
    const elements = [two('resistor', 'R1', 'in', '0'), two('resistor', 'R2', 'out', '0')];
    expect(formulaOf(circuit(elements)).numerators).toEqual([['0']]);
  });

  it('means the same as the numbers, on random circuits', () => {
    const random = seededRandom(31);
    for (let index = 0; index < 40; index += 1) {
      const kinds = { inductors: index % 2 === 0, controlled: index % 3 === 0 };
      const { wiring, values } = randomCircuit(random, 3 + Math.floor(random() * 3), kinds);
      const named = new Map(wiring.elements.map((element, place) => [element.name, values[place]!]));
      const formula = formulaOf(wiring, 1e5);
      const { numerators, denominator } = compile(wiring).evaluate(values);
      // Both fractions have the same value at a real s; sums of both signs may lose some digits.
      const at = (coefficients: readonly number[]) =>
        coefficients.reduceRight((sum, coefficient) => sum * 3000 + coefficient, 0);
      const text = (side: readonly string[]) => at(side.map((part) => evaluate(part, named)));
      numerators.forEach((numerator, output) => {
        const expected = at(numerator) / at(denominator);
        const got = text(formula.numerators[output]!) / text(formula.denominator);
        expect(Math.abs(got - expected)).toBeLessThan(1e-9 * Math.max(1e-3, Math.abs(expected)));
      });
    }
  });

  it('refuses more products than asked for, at once', () => {
    const { wiring } = randomCircuit(seededRandom(3), 12, { inductors: false, controlled: false });
    const start = Date.now();
    expect(() => formulaOf(wiring)).toThrow(expect.objectContaining({ code: 'netlist-too-large' }));
    expect(Date.now() - start).toBeLessThan(5000); // counted, not written and then thrown away
    expect(() =>
      formulaOf(circuit([two('resistor', 'R1', 'in', 'out'), two('resistor', 'R2', 'out', '0')]), 2),
    ).toThrow(NotchworkError);
  });

  it('refuses a circuit without a solution', () => {
    const lost = circuit([two('resistor', 'R1', 'in', '0'), two('resistor', 'R2', 'out', 'far')]);
    expect(() => formulaOf(lost)).toThrow(expect.objectContaining({ code: 'netlist-topology' }));
  });
});
