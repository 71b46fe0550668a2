import type { Element, Wiring } from '../../../src/circuit/wiring.ts';

/** A random connected circuit with values that keep every pole within a few decades of the audio band. */
export interface RandomCircuit {
  readonly wiring: Wiring;
  readonly values: number[];
}

/** What a random circuit may contain beside resistors and capacitors. */
export interface RandomKinds {
  readonly inductors: boolean;
  readonly controlled: boolean;
}

/** Draws a circuit of `nodeCount` nodes: a resistor tree that joins them all, then extra branches. */
export function randomCircuit(random: () => number, nodeCount: number, kinds: RandomKinds): RandomCircuit {
  const name = (node: number): string =>
    node === 0 ? '0' : node === 1 ? 'in' : node === nodeCount - 1 ? 'out' : `n${node}`;
  const pick = (): number => Math.floor(random() * nodeCount);
  const between = (low: number, high: number): number => low * (high / low) ** random();
  const elements: Element[] = [];
  const values: number[] = [];
  const push = (element: Element, value: number): void => {
    elements.push(element);
    values.push(value);
  };
  const two = (): [string, string] => {
    const first = pick();
    const second = (first + 1 + Math.floor(random() * (nodeCount - 1))) % nodeCount;
    return [name(first), name(second)];
  };
  for (let node = 2; node < nodeCount; node += 1) {
    push(
      { kind: 'resistor', name: `R${node}`, nodes: [name(node), name(Math.floor(random() * node))] },
      between(1e3, 1e6),
    );
  }
  const extra = nodeCount + Math.floor(random() * nodeCount);
  for (let index = 0; index < extra; index += 1) {
    const draw = random();
    if (kinds.controlled && draw < 0.12) {
      push(
        { kind: 'transconductance', name: `G${index}`, nodes: two(), control: two() },
        between(1e-6, 1e-3),
      );
    } else if (kinds.controlled && draw < 0.18) {
      // A stiff source feeds its own node through a resistor, as any real stage does.
      const own = `e${index}`;
      push({ kind: 'voltage-gain', name: `E${index}`, nodes: [own, '0'], control: two() }, between(0.1, 10));
      push({ kind: 'resistor', name: `RE${index}`, nodes: [own, name(pick())] }, between(1e3, 1e5));
    } else if (kinds.inductors && draw < 0.3) {
      push({ kind: 'inductor', name: `L${index}`, nodes: two() }, between(1e-2, 10));
    } else if (draw < 0.7) {
      push({ kind: 'capacitor', name: `C${index}`, nodes: two() }, between(1e-10, 1e-7));
    } else {
      push({ kind: 'resistor', name: `RX${index}`, nodes: two() }, between(1e3, 1e6));
    }
  }
  return {
    wiring: {
      elements,
      source: ['in', '0'],
      outputs: [
        ['out', '0'],
        ['out', 'in'],
      ],
    },
    values,
  };
}
