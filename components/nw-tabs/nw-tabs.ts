import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import { baseStyles } from '../theme.ts';
import { tabsStyles } from './nw-tabs.styles.ts';

/** One tab: its name for code and its name for people. */
export interface Tab {
  readonly id: string;
  readonly label: string;
}

/**
 * One task at a time: a row of tabs and one panel (WAI-ARIA tabs, selection follows the focus).
 *
 * @slot - what the chosen tab shows
 * @fires change - another tab was chosen; read `chosen`
 */
@customElement('nw-tabs')
export class NwTabs extends LitElement {
  static override styles = [baseStyles, tabsStyles];

  /** The tabs, in order. */
  @property({ attribute: false }) tabs: readonly Tab[] = [];

  /** Id of the tab shown. */
  @property() chosen = '';

  /** What the tabs are about. */
  @property() label = '';

  #choose(id: string): void {
    if (id === this.chosen) return;
    this.chosen = id;
    this.dispatchEvent(new Event('change', { bubbles: true, composed: true }));
  }

  private async handleKey(event: KeyboardEvent): Promise<void> {
    const index = Math.max(
      0,
      this.tabs.findIndex((tab) => tab.id === this.chosen),
    );
    const last = this.tabs.length - 1;
    const forward = getComputedStyle(this).direction === 'rtl' ? -1 : 1;
    const places: Readonly<Record<string, number>> = {
      ArrowRight: index + forward,
      ArrowLeft: index - forward,
      Home: 0,
      End: last,
    };
    if (!Object.hasOwn(places, event.key)) return;
    event.preventDefault();
    const place = (places[event.key]! + this.tabs.length) % this.tabs.length;
    this.#choose(this.tabs[place]!.id);
    await this.updateComplete;
    this.renderRoot.querySelector<HTMLElement>('[aria-selected="true"]')?.focus();
  }

  override render(): TemplateResult {
    const reached = this.tabs.some((tab) => tab.id === this.chosen) ? this.chosen : this.tabs[0]?.id;
    return html`
      <div class="list" role="tablist" aria-label=${this.label} @keydown=${this.handleKey}>
        ${this.tabs.map(
          (tab) => html`<button
            role="tab"
            id="tab-${tab.id}"
            aria-selected=${tab.id === this.chosen}
            aria-controls="panel"
            tabindex=${tab.id === reached ? 0 : -1}
            @click=${() => this.#choose(tab.id)}
          >
            ${tab.label}
          </button>`,
        )}
      </div>
      <div class="panel" id="panel" role="tabpanel" aria-labelledby="tab-${this.chosen}">
        <slot></slot>
      </div>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-tabs': NwTabs;
  }
}
