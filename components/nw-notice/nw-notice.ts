import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { noticeStyles } from './nw-notice.styles.ts';

/** How much a message matters: `error` is spoken at once, the others when there is time. */
export type NoticeKind = 'info' | 'caution' | 'error';

/**
 * A message beside the thing concerned.
 *
 * @slot - the message
 * @fires nw-dismiss - it was put away (only where it can be)
 */
@customElement('nw-notice')
export class NwNotice extends LitElement {
  static override styles = [baseStyles, noticeStyles];

  /** How much it matters. */
  @property() kind: NoticeKind = 'info';

  /** Whether it can be put away. */
  @property({ type: Boolean }) dismissable = false;

  override render(): TemplateResult {
    return html`<div class="box ${this.kind}" role=${this.kind === 'error' ? 'alert' : 'status'}>
      <span class="text"><slot></slot></span>
      ${
        this.dismissable
          ? html`<button
            aria-label="Put this message away"
            @click=${() => this.dispatchEvent(new CustomEvent('nw-dismiss', { bubbles: true, composed: true }))}
          >
            ✕
          </button>`
          : nothing
      }
    </div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-notice': NwNotice;
  }
}
