import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { partChipStyles } from './nw-part-chip.styles.ts';

/**
 * A part of a block: its name and its value. A press (the native `click`) opens it for editing.
 */
@customElement('nw-part-chip')
export class NwPartChip extends LitElement {
  static override styles = [baseStyles, partChipStyles];

  /** Short name: "Treble cap". */
  @property() label = '';

  /** Value as printed: "390 pF". */
  @property() value = '';

  /** Whether this is the part being worked on. */
  @property({ type: Boolean, reflect: true }) chosen = false;

  override render(): TemplateResult {
    return html`<button aria-pressed=${this.chosen}>
      ${this.label}<span class="value">${this.value}</span>
    </button>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-part-chip': NwPartChip;
  }
}
