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
/** Pixels of scrolling for one step: a notch of a wheel has more, a touchpad sends many small ones. */
const WHEEL_TRAVEL = 30;
/** Milliseconds without scrolling after which it is taken to be over; the wheel has no end of its own. */
const WHEEL_REST = 250;
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
 * focused; a double click or Delete returns to the default; typing a number (of 10, or with a per
 * cent sign) sets it. Escape or a cancelled pointer puts it back to where the drag began.
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

  /** Whether what was typed is no position. */
  @state() private refused = false;

  /** Name above the dial. */
  @property() label = '';

  /** Position, 0 to 1. */
  @property({ type: Number }) position = 0;

  /** Position that a double click returns to. */
  @property({ type: Number }) fallback = 0.5;

  /** What the position is, under the dial: "150k · 100k". */
  @property() readout = '';

  /** The same in words; the position in per cent is read after it: "47 kilohms, 60 %". */
  @property() spoken = '';

  #drag: { readonly pointer: number; readonly y: number; readonly start: number } | undefined;
  #reference = { y: 0, position: 0 };
  #scrolled = 0;
  #scrollRests: ReturnType<typeof setTimeout> | undefined;
  /** Whether `input` was told since the last `change`. */
  #unsettled = false;

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#drag = undefined;
    this.typed = undefined;
    this.#settle();
  }

  override updated(changed: PropertyValues): void {
    if (changed.has('typed' as keyof this) && this.typed !== undefined) this.entryField?.focus();
  }

  #tell(type: 'input' | 'change'): void {
    this.dispatchEvent(new Event(type, { bubbles: true, composed: true }));
  }

  /** Moves by the user's hand. */
  #moveTo(position: number): void {
    const next = Math.min(Math.max(position, 0), 1);
    if (next === this.position) return;
    this.position = next;
    this.#unsettled = true;
    this.#tell('input');
  }

  #moveBySteps(steps: number, fine: boolean): void {
    const position = this.position + steps * (fine ? FINE_STEP : STEP);
    this.#moveTo(Math.round(position * 1e6) / 1e6); // no 0.5700000000000001
  }

  #settle(): void {
    clearTimeout(this.#scrollRests);
    if (!this.#unsettled) return;
    this.#unsettled = false;
    this.#tell('change');
  }

  #set(position: number): void {
    this.#moveTo(position);
    this.#settle();
  }

  private handlePointerDown(event: PointerEvent): void {
    if (event.button !== 0 || this.#drag !== undefined) return;
    event.preventDefault();
    this.#settle();
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
    this.#drag = undefined;
    this.#settle();
  }

  /** Also where the capture is lost: a pointer that was let go has ended its drag before. */
  private handlePointerCancel(event: PointerEvent): void {
    if (this.#drag?.pointer !== event.pointerId) return;
    this.#endDragWhereItBegan();
  }

  #endDragWhereItBegan(): void {
    if (this.#drag === undefined) return;
    const { start } = this.#drag;
    this.#drag = undefined;
    this.#set(start);
  }

  private handleWheel(event: WheelEvent): void {
    if (event.ctrlKey || this.shadowRoot?.activeElement !== this.dial) return;
    event.preventDefault();
    const way = event.deltaY || event.deltaX; // some systems turn a wheel with Shift sideways
    const inPixels = event.deltaMode === WheelEvent.DOM_DELTA_PIXEL;
    const travel = inPixels ? way : Math.sign(way) * WHEEL_TRAVEL;
    this.#scrolled = travel * this.#scrolled < 0 ? travel : this.#scrolled + travel;
    if (Math.abs(this.#scrolled) < WHEEL_TRAVEL) return;
    this.#moveBySteps(-Math.sign(this.#scrolled), event.shiftKey);
    this.#scrolled = 0;
    clearTimeout(this.#scrollRests);
    this.#scrollRests = setTimeout(() => this.#settle(), WHEEL_REST);
  }

  private handleKey(event: KeyboardEvent): void {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const towardsEnd = getComputedStyle(this).direction === 'rtl' ? -1 : 1;
    const steps: Readonly<Record<string, number>> = {
      ArrowUp: 1,
      ArrowDown: -1,
      ArrowRight: towardsEnd,
      ArrowLeft: -towardsEnd,
      PageUp: PAGE_STEPS,
      PageDown: -PAGE_STEPS,
    };
    const places: Readonly<Record<string, number>> = {
      Home: 0,
      End: 1,
      Delete: this.fallback,
      Backspace: this.fallback,
    };
    if (Object.hasOwn(steps, event.key)) {
      this.#moveBySteps(steps[event.key]!, event.shiftKey && Math.abs(steps[event.key]!) === 1);
    } else if (Object.hasOwn(places, event.key)) this.#moveTo(places[event.key]!);
    else if (event.key === 'Escape' && this.#drag !== undefined) this.#endDragWhereItBegan();
    else if (/^[\d.,]$/.test(event.key)) this.typed = event.key;
    else return;
    event.preventDefault();
  }

  /** A key held down moves on and on, and settles once. */
  private handleKeyUp(): void {
    if (this.#drag === undefined) this.#settle();
  }

  private handleEntryKey(event: KeyboardEvent): void {
    event.stopPropagation();
    if (event.key !== 'Enter' && event.key !== 'Escape') return;
    event.preventDefault();
    if (event.key === 'Enter' && !this.#commitEntry()) return;
    this.#closeEntry();
    this.dial.focus();
  }

  private handleEntryInput(event: Event): void {
    event.stopPropagation();
    this.typed = (event.target as HTMLInputElement).value;
    this.refused = false;
  }

  /** Takes what was typed; false where it is no position, and then it stays to be mended. */
  #commitEntry(): boolean {
    const parts = /^\s*(\d+(?:[.,]\d*)?|[.,]\d+)\s*(%?)\s*$/.exec(this.typed ?? '');
    const position = parts ? Number(parts[1]!.replace(',', '.')) / (parts[2] === '%' ? 100 : 10) : Number.NaN;
    this.refused = !(position <= 1);
    if (!this.refused) this.#set(position);
    return !this.refused;
  }

  #closeEntry(): void {
    this.typed = undefined;
    this.refused = false;
  }

  private handleEntryBlur(): void {
    if (this.typed === undefined) return;
    this.#commitEntry();
    this.#closeEntry();
  }

  /** Puts the focus on the dial. */
  override focus(options?: FocusOptions): void {
    this.dial?.focus(options);
  }

  override render(): TemplateResult {
    const shown = (this.position * 10).toFixed(1);
    const share = `${Math.round(this.position * 1000) / 10}\u202f%`;
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
        aria-valuenow=${Math.round(this.position * 1000) / 100}
        aria-valuetext=${this.spoken ? `${this.spoken}, ${share}` : share}
        @pointerdown=${this.handlePointerDown}
        @pointermove=${this.handlePointerMove}
        @pointerup=${this.handlePointerUp}
        @pointercancel=${this.handlePointerCancel}
        @lostpointercapture=${this.handlePointerCancel}
        @dblclick=${() => this.#set(this.fallback)}
        @wheel=${this.handleWheel}
        @keydown=${this.handleKey}
        @keyup=${this.handleKeyUp}
        @blur=${this.handleKeyUp}
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
            aria-invalid=${this.refused}
            aria-describedby=${this.refused ? 'accepted' : nothing}
            .value=${this.typed}
            @input=${this.handleEntryInput}
            @change=${(event: Event) => event.stopPropagation()}
            @keydown=${this.handleEntryKey}
            @blur=${this.handleEntryBlur}
          />`
      }
      </div>
      ${
        this.refused
          ? html`<span class="readout refused" id="accepted" role="alert">0 to 10</span>`
          : html`<span class="readout" aria-hidden="true">${this.readout}</span>`
      }
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-knob': NwKnob;
  }
}
