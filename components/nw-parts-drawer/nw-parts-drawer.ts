import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import { live } from 'lit/directives/live.js';
import { repeat } from 'lit/directives/repeat.js';
import type { Block, BlockSettings, ChoiceSpec, PartSpec } from '../../src/blocks/block.ts';
import { isUsedPart } from '../../src/blocks/settings.ts';
import type { SeriesName } from '../../src/parts/series.ts';
import type { Taper } from '../../src/parts/taper.ts';
import { send } from '../events.ts';
import { SLOT_TITLES } from '../nw-block/nw-block.ts';
import '../nw-notice/nw-notice.ts';
import '../nw-value-field/nw-value-field.ts';
import type { NwValueField } from '../nw-value-field/nw-value-field.ts';
import { baseStyles } from '../theme.ts';
import { partsDrawerStyles } from './nw-parts-drawer.styles.ts';

const LAWS: readonly { readonly value: Taper['law']; readonly label: string }[] = [
  { value: 'linear', label: 'linear' },
  { value: 'audio', label: 'audio' },
  { value: 'reverse-audio', label: 'reverse audio' },
];

/** Share of the track at half turn that a curved taper may have here, in per cent, and what is usual. */
const MIDPOINTS = { min: 2, max: 49, usual: 15 };

/**
 * Everything a block is made of: its circuit, its wiring, its parts with their values and what
 * raising them does, its potentiometers with their tapers. A modal panel at the side; Escape, the
 * button and a press beside it close it.
 *
 * @slot drawing - the schematic
 * @slot stress - what the parts have to stand
 * @fires nw-variant-set - another circuit was chosen
 * @fires nw-choice-set - another option of a choice
 * @fires nw-part-set - a part got another value
 * @fires nw-taper-set - a potentiometer got another taper
 * @fires close - the user closed it
 */
@customElement('nw-parts-drawer')
export class NwPartsDrawer extends LitElement {
  static override styles = [baseStyles, partsDrawerStyles];

  @query('dialog') private dialog!: HTMLDialogElement;

  /** Series that the fields step through, by kind of part. */
  @state() private series: Readonly<Partial<Record<PartSpec['kind'], SeriesName>>> = {};

  /** Knob whose midpoint was typed and cannot be used, with what was typed. */
  @state() private refused: { readonly knob: string; readonly typed: string } | undefined;

  /** The block shown; undefined while the drawer is closed. */
  @property({ attribute: false }) block: Block | undefined;

  /** Its settings. */
  @property({ attribute: false }) settings: BlockSettings | undefined;

  /** Circuits that its place in the line can hold. */
  @property({ attribute: false }) variants: readonly Block[] = [];

  #pressedBeside = false;

  override connectedCallback(): void {
    super.connectedCallback();
    if (this.hasUpdated) this.#openOrClose();
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.dialog?.close();
  }

  override willUpdate(changed: PropertyValues<this>): void {
    if (changed.has('block')) this.refused = undefined;
  }

  override updated(changed: PropertyValues<this>): void {
    if (changed.has('block')) this.#openOrClose();
  }

  #openOrClose(): void {
    if (this.block !== undefined && !this.dialog.open) this.dialog.showModal();
    else if (this.block === undefined) this.dialog.close();
  }

  /** A dialog closed by code, or opened again since, has nothing to tell. */
  private handleClose(): void {
    if (this.block === undefined || this.dialog.open || !this.isConnected) return;
    this.dispatchEvent(new Event('close'));
  }

  private handlePress(event: PointerEvent): void {
    this.#pressedBeside = event.target === this.dialog;
  }

  private handleClick(event: MouseEvent): void {
    if (this.#pressedBeside && event.target === this.dialog) this.dialog.close();
  }

  private handleMidpoint(event: Event, knob: string, taper: Taper): void {
    const { valueAsNumber: share, value: typed } = event.target as HTMLInputElement;
    const isAccepted = share >= MIDPOINTS.min && share <= MIDPOINTS.max;
    this.refused = isAccepted ? undefined : { knob, typed };
    if (isAccepted) this.#setTaper(knob, { ...taper, midpoint: share / 100 });
  }

  #setLaw(knob: string, law: Taper['law'], { midpoint }: Taper): void {
    const usable = midpoint < 0.5 ? midpoint : MIDPOINTS.usual / 100;
    this.refused = undefined;
    this.#setTaper(knob, { law, midpoint: law === 'linear' ? 0.5 : usable });
  }

  #setTaper(knob: string, taper: Taper): void {
    send(this, 'nw-taper-set', { slot: this.block!.slot, knob, taper });
  }

  #select(
    chosen: string,
    options: ChoiceSpec['options'],
    choose: (value: string) => void,
    name?: string,
  ): TemplateResult {
    return html`<select
      aria-label=${name ?? nothing}
      @change=${(event: Event) => choose((event.target as HTMLSelectElement).value)}
    >
      ${options.map(
        ({ value, label }) =>
          html`<option value=${value} .selected=${live(value === chosen)}>${label}</option>`,
      )}
    </select>`;
  }

  #choices(block: Block, settings: BlockSettings): TemplateResult {
    const { slot } = block;
    const circuits = this.variants.map(({ variant, title }) => ({ value: variant, label: title }));
    return html`<div class="choices">
      ${
        circuits.length < 2
          ? nothing
          : html`<label>
            <span class="name">Circuit</span>
            ${this.#select(block.variant, circuits, (variant) => send(this, 'nw-variant-set', { slot, variant }))}
            <span class="soft">Settings of the one you leave are kept.</span>
          </label>`
      }
      ${Object.entries(block.choices).map(
        ([choice, { label, options, help }]) => html`<label>
          <span class="name">${label}</span>
          ${this.#select(settings.choices[choice]!, options, (value) => send(this, 'nw-choice-set', { slot, choice, value }))}
          <span class="soft">${help}</span>
        </label>`,
      )}
    </div>`;
  }

  #part(name: string, part: PartSpec, settings: BlockSettings): TemplateResult {
    const knobs = Object.entries(this.block!.knobs).filter(([, knob]) => knob.part === name);
    return html`<li>
      <span class="designator">${part.designator}</span>
      <div class="what">
        <span class="name">${part.label}</span>
        <p class="soft">${part.help}</p>
      </div>
      <nw-value-field
        .label=${part.label}
        .unit=${part.unit}
        .range=${part.range}
        .series=${this.series[part.kind] ?? 'E12'}
        .seriesChoice=${part.kind !== 'quantity'}
        .value=${settings.parts[name]!}
        @nw-series-set=${(event: HTMLElementEventMap['nw-series-set']) => {
          this.series = { ...this.series, [part.kind]: event.detail.series };
        }}
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
    return html`<div class="taper">
      <span class="soft" aria-hidden="true">Taper</span>
      ${this.#select(taper.law, LAWS, (law) => this.#setLaw(knob, law as Taper['law'], taper), `Taper of ${label}`)}
      ${taper.law === 'linear' ? nothing : this.#midpoint(knob, label, taper)}
    </div>`;
  }

  #midpoint(knob: string, label: string, taper: Taper): TemplateResult {
    const isRefused = this.refused?.knob === knob;
    const shown = String(Math.round(taper.midpoint * 1000) / 10);
    return html`
      <input
        class="field"
        type="number"
        min=${MIDPOINTS.min}
        max=${MIDPOINTS.max}
        step="any"
        aria-label="${label}: per cent of the track at half turn"
        aria-invalid=${isRefused}
        aria-describedby=${isRefused ? `midpoint-${knob}` : nothing}
        .value=${live(isRefused ? this.refused!.typed : shown)}
        @change=${(event: Event) => this.handleMidpoint(event, knob, taper)}
      />
      <span class="soft" aria-hidden="true">% of the track at half turn</span>
      <span class="message" id="midpoint-${knob}" role="status"
        >${isRefused ? `${MIDPOINTS.min} to ${MIDPOINTS.max} % is accepted; ${shown} % stays in force.` : ''}</span
      >
    `;
  }

  #inside(block: Block, settings: BlockSettings): TemplateResult {
    const parts = Object.entries(block.parts).filter(([name]) => isUsedPart(block, settings, name));
    return html`
      <header>
        <h2 tabindex="-1" autofocus>${SLOT_TITLES[block.slot]}: ${block.title}</h2>
        <button class="button" @click=${() => this.dialog.close()}>Close</button>
      </header>
      <div class="inside">
        <p class="soft">${block.summary}</p>
        <slot name="drawing"></slot>
        ${this.#choices(block, settings)}
        <nw-notice kind="caution"
          >Valve amplifiers hold hundreds of volts, also when switched off and unplugged: capacitors keep their
          charge. Leave building and measuring inside one to qualified people, and follow the electrical code
          where you live first.</nw-notice
        >
        <h3 id="parts">Parts</h3>
        <ul aria-labelledby="parts">
          ${repeat(
            parts,
            ([name]) => `${block.slot}/${block.variant}/${name}`,
            ([name, part]) => this.#part(name, part, settings),
          )}
        </ul>
        <slot name="stress"></slot>
      </div>
    `;
  }

  override render(): TemplateResult {
    const { block, settings } = this;
    return html`<dialog
      aria-label=${block ? `Parts of the ${SLOT_TITLES[block.slot].toLowerCase()}` : 'Parts'}
      @close=${this.handleClose}
      @pointerdown=${this.handlePress}
      @click=${this.handleClick}
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
