import { NotchworkError } from '../errors.ts';
import { JoinedNodes } from './joined-nodes.ts';
import { GROUND, type NodePair, type Wiring } from './wiring.ts';

function refuse(message: string): never {
  throw new NotchworkError('netlist-topology', message);
}

/** "Node a has", "Nodes a, b and c have" … */
function nodesWith(nodes: readonly string[], one: string, several: string): string {
  return nodes.length === 1 ? `Node ${nodes[0]} ${one}` : `Nodes ${listed(nodes)} ${several}`;
}

function listed(names: readonly string[]): string {
  const rest = names.slice(0, -1);
  return rest.length === 0 ? names.join() : `${rest.join(', ')} and ${names.at(-1)}`;
}

/** Names all nodes that these pairs, from one to the next, do not join to ground. */
function withoutPath(all: Iterable<string>, pairs: readonly NodePair[]): readonly string[] {
  const joined = new JoinedNodes();
  for (const [first, second] of pairs) joined.join(first, second);
  return [...new Set(all)].filter((node) => joined.rootOf(node) !== GROUND);
}

function checkVoltageLoops({ elements, source }: Wiring): void {
  const joined = new JoinedNodes();
  joined.join(...source);
  for (const { kind, name, nodes } of elements) {
    if (kind !== 'voltage-gain') continue;
    if (joined.rootOf(nodes[0]) === joined.rootOf(nodes[1])) {
      refuse(
        `${name} closes a loop of ideal voltage sources from ${nodes[0]} to ${nodes[1]}, so its current is undefined. Put a resistor in series with it.`,
      );
    }
    joined.join(...nodes);
  }
}

/**
 * Refuses what no values could make solvable, naming what is wrong: a source with both ends at one
 * node, a node (an output and a controlling one too) that nothing joins to ground, a loop of ideal
 * voltage sources, a node that is fed by current sources alone.
 *
 * @throws NotchworkError `netlist-topology`.
 */
export function checkTopology(wiring: Wiring): void {
  const { elements, source, outputs } = wiring;
  if (source[0] === source[1]) {
    refuse(`The source has both ends at node ${source[0]}; join it to two nodes.`);
  }
  const controls = elements.flatMap((element) => ('control' in element ? [element.control] : []));
  const branches = [source, ...elements.map((element) => element.nodes)];
  const all = [...branches, ...controls, ...outputs].flat();
  const floating = withoutPath(all, branches);
  if (floating.length > 0) {
    refuse(
      `${nodesWith(floating, 'has', 'have')} no path to ground (node 0), so the voltage there is undefined. Join it, for instance by a large resistor.`,
    );
  }
  checkVoltageLoops(wiring);
  // A current source fixes no voltage between its ends; the pairs that one is fixed by are these.
  const fixed = [
    source,
    ...controls,
    ...elements.flatMap(({ kind, nodes }) => (kind === 'transconductance' ? [] : [nodes])),
  ];
  const loose = withoutPath(all, fixed);
  if (loose.length > 0) {
    const feeding = elements.filter((element) => element.nodes.some((node) => loose.includes(node)));
    refuse(
      `${nodesWith(loose, 'is', 'are')} joined to the rest by current sources alone (${listed(feeding.map((element) => element.name))}), so the voltage there is undefined. Join it to ground, for instance by a large resistor.`,
    );
  }
}
