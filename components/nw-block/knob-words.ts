import type { Block, BlockSettings } from '../../src/blocks/block.ts';
import { potentiometerHalves } from '../../src/blocks/settings.ts';
import { formatShort, speakValue } from '../../src/parts/value-text.ts';

/** What a knob's position is, to be seen and to be heard. */
export interface KnobWords {
  /** "150k · 100k", lower half first; "75k of 500k" for a variable resistor. */
  readonly readout: string;
  readonly spoken: string;
}

/** Sides of a knob's potentiometer that the block's present wiring has elements for. */
function usedSides(block: Block, settings: BlockSettings, knob: string): ReadonlySet<'lower' | 'upper'> {
  const elements = block.elements(settings, { before: undefined, after: undefined });
  return new Set(
    elements.flatMap(({ value }) => ('knob' in value && value.knob === knob ? [value.side] : [])),
  );
}

/**
 * Resistances that a knob's position stands for: both halves of its potentiometer, or, where the
 * wiring uses it as a variable resistor, the one half and the whole.
 *
 * @throws NotchworkError `design-invalid` for a knob that the block does not have.
 */
export function knobWords(block: Block, settings: BlockSettings, knob: string): KnobWords {
  const { lower, upper } = potentiometerHalves(block, settings, knob);
  const sides = usedSides(block, settings, knob);
  if (sides.size === 1) {
    const part = sides.has('lower') ? lower : upper;
    const whole = settings.parts[block.knobs[knob]!.part]!;
    return {
      readout: `${formatShort(part)} of ${formatShort(whole)}`,
      spoken: `${speakValue(part, 'Ω')} of ${speakValue(whole, 'Ω')}`,
    };
  }
  return {
    readout: `${formatShort(lower)} · ${formatShort(upper)}`,
    spoken: `${speakValue(lower, 'Ω')} below the wiper, ${speakValue(upper, 'Ω')} above`,
  };
}
