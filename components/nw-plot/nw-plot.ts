import { html, LitElement, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query } from 'lit/decorators.js';
import {
  type AxisRange,
  axisRange,
  frequencyText,
  PLOT_FROM,
  PLOT_TO,
  type PlotCurve,
  type PlotQuantity,
  plotNumber,
  QUANTITIES,
  valueAt,
} from '../../src/sheet/plot-model.ts';
import type { Hertz } from '../../src/units.ts';
import { baseStyles } from '../theme.ts';
import type { PlotChart, PlotColours } from './chart-setup.ts';
import { plotStyles } from './nw-plot.styles.ts';

const CURVE_COLOURS = ['a', 'b', 'c', 'd', 'e', 'f', 'g', 'h'] as const;

function readColours(element: Element): PlotColours {
  const style = getComputedStyle(element);
  const token = (name: string): string => style.getPropertyValue(`--nw-${name}`).trim();
  const curves = Object.fromEntries(CURVE_COLOURS.map((letter) => [letter, token(`curve-${letter}`)]));
  return {
    ink: token('ink'),
    soft: token('ink-soft'),
    hairline: token('hairline'),
    rule: token('rule'),
    ground: token('sheet'),
    curves: { ...(curves as PlotColours['curves']), soft: token('ink-soft') },
  };
}

/**
 * The plot: level, phase or difference against frequency, with a reading cursor that mouse, finger
 * and keys move. The drawing library is loaded when the first plot is shown.
 *
 * @fires input - the cursor is being moved; read `cursor`
 * @fires change - the cursor was let go
 */
@customElement('nw-plot')
export class NwPlot extends LitElement {
  static override styles = [baseStyles, plotStyles];

  @query('canvas') private canvas!: HTMLCanvasElement;

  @query('.area') private area!: HTMLElement;

  /** Curves to draw. */
  @property({ attribute: false }) curves: readonly PlotCurve[] = [];

  /** What the vertical axis is. */
  @property() quantity: PlotQuantity = 'magnitude';

  /** Where the reading cursor stands, in hertz. */
  @property({ type: Number }) cursor: Hertz = 1000;

  /** Whether a control is being moved: the axis then only grows. */
  @property({ type: Boolean }) moving = false;

  /** What is drawn, in words. */
  @property() label = '';

  #chart: PlotChart | undefined;
  #range: AxisRange | undefined;
  #rangeOf: PlotQuantity | undefined;
  #frame: number | undefined;
  #pointer: number | undefined;
  readonly #scheme = matchMedia('(prefers-color-scheme: dark)');
  #themeObserver: MutationObserver | undefined;

  override connectedCallback(): void {
    super.connectedCallback();
    this.#scheme.addEventListener('change', this.#redraw);
    this.#themeObserver = new MutationObserver(this.#redraw);
    this.#themeObserver.observe(document.documentElement, { attributeFilter: ['data-theme'] });
    if (this.hasUpdated) this.#makeChart();
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#scheme.removeEventListener('change', this.#redraw);
    this.#themeObserver?.disconnect();
    if (this.#frame !== undefined) cancelAnimationFrame(this.#frame);
    this.#frame = undefined;
    this.#chart?.destroy();
    this.#chart = undefined;
  }

  override firstUpdated(): void {
    this.#makeChart();
  }

  override updated(changed: PropertyValues<NwPlot>): void {
    const drawn: readonly (keyof NwPlot)[] = ['curves', 'quantity', 'cursor', 'moving'];
    if (drawn.some((name) => changed.has(name))) this.#redraw();
  }

  async #makeChart(): Promise<void> {
    const { PlotChart } = await import('./chart-setup.ts');
    if (!this.isConnected || this.#chart !== undefined) return;
    this.#chart = new PlotChart(this.canvas, this.#picture());
    this.toggleAttribute('drawn', true);
  }

  #picture(): ConstructorParameters<typeof PlotChart>[1] {
    const held = this.moving && this.#rangeOf === this.quantity ? this.#range : undefined;
    this.#range = axisRange(this.quantity, this.curves, held);
    this.#rangeOf = this.quantity;
    return {
      curves: this.curves,
      quantity: this.quantity,
      range: this.#range,
      cursor: this.cursor,
      colours: readColours(this),
    };
  }

  /** Draws in the next frame, once however many changes come before it. */
  readonly #redraw = (): void => {
    if (this.#frame !== undefined || this.#chart === undefined) return;
    this.#frame = requestAnimationFrame(() => {
      this.#frame = undefined;
      this.#chart?.draw(this.#picture());
    });
  };

  #moveCursor(frequency: Hertz, type: 'input' | 'change'): void {
    this.cursor = Math.min(Math.max(frequency, PLOT_FROM), PLOT_TO);
    this.dispatchEvent(new Event(type, { bubbles: true, composed: true }));
  }

  #moveToPointer(event: PointerEvent, type: 'input' | 'change'): void {
    if (this.#chart === undefined) return;
    this.#moveCursor(this.#chart.frequencyAt(event.clientX - this.area.getBoundingClientRect().left), type);
  }

  private handlePointerDown(event: PointerEvent): void {
    if (event.button !== 0) return;
    this.#pointer = event.pointerId;
    this.area.setPointerCapture(event.pointerId);
    this.#moveToPointer(event, 'input');
  }

  private handlePointerMove(event: PointerEvent): void {
    if (this.#pointer === event.pointerId) this.#moveToPointer(event, 'input');
  }

  private handlePointerEnd(event: PointerEvent): void {
    if (this.#pointer !== event.pointerId) return;
    this.#pointer = undefined;
    this.dispatchEvent(new Event('change', { bubbles: true, composed: true }));
  }

  private handleKey(event: KeyboardEvent): void {
    const fine = event.shiftKey ? 1 / 48 : 1 / 12;
    const moves: Readonly<Record<string, number>> = {
      ArrowRight: this.cursor * 2 ** fine,
      ArrowUp: this.cursor * 2 ** fine,
      ArrowLeft: this.cursor / 2 ** fine,
      ArrowDown: this.cursor / 2 ** fine,
      PageUp: this.cursor * 2,
      PageDown: this.cursor / 2,
      Home: PLOT_FROM,
      End: PLOT_TO,
    };
    if (!Object.hasOwn(moves, event.key)) return;
    event.preventDefault();
    this.#moveCursor(moves[event.key]!, 'change');
  }

  /** What the cursor reads, in words. */
  #reading(): string {
    const { unit } = QUANTITIES[this.quantity];
    const values = this.curves
      .filter((curve) => curve.letter !== '')
      .map((curve) => `${curve.letter} ${plotNumber(valueAt(curve, this.cursor), this.quantity)} ${unit}`);
    return `${frequencyText(this.cursor)}: ${values.join(', ') || 'no curve'}`;
  }

  /**
   * The plot as a PNG on a light ground, twice as large as a page shows it.
   *
   * @param title written above the plot.
   */
  async toPng(title: string): Promise<Blob> {
    const { plotSvg } = await import('../../src/sheet/plot-svg.ts');
    const { rasterise } = await import('./rasterise.ts');
    return rasterise(plotSvg(this.curves, { title, quantity: this.quantity }), 2);
  }

  override render(): TemplateResult {
    return html`<div
      class="area"
      role="slider"
      tabindex="0"
      aria-label="${this.label}: reading cursor"
      aria-valuemin=${PLOT_FROM}
      aria-valuemax=${PLOT_TO}
      aria-valuenow=${Math.round(this.cursor)}
      aria-valuetext=${this.#reading()}
      @pointerdown=${this.handlePointerDown}
      @pointermove=${this.handlePointerMove}
      @pointerup=${this.handlePointerEnd}
      @pointercancel=${this.handlePointerEnd}
      @keydown=${this.handleKey}
    >
      <span class="unit" aria-hidden="true">${QUANTITIES[this.quantity].unit}</span>
      <div class="canvas"><canvas role="img" aria-label=${this.label}></canvas></div>
    </div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-plot': NwPlot;
  }
}
