import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import { messageOf } from '../../src/errors.ts';
import { next, type SeriesName } from '../../src/parts/series.ts';
import { formatValue, parseValue, speakValue } from '../../src/parts/value-text.ts';
import type { UnitSymbol } from '../../src/units.ts';
import { baseStyles } from '../theme.ts';
import { valueFieldStyles } from './nw-value-field.styles.ts';

/**
 * A field for a part's value. It reads what people write on parts, steps through a series of
 * preferred values by arrow keys or buttons, and where it cannot read something says what it
 * accepts; what was typed stays, and the last good value stays in force.
 *
 * @fires change - the value changed; read `value`
 */
@customElement('nw-value-field')
export class NwValueField extends LitElement {
  static override styles = [baseStyles, valueFieldStyles];

  @query('input') private input!: HTMLInputElement;

  /** What was typed and could not be used, or is being typed; undefined while the value is shown. */
  @state() private typed: string | undefined;

  @state() private problem = '';

  /** Name of the value, for those who do not see what stands beside it. */
  @property() label = '';

  /** The value in force, in its unit. */
  @property({ type: Number }) value = 0;

  /** What it is measured in. */
  @property() unit: UnitSymbol = 'Ω';

  /** Smallest and largest value accepted. */
  @property({ attribute: false }) range: readonly [min: number, max: number] = [0, Number.MAX_VALUE];

  /** Series that arrows and buttons step through. */
  @property() series: SeriesName = 'E12';

  override willUpdate(changed: PropertyValues<this>): void {
    if (changed.has('value') && changed.get('value') !== undefined) this.#forget();
  }

  #forget(): void {
    this.typed = undefined;
    this.problem = '';
  }

  #accept(value: number): void {
    this.#forget();
    if (value === this.value) return;
    this.value = value;
    this.dispatchEvent(new Event('change', { bubbles: true, composed: true }));
  }

  #step(steps: number): void {
    const [min, max] = this.range;
    const from =
      this.value > 0 ? next(this.value, this.series, steps) : steps > 0 ? Math.max(min, 1e-12) : min;
    if (from >= min && from <= max) this.#accept(from);
    else
      this.problem = `That is the end: ${formatValue(min, this.unit)} to ${formatValue(max, this.unit)} is accepted.`;
  }

  private handleInput(event: Event): void {
    event.stopPropagation();
    this.typed = this.input.value;
  }

  private handleChange(event: Event): void {
    event.stopPropagation();
    const typed = this.input.value;
    const [min, max] = this.range;
    try {
      this.#accept(parseValue(typed, this.unit, { min, max }));
    } catch (error) {
      this.typed = typed;
      this.problem = `${messageOf(error)} ${formatValue(this.value, this.unit)} stays in force.`;
    }
  }

  private handleKey(event: KeyboardEvent): void {
    const steps: Readonly<Record<string, number>> = { ArrowUp: 1, ArrowDown: -1, PageUp: 12, PageDown: -12 };
    if (Object.hasOwn(steps, event.key)) {
      event.preventDefault();
      this.#step(steps[event.key]!);
    } else if (event.key === 'Escape' && this.typed !== undefined) {
      event.stopPropagation();
      this.#forget();
    }
  }

  /** Puts the focus into the field and selects what is in it. */
  override focus(options?: FocusOptions): void {
    this.input?.focus(options);
    this.input?.select();
  }

  override render(): TemplateResult {
    const shown = this.typed ?? formatValue(this.value, this.unit);
    return html`
      <div class="row">
        <button
          class="button icon"
          aria-label="${this.label}: one value down in ${this.series}"
          @click=${() => this.#step(-1)}
        >
          −
        </button>
        <input
          class="field"
          aria-label=${this.label}
          aria-invalid=${this.problem !== ''}
          aria-describedby=${this.problem ? 'problem' : nothing}
          autocomplete="off"
          spellcheck="false"
          title=${speakValue(this.value, this.unit)}
          .value=${shown}
          @input=${this.handleInput}
          @change=${this.handleChange}
          @keydown=${this.handleKey}
        />
        <button
          class="button icon"
          aria-label="${this.label}: one value up in ${this.series}"
          @click=${() => this.#step(1)}
        >
          +
        </button>
      </div>
      <span class="message" id="problem" role="status">${this.problem}</span>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-value-field': NwValueField;
  }
}
