import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { Block } from '../../src/blocks/block.ts';
import type { PlacedBlock } from '../../src/blocks/span.ts';
import { messageOf } from '../../src/errors.ts';
import { formatValue } from '../../src/parts/value-text.ts';
import { type DcStress, dcStress, type PartStress } from '../../src/study/dc-stress.ts';
import '../nw-notice/nw-notice.ts';
import { baseStyles } from '../theme.ts';
import { stressTableStyles } from './nw-stress-table.styles.ts';

const digits = { digits: 3 };

/**
 * What a block's parts have to stand at direct voltage, warm and with the valves cold, and the least
 * usual rating that covers it.
 */
@customElement('nw-stress-table')
export class NwStressTable extends LitElement {
  static override styles = [baseStyles, stressTableStyles];

  /** The block whose parts are shown. */
  @property({ attribute: false }) block!: Block;

  /** The blocks in the line. */
  @property({ attribute: false }) placed: readonly PlacedBlock[] = [];

  #row(part: PartStress): TemplateResult {
    const { kind, running, cold, dissipation, rating, byLeakage } = part;
    const isCapacitor = kind.endsWith('capacitor');
    const unit = isCapacitor ? 'V' : 'W';
    return html`<tr>
      <th scope="row">${this.block.parts[part.part]!.label}${byLeakage ? ' *' : nothing}</th>
      <td>${formatValue(running, 'V', digits)}</td>
      <td>${formatValue(cold, 'V', digits)}</td>
      <td>${isCapacitor ? '–' : formatValue(dissipation, 'W', digits)}</td>
      <td>${rating === undefined ? 'none on sale' : formatValue(rating, unit)}</td>
    </tr>`;
  }

  #table({ supply, running, cold, parts, hasOwnStage }: DcStress): TemplateResult {
    const own = parts.filter((part) => part.slot === this.block.slot);
    const reachesGrid = Math.max(Math.abs(running.output), Math.abs(cold.output)) > 0.5;
    return html`
      <p class="soft">
        From a supply of ${formatValue(supply, 'V')}: warm at rest, and with the valves cold, when the whole supply
        stands on the network. Ratings keep the usual margin (common practice, no source).
      </p>
      <div class="scroll" tabindex="0" role="group" aria-label="Direct voltages">
        <table>
          <thead>
            <tr>
              <th scope="col">Part</th>
              <th scope="col">warm</th>
              <th scope="col">cold</th>
              <th scope="col">heat</th>
              <th scope="col">least rating</th>
            </tr>
          </thead>
          <tbody>
            ${own.map((part) => this.#row(part))}
          </tbody>
        </table>
      </div>
      ${own.some((part) => part.byLeakage) ? html`<p class="soft">* Leakage alone divides the voltage here: rated for all of it.</p>` : nothing}
      ${
        reachesGrid
          ? html`<nw-notice kind="caution"
            >Direct voltage passes this network to the next grid. Couple the driver through a capacitor, or put one
            behind.</nw-notice
          >`
          : nothing
      }
      ${hasOwnStage ? html`<p class="soft">The stage inside this network has voltages of its own that are not in this table.</p>` : nothing}
    `;
  }

  /** The table, or why there is none. */
  #inside(): TemplateResult {
    try {
      const stress = dcStress(this.placed);
      return stress === undefined
        ? html`<p class="soft">Nothing here is under direct voltage.</p>`
        : this.#table(stress);
    } catch (error) {
      return html`<p class="soft">${messageOf(error)}</p>`;
    }
  }

  override render(): TemplateResult {
    return html`<h3>What the parts have to stand</h3>
      ${this.#inside()}`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-stress-table': NwStressTable;
  }
}
