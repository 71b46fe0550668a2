import { html, LitElement, type TemplateResult } from 'lit';
import { customElement, property } from 'lit/decorators.js';
import type { Decibels } from '../../src/units.ts';
import { baseStyles } from '../theme.ts';
import { levelMeterStyles } from './nw-level-meter.styles.ts';

/** Ends of the scale, in dB relative to full scale. */
const QUIETEST: Decibels = -48;
const LOUDEST: Decibels = 0;

/** Share of the scale that a level fills, 0 to 1; −Infinity and NaN fill nothing. */
function share(level: Decibels): number {
  return level > QUIETEST ? Math.min((level - QUIETEST) / (LOUDEST - QUIETEST), 1) : 0;
}

/** A level in words that are said well. */
function spoken(level: Decibels): string {
  if (!(level > QUIETEST)) return 'silent';
  const rounded = Math.round(level);
  return `${rounded < 0 ? 'minus ' : ''}${Math.abs(rounded)} decibels`;
}

/**
 * The output level: a bar from −48 dB to full scale, a mark at the highest of the last seconds, and a
 * word where something had to be cut. It has no clock of its own: whoever has the levels sets them.
 *
 * @csspart bar - the scale
 */
@customElement('nw-level-meter')
export class NwLevelMeter extends LitElement {
  static override styles = [baseStyles, levelMeterStyles];

  /** What is measured, for those who do not see where it stands. */
  @property() label = 'Output level';

  /** Level now, in dB relative to full scale; −Infinity for silence. */
  @property({ type: Number }) level: Decibels = Number.NEGATIVE_INFINITY;

  /** Highest level of the last seconds. */
  @property({ type: Number }) hold: Decibels = Number.NEGATIVE_INFINITY;

  /** Whether something was cut lately to keep it under full scale. */
  @property({ type: Boolean }) over = false;

  override render(): TemplateResult {
    const level = share(this.level);
    const hold = share(this.hold);
    return html`<div
      class="meter"
      role="meter"
      aria-label=${this.label}
      aria-valuemin=${QUIETEST}
      aria-valuemax=${LOUDEST}
      aria-valuenow=${Math.round(QUIETEST + level * (LOUDEST - QUIETEST))}
      aria-valuetext="${spoken(this.level)}, peak ${spoken(this.hold)}${this.over ? ', cut to stay under full scale' : ''}"
      title=${
        this.over
          ? 'Something was cut to stay under full scale; turn it down a little'
          : 'Level from −48 dB to full scale, with the highest of the last seconds'
      }
    >
      <div class="bar" part="bar">
        <div class="level" style="transform:scaleX(${level.toFixed(4)})"></div>
        <div class="hold" style="left:${(hold * 100).toFixed(2)}%" ?hidden=${hold === 0}></div>
      </div>
      <span class="over ${this.over ? 'lit' : ''}" aria-hidden="true">${this.over ? '!' : ''}</span>
    </div>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-level-meter': NwLevelMeter;
  }
}
