import { impedance } from '../circuit/impedance.ts';
import { GROUND } from '../circuit/wiring.ts';
import type { TransferFunction } from '../transfer-function.ts';
import { elementValues, type PlacedBlock, spansOf } from './span.ts';

/**
 * Impedance that the blocks before a load look like from it, in ohms, as a function of `s`: for a
 * driver alone, what the tone network is driven from.
 *
 * @param placed blocks present up to and with the one that feeds the load, at least one.
 * @throws NotchworkError from the compiler, or where the values leave no answer.
 */
export function sourceImpedance(placed: readonly PlacedBlock[]): TransferFunction {
  const span = spansOf(placed).at(-1)!;
  const { elements, network } = span.circuits.at(-1)!;
  const output = `${span.blocks.at(-1)!.block.slot}.out`;
  return impedance(
    {
      elements: elements.map((entry) => entry.element),
      source: network.wiring.source,
      outputs: [],
    },
    elementValues({ elements, network }, span.blocks),
    [output, GROUND],
  );
}
