import { NotchworkError } from '../errors.ts';
import { GROUND, type Wiring } from './wiring.ts';

/** Most nodes in one wiring, ground among them. */
export const MOST_NODES = 60;
/** Most elements in one wiring. */
export const MOST_ELEMENTS = 150;

/** How much work a wiring may take to compile; counted, not timed, so that every machine refuses alike. */
export interface DiagramLimits {
  /** Most steps of the finished diagram: what one evaluation has to go through. */
  readonly steps: number;
  /** Most states looked at while it is built, those that lead nowhere included. */
  readonly states: number;
}

/** What is compiled at the most: some tenths of a second of work and some tens of megabytes. */
export const DEFAULT_LIMITS: DiagramLimits = { steps: 60_000, states: 120_000 };

/**
 * Refuses a wiring by its size, before any work is done on it.
 *
 * @throws NotchworkError `netlist-too-large` beyond {@link MOST_NODES} or {@link MOST_ELEMENTS}.
 */
export function checkSize({ elements, source, outputs }: Wiring): void {
  const nodes = new Set([GROUND, ...source]);
  for (const pair of outputs) for (const node of pair) nodes.add(node);
  for (const element of elements) {
    for (const node of [...element.nodes, ...('control' in element ? element.control : [])]) nodes.add(node);
  }
  if (nodes.size > MOST_NODES || elements.length > MOST_ELEMENTS) {
    throw new NotchworkError(
      'netlist-too-large',
      `This circuit has ${nodes.size} nodes and ${elements.length} elements; at most ${MOST_NODES} and ${MOST_ELEMENTS} can be solved exactly.`,
    );
  }
}
