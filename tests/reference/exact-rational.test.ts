import { describe, expect, it } from 'vitest';
import { compile } from '../../src/circuit/compile.ts';
import type { Wiring } from '../../src/circuit/wiring.ts';
import { seededRandom } from '../../src/study/blind-trial.ts';
import { randomCircuit } from '../src/circuit/random-wiring.ts';
import { exactly, type Fraction, fraction, minus, over, plus, times, toNumber } from './fraction.ts';

/** A polynomial in s with exact coefficients, ascending. */
type Poly = readonly Fraction[];

const ZERO = fraction(0n);
const add = (a: Poly, b: Poly): Poly =>
  Array.from({ length: Math.max(a.length, b.length) }, (_, k) => plus(a[k] ?? ZERO, b[k] ?? ZERO));
const negative = (a: Poly): Poly => a.map(minus);
const isZero = (a: Poly): boolean => a.every((value) => value.top === 0n);

function multiply(a: Poly, b: Poly): Poly {
  const out = Array.from({ length: Math.max(0, a.length + b.length - 1) }, () => ZERO);
  a.forEach((x, i) => {
    b.forEach((y, j) => {
      out[i + j] = plus(out[i + j]!, times(x, y));
    });
  });
  return out;
}

/** Determinant by expansion along the first row, minors remembered by their columns: exact, no division. */
function determinant(matrix: readonly (readonly Poly[])[]): Poly {
  const known = new Map<string, Poly>();
  const minor = (row: number, columns: readonly number[]): Poly => {
    if (row === matrix.length) return [fraction(1n)];
    const key = columns.join();
    const found = known.get(key);
    if (found !== undefined) return found;
    let sum: Poly = [];
    columns.forEach((column, index) => {
      const entry = matrix[row]![column]!;
      if (isZero(entry)) return;
      const term = multiply(
        entry,
        minor(
          row + 1,
          columns.filter((other) => other !== column),
        ),
      );
      sum = add(sum, index % 2 === 0 ? term : negative(term));
    });
    known.set(key, sum);
    return sum;
  };
  return minor(
    0,
    matrix.map((_, index) => index),
  );
}

/**
 * Numerator and denominator by Cramer's rule on modified nodal equations, every coefficient exact: an
 * independent method (no trees) in an independent arithmetic (no rounding).
 */
function exactTransfer(
  wiring: Wiring,
  values: readonly number[],
): { numerator: number[]; denominator: number[] } {
  const names = [
    ...new Set([
      ...wiring.elements.flatMap((e) => [...e.nodes, ...('control' in e ? e.control : [])]),
      ...wiring.source,
      ...wiring.outputs[0]!,
    ]),
  ].filter((name) => name !== '0');
  const extra = wiring.elements.filter((e) => e.kind === 'inductor' || e.kind === 'voltage-gain').length + 1;
  const size = names.length + extra;
  const matrix: Poly[][] = Array.from({ length: size }, () => Array.from({ length: size }, (): Poly => []));
  const put = (row: number, column: number, value: Poly): void => {
    if (row >= 0 && column >= 0) matrix[row]![column] = add(matrix[row]![column]!, value);
  };
  const node = (name: string): number => names.indexOf(name);
  const one: Poly = [fraction(1n)];
  let next = names.length;
  const branch = (a: string, b: string): number => {
    const row = next;
    next += 1;
    put(node(a), row, one);
    put(node(b), row, negative(one));
    put(row, node(a), one);
    put(row, node(b), negative(one));
    return row;
  };
  wiring.elements.forEach((element, index) => {
    const value = exactly(values[index]!);
    const [a, b] = element.nodes;
    const [c, d] = 'control' in element ? element.control : element.nodes;
    if (element.kind === 'inductor') {
      const row = branch(a, b);
      put(row, row, [ZERO, minus(value)]);
    } else if (element.kind === 'voltage-gain') {
      const row = branch(a, b);
      put(row, node(c), [minus(value)]);
      put(row, node(d), [value]);
    } else {
      const admittance: Poly =
        element.kind === 'resistor'
          ? [over(fraction(1n), value)]
          : element.kind === 'capacitor'
            ? [ZERO, value]
            : [value];
      put(node(a), node(c), admittance);
      put(node(b), node(d), admittance);
      put(node(a), node(d), negative(admittance));
      put(node(b), node(c), negative(admittance));
    }
  });
  const source = branch(...wiring.source);
  const excited = (output: string): Poly => {
    if (output === '0') return [];
    const column = node(output);
    return determinant(
      matrix.map((row, index) =>
        row.map((entry, place) => (place === column ? (index === source ? one : []) : entry)),
      ),
    );
  };
  const [plusNode, minusNode] = wiring.outputs[0]!;
  const numbers = (poly: Poly): number[] => poly.map(toNumber);
  // Scaled by the lowest coefficient of the denominator, as a common factor is nobody's business.
  const denominator = determinant(matrix);
  const numerator = add(excited(plusNode), negative(excited(minusNode)));
  const scale = denominator.find((value) => value.top !== 0n)!;
  const scaled = (poly: Poly): Poly => poly.map((value) => over(value, scale));
  return { numerator: numbers(scaled(numerator)), denominator: numbers(scaled(denominator)) };
}

function compare(wiring: Wiring, values: readonly number[]): number {
  const expected = exactTransfer(wiring, values);
  const { numerators, denominator } = compile(wiring).evaluate(values);
  const scale = denominator.find((value) => value !== 0)!;
  let worst = 0;
  // Where R, C and L are alone every coefficient keeps its own relative precision.
  const side = (got: readonly number[], exact: readonly number[]): void => {
    for (let power = 0; power < Math.max(got.length, exact.length); power += 1) {
      const [a, b] = [(got[power] ?? 0) / scale, exact[power] ?? 0];
      if (a !== b) worst = Math.max(worst, Math.abs(a - b) / Math.abs(b));
    }
  };
  side(numerators[0]!, expected.numerator);
  side(denominator, expected.denominator);
  return worst;
}

describe('engine against exact rational arithmetic', () => {
  it.each([
    ['RC', { inductors: false, controlled: false }, 30],
    ['RLC', { inductors: true, controlled: false }, 30],
  ])('every coefficient of passive %s circuits to 1e-13', (_, kinds, count) => {
    const random = seededRandom(77);
    for (let index = 0; index < count; index += 1) {
      const { wiring, values } = randomCircuit(random, 3 + Math.floor(random() * 4), kinds);
      expect(compare({ ...wiring, outputs: [['out', '0']] }, values)).toBeLessThan(1e-13);
    }
  });

  it('every coefficient of a feedback amplifier with a controlled source, where terms have both signs', () => {
    const random = seededRandom(78);
    const wiring: Wiring = {
      elements: [
        { kind: 'voltage-gain', name: 'A', nodes: ['p', '0'], control: ['in', 't'] },
        { kind: 'resistor', name: 'RO', nodes: ['p', 'out'] },
        { kind: 'resistor', name: 'RL', nodes: ['out', '0'] },
        { kind: 'resistor', name: 'RF', nodes: ['out', 't'] },
        { kind: 'resistor', name: 'RU', nodes: ['t', 'w'] },
        { kind: 'resistor', name: 'RD', nodes: ['w', '0'] },
        { kind: 'capacitor', name: 'C', nodes: ['w', '0'] },
        { kind: 'transconductance', name: 'G', nodes: ['0', 't'], control: ['out', '0'] },
      ],
      source: ['in', '0'],
      outputs: [['out', '0']],
    };
    const between = (low: number, high: number) => low * (high / low) ** random();
    for (let index = 0; index < 40; index += 1) {
      const values = [
        between(10, 1000),
        between(1, 100),
        between(4, 16),
        between(1e4, 1e5),
        between(100, 1e4),
        between(100, 1e4),
        between(1e-8, 1e-6),
        between(1e-6, 1e-5),
      ];
      expect(compare(wiring, values)).toBeLessThan(1e-13);
    }
  });
});
