import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { ThemeChoice } from '../../src/bench/preferences.ts';
import { send } from '../events.ts';
import { baseStyles } from '../theme.ts';
import { headerStyles } from './nw-header.styles.ts';

const THEME_NAMES: Readonly<Record<ThemeChoice, string>> = {
  system: 'Theme: as the system',
  light: 'Theme: light',
  dark: 'Theme: dark',
};
const THEME_SIGNS: Readonly<Record<ThemeChoice, string>> = { system: '◐', light: '○', dark: '●' };
const NEXT_THEME: Readonly<Record<ThemeChoice, ThemeChoice>> = {
  system: 'light',
  light: 'dark',
  dark: 'system',
};

/**
 * The top of the page: whose design this is, undo and redo, the theme, and what can leave.
 *
 * @slot - menus and buttons at the right end
 * @fires nw-title-set - `{ title: string }`, the title was typed
 * @fires nw-undo - undo was asked for
 * @fires nw-redo - redo was asked for
 * @fires nw-theme-set - `{ theme: ThemeChoice }`
 */
@customElement('nw-header')
export class NwHeader extends LitElement {
  static override styles = [baseStyles, headerStyles];

  /** Title of the design. */
  @property() designTitle = '';

  /** What stands behind the title: revision, saved or not. */
  @property() note = '';

  /** Name of the step that undo takes back; empty where there is none. */
  @property() undoName = '';

  /** Name of the step that redo makes again; empty where there is none. */
  @property() redoName = '';

  /** Theme chosen. */
  @property() theme: ThemeChoice = 'system';

  private handleTitle(event: Event): void {
    const field = event.target as HTMLInputElement;
    const title = field.value.trim();
    if (title === '') field.value = this.designTitle;
    else if (title !== this.designTitle) send(this, 'nw-title-set', { title });
  }

  override render(): TemplateResult {
    return html`
      <header class="row">
        <h1 class="mark" aria-label="Notchwork">
          <svg viewBox="0 0 30 20" aria-hidden="true">
            <path
              d="M2 5h5c4 0 4 11 8 11s4-11 8-11h5"
              fill="none"
              stroke="currentColor"
              stroke-width="2.500"
              stroke-linecap="round"
            />
          </svg>
          <span class="word">Notchwork</span>
        </h1>
        <div class="design">
          <input
            class="title"
            aria-label="Title of the design"
            maxlength="80"
            .value=${this.designTitle}
            @change=${this.handleTitle}
          />
          <span class="revision">${this.note}</span>
        </div>
        <div class="tools">
          <button
            class="button icon"
            aria-label=${this.undoName ? `Undo: ${this.undoName}` : 'Undo'}
            title=${this.undoName ? `Undo: ${this.undoName}` : 'Nothing to undo'}
            ?disabled=${this.undoName === ''}
            @click=${() => send(this, 'nw-undo', undefined)}
          >
            ↶
          </button>
          <button
            class="button icon"
            aria-label=${this.redoName ? `Redo: ${this.redoName}` : 'Redo'}
            title=${this.redoName ? `Redo: ${this.redoName}` : 'Nothing to redo'}
            ?disabled=${this.redoName === ''}
            @click=${() => send(this, 'nw-redo', undefined)}
          >
            ↷
          </button>
          <button
            class="button icon"
            aria-label=${THEME_NAMES[this.theme]}
            title=${THEME_NAMES[this.theme]}
            @click=${() => send(this, 'nw-theme-set', { theme: NEXT_THEME[this.theme] })}
          >
            ${THEME_SIGNS[this.theme]}
          </button>
          <slot></slot>
        </div>
      </header>
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-header': NwHeader;
  }
}
