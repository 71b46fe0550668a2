import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, state } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { menuStyles } from './nw-menu.styles.ts';

/** One thing that can be chosen. */
export interface MenuItem {
  readonly id: string;
  readonly label: string;
  readonly note?: string;
  readonly disabled?: boolean;
}

/**
 * A button that opens a short list (WAI-ARIA menu button).
 *
 * @fires nw-choose - `{ id: string }`
 */
@customElement('nw-menu')
export class NwMenu extends LitElement {
  static override styles = [baseStyles, menuStyles];

  @state() private open = false;

  /** Words on the button. */
  @property() label = '';

  /** What the button is for, where its words alone do not tell. */
  @property() spoken = '';

  /** What can be chosen. */
  @property({ attribute: false }) items: readonly MenuItem[] = [];

  /** Whether the button is the page's main one. */
  @property({ type: Boolean }) primary = false;

  /** Opens above the button. */
  @property({ type: Boolean, reflect: true }) upwards = false;

  #opensAtEnd = false;

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.open = false;
  }

  override updated(changed: PropertyValues): void {
    if (!changed.has('open' as keyof this) || !this.open) return;
    this.#itemButtons()
      .at(this.#opensAtEnd ? -1 : 0)
      ?.focus();
    this.#opensAtEnd = false;
  }

  #itemButtons(): HTMLButtonElement[] {
    return [...this.renderRoot.querySelectorAll<HTMLButtonElement>('.item:not(:disabled)')];
  }

  #close(): void {
    this.open = false;
    this.renderRoot.querySelector<HTMLElement>('.button')?.focus();
  }

  #choose(id: string): void {
    this.#close();
    this.dispatchEvent(new CustomEvent('nw-choose', { detail: { id }, bubbles: true, composed: true }));
  }

  private handleButtonKey(event: KeyboardEvent): void {
    if (this.open || (event.key !== 'ArrowDown' && event.key !== 'ArrowUp')) return;
    event.preventDefault();
    this.#opensAtEnd = event.key === 'ArrowUp';
    this.open = true;
  }

  private handleFocusOut(event: FocusEvent): void {
    if (!this.renderRoot.contains(event.relatedTarget as Node | null)) this.open = false;
  }

  private handleKey(event: KeyboardEvent): void {
    if (event.key === 'Escape') {
      event.stopPropagation();
      this.#close();
      return;
    }
    const buttons = this.#itemButtons();
    const index = buttons.indexOf(this.shadowRoot?.activeElement as HTMLButtonElement);
    const places: Readonly<Record<string, number>> = {
      ArrowDown: index + 1,
      ArrowUp: index - 1,
      Home: 0,
      End: buttons.length - 1,
    };
    if (!Object.hasOwn(places, event.key)) return;
    event.preventDefault();
    buttons[(places[event.key]! + buttons.length) % buttons.length]?.focus();
  }

  override render(): TemplateResult {
    return html`
      <button
        class="button ${this.primary ? 'primary' : ''}"
        aria-label=${this.spoken || nothing}
        aria-haspopup="menu"
        aria-expanded=${this.open}
        @keydown=${this.handleButtonKey}
        @click=${() => {
          this.open = !this.open;
        }}
      >
        ${this.label}
      </button>
      ${
        this.open
          ? html`<div
            class="list"
            role="menu"
            aria-label=${this.label}
            @keydown=${this.handleKey}
            @focusout=${this.handleFocusOut}
          >
            ${this.items.map(
              (item) => html`<button
                class="item"
                role="menuitem"
                ?disabled=${item.disabled ?? false}
                @click=${() => this.#choose(item.id)}
              >
                ${item.label}${item.note ? html`<span class="note">${item.note}</span>` : nothing}
              </button>`,
            )}
          </div>`
          : nothing
      }
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-menu': NwMenu;
  }
}
