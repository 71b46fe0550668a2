import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { figuresStyles } from './nw-figures.styles.ts';

/** A figure that people quote. */
export interface Figure {
  readonly label: string;
  readonly value: string;
  /** Beside the value: "at 560 Hz". */
  readonly note?: string;
}

/** The figures read off a curve, values heavier than their names, and what 0 dB is. */
@customElement('nw-figures')
export class NwFigures extends LitElement {
  static override styles = [baseStyles, figuresStyles];

  /** The figures, in order. */
  @property({ attribute: false }) figures: readonly Figure[] = [];

  /** What 0 dB is, as a sentence. */
  @property() reference = '';

  override render(): TemplateResult {
    return html`
      <dl>
        ${this.figures.map(
          ({ label, value, note }) => html`<div>
            <dt>${label}</dt>
            <dd>${value}${note ? html` <span class="note">${note}</span>` : nothing}</dd>
          </div>`,
        )}
      </dl>
      <p class="reference">${this.reference}</p>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-figures': NwFigures;
  }
}
