import { type Branch, type Diagram, END, type Step } from './diagram.ts';

/** Fields of one instruction in {@link Evaluator}'s flat program. */
const FIELDS = 4;

/**
 * Runs a diagram for given values: `polynomial[target] += ±weight · s^shift · polynomial[operand]`,
 * instruction after instruction, in one preallocated array. No allocation but for the results.
 */
export class Evaluator {
  /** Per instruction: target offset, operand offset, operand length and weight index. */
  readonly #program: Int32Array;
  /** Weights: 1, −1, then value and −value of every element. */
  readonly #weights: Float64Array;
  readonly #store: Float64Array;
  readonly #roots: readonly { readonly offset: number; readonly length: number; readonly sign: number }[];

  constructor(diagram: Diagram, elementCount: number) {
    const lengths: number[] = [];
    const offsets: number[] = [];
    let size = 1; // offset 0 holds the polynomial 1, where END leads
    const operandOf = (branch: Branch): { offset: number; length: number } =>
      branch.next === END
        ? { offset: 0, length: 1 }
        : { offset: offsets[branch.next]!, length: lengths[branch.next]! };
    const program: number[] = [];
    for (const step of diagram.steps) {
      const terms = termsOf(step).map(({ branch, weight, shift }) => ({
        ...operandOf(branch),
        weight,
        shift,
      }));
      const length = Math.max(...terms.map((term) => term.length + term.shift));
      for (const term of terms) program.push(size + term.shift, term.offset, term.length, term.weight);
      offsets.push(size);
      lengths.push(length);
      size += length;
    }
    this.#program = Int32Array.from(program);
    this.#weights = new Float64Array(2 + 2 * elementCount);
    this.#store = new Float64Array(size);
    this.#roots = diagram.roots.map((root) =>
      root === undefined ? { offset: 0, length: 0, sign: 1 } : { ...operandOf(root), sign: root.sign },
    );
  }

  /** Coefficients (ascending powers of s) of the denominator and of every numerator. */
  evaluate(values: ArrayLike<number>): number[][] {
    const weights = this.#weights;
    weights[0] = 1;
    weights[1] = -1;
    for (let index = 2, element = 0; index < weights.length; index += 2, element += 1) {
      const value = values[element]!;
      weights[index] = value;
      weights[index + 1] = -value;
    }
    const store = this.#store;
    store.fill(0);
    store[0] = 1;
    const program = this.#program;
    for (let at = 0; at < program.length; at += FIELDS) {
      let target = program[at]!;
      let operand = program[at + 1]!;
      const end = operand + program[at + 2]!;
      const weight = weights[program[at + 3]!]!;
      while (operand < end) {
        store[target] = store[target]! + weight * store[operand]!;
        target += 1;
        operand += 1;
      }
    }
    return this.#roots.map(({ offset, length, sign }) => {
      const coefficients: number[] = length === 0 ? [0] : [];
      // + 0 makes a plain zero of −0.
      for (let power = 0; power < length; power += 1) coefficients.push(sign * store[offset + power]! + 0);
      return coefficients;
    });
  }
}

interface Term {
  readonly branch: Branch;
  /** Index into the weights. */
  readonly weight: number;
  readonly shift: number;
}

/** Index of ±1 or of an element's ±value among the weights. */
function weightIndex(element: number | undefined, sign: number): number {
  return (element === undefined ? 0 : 2 + 2 * element) + (sign < 0 ? 1 : 0);
}

/** What each way of deciding a step's edge multiplies the sum behind it with. */
function termsOf({ edge, without, including }: Step): readonly Term[] {
  const outside = edge.kind === 'resistor' || edge.kind === 'inductor';
  const terms: Term[] = [];
  if (without !== undefined) {
    terms.push({
      branch: without,
      weight: weightIndex(outside ? edge.element : undefined, without.sign),
      shift: edge.kind === 'inductor' ? 1 : 0,
    });
  }
  including.forEach((branch, way) => {
    if (branch === undefined) return;
    const carriesValue = edge.kind === 'capacitor' || edge.kind === 'transconductance' || way === 1;
    const sign = way === 1 ? -branch.sign : branch.sign; // a voltage gain's control side enters as −gain
    terms.push({
      branch,
      weight: weightIndex(carriesValue ? edge.element : undefined, sign),
      shift: edge.kind === 'capacitor' ? 1 : 0,
    });
  });
  return terms;
}
