import { type DirectSource, directVoltages } from '../circuit/dc.ts';
import { JoinedNodes } from '../circuit/joined-nodes.ts';
import { GROUND, type NodeName, type NodePair } from '../circuit/wiring.ts';
import type { Ohms, Volts } from '../units.ts';

/** A passive element with its value in Ω, F or H. */
export interface DirectElement {
  readonly kind: 'resistor' | 'capacitor' | 'inductor';
  readonly name: string;
  readonly nodes: NodePair;
  readonly value: number;
}

/** What stands across one element. */
export interface Standing {
  /** Size of the direct voltage across it at worst. */
  readonly volts: Volts;
  /**
   * Whether an end has no resistor to anywhere: the leakages of all capacitors there then decide, and
   * nobody knows them, so that each is taken to stand whatever all others together might.
   */
  readonly byLeakage: boolean;
}

/** Less than this is a potentiometer's end stop but for rounding, and counts as a wire. */
const WIRE: Ohms = 1e-3;

/** Direct voltages in a passive network, capacitors that nothing else holds included. */
export class DirectCase {
  readonly #elements: readonly DirectElement[];
  readonly #joined = new JoinedNodes();
  readonly #voltages: ReadonlyMap<NodeName, Volts>;

  /** @throws NotchworkError `circuit-unsolvable` where the sources contradict each other. */
  constructor(elements: readonly DirectElement[], sources: readonly DirectSource[]) {
    this.#elements = elements;
    const conducting = elements.filter(({ kind }) => kind !== 'capacitor');
    for (const { nodes } of [...conducting, ...sources]) this.#joined.join(...nodes);
    const held = conducting.filter(({ nodes }) => this.#isHeld(nodes[0]));
    this.#voltages = directVoltages(
      held,
      held.map(({ value }) => (value < WIRE ? 0 : value)),
      sources,
    );
  }

  /** Whether resistors or a source hold a node at its voltage. */
  #isHeld(node: NodeName): boolean {
    return this.#joined.rootOf(node) === this.#joined.rootOf(GROUND);
  }

  /** Voltages that a node may have: the one it is held at, or those that its capacitors may leak from. */
  #possible(node: NodeName, without?: DirectElement): readonly Volts[] {
    if (this.#isHeld(node)) return [this.#voltages.get(node) ?? 0];
    const reached = new Set([this.#joined.rootOf(node)]);
    const found: Volts[] = [];
    for (const root of reached) {
      for (const element of this.#elements) {
        if (element.kind !== 'capacitor' || element === without) continue;
        const [first, second] = element.nodes;
        for (const [near, far] of [
          [first, second],
          [second, first],
        ] as const) {
          if (this.#joined.rootOf(near) !== root) continue;
          if (this.#isHeld(far)) found.push(this.#voltages.get(far) ?? 0);
          else reached.add(this.#joined.rootOf(far));
        }
      }
    }
    return found;
  }

  /** Voltage of a node against ground; of those that it may have, the one farthest from 0. */
  at(node: NodeName): Volts {
    return this.#possible(node).reduce((most, volts) => (Math.abs(volts) > Math.abs(most) ? volts : most), 0);
  }

  /** What stands across an element, at worst. */
  across(element: DirectElement): Standing {
    const [first, second] = element.nodes;
    const byLeakage = !this.#isHeld(first) || !this.#isHeld(second);
    if (byLeakage && this.#joined.rootOf(first) === this.#joined.rootOf(second)) {
      return { volts: 0, byLeakage: false }; // resistors around it carry no current
    }
    const others = this.#possible(second, element);
    const spans = this.#possible(first, element).flatMap((one) =>
      others.map((other) => Math.abs(one - other)),
    );
    return { volts: Math.max(0, ...spans), byLeakage };
  }

  /** Resistance for direct current between a node and ground, the sources there are at rest; Infinity for none. */
  static resistance(elements: readonly DirectElement[], node: NodeName): Ohms {
    const meter: DirectElement = { kind: 'resistor', name: 'meter', nodes: ['(meter)', node], value: 1e6 };
    const metered = new DirectCase([...elements, meter], [{ nodes: ['(meter)', GROUND], volts: 1 }]);
    const share = metered.at(node);
    // What rounding leaves of a share of 1 is no path: a thousand gigohms and more.
    return 1 - share < 1e-12 ? Number.POSITIVE_INFINITY : (share / (1 - share)) * 1e6;
  }
}
