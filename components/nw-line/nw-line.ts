import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { Block, BlockSettings, SlotName } from '../../src/blocks/block.ts';
import type { PlacedBlock } from '../../src/blocks/span.ts';
import { formatValue } from '../../src/parts/value-text.ts';
import { hasChip } from '../nw-block/nw-block.ts';
import { baseStyles } from '../theme.ts';
import { lineStyles } from './nw-line.styles.ts';

/** A block of the line and whether the signal passes it. */
export interface LineEntry extends PlacedBlock {
  readonly present: boolean;
  /** Circuits that the place can hold; the card offers them where there are several. */
  readonly variants?: readonly Block[];
  /** False where the block cannot be taken out of the line. */
  readonly removable?: boolean;
}

/** The part being worked on. */
export interface ChosenPart {
  readonly slot: SlotName;
  readonly part: string;
}

/** Pixels that a card would like: its knobs beside each other, its chips (by their letters) in three rows. */
function cardWidth(block: Block, settings: BlockSettings): number {
  const knobs = Object.keys(block.knobs).length;
  const chips = Object.entries(block.parts)
    .filter(([name]) => hasChip(block, settings, name))
    .map(([name, { short, unit }]) => 42 + 6.5 * (short + formatValue(settings.parts[name]!, unit)).length);
  const row = chips.reduce((sum, chip) => sum + chip, 0) / 3 + 50;
  return Math.round(26 + Math.max(112, 96 * knobs, row, ...chips));
}

/**
 * The line: its blocks on one rail, in the order in which the signal passes them; a row that wraps,
 * and in a narrow place a column. A block out of the line leaves its name and its switch on the rail.
 * Events of the blocks pass through.
 *
 * @slot input, stage, volume, driver, tone, power, speaker - what the block of that name has to say
 */
@customElement('nw-line')
export class NwLine extends LitElement {
  static override styles = [baseStyles, lineStyles];

  /** The blocks, in the signal's order. */
  @property({ attribute: false }) entries: readonly LineEntry[] = [];

  /** The part being worked on, if any. */
  @property({ attribute: false }) chosen: ChosenPart | undefined;

  #entry(entry: LineEntry): TemplateResult {
    const { block, settings, present, variants = [], removable = true } = entry;
    return html`<li class=${present ? 'in' : 'out'} style="--width: ${cardWidth(block, settings)}">
      <nw-block
        .block=${block}
        .settings=${settings}
        .present=${present}
        .variants=${variants}
        .removable=${removable}
        .chosenPart=${this.chosen?.slot === block.slot ? this.chosen.part : ''}
      >
        <slot name=${block.slot}></slot>
      </nw-block>
    </li>`;
  }

  override render(): TemplateResult {
    return html`
      <ol class="rail" aria-label="The line, in the order of the signal">
        ${this.entries.map((entry) => this.#entry(entry))}
      </ol>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-line': NwLine;
  }
}
