import type { BranchContent } from './branch.ts';
import type { LineFilter } from './engine-types.ts';
import { FilterSlot } from './filter-slot.ts';

/** The slots of a line in series. Its layout is fixed; another layout is another rack. */
export class Rack implements BranchContent {
  readonly #slots: ReadonlyMap<string, FilterSlot>;
  readonly entry: AudioNode | undefined;
  readonly exit: AudioNode | undefined;

  /**
   * @param line the filters in the order of the signal; keys must differ.
   * @throws NotchworkError `filter-invalid` or `filter-unstable`.
   */
  constructor(context: BaseAudioContext, line: readonly LineFilter[]) {
    this.#slots = new Map(line.map(({ key, sections }) => [key, new FilterSlot(context, sections)]));
    const slots = [...this.#slots.values()];
    slots.forEach((slot, index) => {
      slots[index - 1]?.output.connect(slot.input);
    });
    this.entry = slots[0]?.input;
    this.exit = slots.at(-1)?.output;
  }

  /** Whether a line has the same keys in the same order. */
  fits(line: readonly LineFilter[]): boolean {
    const keys = [...this.#slots.keys()];
    return keys.length === line.length && keys.every((key, index) => key === line[index]!.key);
  }

  /** The slots whose filters a line of the same layout would change, with those filters. */
  changes(line: readonly LineFilter[]): { slot: FilterSlot; sections: LineFilter['sections'] }[] {
    return line.flatMap(({ key, sections }) => {
      const slot = this.#slots.get(key)!;
      return slot.sections === sections ? [] : [{ slot, sections }];
    });
  }

  dispose(): void {
    for (const slot of this.#slots.values()) slot.dispose();
  }
}
