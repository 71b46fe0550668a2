import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { Block, BlockSettings, SlotName } from '../../src/blocks/block.ts';
import { isUsedPart, potentiometerHalves } from '../../src/blocks/settings.ts';
import { formatShort, formatValue, speakValue } from '../../src/parts/value-text.ts';
import { rotation } from '../../src/units.ts';
import { send } from '../events.ts';
import '../nw-knob/nw-knob.ts';
import type { NwKnob } from '../nw-knob/nw-knob.ts';
import '../nw-part-chip/nw-part-chip.ts';
import '../nw-switch/nw-switch.ts';
import type { NwSwitch } from '../nw-switch/nw-switch.ts';
import { baseStyles } from '../theme.ts';
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

/**
 * A block of the line as a card: what it does now, its knobs, its parts, and a switch that takes it
 * out of the line. A press on its name opens the parts drawer.
 *
 * @slot - anything the block has to say (a warning)
 * @fires nw-knob-move - a knob was moved
 * @fires nw-part-choose - a part was pressed
 * @fires nw-present-set - the block was put into the line or taken out
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

  #knob(name: string): TemplateResult {
    const knob = this.block.knobs[name]!;
    const { lower, upper } = potentiometerHalves(this.block, this.settings, name);
    return html`<nw-knob
      data-knob=${name}
      .label=${knob.label}
      .position=${this.settings.knobs[name]!}
      .fallback=${knob.fallback}
      .readout=${`${formatShort(lower)} · ${formatShort(upper)}`}
      .spoken=${`${speakValue(lower, 'Ω')} below the wiper, ${speakValue(upper, 'Ω')} above`}
      title=${knob.help}
      @input=${(event: Event) => this.handleKnob(event, false)}
      @change=${(event: Event) => this.handleKnob(event, true)}
    ></nw-knob>`;
  }

  override render(): TemplateResult {
    const { block, settings } = this;
    const knobs = Object.keys(block.knobs);
    const parts = Object.entries(block.parts).filter(
      ([name, part]) => part.kind !== 'potentiometer' && isUsedPart(block, settings, name),
    );
    const title = SLOT_TITLES[block.slot];
    return html`
      <section class="card" aria-label=${title}>
        <div class="head">
          <div class="names">
            <button
              class="name"
              aria-haspopup="dialog"
              title="Open the parts drawer"
              @click=${() => send(this, 'nw-drawer-open', { slot: block.slot })}
            >
              ${title}
            </button>
            ${this.present ? html`<span class="doing">${block.describe(settings)}</span>` : nothing}
          </div>
          <nw-switch
            .label=${`${title} in the line`}
            .checked=${this.present}
            @change=${this.handlePresent}
          ></nw-switch>
        </div>
        ${this.present && knobs.length > 0 ? html`<div class="knobs">${knobs.map((name) => this.#knob(name))}</div>` : nothing}
        <slot></slot>
        ${
          this.present
            ? html`<div class="chips">
              ${parts.map(
                ([name, part]) => html`<nw-part-chip
                  .label=${part.short}
                  .value=${formatValue(settings.parts[name]!, part.unit)}
                  .chosen=${this.chosenPart === name}
                  title=${part.label}
                  @click=${() => send(this, 'nw-part-choose', { slot: block.slot, part: name })}
                ></nw-part-chip>`,
              )}
            </div>`
            : nothing
        }
      </section>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-block': NwBlock;
  }
}
