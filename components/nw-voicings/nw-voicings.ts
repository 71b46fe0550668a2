import { html, LitElement, nothing, type PropertyValues, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import { VOICING_LETTERS, type VoicingLetter } from '../../src/design/design.ts';
import { LONGEST_VOICING_NAME } from '../../src/design/voicings.ts';
import { DASHES } from '../../src/sheet/plot-model.ts';
import { send } from '../events.ts';
import '../nw-menu/nw-menu.ts';
import type { MenuItem } from '../nw-menu/nw-menu.ts';
import { baseStyles } from '../theme.ts';
import { voicingsStyles } from './nw-voicings.styles.ts';

/** A voicing as it stands in the row. */
export interface VoicingEntry {
  readonly letter: VoicingLetter;
  readonly name: string;
  readonly colour: VoicingLetter;
}

/**
 * The voicings, lettered A to H: press one to edit and hear it (or the keys 1 to 8), keep the present
 * one under another letter, rename, move, recolour or delete the active one.
 *
 * @fires nw-voicing-choose - `{ letter }`
 * @fires nw-voicing-keep - the present line is to be kept under the next letter
 * @fires nw-voicing-rename - `{ letter, name }`
 * @fires nw-voicing-recolour - `{ letter, colour }`
 * @fires nw-voicing-move - `{ letter, places }`
 * @fires nw-voicing-delete - `{ letter }`
 */
@customElement('nw-voicings')
export class NwVoicings extends LitElement {
  static override styles = [baseStyles, voicingsStyles];

  @query('.rename') private renameField!: HTMLInputElement | null;

  @state() private renaming = false;

  /** The voicings, in order. */
  @property({ attribute: false }) voicings: readonly VoicingEntry[] = [];

  /** Letter of the one that is edited and heard. */
  @property() active: VoicingLetter = 'A';

  override updated(changed: PropertyValues): void {
    if (changed.has('renaming') && this.renaming) {
      this.renameField?.focus();
      this.renameField?.select();
    }
  }

  get #present(): VoicingEntry | undefined {
    return this.voicings.find((voicing) => voicing.letter === this.active);
  }

  private handleChoice(event: CustomEvent<{ readonly id: string }>): void {
    event.stopPropagation();
    const letter = this.active;
    switch (event.detail.id) {
      case 'rename':
        this.renaming = true;
        break;
      case 'delete':
        send(this, 'nw-voicing-delete', { letter });
        break;
      case 'left':
        send(this, 'nw-voicing-move', { letter, places: -1 });
        break;
      case 'right':
        send(this, 'nw-voicing-move', { letter, places: 1 });
        break;
      case 'recolour': {
        const place = VOICING_LETTERS.indexOf(this.#present?.colour ?? letter);
        send(this, 'nw-voicing-recolour', {
          letter,
          colour: VOICING_LETTERS[(place + 1) % VOICING_LETTERS.length]!,
        });
        break;
      }
    }
  }

  #rename(event: Event): void {
    if (!this.renaming) return;
    this.renaming = false;
    send(this, 'nw-voicing-rename', { letter: this.active, name: (event.target as HTMLInputElement).value });
  }

  private handleRenameKey(event: KeyboardEvent): void {
    event.stopPropagation();
    if (event.key === 'Escape') this.renaming = false;
    else if (event.key === 'Enter') this.#rename(event);
  }

  #entry({ letter, name, colour }: VoicingEntry, index: number): TemplateResult {
    if (this.renaming && letter === this.active) {
      return html`<input
        class="field rename"
        aria-label="Name of voicing ${letter}"
        maxlength=${LONGEST_VOICING_NAME}
        .value=${name}
        @keydown=${this.handleRenameKey}
        @blur=${(event: Event) => this.#rename(event)}
      />`;
    }
    const drawn = colour.toLowerCase() as Lowercase<VoicingLetter>;
    return html`<button
      class="voicing"
      style="--voicing: var(--nw-curve-${drawn})"
      aria-pressed=${letter === this.active}
      title="Key ${index + 1}"
      @click=${() => send(this, 'nw-voicing-choose', { letter })}
    >
      <svg viewBox="0 0 26 8" aria-hidden="true">
        <path d="M0 4h26" stroke-width="2.500" stroke-dasharray=${DASHES[drawn].join(' ')}></path>
      </svg>
      <span class="letter">${letter}</span><span class="name">${name}</span>
    </button>`;
  }

  override render(): TemplateResult {
    const free = VOICING_LETTERS.find(
      (letter) => !this.voicings.some((voicing) => voicing.letter === letter),
    );
    const several = this.voicings.length > 1;
    const items: readonly MenuItem[] = [
      { id: 'rename', label: `Rename ${this.active}…` },
      { id: 'recolour', label: 'Next colour and dash' },
      { id: 'left', label: 'Move to the left', disabled: !several },
      { id: 'right', label: 'Move to the right', disabled: !several },
      {
        id: 'delete',
        label: `Delete ${this.active}`,
        disabled: !several,
        note: several ? 'can be undone' : 'the last one stays',
      },
    ];
    return html`<div class="row" role="group" aria-label="Voicings">
      ${this.voicings.map((voicing, index) => this.#entry(voicing, index))}
      ${
        free === undefined
          ? nothing
          : html`<button
            class="voicing"
            title="Keep the present line as another voicing and go on with that one"
            @click=${() => send(this, 'nw-voicing-keep', undefined)}
          >
            + Keep as ${free}
          </button>`
      }
      <nw-menu label="⋯" spoken="More about voicing ${this.active}" .items=${items} @nw-choose=${this.handleChoice}></nw-menu>
    </div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-voicings': NwVoicings;
  }
}
