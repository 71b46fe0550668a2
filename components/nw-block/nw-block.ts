import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { live } from 'lit/directives/live.js';
import type { Block, BlockSettings, PartSpec, SlotName } from '../../src/blocks/block.ts';
import { isUsedPart } from '../../src/blocks/settings.ts';
import { formatValue } from '../../src/parts/value-text.ts';
import { rotation } from '../../src/units.ts';
import { send } from '../events.ts';
import '../nw-knob/nw-knob.ts';
import type { NwKnob } from '../nw-knob/nw-knob.ts';
import '../nw-part-chip/nw-part-chip.ts';
import '../nw-switch/nw-switch.ts';
import type { NwSwitch } from '../nw-switch/nw-switch.ts';
import { baseStyles } from '../theme.ts';
import { knobWords } from './knob-words.ts';
import { blockStyles } from './nw-block.styles.ts';

/** Name of each slot as it stands on its card. */
export const SLOT_TITLES: Readonly<Record<SlotName, string>> = {
  input: 'Input',
  stage: 'Stage',
  volume: 'Volume',
  driver: 'Driver',
  tone: 'Tone network',
  power: 'Power stage',
  speaker: 'Speaker',
};

/** Whether a part stands on the card: one that the wiring uses, and that is not behind a knob there. */
export function hasChip(block: Block, settings: BlockSettings, part: string): boolean {
  const { kind, unit } = block.parts[part]!;
  // Direct voltages shape nothing that is heard; they stand in the drawer.
  return kind !== 'potentiometer' && unit !== 'V' && isUsedPart(block, settings, part);
}

/**
 * A block of the line as a card: what it does now, its knobs, its parts, and a switch that takes it
 * out of the line. A press on its name opens the parts drawer; a press on what it does now chooses
 * another circuit, where its place has several.
 *
 * @slot - anything the block has to say (a warning)
 * @fires nw-knob-move - a knob was moved
 * @fires nw-part-choose - a part was pressed
 * @fires nw-present-set - the block was put into the line or taken out
 * @fires nw-variant-set - another circuit was chosen
 * @fires nw-drawer-open - its name was pressed
 */
@customElement('nw-block')
export class NwBlock extends LitElement {
  static override styles = [baseStyles, blockStyles];

  /** The block as the catalogue declares it. */
  @property({ attribute: false }) block!: Block;

  /** What the user decided about it. */
  @property({ attribute: false }) settings!: BlockSettings;

  /** Whether it is in the line. */
  @property({ type: Boolean, reflect: true }) present = false;

  /** Circuits that its place in the line can hold; with two or more, another can be chosen. */
  @property({ attribute: false }) variants: readonly Block[] = [];

  /** Whether it can be taken out of the line. */
  @property({ attribute: false }) removable = true;

  /** The part being worked on, if it is one of this block's. */
  @property() chosenPart = '';

  private handleKnob(event: Event, settled: boolean): void {
    const knob = event.target as NwKnob;
    send(this, 'nw-knob-move', {
      slot: this.block.slot,
      knob: knob.dataset['knob']!,
      position: rotation(knob.position),
      settled,
    });
  }

  private handlePresent(event: Event): void {
    send(this, 'nw-present-set', { slot: this.block.slot, present: (event.target as NwSwitch).checked });
  }

  private handleVariant(event: Event): void {
    const variant = (event.target as HTMLSelectElement).value;
    send(this, 'nw-variant-set', { slot: this.block.slot, variant });
  }

  #knob(name: string): TemplateResult {
    const knob = this.block.knobs[name]!;
    const { readout, spoken } = knobWords(this.block, this.settings, name);
    return html`<nw-knob
      data-knob=${name}
      .label=${knob.label}
      .position=${live(this.settings.knobs[name]!)}
      .fallback=${knob.fallback}
      .readout=${readout}
      .spoken=${spoken}
      title=${knob.help}
      @input=${(event: Event) => this.handleKnob(event, false)}
      @change=${(event: Event) => this.handleKnob(event, true)}
    ></nw-knob>`;
  }

  #chip(name: string, part: PartSpec): TemplateResult {
    return html`<nw-part-chip
      .label=${part.short}
      .value=${formatValue(this.settings.parts[name]!, part.unit)}
      .chosen=${this.chosenPart === name}
      title=${part.label}
      @click=${() => send(this, 'nw-part-choose', { slot: this.block.slot, part: name })}
    ></nw-part-chip>`;
  }

  /** What the block does now; where there is a choice, the native list lies invisibly on the words. */
  #doing(title: string): TemplateResult {
    const { block } = this;
    const words = block.describe(this.settings);
    if (this.variants.length < 2) return html`<span class="doing">${words}</span>`;
    return html`<span class="doing choosable">
      <span aria-hidden="true">${words}</span>
      <select aria-label="${title}: circuit" @change=${this.handleVariant}>
        ${this.variants.map(
          (entry) => html`<option
            value=${entry.variant}
            .selected=${live(entry.variant === block.variant)}
          >
            ${entry.title}
          </option>`,
        )}
      </select>
    </span>`;
  }

  #inside(title: string): TemplateResult {
    const { block, settings } = this;
    const knobs = Object.keys(block.knobs);
    const parts = Object.entries(block.parts).filter(([name]) => hasChip(block, settings, name));
    return html`
      ${this.#doing(title)}
      ${knobs.length > 0 ? html`<div class="knobs">${knobs.map((name) => this.#knob(name))}</div>` : nothing}
      <slot></slot>
      <div class="chips">${parts.map(([name, part]) => this.#chip(name, part))}</div>
    `;
  }

  override render(): TemplateResult {
    const title = SLOT_TITLES[this.block.slot];
    return html`
      <section class="card" aria-label=${title}>
        <div class="head">
          <button
            class="name"
            aria-haspopup="dialog"
            title="Open the parts drawer"
            @click=${() => send(this, 'nw-drawer-open', { slot: this.block.slot })}
          >
            ${title}
          </button>
          ${
            this.removable
              ? html`<nw-switch
                .label=${`${title} in the line`}
                .checked=${live(this.present)}
                @change=${this.handlePresent}
              ></nw-switch>`
              : nothing
          }
        </div>
        ${this.present ? this.#inside(title) : nothing}
      </section>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-block': NwBlock;
  }
}
