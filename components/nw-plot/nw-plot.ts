import { html, LitElement, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query } from 'lit/decorators.js';
import { type AxisRange, axisRange, PLOT_FROM, PLOT_TO } from '../../src/sheet/plot-axes.ts';
import {
  frequencyText,
  type PlotCurve,
  type PlotQuantity,
  plotValue,
  valueAt,
} from '../../src/sheet/plot-model.ts';
import { plotSentences } from '../../src/sheet/plot-words.ts';
import type { Hertz } from '../../src/units.ts';
import type { PlotChart } from '../chart/plot-chart.ts';
import { type PlotColours, readPlotColours } from '../chart/plot-colours.ts';
import type { PlotPicture } from '../chart/plot-picture.ts';
import { ThemeWatcher } from '../chart/theme-watcher.ts';
import { baseStyles } from '../theme.ts';
import { plotStyles } from './nw-plot.styles.ts';

/** Arrow keys move the cursor by a twelfth of an octave, with Shift by a forty-eighth. */
const STEPS_PER_OCTAVE = 12;
const FINE_STEPS_PER_OCTAVE = 48;

/**
 * The plot: level, phase, difference or impedance against frequency, with a reading cursor that mouse,
 * finger and keys move. The drawing library is loaded when the first plot is shown, so that the page
 * answers before it has come.
 *
 * Arrow keys move the cursor by a twelfth of an octave (Shift: a forty-eighth), Page keys by an octave,
 * Home and End to the ends of the axis.
 *
 * @fires input - the cursor is being moved; read `cursor`
 * @fires change - the cursor was let go
 */
@customElement('nw-plot')
export class NwPlot extends LitElement {
  static override styles = [baseStyles, plotStyles];

  @query('canvas') private canvas!: HTMLCanvasElement;

  @query('.area') private area!: HTMLElement;

  @query('.cursor') private handle!: HTMLElement;

  /** Curves to draw. */
  @property({ attribute: false }) curves: readonly PlotCurve[] = [];

  /** What the vertical axis is. */
  @property() quantity: PlotQuantity = 'magnitude';

  /** Where the reading cursor stands, in hertz. */
  @property({ type: Number }) cursor: Hertz = 1000;

  /** Whether a control is being moved: the axis then only grows. */
  @property({ type: Boolean }) moving = false;

  /** What is drawn, in words: "Magnitude of the line". */
  @property() label = '';

  #chart: PlotChart | undefined;
  #colours: PlotColours | undefined;
  #range: AxisRange | undefined;
  #rangeOf: PlotQuantity | undefined;
  #frame: number | undefined;
  #pointer: number | undefined;

  constructor() {
    super();
    new ThemeWatcher(this, () => {
      this.#colours = undefined;
      this.#redraw();
    });
  }

  override connectedCallback(): void {
    super.connectedCallback();
    if (this.hasUpdated) void this.#makeChart();
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    if (this.#frame !== undefined) cancelAnimationFrame(this.#frame);
    this.#frame = undefined;
    this.#pointer = undefined;
    this.#colours = undefined; // the theme may change unseen
    this.#chart?.destroy();
    this.#chart = undefined;
    this.toggleAttribute('drawn', false);
  }

  override firstUpdated(): void {
    void this.#makeChart();
  }

  override updated(changed: PropertyValues<this>): void {
    const drawn: readonly (keyof NwPlot)[] = ['curves', 'quantity', 'cursor', 'moving'];
    if (drawn.some((name) => changed.has(name))) this.#redraw();
  }

  async #makeChart(): Promise<void> {
    const { PlotChart } = await import('../chart/plot-chart.ts');
    if (!this.isConnected || this.#chart !== undefined) return;
    this.#chart = new PlotChart(this.canvas, this.#picture());
    this.toggleAttribute('drawn', true);
  }

  #picture(): PlotPicture {
    const held = this.moving && this.#rangeOf === this.quantity ? this.#range : undefined;
    this.#range = axisRange(this.quantity, this.curves, held);
    this.#rangeOf = this.quantity;
    this.#colours ??= readPlotColours(this);
    return {
      curves: this.curves,
      quantity: this.quantity,
      range: this.#range,
      cursor: this.cursor,
      colours: this.#colours,
    };
  }

  /** Draws in the next frame, once however many changes come before it. */
  #redraw(): void {
    if (this.#frame !== undefined || this.#chart === undefined) return;
    this.#frame = requestAnimationFrame(() => {
      this.#frame = undefined;
      this.#chart?.draw(this.#picture());
    });
  }

  #tell(type: 'input' | 'change'): void {
    this.dispatchEvent(new Event(type, { bubbles: true, composed: true }));
  }

  #moveCursor(frequency: Hertz): void {
    this.cursor = Math.min(Math.max(frequency, PLOT_FROM), PLOT_TO);
    this.#tell('input');
  }

  #moveToPointer(event: PointerEvent): void {
    if (this.#chart === undefined) return;
    this.#moveCursor(this.#chart.frequencyAt(event.clientX - this.area.getBoundingClientRect().left));
  }

  private handlePointerDown(event: PointerEvent): void {
    if (event.button !== 0 || this.#chart === undefined || this.#pointer !== undefined) return;
    this.#pointer = event.pointerId;
    this.area.setPointerCapture(event.pointerId);
    this.handle.focus({ preventScroll: true });
    this.#moveToPointer(event);
  }

  private handlePointerMove(event: PointerEvent): void {
    if (this.#pointer === event.pointerId) this.#moveToPointer(event);
  }

  private handlePointerEnd(event: PointerEvent): void {
    if (this.#pointer !== event.pointerId) return;
    this.#pointer = undefined;
    this.#tell('change');
  }

  private handleKey(event: KeyboardEvent): void {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const step = 2 ** (1 / (event.shiftKey ? FINE_STEPS_PER_OCTAVE : STEPS_PER_OCTAVE));
    const moves: Readonly<Record<string, Hertz>> = {
      ArrowRight: this.cursor * step,
      ArrowUp: this.cursor * step,
      ArrowLeft: this.cursor / step,
      ArrowDown: this.cursor / step,
      PageUp: this.cursor * 2,
      PageDown: this.cursor / 2,
      Home: PLOT_FROM,
      End: PLOT_TO,
    };
    if (!Object.hasOwn(moves, event.key)) return;
    event.preventDefault();
    this.#moveCursor(moves[event.key]!);
    this.#tell('change');
  }

  /** What the cursor reads, in words. */
  #reading(): string {
    const values = this.curves
      .filter((curve) => curve.letter !== '')
      .map((curve) => `${curve.letter} ${plotValue(valueAt(curve, this.cursor), this.quantity)}`);
    return `${frequencyText(this.cursor)}: ${values.join(', ') || 'no curve'}`;
  }

  /**
   * The plot as a PNG on a light ground, at twice the size of the SVG.
   *
   * @param title written above the plot. @param reference what 0 dB is, written under it.
   * @throws NotchworkError `storage-failed` where the browser cannot make the picture.
   */
  async toPng(title: string, reference = ''): Promise<Blob> {
    const [{ plotSvg }, { rasterise }] = await Promise.all([
      import('../../src/sheet/plot-svg.ts'),
      import('../chart/rasterise.ts'),
    ]);
    return rasterise(plotSvg(this.curves, { title, quantity: this.quantity, reference }), 2);
  }

  override render(): TemplateResult {
    const name = this.label === '' ? '' : `${this.label}. `;
    return html`<div
      class="area"
      dir="ltr"
      @pointerdown=${this.handlePointerDown}
      @pointermove=${this.handlePointerMove}
      @pointerup=${this.handlePointerEnd}
      @pointercancel=${this.handlePointerEnd}
    >
      <div class="canvas">
        <canvas role="img" aria-label="${name}${plotSentences(this.curves, this.quantity)}"></canvas>
      </div>
      <div
        class="cursor"
        role="slider"
        tabindex="0"
        aria-label="Reading cursor"
        aria-valuemin=${PLOT_FROM}
        aria-valuemax=${PLOT_TO}
        aria-valuenow=${Math.round(this.cursor)}
        aria-valuetext=${this.#reading()}
        @keydown=${this.handleKey}
      ></div>
    </div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-plot': NwPlot;
  }
}
