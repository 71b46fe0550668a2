import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { MatchedVoicing } from '../../src/bench/matched-voicings.ts';
import { CONTEXT_RATES, type ContextRate } from '../../src/bench/preferences.ts';
import { send } from '../events.ts';
import '../nw-notice/nw-notice.ts';
import '../nw-switch/nw-switch.ts';
import type { NwSwitch } from '../nw-switch/nw-switch.ts';
import { baseStyles } from '../theme.ts';
import { listenPanelStyles } from './nw-listen-panel.styles.ts';

/**
 * Listen: matched loudness, the rate of the sound, and how to compare.
 *
 * @fires nw-matched-set - `{ matched }`
 * @fires nw-rate-set - `{ rate }`
 */
@customElement('nw-listen-panel')
export class NwListenPanel extends LitElement {
  static override styles = [baseStyles, listenPanelStyles];

  /** Whether everything is heard at the same loudness. */
  @property({ type: Boolean }) matched = true;

  /** Rate of the audio context. */
  @property({ type: Number }) rate: ContextRate = 48_000;

  /** The voicings with their gains. */
  @property({ attribute: false }) voicings: readonly MatchedVoicing[] = [];

  override render(): TemplateResult {
    return html`
      <h2>Listen</h2>
      <p>Space plays and stops; the keys 1 to 8 switch between voicings while it plays.</p>
      <nw-switch
        label="Match the loudness"
        .checked=${this.matched}
        @change=${(event: Event) => send(this, 'nw-matched-set', { matched: (event.target as NwSwitch).checked })}
        >Match the loudness</nw-switch
      >
      <p class="soft">
        ${
          this.matched
            ? 'Every voicing and the bypass are as loud as the clip itself (ITU-R BS.1770), so that the louder one does not simply win.'
            : 'You hear the true level differences; the louder one tends to win.'
        }
      </p>
      <dl>
        ${this.voicings.map(
          ({ letter, name, gain }) => html`<dt>${letter} ${name}</dt>
            <dd>${gain === undefined ? 'silent' : `${gain < 0 ? '−' : '+'}${Math.abs(gain).toFixed(1)} dB`}</dd>`,
        )}
      </dl>
      <label class="rate">
        Sample rate of the sound
        <select
          @change=${(event: Event) =>
            send(this, 'nw-rate-set', {
              rate: Number((event.target as HTMLSelectElement).value) as ContextRate,
            })}
        >
          ${CONTEXT_RATES.map(
            (rate) => html`<option value=${rate} ?selected=${rate === this.rate}>${rate / 1000} kHz</option>`,
          )}
        </select>
        <span class="soft"
          >Digital filters bend the topmost octave. “Digital difference” above the plot shows how far; a higher
          rate makes it smaller and asks more of the machine.</span
        >
      </label>
      <nw-notice kind="caution"
        >Start with the volume low. Changes of a circuit can be loud; protect your hearing.</nw-notice
      >
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-listen-panel': NwListenPanel;
  }
}
