import { NotchworkError } from '../errors.ts';
import type { Volts } from '../units.ts';
import { JoinedNodes } from './joined-nodes.ts';
import { type Element, GROUND, type NodeName, type NodePair } from './wiring.ts';

/** A source of direct voltage: `V(nodes[0]) − V(nodes[1]) = volts`. */
export interface DirectSource {
  readonly nodes: NodePair;
  readonly volts: Volts;
}

/** Solves `matrix · x = right` in place by elimination with partial pivoting; `undefined` where it is singular. */
function solve(matrix: Float64Array[], right: Float64Array): Float64Array | undefined {
  const size = right.length;
  const scales = right.map((_, column) => Math.max(...matrix.map((row) => Math.abs(row[column]!))));
  for (let column = 0; column < size; column += 1) {
    let pivot = column;
    for (let row = column + 1; row < size; row += 1) {
      if (Math.abs(matrix[row]![column]!) > Math.abs(matrix[pivot]![column]!)) pivot = row;
    }
    const lead = matrix[pivot]![column]!;
    // Less than this is what rounding leaves of a column that cancels.
    if (!(Math.abs(lead) > scales[column]! * 1e-14)) return undefined;
    [matrix[column], matrix[pivot]] = [matrix[pivot]!, matrix[column]!];
    [right[column], right[pivot]] = [right[pivot]!, right[column]!];
    for (let row = column + 1; row < size; row += 1) {
      const factor = matrix[row]![column]! / lead;
      if (factor === 0) continue;
      for (let k = column; k < size; k += 1)
        matrix[row]![k] = matrix[row]![k]! - factor * matrix[column]![k]!;
      right[row] = right[row]! - factor * right[column]!;
    }
  }
  for (let row = size - 1; row >= 0; row -= 1) {
    for (let k = row + 1; k < size; k += 1) right[row] = right[row]! - matrix[row]![k]! * right[k]!;
    right[row] = right[row]! / matrix[row]![row]!;
  }
  return right;
}

/** Names nodes without a path for direct current to ground. */
function adrift(nodes: readonly NodeName[], paths: readonly NodePair[]): readonly NodeName[] {
  const joined = new JoinedNodes();
  for (const [first, second] of paths) joined.join(first, second);
  return nodes.filter((node) => joined.rootOf(node) !== joined.rootOf(GROUND));
}

/**
 * Direct voltages at all nodes: capacitors are open, inductors are wires, controlled sources keep
 * their signs as in SPICE. Nodal equations with a current for each voltage source (C.-W. Ho, A. E.
 * Ruehli, P. A. Brennan, IEEE Trans. Circuits Syst. 22, 1975), by elimination with partial pivoting.
 * A resistor of 0 Ω is a wire too.
 *
 * @param values one per element: Ω, F, H, S or ratio.
 * @param sources all sources there are; a wiring's own signal source is given here with its direct
 *   voltage, usually 0.
 * @returns volts against ground by node name, ground among them.
 * @throws NotchworkError `netlist-topology` where a node has no path to ground for direct current;
 *   `circuit-unsolvable` where sources contradict each other.
 */
export function directVoltages(
  elements: readonly Element[],
  values: ArrayLike<number>,
  sources: readonly DirectSource[],
): ReadonlyMap<NodeName, Volts> {
  const joined = new JoinedNodes(); // nodes at one voltage whatever flows
  elements.forEach(({ kind, nodes }, index) => {
    if (kind === 'inductor' || (kind === 'resistor' && values[index] === 0)) joined.join(...nodes);
  });
  const names = new Set<NodeName>([GROUND]);
  for (const { nodes } of sources) for (const node of nodes) names.add(node);
  for (const element of elements) {
    for (const node of [...element.nodes, ...('control' in element ? element.control : [])]) names.add(node);
  }
  const conducting = elements.filter((element) => element.kind !== 'capacitor');
  const lost = adrift(
    [...names],
    [...conducting, ...sources].map((entry) => entry.nodes),
  );
  if (lost.length > 0) {
    throw new NotchworkError(
      'netlist-topology',
      `Node ${lost.join(', ')} has no path to ground for direct current, so its voltage is undefined. Join it, for instance by a large resistor.`,
    );
  }

  const unknowns = [...new Set([...names].map((node) => joined.rootOf(node)))].filter(
    (node) => node !== GROUND,
  );
  const branches = elements.filter((element) => element.kind === 'voltage-gain').length + sources.length;
  const size = unknowns.length + branches;
  const matrix = Array.from({ length: size }, () => new Float64Array(size));
  const right = new Float64Array(size);
  const numbers = new Map(unknowns.map((node, index) => [node, index]));
  const numberOf = (node: NodeName): number => numbers.get(joined.rootOf(node)) ?? -1;
  const add = (row: number, column: number, value: number): void => {
    if (row >= 0 && column >= 0) matrix[row]![column] = matrix[row]![column]! + value;
  };
  let next = unknowns.length;
  const branch = ([first, second]: NodePair): number => {
    const row = next;
    next += 1;
    const [a, b] = [numberOf(first), numberOf(second)];
    add(a, row, 1);
    add(b, row, -1);
    add(row, a, 1);
    add(row, b, -1);
    return row;
  };
  elements.forEach((element, index) => {
    const value = values[index]!;
    const [c, d] = ('control' in element ? element.control : element.nodes).map(numberOf) as [number, number];
    if (element.kind === 'voltage-gain') {
      const row = branch(element.nodes);
      add(row, c, -value);
      add(row, d, value);
    } else if (element.kind === 'transconductance' || (element.kind === 'resistor' && value !== 0)) {
      const conductance = element.kind === 'resistor' ? 1 / value : value;
      const [a, b] = element.nodes.map(numberOf) as [number, number];
      add(a, c, conductance);
      add(b, d, conductance);
      add(a, d, -conductance);
      add(b, c, -conductance);
    }
  });
  for (const { nodes, volts } of sources) right[branch(nodes)] = volts;

  const solution = solve(matrix, right);
  if (solution === undefined) {
    throw new NotchworkError(
      'circuit-unsolvable',
      'There is no single answer for the direct voltages: voltage sources in a loop, or feedback that cancels a resistance. Put a resistor in.',
    );
  }
  return new Map([...names].map((node) => [node, numberOf(node) < 0 ? 0 : solution[numberOf(node)]!]));
}
