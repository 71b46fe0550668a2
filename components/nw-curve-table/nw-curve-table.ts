import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import {
  frequencyText,
  type PlotCurve,
  type PlotQuantity,
  plotNumber,
  QUANTITIES,
  valueAt,
} from '../../src/sheet/plot-model.ts';
import { preferredFrequencies } from '../../src/sheet/preferred-frequencies.ts';
import { baseStyles } from '../theme.ts';
import { curveTableStyles } from './nw-curve-table.styles.ts';

/** What is listed: the audible part of the plot. */
const LISTED = preferredFrequencies(20, 20_000);

/** The curves in numbers, for those who cannot see the plot and those who want the figures. */
@customElement('nw-curve-table')
export class NwCurveTable extends LitElement {
  static override styles = [baseStyles, curveTableStyles];

  /** Curves to list; those without a letter are left out. */
  @property({ attribute: false }) curves: readonly PlotCurve[] = [];

  /** What the values are. */
  @property() quantity: PlotQuantity = 'magnitude';

  override render(): TemplateResult {
    const { name, unit } = QUANTITIES[this.quantity];
    const curves = this.curves.filter((curve) => curve.letter !== '');
    return html`<div class="scroll" tabindex="0" role="region" aria-label="Table of the curves"><table>
      <caption>
        ${name} in ${unit === '°' ? 'degrees' : unit} at the preferred frequencies of ISO 266
      </caption>
      <thead>
        <tr>
          <th scope="col">Frequency</th>
          ${curves.map((curve) => html`<th scope="col">${curve.letter} ${curve.label}</th>`)}
        </tr>
      </thead>
      <tbody>
        ${LISTED.map(
          (frequency) => html`<tr>
            <th scope="row">${frequencyText(frequency)}</th>
            ${curves.map((curve) => html`<td>${plotNumber(valueAt(curve, frequency), this.quantity)}</td>`)}
          </tr>`,
        )}
      </tbody>
    </table></div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-curve-table': NwCurveTable;
  }
}
