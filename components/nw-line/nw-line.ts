import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { SlotName } from '../../src/blocks/block.ts';
import type { PlacedBlock } from '../../src/blocks/span.ts';
import '../nw-block/nw-block.ts';
import { baseStyles } from '../theme.ts';
import { lineStyles } from './nw-line.styles.ts';

/** A block of the line and whether the signal passes it. */
export interface LineEntry extends PlacedBlock {
  readonly present: boolean;
}

/** The part being worked on. */
export interface ChosenPart {
  readonly slot: SlotName;
  readonly part: string;
}

/**
 * The line: its blocks on one rail, in the order in which the signal passes them. Events of the
 * blocks pass through.
 *
 * @slot power - what the power stage has to say
 */
@customElement('nw-line')
export class NwLine extends LitElement {
  static override styles = [baseStyles, lineStyles];

  /** The blocks, in the signal's order. */
  @property({ attribute: false }) entries: readonly LineEntry[] = [];

  /** The part being worked on, if any. */
  @property({ attribute: false }) chosen: ChosenPart | undefined;

  /** Blocks out of the line lead on a row of their own, so that the others stay large. */
  #beginsRow(index: number): boolean {
    return (
      index > 0 &&
      this.entries[index]!.present &&
      this.entries.slice(0, index).every((entry) => !entry.present)
    );
  }

  #entry({ block, settings, present }: LineEntry, index: number): TemplateResult {
    return html`${this.#beginsRow(index) ? html`<li class="break" role="presentation"></li>` : nothing}
      <li class=${present ? 'in' : 'out'} style="--knobs: ${present ? Object.keys(block.knobs).length : 0}">
        <nw-block
          .block=${block}
          .settings=${settings}
          .present=${present}
          .chosenPart=${this.chosen?.slot === block.slot ? this.chosen.part : ''}
        >
          <slot name=${block.slot}></slot>
        </nw-block>
      </li>`;
  }

  override render(): TemplateResult {
    return html`
      <ol class="rail" aria-label="The line, in the order of the signal">
        ${this.entries.map((entry, index) => this.#entry(entry, index))}
      </ol>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-line': NwLine;
  }
}
