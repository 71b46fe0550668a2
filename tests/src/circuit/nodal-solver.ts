import type { Wiring } from '../../../src/circuit/wiring.ts';

interface Complex {
  readonly re: number;
  readonly im: number;
}

const add = (a: Complex, b: Complex): Complex => ({ re: a.re + b.re, im: a.im + b.im });
const times = (a: Complex, b: Complex): Complex => ({
  re: a.re * b.re - a.im * b.im,
  im: a.re * b.im + a.im * b.re,
});
const over = (a: Complex, b: Complex): Complex => {
  const size = b.re * b.re + b.im * b.im;
  return { re: (a.re * b.re + a.im * b.im) / size, im: (a.im * b.re - a.re * b.im) / size };
};

/**
 * Output voltages of a wiring at one angular frequency by modified nodal analysis (C.-W. Ho,
 * A. E. Ruehli, P. A. Brennan, IEEE Trans. Circuits Syst. 22, 1975): another method than the one
 * under test, solved by elimination with partial pivoting.
 */
export function solveNodal(wiring: Wiring, values: readonly number[], omega: number): Complex[] {
  const names = new Set<string>();
  for (const element of wiring.elements) {
    for (const node of [...element.nodes, ...('control' in element ? element.control : [])]) names.add(node);
  }
  for (const node of [...wiring.source, ...wiring.outputs.flat()]) names.add(node);
  names.delete('0');
  const nodes = [...names];
  const branches = wiring.elements.filter(
    (e) => e.kind === 'voltage-gain' || e.kind === 'resistor' || e.kind === 'inductor',
  );
  const size = nodes.length + branches.length + 1;
  const matrix = Array.from({ length: size }, () =>
    Array.from({ length: size + 1 }, (): Complex => ({ re: 0, im: 0 })),
  );
  const put = (row: number, column: number, value: Complex): void => {
    if (row >= 0 && column >= 0) matrix[row]![column] = add(matrix[row]![column]!, value);
  };
  const node = (name: string): number => nodes.indexOf(name);
  const real = (re: number): Complex => ({ re, im: 0 });
  let branch = nodes.length;
  /** A branch whose current is an unknown: V(a) − V(b) − impedance·I = 0, plus further terms by the caller. */
  const unknownCurrent = (a: string, b: string, impedance: Complex): number => {
    const row = branch;
    branch += 1;
    put(node(a), row, real(1));
    put(node(b), row, real(-1));
    put(row, node(a), real(1));
    put(row, node(b), real(-1));
    put(row, row, times(real(-1), impedance));
    return row;
  };
  wiring.elements.forEach((element, index) => {
    const value = values[index]!;
    const [a, b] = element.nodes;
    if (element.kind === 'capacitor' || element.kind === 'transconductance') {
      const [c, d] = 'control' in element ? element.control : element.nodes;
      const admittance = element.kind === 'capacitor' ? { re: 0, im: omega * value } : real(value);
      const minus = times(real(-1), admittance);
      put(node(a), node(c), admittance);
      put(node(b), node(d), admittance);
      put(node(a), node(d), minus);
      put(node(b), node(c), minus);
    } else if (element.kind === 'resistor') {
      unknownCurrent(a, b, real(value));
    } else if (element.kind === 'inductor') {
      unknownCurrent(a, b, { re: 0, im: omega * value });
    } else {
      const [c, d] = 'control' in element ? element.control : element.nodes;
      const row = unknownCurrent(a, b, real(0));
      put(row, node(c), real(-value));
      put(row, node(d), real(value));
    }
  });
  const sourceRow = unknownCurrent(wiring.source[0], wiring.source[1], real(0));
  put(sourceRow, size, real(1));

  for (let column = 0; column < size; column += 1) {
    let pivot = column;
    for (let row = column; row < size; row += 1) {
      const size2 = (value: Complex): number => Math.hypot(value.re, value.im);
      if (size2(matrix[row]![column]!) > size2(matrix[pivot]![column]!)) pivot = row;
    }
    [matrix[column], matrix[pivot]] = [matrix[pivot]!, matrix[column]!];
    for (let row = 0; row < size; row += 1) {
      if (row === column) continue;
      const factor = over(matrix[row]![column]!, matrix[column]![column]!);
      if (factor.re === 0 && factor.im === 0) continue;
      for (let k = column; k <= size; k += 1) {
        matrix[row]![k] = add(
          matrix[row]![k]!,
          times({ re: -factor.re, im: -factor.im }, matrix[column]![k]!),
        );
      }
    }
  }
  const voltage = (name: string): Complex =>
    name === '0' ? real(0) : over(matrix[node(name)]![size]!, matrix[node(name)]![node(name)]!);
  return wiring.outputs.map(([a, b]) => add(voltage(a), times(real(-1), voltage(b))));
}
