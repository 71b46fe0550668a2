import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import type { Block, BlockSettings, ChoiceSpec, PartSpec } from '../../src/blocks/block.ts';
import { isUsedPart } from '../../src/blocks/settings.ts';
import { SERIES_NAMES, type SeriesName } from '../../src/parts/series.ts';
import type { Taper } from '../../src/parts/taper.ts';
import { send } from '../events.ts';
import { SLOT_TITLES } from '../nw-block/nw-block.ts';
import '../nw-notice/nw-notice.ts';
import '../nw-value-field/nw-value-field.ts';
import type { NwValueField } from '../nw-value-field/nw-value-field.ts';
import { baseStyles } from '../theme.ts';
import { partsDrawerStyles } from './nw-parts-drawer.styles.ts';

const LAWS: readonly { readonly law: Taper['law']; readonly label: string }[] = [
  { law: 'linear', label: 'linear' },
  { law: 'audio', label: 'audio' },
  { law: 'reverse-audio', label: 'reverse audio' },
];

/**
 * Everything a block is made of: its variant, its wiring, its parts with their values and what
 * raising them does, its potentiometers with their tapers.
 *
 * @slot drawing - the schematic
 * @slot stress - what the parts have to stand
 * @fires nw-variant-set - another variant was chosen
 * @fires nw-choice-set - another option of a choice
 * @fires nw-part-set - a part got another value
 * @fires nw-taper-set - a potentiometer got another taper
 * @fires close - it was closed
 */
@customElement('nw-parts-drawer')
export class NwPartsDrawer extends LitElement {
  static override styles = [baseStyles, partsDrawerStyles];

  @query('dialog') private dialog!: HTMLDialogElement;

  @state() private series: SeriesName = 'E12';

  /** The block shown; undefined while the drawer is closed. */
  @property({ attribute: false }) block: Block | undefined;

  /** Its settings. */
  @property({ attribute: false }) settings: BlockSettings | undefined;

  /** Blocks that its slot can hold. */
  @property({ attribute: false }) variants: readonly Block[] = [];

  override updated(changed: PropertyValues<this>): void {
    if (!changed.has('block')) return;
    if (this.block !== undefined && !this.dialog.open) this.dialog.showModal();
    else if (this.block === undefined && this.dialog.open) this.dialog.close();
  }

  private handleClose(): void {
    this.dispatchEvent(new Event('close'));
  }

  private handleBackdrop(event: MouseEvent): void {
    if (event.target === this.dialog) this.dialog.close();
  }

  #choice(name: string, choice: ChoiceSpec, settings: BlockSettings): TemplateResult {
    return html`<label>
      <span class="what">${choice.label}</span>
      <select
        @change=${(event: Event) =>
          send(this, 'nw-choice-set', {
            slot: this.block!.slot,
            choice: name,
            value: (event.target as HTMLSelectElement).value,
          })}
      >
        ${choice.options.map(
          (option) => html`<option
            value=${option.value}
            ?selected=${settings.choices[name] === option.value}
          >
            ${option.label}
          </option>`,
        )}
      </select>
      <span class="soft">${choice.help}</span>
    </label>`;
  }

  #part(name: string, part: PartSpec, settings: BlockSettings): TemplateResult {
    const knobs = Object.entries(this.block!.knobs).filter(([, knob]) => knob.part === name);
    return html`<li>
      <span class="designator">${part.designator}</span>
      <span class="what">
        ${part.label}
        <p class="soft">${part.help}</p>
      </span>
      <nw-value-field
        .label=${part.label}
        .unit=${part.unit}
        .range=${part.range}
        .series=${this.series}
        .value=${settings.parts[name]!}
        @change=${(event: Event) =>
          send(this, 'nw-part-set', {
            slot: this.block!.slot,
            part: name,
            value: (event.target as NwValueField).value,
          })}
      ></nw-value-field>
      ${knobs.map(([knob, { label }]) => this.#taper(knob, label, settings.tapers[knob]!))}
    </li>`;
  }

  #taper(knob: string, label: string, taper: Taper): TemplateResult {
    const set = (next: Taper): void =>
      send(this, 'nw-taper-set', { slot: this.block!.slot, knob, taper: next });
    return html`<span class="taper">
      <select
        aria-label="Taper of ${label}"
        @change=${(event: Event) => {
          const law = (event.target as HTMLSelectElement).value as Taper['law'];
          set({ law, midpoint: law === 'linear' ? 0.5 : taper.midpoint < 0.5 ? taper.midpoint : 0.15 });
        }}
      >
        ${LAWS.map(({ law, label: words }) => html`<option value=${law} ?selected=${taper.law === law}>${words}</option>`)}
      </select>
      ${
        taper.law === 'linear'
          ? nothing
          : html`<label
            ><input
              class="field"
              type="number"
              min="2"
              max="49"
              step="1"
              aria-label="${label}: per cent of the track at half turn"
              .value=${String(Math.round(taper.midpoint * 1000) / 10)}
              @change=${(event: Event) => {
                const field = event.target as HTMLInputElement;
                if (field.checkValidity() && field.value !== '')
                  set({ ...taper, midpoint: field.valueAsNumber / 100 });
                else field.value = String(taper.midpoint * 100);
              }}
            />
            <span class="soft">% at half turn</span></label
          >`
      }
    </span>`;
  }

  #inside(block: Block, settings: BlockSettings): TemplateResult {
    const parts = Object.entries(block.parts).filter(([name]) => isUsedPart(block, settings, name));
    return html`
      <div class="inside">
        <header>
          <h2>${SLOT_TITLES[block.slot]}: ${block.title}</h2>
          <button class="button" @click=${() => this.dialog.close()}>Close</button>
        </header>
        <p class="soft">${block.summary}</p>
        <slot name="drawing"></slot>
        <div class="choices">
          ${
            this.variants.length > 1
              ? html`<label>
                <span class="what">Circuit</span>
                <select
                  @change=${(event: Event) =>
                    send(this, 'nw-variant-set', {
                      slot: block.slot,
                      variant: (event.target as HTMLSelectElement).value,
                    })}
                >
                  ${this.variants.map(
                    ({
                      variant,
                      title,
                    }) => html`<option value=${variant} ?selected=${variant === block.variant}>
                      ${title}
                    </option>`,
                  )}
                </select>
                <span class="soft">Settings of the one you leave are kept.</span>
              </label>`
              : nothing
          }
          ${Object.entries(block.choices).map(([name, choice]) => this.#choice(name, choice, settings))}
          <label>
            <span class="what">Steps of the value fields</span>
            <select
              @change=${(event: Event) => {
                this.series = (event.target as HTMLSelectElement).value as SeriesName;
              }}
            >
              ${SERIES_NAMES.map((name) => html`<option ?selected=${name === this.series}>${name}</option>`)}
            </select>
          </label>
        </div>
        <h3>Parts</h3>
        <ul>
          ${parts.map(([name, part]) => this.#part(name, part, settings))}
        </ul>
        <slot name="stress"></slot>
        <nw-notice kind="caution"
          >Valve amplifiers hold hundreds of volts, also when switched off and unplugged: capacitors keep their
          charge. Leave building and measuring inside one to qualified people, and follow the electrical code
          where you live first.</nw-notice
        >
      </div>
    `;
  }

  override render(): TemplateResult {
    const { block, settings } = this;
    return html`<dialog
      aria-label=${block ? `Parts of the ${SLOT_TITLES[block.slot].toLowerCase()}` : 'Parts'}
      @close=${this.handleClose}
      @click=${this.handleBackdrop}
    >
      ${block && settings ? this.#inside(block, settings) : nothing}
    </dialog>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-parts-drawer': NwPartsDrawer;
  }
}
