import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import { live } from 'lit/directives/live.js';
import { messageOf } from '../../src/errors.ts';
import { parseValue } from '../../src/parts/read-value.ts';
import { next, SERIES_NAMES, type SeriesName, seriesValues } from '../../src/parts/series.ts';
import { formatValue, speakValue } from '../../src/parts/value-text.ts';
import type { UnitSymbol } from '../../src/units.ts';
import { send } from '../events.ts';
import { baseStyles } from '../theme.ts';
import { valueFieldStyles } from './nw-value-field.styles.ts';

/** First value above nothing, in each unit: a preferred series has no zero to step to or from. */
const LEAST: Readonly<Record<UnitSymbol, number>> = {
  Ω: 1,
  F: 1e-12,
  H: 1e-6,
  S: 1e-6,
  V: 1,
  A: 1e-6,
  W: 1e-3,
  ratio: 0.1,
};

/** A value so many preferred values up or down; through zero to the other sign. */
function stepped(value: number, series: SeriesName, unit: UnitSymbol, steps: number): number {
  if (value === 0) return Math.sign(steps) * LEAST[unit];
  if (value < 0) return -stepped(-value, series, unit, -steps);
  const result = next(value, series, steps);
  return steps < 0 && result < LEAST[unit] ? 0 : result;
}

/**
 * A field for a part's value. It reads what people write on parts, steps through a series of
 * preferred values by arrow keys or buttons (Page keys: a decade), and where it cannot read something
 * says what it accepts; what was typed stays, and the last good value stays in force.
 *
 * @fires change - the value changed; read `value`
 * @fires nw-series-set - another series was chosen, where it can be (`{ series: SeriesName }`)
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

  /** Whether the series can be chosen here. */
  @property({ type: Boolean, attribute: 'series-choice' }) seriesChoice = false;

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

  /** The value that was typed; undefined, and said why, where it cannot be used. */
  #readTyped(typed: string): number | undefined {
    const [min, max] = this.range;
    try {
      return parseValue(typed, this.unit, { min, max });
    } catch (error) {
      this.typed = typed;
      this.problem = `${messageOf(error)} ${formatValue(this.value, this.unit)} stays in force.`;
      return undefined;
    }
  }

  #step(steps: number): void {
    const { series, unit, range, typed } = this;
    const from = typed === undefined ? this.value : this.#readTyped(typed);
    if (from === undefined) return;
    const value = stepped(from, series, unit, steps);
    const [min, max] = range;
    if (value >= min && value <= max) this.#accept(value);
    else {
      const words = (figure: number): string => formatValue(figure, unit);
      this.problem = `${words(min)} to ${words(max)} is accepted; the next value in ${series} would be ${words(value)}.`;
    }
  }

  private handleInput(event: Event): void {
    event.stopPropagation();
    this.typed = this.input.value;
  }

  private handleChange(event: Event): void {
    event.stopPropagation();
    if (this.typed === undefined) return;
    const value = this.#readTyped(this.input.value);
    if (value !== undefined) this.#accept(value);
  }

  private handleKey(event: KeyboardEvent): void {
    const decade = seriesValues(this.series).length;
    const steps: Readonly<Record<string, number>> = {
      ArrowUp: 1,
      ArrowDown: -1,
      PageUp: decade,
      PageDown: -decade,
    };
    if (Object.hasOwn(steps, event.key)) {
      event.preventDefault();
      this.#step(steps[event.key]!);
    } else if (event.key === 'Escape' && this.typed !== undefined) {
      event.preventDefault(); // it would close the dialog around the field
      event.stopPropagation();
      this.#forget();
    }
  }

  private handleSeries(event: Event): void {
    event.stopPropagation();
    this.series = (event.target as HTMLSelectElement).value as SeriesName;
    send(this, 'nw-series-set', { series: this.series });
  }

  /** Puts the focus into the field and selects what is in it. */
  override focus(options?: FocusOptions): void {
    this.input?.focus(options);
    this.input?.select();
  }

  /** Arrow keys do the same from within the field, so the buttons are no stops of the Tab key. */
  #stepButton(sign: string, words: string, steps: number): TemplateResult {
    return html`<button
      class="button icon"
      tabindex="-1"
      aria-label="${this.label}: next ${words} in ${this.series}"
      @click=${() => this.#step(steps)}
    >
      ${sign}
    </button>`;
  }

  override render(): TemplateResult {
    return html`
      <div class="row">
        ${this.#stepButton('−', 'lower value', -1)}
        <input
          class="field"
          aria-label=${this.label}
          aria-invalid=${this.problem !== ''}
          aria-describedby=${this.problem ? 'problem' : nothing}
          autocomplete="off"
          autocapitalize="off"
          spellcheck="false"
          title=${speakValue(this.value, this.unit)}
          .value=${live(this.typed ?? formatValue(this.value, this.unit))}
          @input=${this.handleInput}
          @change=${this.handleChange}
          @keydown=${this.handleKey}
        />
        ${this.#stepButton('+', 'higher value', 1)}
        ${
          this.seriesChoice
            ? html`<select
              class="series"
              aria-label="${this.label}: series that is stepped through"
              @change=${this.handleSeries}
            >
              ${SERIES_NAMES.map((name) => html`<option .selected=${live(name === this.series)}>${name}</option>`)}
            </select>`
            : nothing
        }
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
