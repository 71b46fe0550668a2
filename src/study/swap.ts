import type { SlotName } from '../blocks/block.ts';
import type { LineSettings } from '../blocks/line.ts';
import { LineTransfer } from '../blocks/line-transfer.ts';
import { withPart } from '../blocks/settings.ts';
import type { PlacedBlock, SpanTransfer } from '../blocks/span.ts';
import { lineLevel } from '../response/line-response.ts';
import type { Decibels, Hertz } from '../units.ts';

/** Where a swap is read: two fixed frequencies around the middle and the dip of the present curve. */
export interface SwapPlaces {
  readonly low: Hertz;
  /** Frequency of the present curve's mid dip; `undefined` where there is none. */
  readonly dip: Hertz | undefined;
  readonly middle: Hertz;
  readonly high: Hertz;
}

/** One value that a part could have instead, and what it would do. */
export interface SwapCandidate {
  readonly value: number;
  /** Whether this is the value in force. */
  readonly present: boolean;
  /** Transfer functions of the line with this value. */
  readonly spans: readonly SpanTransfer[];
  /** Level with this value less the level with the present one, at the places asked for. */
  readonly change: Readonly<Record<keyof SwapPlaces, Decibels | undefined>>;
}

/**
 * What other values of one part would do to the line.
 *
 * @param placed the blocks in the line; the part's block must be among them.
 * @param values the values to try, in the part's unit; the present one may be among them.
 * @returns one candidate for each value, in the order given.
 * @throws NotchworkError where a value leaves the circuit without an answer.
 */
export function swapPart(
  placed: readonly PlacedBlock[],
  slot: SlotName,
  part: string,
  values: readonly number[],
  places: SwapPlaces,
): readonly SwapCandidate[] {
  const index = placed.findIndex((entry) => entry.block.slot === slot);
  const own = placed[index];
  if (own === undefined) return [];
  const transfer = new LineTransfer();
  const now = transfer.of(placed);
  return values.map((value): SwapCandidate => {
    const present = own.settings.parts[part] === value;
    const spans = present
      ? now
      : transfer.of(placed.with(index, { ...own, settings: withPart(own.settings, part, value) }));
    const changeAt = (frequency: Hertz | undefined): Decibels | undefined =>
      frequency === undefined ? undefined : lineLevel(spans, frequency) - lineLevel(now, frequency);
    return {
      value,
      present,
      spans,
      change: {
        low: changeAt(places.low),
        dip: changeAt(places.dip),
        middle: changeAt(places.middle),
        high: changeAt(places.high),
      },
    };
  });
}

/** The line with one part of one slot changed, as a voicing would hold it. */
export function lineWithPart(line: LineSettings, slot: SlotName, part: string, value: number): LineSettings {
  const settings = line[slot];
  const own = settings.variants[settings.variant];
  if (own === undefined) return line;
  return {
    ...line,
    [slot]: {
      ...settings,
      variants: { ...settings.variants, [settings.variant]: withPart(own, part, value) },
    },
  };
}
