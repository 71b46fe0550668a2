import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { switchStyles } from './nw-switch.styles.ts';

/**
 * On or off.
 *
 * @slot - the words beside it; without any, `label` is read aloud
 * @fires change - it was switched; read `checked`
 */
@customElement('nw-switch')
export class NwSwitch extends LitElement {
  static override styles = [baseStyles, switchStyles];

  /** What it switches, for those who do not see it. */
  @property() label = '';

  /** Whether it is on. */
  @property({ type: Boolean }) checked = false;

  private handleChange(event: Event): void {
    event.stopPropagation();
    this.checked = (event.target as HTMLInputElement).checked;
    this.dispatchEvent(new Event('change', { bubbles: true, composed: true }));
  }

  override render(): TemplateResult {
    return html`<label>
      <input
        type="checkbox"
        role="switch"
        aria-label=${this.label}
        .checked=${this.checked}
        @change=${this.handleChange}
      />
      <slot></slot>
    </label>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-switch': NwSwitch;
  }
}
