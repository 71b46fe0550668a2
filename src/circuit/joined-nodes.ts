import { GROUND, type NodeName } from './wiring.ts';

/** Which nodes have been joined to one (by a wire, a path …); a group with ground is called ground. */
export class JoinedNodes {
  readonly #parents = new Map<NodeName, NodeName>();

  /** One name for all nodes that are joined with this one, itself included. */
  rootOf(node: NodeName): NodeName {
    let root = node;
    for (let parent = this.#parents.get(root); parent !== undefined; parent = this.#parents.get(root))
      root = parent;
    return root;
  }

  /** Joins two nodes and all that is joined with them. */
  join(first: NodeName, second: NodeName): void {
    const [a, b] = [this.rootOf(first), this.rootOf(second)];
    if (a === b) return;
    if (b === GROUND) this.#parents.set(a, b);
    else this.#parents.set(b, a);
  }
}
