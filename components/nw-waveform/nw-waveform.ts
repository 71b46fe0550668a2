import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import type { Region } from '../../src/audio/engine-types.ts';
import type { Overview } from '../../src/clip/overview.ts';
import type { Seconds } from '../../src/units.ts';
import { send } from '../events.ts';
import { baseStyles } from '../theme.ts';
import { spokenTime, timeText } from './clip-time.ts';
import { waveformStyles } from './nw-waveform.styles.ts';
import { isWhole, type RegionEdge, regionBetween, withEdge } from './region.ts';
import { HALF_HEIGHT, wavePath } from './wave-path.ts';

/** Steps across the drawing; it stretches to any width and stays a vector. */
const COLUMNS = 1000;
/** A press that moves less than this is a click. */
const CLICK_SLACK = 4;
const EDGES: readonly RegionEdge[] = ['start', 'end'];

/** What the pointer is doing: moving one edge, or pressing a place from which a new region may be drawn. */
interface Drag {
  readonly pointer: number;
  /** Where it came down, in the window and in the clip. */
  readonly x: number;
  readonly from: Seconds;
  /** The region as it was; the owner may follow every move with the property. */
  readonly before: Region;
  readonly edge: RegionEdge | undefined;
}

/**
 * A clip as a waveform, with the part of it that plays and the place that is heard.
 *
 * Press to go to a place; drag to choose a part; drag its ends, or move them by arrow keys (Shift:
 * fine), Page keys, Home and End. Delete, Escape while dragging, or a double click chooses the whole.
 *
 * @fires nw-seek - `{ seconds }`, the place that was pressed
 * @fires nw-region-set - `{ start, end, settled }`; the whole clip is 0 to its length
 * @cssproperty --nw-wave - colour of the waveform
 */
@customElement('nw-waveform')
export class NwWaveform extends LitElement {
  static override styles = [baseStyles, waveformStyles];

  @query('.stage') private stage!: HTMLElement;

  /** The region while it is dragged; the property answers only once it is settled. */
  @state() private dragged: Region | undefined;

  /** Edge whose time is shown: the one that is dragged or has the focus. */
  @state() private tagged: RegionEdge | undefined;

  /** The waveform; undefined while there is no clip. */
  @property({ attribute: false }) overview: Overview | undefined;

  /** Length of the clip in seconds. */
  @property({ type: Number }) duration: Seconds = 0;

  /** Place that is heard, in seconds. */
  @property({ type: Number }) position: Seconds = 0;

  /** The part that plays; undefined for all of it. */
  @property({ attribute: false }) region: Region | undefined;

  #path = '';
  #drag: Drag | undefined;

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#endDrag();
  }

  override willUpdate(changed: PropertyValues<this>): void {
    if (changed.has('overview')) this.#path = this.overview ? wavePath(this.overview, COLUMNS) : '';
    if (changed.has('duration') || changed.has('overview')) this.#endDrag();
  }

  get #shown(): Region {
    return this.dragged ?? this.region ?? { start: 0, end: this.duration };
  }

  #share(seconds: Seconds): number {
    return this.duration > 0 ? Math.min(Math.max(seconds / this.duration, 0), 1) : 0;
  }

  #secondsAt(clientX: number): Seconds {
    const { left, width } = this.stage.getBoundingClientRect();
    return width > 0 ? Math.min(Math.max((clientX - left) / width, 0), 1) * this.duration : 0;
  }

  #setRegion(region: Region, settled: boolean): void {
    this.dragged = settled ? undefined : region;
    if (settled) this.region = isWhole(region, this.duration) ? undefined : region;
    send(this, 'nw-region-set', { ...region, settled });
  }

  #endDrag(): void {
    this.#drag = undefined;
    this.dragged = undefined;
  }

  private handlePointerDown(event: PointerEvent): void {
    if (event.button !== 0 || this.duration <= 0 || this.#drag !== undefined) return;
    this.stage.setPointerCapture(event.pointerId);
    this.#drag = {
      pointer: event.pointerId,
      x: event.clientX,
      from: this.#secondsAt(event.clientX),
      before: this.#shown,
      edge: EDGES.find((name) => (event.target as Element).classList.contains(name)),
    };
  }

  private handlePointerMove(event: PointerEvent): void {
    const drag = this.#drag;
    if (drag?.pointer !== event.pointerId) return;
    if (this.dragged === undefined && Math.abs(event.clientX - drag.x) < CLICK_SLACK) return;
    const to = this.#secondsAt(event.clientX);
    if (drag.edge === undefined) {
      this.tagged = to < drag.from ? 'start' : 'end';
      this.#setRegion(regionBetween(drag.from, to, this.duration), false);
    } else {
      // Counted from the edge, not from where in its grip the finger came down.
      this.tagged = drag.edge;
      const moved = drag.before[drag.edge] + to - drag.from;
      this.#setRegion(withEdge(drag.before, drag.edge, moved, this.duration), false);
    }
  }

  private handlePointerUp(event: PointerEvent): void {
    const drag = this.#drag;
    if (drag?.pointer !== event.pointerId) return;
    this.#drag = undefined;
    this.tagged = undefined;
    if (this.dragged !== undefined) this.#setRegion(this.dragged, true);
    else if (drag.edge === undefined) send(this, 'nw-seek', { seconds: drag.from });
  }

  private handlePointerCancel(event: PointerEvent): void {
    if (this.#drag?.pointer === event.pointerId) this.#callOff();
  }

  #callOff(): void {
    const before = this.dragged === undefined ? undefined : this.#drag?.before;
    this.#endDrag();
    this.tagged = undefined;
    if (before !== undefined) this.#setRegion(before, true);
  }

  private handleDoubleClick(): void {
    if (this.region !== undefined) this.#chooseWhole();
  }

  #chooseWhole(): void {
    this.#setRegion({ start: 0, end: this.duration }, true);
  }

  /** One key press: a tenth of a second, or about a thousandth of a long clip. */
  #step(isFine: boolean): Seconds {
    const step = Math.max(0.1, Math.round(this.duration / 100) / 10);
    return isFine ? step / 10 : step;
  }

  /** Where a key leads from a place; undefined where it leads nowhere. */
  #goal(event: KeyboardEvent, from: Seconds): Seconds | undefined {
    const step = this.#step(event.shiftKey);
    const goals: Readonly<Record<string, Seconds>> = {
      ArrowRight: from + step,
      ArrowUp: from + step,
      ArrowLeft: from - step,
      ArrowDown: from - step,
      PageUp: from + 10 * step,
      PageDown: from - 10 * step,
      Home: 0,
      End: this.duration,
    };
    return Object.hasOwn(goals, event.key) ? goals[event.key] : undefined;
  }

  private handleKey(event: KeyboardEvent): void {
    if (event.ctrlKey || event.metaKey || event.altKey || this.duration <= 0) return;
    const edge = EDGES.find((name) => (event.target as Element).classList.contains(name));
    if (event.key === 'Escape' && this.#drag !== undefined) {
      event.preventDefault();
      this.#callOff();
      return;
    }
    if ((event.key === 'Delete' || event.key === 'Backspace') && this.region !== undefined) {
      event.preventDefault();
      this.#chooseWhole();
      return;
    }
    const goal = this.#goal(event, edge ? this.#shown[edge] : this.position);
    if (goal === undefined) return;
    event.preventDefault();
    if (edge) this.#setRegion(withEdge(this.#shown, edge, goal, this.duration), true);
    else send(this, 'nw-seek', { seconds: Math.min(Math.max(goal, 0), this.duration) });
  }

  #renderWave(): TemplateResult {
    const { start, end } = this.#shown;
    const whole = isWhole(this.#shown, this.duration);
    const [from, to] = [this.#share(start) * 100, this.#share(end) * 100];
    return html`
      ${whole ? nothing : html`<div class="wash" style="left:${from}%;right:${100 - to}%"></div>`}
      <div class="picture">
        <svg viewBox="0 ${-HALF_HEIGHT} ${COLUMNS} ${2 * HALF_HEIGHT}" preserveAspectRatio="none" aria-hidden="true">
          <path class="wave" d=${this.#path}></path>
        </svg>
      </div>
      ${
        whole
          ? nothing
          : html`<div class="picture" style="clip-path:inset(0 ${100 - to}% 0 ${from}%)">
            <svg viewBox="0 ${-HALF_HEIGHT} ${COLUMNS} ${2 * HALF_HEIGHT}" preserveAspectRatio="none" aria-hidden="true">
              <path class="wave chosen" d=${this.#path}></path>
            </svg>
          </div>`
      }
    `;
  }

  #renderEdge(edge: RegionEdge): TemplateResult {
    const { start, end } = this.#shown;
    const seconds = this.#shown[edge];
    const place = this.#share(seconds) * 100;
    // The grip lies outside the part, so that both ends of a short part can be taken; at the clip's
    // ends it moves in. Of two grips on one place the one with room to move lies in front.
    const grip = edge === 'start' ? `calc(${place}% - var(--grip) + 6px)` : `calc(${place}% - 6px)`;
    const inFront = edge === 'start' && start > this.duration / 2;
    return html`
      <div class="line edge ${edge}" style="left:${place}%"></div>
      <div
        class="grip ${edge} ${inFront ? 'front' : ''}"
        style="left:clamp(0px, ${grip}, calc(100% - var(--grip)))"
        role="slider"
        tabindex="0"
        aria-label=${edge === 'start' ? 'Start of the part that plays' : 'End of the part that plays'}
        aria-valuemin=${edge === 'start' ? 0 : start}
        aria-valuemax=${edge === 'start' ? end : this.duration}
        aria-valuenow=${seconds.toFixed(2)}
        aria-valuetext=${spokenTime(seconds)}
        @focus=${() => {
          if (this.shadowRoot?.activeElement?.matches(':focus-visible')) this.tagged = edge;
        }}
        @blur=${() => {
          if (this.#drag === undefined) this.tagged = undefined;
        }}
      ></div>
      ${
        this.tagged === edge
          ? html`<span class="tag" aria-hidden="true" style="left:clamp(24px, ${place}%, calc(100% - 24px))">${timeText(seconds)}</span>`
          : nothing
      }
    `;
  }

  override render(): TemplateResult {
    if (this.duration <= 0 || this.overview === undefined) {
      return html`<div class="stage empty"><div class="nothing"></div></div>`;
    }
    return html`<div
      class="stage"
      dir="ltr"
      @pointerdown=${this.handlePointerDown}
      @pointermove=${this.handlePointerMove}
      @pointerup=${this.handlePointerUp}
      @pointercancel=${this.handlePointerCancel}
      @dblclick=${this.handleDoubleClick}
      @keydown=${this.handleKey}
    >
      ${this.#renderWave()}
      <div
        class="place"
        role="slider"
        tabindex="0"
        aria-label="Place in the clip"
        aria-valuemin="0"
        aria-valuemax=${this.duration}
        aria-valuenow=${Math.floor(this.position)}
        aria-valuetext="${spokenTime(Math.floor(this.position))} of ${spokenTime(this.duration)}"
      ></div>
      <div class="line playhead" style="left:${this.#share(this.position) * 100}%"></div>
      ${EDGES.map((edge) => this.#renderEdge(edge))}
    </div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-waveform': NwWaveform;
  }
}
