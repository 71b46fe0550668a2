import { html, LitElement, nothing, type PropertyValues, svg, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { knobStyles } from './nw-knob.styles.ts';

/** One key press: a tenth of a mark on the dial of 0 to 10. */
const STEP = 0.01;
const FINE_STEP = 0.002;
const PAGE_STEPS = 10;
/** Pixels of vertical drag for the whole range, coarse and with Shift. */
const DRAG_TRAVEL = 180;
const FINE_DRAG_TRAVEL = 900;
/** The arc spans 270 degrees, from lower left to lower right. */
const SWEEP = 270;
const TICKS = 11;

/** Point on a circle about the dial's centre; `turn` from 0 to 1 along the arc. */
function pointAt(turn: number, radius: number): [x: number, y: number] {
  const angle = ((turn * SWEEP - SWEEP / 2 - 90) * Math.PI) / 180;
  return [50 + radius * Math.cos(angle), 52 + radius * Math.sin(angle)];
}

function arc(from: number, to: number, radius: number): string {
  const [x1, y1] = pointAt(from, radius);
  const [x2, y2] = pointAt(to, radius);
  const large = (to - from) * SWEEP > 180 ? 1 : 0;
  return `M${x1.toFixed(2)} ${y1.toFixed(2)}A${radius} ${radius} 0 ${large} 1 ${x2.toFixed(2)} ${y2.toFixed(2)}`;
}

/**
 * A control to turn: an arc from 0 to 10, its position in figures, and under it what the position is.
 *
 * Drag up or down (Shift: fine), arrow keys one step, Page keys ten, Home and End, the wheel while
 * focused; a double click or Delete returns to the default; typing a number sets it.
 *
 * @fires input - while it is being turned; read `position`
 * @fires change - when it has settled; read `position`
 * @csspart dial - the part that is dragged
 * @cssproperty --nw-accent - colour of the filled arc
 */
@customElement('nw-knob')
export class NwKnob extends LitElement {
  static override styles = [baseStyles, knobStyles];

  @query('.entry') private entryField!: HTMLInputElement | null;

  @query('.dial') private dial!: HTMLElement;

  /** Text being typed, or undefined while nothing is. */
  @state() private typed: string | undefined;

  /** Name above the dial. */
  @property() label = '';

  /** Position, 0 to 1. */
  @property({ type: Number }) position = 0;

  /** Position that a double click returns to. */
  @property({ type: Number }) fallback = 0.5;

  /** What the position is, under the dial: "150k · 100k". */
  @property() readout = '';

  /** The same in words, read after the position: "150 kilohms and 100 kilohms". */
  @property() spoken = '';

  #drag: { readonly pointer: number; readonly y: number; readonly start: number } | undefined;
  #reference = { y: 0, position: 0 };
  #wheelSettles: ReturnType<typeof setTimeout> | undefined;

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#settleWheel();
    this.#drag = undefined;
  }

  override updated(changed: PropertyValues): void {
    if (changed.has('typed' as keyof this) && this.typed !== undefined) this.entryField?.focus();
  }

  #tell(type: 'input' | 'change'): void {
    this.dispatchEvent(new Event(type, { bubbles: true, composed: true }));
  }

  /** Moves by the user's hand; true where the position changed. */
  #moveTo(position: number): boolean {
    const next = Math.min(Math.max(position, 0), 1);
    if (next === this.position || Number.isNaN(next)) return false;
    this.position = next;
    this.#tell('input');
    return true;
  }

  #set(position: number): void {
    if (this.#moveTo(position)) this.#tell('change');
  }

  private handlePointerDown(event: PointerEvent): void {
    if (event.button !== 0 || this.typed !== undefined) return;
    event.preventDefault();
    this.dial.focus();
    this.dial.setPointerCapture(event.pointerId);
    this.#drag = { pointer: event.pointerId, y: event.clientY, start: this.position };
    this.#reference = { y: event.clientY, position: this.position };
  }

  private handlePointerMove(event: PointerEvent): void {
    if (this.#drag?.pointer !== event.pointerId) return;
    const travel = event.shiftKey ? FINE_DRAG_TRAVEL : DRAG_TRAVEL;
    this.#moveTo(this.#reference.position + (this.#reference.y - event.clientY) / travel);
    this.#reference = { y: event.clientY, position: this.position };
  }

  private handlePointerUp(event: PointerEvent): void {
    if (this.#drag?.pointer !== event.pointerId) return;
    const { start } = this.#drag;
    this.#drag = undefined;
    if (this.position !== start) this.#tell('change');
  }

  private handlePointerCancel(event: PointerEvent): void {
    if (this.#drag?.pointer !== event.pointerId) return;
    this.#endDragWhereItBegan();
  }

  #endDragWhereItBegan(): void {
    if (this.#drag === undefined) return;
    const { start } = this.#drag;
    this.#drag = undefined;
    if (this.#moveTo(start)) this.#tell('change');
  }

  private handleWheel(event: WheelEvent): void {
    if (this.shadowRoot?.activeElement !== this.dial) return;
    event.preventDefault();
    const step = event.shiftKey ? FINE_STEP : STEP;
    if (!this.#moveTo(this.position - Math.sign(event.deltaY || event.deltaX) * step)) return;
    clearTimeout(this.#wheelSettles);
    this.#wheelSettles = setTimeout(() => this.#settleWheel(), 250); // the wheel has no end of its own
  }

  #settleWheel(): void {
    if (this.#wheelSettles === undefined) return;
    clearTimeout(this.#wheelSettles);
    this.#wheelSettles = undefined;
    this.#tell('change');
  }

  private handleKey(event: KeyboardEvent): void {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const step = event.shiftKey ? FINE_STEP : STEP;
    const towardsEnd = getComputedStyle(this).direction === 'rtl' ? -1 : 1;
    const moves: Readonly<Record<string, number>> = {
      ArrowUp: this.position + step,
      ArrowDown: this.position - step,
      ArrowRight: this.position + towardsEnd * step,
      ArrowLeft: this.position - towardsEnd * step,
      PageUp: this.position + PAGE_STEPS * STEP,
      PageDown: this.position - PAGE_STEPS * STEP,
      Home: 0,
      End: 1,
      Delete: this.fallback,
      Backspace: this.fallback,
    };
    if (event.key === 'Escape' && this.#drag !== undefined) {
      event.preventDefault();
      this.#endDragWhereItBegan();
    } else if (Object.hasOwn(moves, event.key)) {
      event.preventDefault();
      this.#set(Math.round(moves[event.key]! * 1e6) / 1e6);
    } else if (/^[\d.,]$/.test(event.key)) {
      event.preventDefault();
      this.typed = event.key;
    }
  }

  private handleEntryKey(event: KeyboardEvent): void {
    event.stopPropagation();
    if (event.key === 'Enter') this.#commitEntry();
    else if (event.key === 'Escape') this.typed = undefined;
    else return;
    event.preventDefault();
    this.dial.focus();
  }

  private handleEntryInput(event: Event): void {
    event.stopPropagation();
    this.typed = (event.target as HTMLInputElement).value;
  }

  #commitEntry(): void {
    const value = Number(this.typed?.trim().replace(',', '.'));
    const isNumber = this.typed !== undefined && this.typed.trim() !== '' && Number.isFinite(value);
    this.typed = undefined;
    if (isNumber) this.#set(value / 10);
  }

  private handleEntryBlur(): void {
    if (this.typed !== undefined) this.#commitEntry();
  }

  /** Puts the focus on the dial. */
  override focus(options?: FocusOptions): void {
    this.dial?.focus(options);
  }

  override render(): TemplateResult {
    const shown = (this.position * 10).toFixed(1);
    const [x1, y1] = pointAt(this.position, 38);
    const [x2, y2] = pointAt(this.position, 26);
    return html`
      <span class="label" id="label">${this.label}</span>
      <div class="stage">
      <div
        class="dial"
        part="dial"
        role="slider"
        tabindex="0"
        aria-labelledby="label"
        aria-valuemin="0"
        aria-valuemax="10"
        aria-valuenow=${shown}
        aria-valuetext=${this.spoken ? `${shown}, ${this.spoken}` : shown}
        @pointerdown=${this.handlePointerDown}
        @pointermove=${this.handlePointerMove}
        @pointerup=${this.handlePointerUp}
        @pointercancel=${this.handlePointerCancel}
        @dblclick=${() => this.#set(this.fallback)}
        @wheel=${this.handleWheel}
        @keydown=${this.handleKey}
      >
        <svg viewBox="0 0 100 96" aria-hidden="true">
          <g class="ticks">
            ${Array.from({ length: TICKS }, (_, index) => {
              const [a, b] = pointAt(index / (TICKS - 1), 43);
              const [c, d] = pointAt(index / (TICKS - 1), 46.5);
              return svg`<line x1=${a} y1=${b} x2=${c} y2=${d}></line>`;
            })}
          </g>
          <path class="track" d=${arc(0, 1, 36)}></path>
          ${this.position > 0 ? svg`<path class="filled" d=${arc(0, this.position, 36)}></path>` : nothing}
          <line class="pointer" x1=${x1} y1=${y1} x2=${x2} y2=${y2}></line>
        </svg>
        <span class="value" aria-hidden="true">${this.typed === undefined ? shown : ''}</span>
      </div>
      ${
        this.typed === undefined
          ? nothing
          : html`<input
            class="entry"
            inputmode="decimal"
            aria-label="${this.label}, 0 to 10"
            .value=${this.typed}
            @input=${this.handleEntryInput}
            @change=${(event: Event) => event.stopPropagation()}
            @keydown=${this.handleEntryKey}
            @blur=${this.handleEntryBlur}
          />`
      }
      </div>
      <span class="readout" aria-hidden="true">${this.readout}</span>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-knob': NwKnob;
  }
}
