import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { PlotView } from '../../src/bench/preferences.ts';
import type { Hertz } from '../../src/units.ts';
import '../nw-figures/nw-figures.ts';
import type { Figure } from '../nw-figures/nw-figures.ts';
import '../nw-plot/nw-plot.ts';
import type { PlotCurve } from '../../src/sheet/plot-model.ts';
import { send } from '../events.ts';
import type { NwPlot } from '../nw-plot/nw-plot.ts';
import { baseStyles } from '../theme.ts';
import { plotPanelStyles } from './nw-plot-panel.styles.ts';

const VIEWS: readonly { readonly view: PlotView; readonly label: string }[] = [
  { view: 'magnitude', label: 'Magnitude' },
  { view: 'phase', label: 'Phase' },
  { view: 'difference', label: 'Digital difference' },
];

/** What the plot is about, in words, for those who do not see it. */
export interface PlotWords {
  /** The name of the picture: "Magnitude of the line". */
  readonly title: string;
  /** What 0 on the axis is. */
  readonly reference: string;
}

/**
 * The plot with what belongs to it: the voicings (slotted), which view is drawn, the figures that
 * people quote, and the table that says the same in numbers.
 *
 * @slot voicings - the row of voicings above the plot
 * @slot messages - notices between the bar and the plot
 * @fires nw-view-set - `{ view: PlotView }`
 * @fires nw-blocks-set - `{ show: boolean }`, draw each block's share or not
 * @fires nw-table-set - `{ show: boolean }`
 * @fires nw-pin-set - `{ pinned: boolean }`, keep the present curve to compare with
 * @fires nw-cursor-set - `{ frequency: Hertz }`
 */
@customElement('nw-plot-panel')
export class NwPlotPanel extends LitElement {
  static override styles = [baseStyles, plotPanelStyles];

  /** Curves of the chosen view. */
  @property({ attribute: false }) curves: readonly PlotCurve[] = [];

  /** Figures beside the plot. */
  @property({ attribute: false }) figures: readonly Figure[] = [];

  /** Title and reference of the plot. */
  @property({ attribute: false }) words: PlotWords = { title: '', reference: '' };

  /** Which view is drawn. */
  @property() view: PlotView = 'magnitude';

  /** Whether each block's share is drawn. */
  @property({ type: Boolean }) blocks = false;

  /** Whether the table stands in for the plot. */
  @property({ type: Boolean }) table = false;

  /** Whether a curve is pinned. */
  @property({ type: Boolean }) pinned = false;

  /** Whether a control is being moved; the axis then holds still. */
  @property({ type: Boolean }) moving = false;

  /** Where the reading cursor stands, in hertz. */
  @property({ type: Number }) cursor: Hertz = 1000;

  override willUpdate(): void {
    if (this.table) void import('../nw-curve-table/nw-curve-table.ts');
  }

  private handleCursor(event: Event): void {
    send(this, 'nw-cursor-set', { frequency: (event.target as NwPlot).cursor });
  }

  override render(): TemplateResult {
    return html`
      <section class="card" aria-label="Response">
        <div class="bar">
          <slot name="voicings"></slot>
          <div class="views">
            <button
              class="toggle"
              aria-pressed=${this.pinned}
              title="Keep the present curve as a dotted reference"
              @click=${() => send(this, 'nw-pin-set', { pinned: !this.pinned })}
            >
              ${this.pinned ? 'Unpin' : 'Pin'}
            </button>
            <button
              class="toggle"
              aria-pressed=${this.blocks}
              ?disabled=${this.view !== 'magnitude'}
              @click=${() => send(this, 'nw-blocks-set', { show: !this.blocks })}
            >
              Blocks
            </button>
            <button
              class="toggle"
              aria-pressed=${this.table}
              @click=${() => send(this, 'nw-table-set', { show: !this.table })}
            >
              Table
            </button>
            <span role="radiogroup" aria-label="What is drawn">
              ${VIEWS.map(
                ({ view, label }) => html`
                  <button
                    class="toggle"
                    role="radio"
                    aria-checked=${this.view === view}
                    @click=${() => send(this, 'nw-view-set', { view })}
                  >
                    ${label}
                  </button>
                `,
              )}
            </span>
          </div>
        </div>
        <slot name="messages"></slot>
        <div class="body">
          ${
            this.table
              ? html`<div class="plot table">
                <nw-curve-table .curves=${this.curves} .quantity=${this.view}></nw-curve-table>
              </div>`
              : html`<div class="plot">
                <nw-plot
                  .curves=${this.curves}
                  .quantity=${this.view}
                  .cursor=${this.cursor}
                  .moving=${this.moving}
                  .label=${this.words.title}
                  @input=${this.handleCursor}
                  @change=${this.handleCursor}
                ></nw-plot>
              </div>`
          }
          <div class="figures" role="group" aria-label="Figures" tabindex="0">
            <nw-figures .figures=${this.figures} .reference=${this.words.reference}></nw-figures>
          </div>
        </div>
      </section>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-plot-panel': NwPlotPanel;
  }
}
