import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { frequencyText, type PlotCurve, type PlotQuantity, plotNumber, QUANTITIES, valueAt } from '../../src/sheet/plot-model.ts';
import { baseStyles } from '../theme.ts';
import { curveTableStyles } from './nw-curve-table.styles.ts';

/** Third-octave preferred frequencies of ISO 266 (from memory), 20 Hz to 20 kHz. */
const PREFERRED: readonly number[] = [20, 25, 31.5, 40, 50, 63, 80, 100, 125, 160]
  .flatMap((value) => [value, value * 10, value * 100])
  .filter((value, index, all) => all.indexOf(value) === index)
  .concat([16_000, 20_000])
  .filter((value, index, all) => value <= 20_000 && all.indexOf(value) === index)
  .sort((first, second) => first - second);

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
    return html`<table>
      <caption>
        ${name} in ${unit} at the preferred frequencies of ISO 266
      </caption>
      <thead>
        <tr>
          <th scope="col">Frequency</th>
          ${curves.map((curve) => html`<th scope="col">${curve.letter} ${curve.label}</th>`)}
        </tr>
      </thead>
      <tbody>
        ${PREFERRED.map(
          (frequency) => html`<tr>
            <th scope="row">${frequencyText(frequency)}</th>
            ${curves.map((curve) => html`<td>${plotNumber(valueAt(curve, frequency), this.quantity)}</td>`)}
          </tr>`,
        )}
      </tbody>
    </table>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-curve-table': NwCurveTable;
  }
}
