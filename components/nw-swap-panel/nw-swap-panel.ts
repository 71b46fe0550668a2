import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { PartSpec, SlotName } from '../../src/blocks/block.ts';
import { SERIES_NAMES, SERIES_TOLERANCE, type SeriesName } from '../../src/parts/series.ts';
import { formatValue } from '../../src/parts/value-text.ts';
import { plotNumber } from '../../src/sheet/plot-model.ts';
import type { SwapCandidate } from '../../src/study/swap.ts';
import { send } from '../events.ts';
import '../nw-notice/nw-notice.ts';
import '../nw-value-field/nw-value-field.ts';
import type { NwValueField } from '../nw-value-field/nw-value-field.ts';
import { baseStyles } from '../theme.ts';
import { swapPanelStyles } from './nw-swap-panel.styles.ts';

/** The part being swapped, with everything the panel says about it. */
export interface SwapSubject {
  readonly slot: SlotName;
  readonly part: string;
  readonly spec: PartSpec;
  /** Value in force before anything was tried. */
  readonly value: number;
  readonly candidates: readonly SwapCandidate[];
}

/**
 * Swap: a part's neighbours in a series of preferred values, what each would change, and each of
 * them heard at a press.
 *
 * @fires nw-part-set - a value was typed
 * @fires nw-swap-try - `{ value }`, hear and see this value for now
 * @fires nw-swap-keep - `{ value, into }`, keep it in the voicing or make it another one
 * @fires nw-swap-end - back to the value in force
 * @fires change - another series was chosen; read `series`
 */
@customElement('nw-swap-panel')
export class NwSwapPanel extends LitElement {
  static override styles = [baseStyles, swapPanelStyles];

  /** The part; undefined where none was pressed yet. */
  @property({ attribute: false }) subject: SwapSubject | undefined;

  /** Series that the neighbours are taken from. */
  @property() series: SeriesName = 'E12';

  /** The value being tried; undefined for none. */
  @property({ type: Number }) tried: number | undefined;

  /** Letter that a new voicing would get; empty where all are taken. */
  @property() nextLetter = '';

  #tryValue(value: number): void {
    if (value === this.subject?.value || value === this.tried) send(this, 'nw-swap-end', undefined);
    else send(this, 'nw-swap-try', { value });
  }

  #row(candidate: SwapCandidate, index: number, { spec, value }: SwapSubject): TemplateResult {
    const cell = (change: number | undefined): TemplateResult =>
      html`<td>${change === undefined ? '–' : plotNumber(change, 'magnitude', true)}</td>`;
    const { low, dip, high } = candidate.change;
    const isPresent = candidate.value === value;
    const text = formatValue(candidate.value, spec.unit);
    return html`<tr class=${isPresent ? 'present' : candidate.value === this.tried ? 'tried' : ''}>
      <th scope="row">${text}</th>
      ${isPresent ? html`<td>now</td><td></td><td></td>` : html`${cell(low)}${cell(dip)}${cell(high)}`}
      <td>
        <button
          class="key"
          aria-pressed=${candidate.value === this.tried || (isPresent && this.tried === undefined)}
          aria-label="${index + 1}: hear ${text}"
          @click=${() => this.#tryValue(candidate.value)}
        >
          ${index + 1}
        </button>
      </td>
    </tr>`;
  }

  #part(subject: SwapSubject): TemplateResult {
    const { slot, part, spec, value, candidates } = subject;
    return html`
      <h2>${spec.label}</h2>
      <p>${spec.help}</p>
      <div class="settings">
        <nw-value-field
          .label=${spec.label}
          .unit=${spec.unit}
          .range=${spec.range}
          .series=${this.series}
          .value=${value}
          @change=${(event: Event) => {
            event.stopPropagation();
            send(this, 'nw-part-set', { slot, part, value: (event.target as NwValueField).value });
          }}
        ></nw-value-field>
        <label>
          <select
            aria-label="Series of the neighbours"
            @change=${(event: Event) => {
              event.stopPropagation();
              this.series = (event.target as HTMLSelectElement).value as SeriesName;
              this.dispatchEvent(new Event('change', { bubbles: true, composed: true }));
            }}
          >
            ${SERIES_NAMES.map(
              (name) => html`<option value=${name} ?selected=${name === this.series}>
                ${name}, ±${SERIES_TOLERANCE[name]} %
              </option>`,
            )}
          </select>
        </label>
      </div>
      ${
        candidates.length === 0
          ? html`<p>This block is out of the line; put it in to see what another value would do.</p>`
          : html`
            <p>Neighbours in ${this.series}. Press a number to hear one; loudness stays matched.</p>
            <table>
              <thead>
                <tr>
                  <th scope="col">Value</th>
                  <th scope="col">100 Hz</th>
                  <th scope="col">dip</th>
                  <th scope="col">5 kHz</th>
                  <th scope="col">hear</th>
                </tr>
              </thead>
              <tbody>
                ${candidates.map((candidate, index) => this.#row(candidate, index, subject))}
              </tbody>
            </table>
            <p class="soft">Differences in dB from ${formatValue(value, spec.unit)}.</p>
            ${this.#actions(spec)}
          `
      }
      ${
        spec.kind === 'quantity'
          ? nothing
          : html`<nw-notice kind="caution"
            >Inside an amplifier this part sits at hundreds of volts, and capacitors stay charged when it is
            unplugged. Leave the work to someone qualified, and follow the electrical code where you live.</nw-notice
          >`
      }
    `;
  }

  #actions(spec: PartSpec): TemplateResult | typeof nothing {
    if (this.tried === undefined) return nothing;
    const value = this.tried;
    return html`<div class="actions">
      <button class="button primary" @click=${() => send(this, 'nw-swap-keep', { value, into: 'present' })}>
        Keep ${formatValue(value, spec.unit)}
      </button>
      ${
        this.nextLetter
          ? html`<button class="button" @click=${() => send(this, 'nw-swap-keep', { value, into: 'voicing' })}>
            Make it voicing ${this.nextLetter}
          </button>`
          : nothing
      }
      <button class="button quiet" @click=${() => send(this, 'nw-swap-end', undefined)}>Put it back</button>
    </div>`;
  }

  override render(): TemplateResult {
    return this.subject === undefined
      ? html`<h2>Swap a part</h2>
          <p>Press a part on one of the blocks: its neighbours appear here, each with what it would change.</p>`
      : this.#part(this.subject);
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-swap-panel': NwSwapPanel;
  }
}
