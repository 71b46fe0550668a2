import { html, LitElement, type TemplateResult } from 'lit';
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

  override render(): TemplateResult {
    return html`
      <ol class="rail" aria-label="The line, in the order of the signal">
        ${this.entries.map(
          ({ block, settings, present }) => html`<li>
            <nw-block
              .block=${block}
              .settings=${settings}
              .present=${present}
              .chosenPart=${this.chosen?.slot === block.slot ? this.chosen.part : ''}
            >
              <slot name=${block.slot}></slot>
            </nw-block>
          </li>`,
        )}
      </ol>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-line': NwLine;
  }
}
