import type { BlockSettings, SlotName } from '../blocks/block.ts';
import { blockOf } from '../blocks/catalogue.ts';
import type { LineSettings, SlotSettings } from '../blocks/line.ts';
import { defaultSettings, withKnob, withPart } from '../blocks/settings.ts';
import type { Taper } from '../parts/taper.ts';
import type { Rotation } from '../units.ts';
import type { Design } from './design.ts';

/** A change is a pure function from one design to the next; it returns the same object if nothing changes. */
export type DesignChange = (design: Design) => Design;

/** Changes the line of the active voicing. */
function changeLine(change: (line: LineSettings) => LineSettings): DesignChange {
  return (design) => {
    const voicings = design.voicings.map((voicing) => {
      if (voicing.letter !== design.active) return voicing;
      const line = change(voicing.line);
      return line === voicing.line ? voicing : { ...voicing, line };
    });
    return voicings.every((voicing, index) => voicing === design.voicings[index])
      ? design
      : { ...design, voicings };
  };
}

function changeSlot(slot: SlotName, change: (settings: SlotSettings) => SlotSettings): DesignChange {
  return changeLine((line) => {
    const next = change(line[slot]);
    return next === line[slot] ? line : { ...line, [slot]: next };
  });
}

/** Changes the settings of the variant in use in a slot. */
function changeBlock(slot: SlotName, change: (settings: BlockSettings) => BlockSettings): DesignChange {
  return changeSlot(slot, (settings) => {
    const before = settings.variants[settings.variant] ?? defaultSettings(blockOf(slot, settings.variant));
    const after = change(before);
    return after === before
      ? settings
      : { ...settings, variants: { ...settings.variants, [settings.variant]: after } };
  });
}

/** Turns a knob of the active voicing. */
export function setKnob(slot: SlotName, knob: string, position: Rotation): DesignChange {
  return changeBlock(slot, (settings) =>
    settings.knobs[knob] === position ? settings : withKnob(settings, knob, position),
  );
}

/** Changes a part's value in the active voicing; `value` is in the part's unit and within its range. */
export function setPart(slot: SlotName, part: string, value: number): DesignChange {
  return changeBlock(slot, (settings) =>
    settings.parts[part] === value ? settings : withPart(settings, part, value),
  );
}

/** Changes a potentiometer's taper in the active voicing. */
export function setTaper(slot: SlotName, knob: string, taper: Taper): DesignChange {
  return changeBlock(slot, (settings) => ({ ...settings, tapers: { ...settings.tapers, [knob]: taper } }));
}

/** Takes another option of a block's choice in the active voicing. */
export function setChoice(slot: SlotName, choice: string, value: string): DesignChange {
  return changeBlock(slot, (settings) =>
    settings.choices[choice] === value
      ? settings
      : { ...settings, choices: { ...settings.choices, [choice]: value } },
  );
}

/** Puts a block into the line of the active voicing, or takes it out; its settings stay. */
export function setPresent(slot: SlotName, present: boolean): DesignChange {
  return changeSlot(slot, (settings) => (settings.present === present ? settings : { ...settings, present }));
}

/** Switches a slot to another variant; settings of the one left are kept for switching back. */
export function setVariant(slot: SlotName, variant: string): DesignChange {
  return changeSlot(slot, (settings) => {
    if (settings.variant === variant) return settings;
    const known = settings.variants[variant] ?? defaultSettings(blockOf(slot, variant));
    return { ...settings, variant, variants: { ...settings.variants, [variant]: known } };
  });
}

/** Changes the words of the design: its title, author, revision or notes. */
export function setWords(
  words: Partial<Pick<Design, 'title' | 'author' | 'revision' | 'notes'>>,
): DesignChange {
  return (design) => ({ ...design, ...words });
}
