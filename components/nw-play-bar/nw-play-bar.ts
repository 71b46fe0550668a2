import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, property, query, state } from 'lit/decorators.js';
import type { Region } from '../../src/audio/engine-types.ts';
import type { Overview } from '../../src/clip/overview.ts';
import type { Decibels, Seconds } from '../../src/units.ts';
import { send } from '../events.ts';
import '../nw-menu/nw-menu.ts';
import type { MenuItem } from '../nw-menu/nw-menu.ts';
import '../nw-notice/nw-notice.ts';
import { timeText } from '../nw-waveform/clip-time.ts';
import { baseStyles } from '../theme.ts';
import { playBarStyles } from './nw-play-bar.styles.ts';

/** Entry of the clip menu that asks for a file; no clip may have this id. */
const OPEN_FILE = 'open-file';

/** What browsers decode; the extensions are for systems that know no media types. */
const ACCEPTED = 'audio/*,.wav,.flac,.mp3,.ogg,.oga,.m4a';

/** Widths under this are a phone's; the same number stands in the styles. */
const NARROW = 700;

/** Longest title shown on the button, in letters; the whole of it stands in its tooltip. */
const LONGEST_TITLE = 26;
const LONGEST_NARROW_TITLE = 14;

/** A title that stays on one line of the button: cut to so many letters, its spaces not to be broken at. */
function buttonTitle(title: string, most: number): string {
  const letters = [...title];
  const kept =
    letters.length <= most
      ? title
      : `${letters
          .slice(0, most - 1)
          .join('')
          .trimEnd()}…`;
  return kept.replaceAll(' ', '\u00a0');
}

/** The picture on the play button: a triangle, or a square while it plays. */
const PLAY_SIGN = 'M7 4.5v15a1 1 0 0 0 1.5.86l12-7.5a1 1 0 0 0 0-1.72l-12-7.5A1 1 0 0 0 7 4.5Z';
const STOP_SIGN =
  'M6.5 5h11A1.5 1.5 0 0 1 19 6.5v11a1.5 1.5 0 0 1-1.5 1.5h-11A1.5 1.5 0 0 1 5 17.5v-11A1.5 1.5 0 0 1 6.5 5Z';

/**
 * The bar that is always at the bottom: play and stop, which clip, where in it, which part of it,
 * with or without the line, and how loud it comes out.
 *
 * @slot - words beside the level, such as the loudness of each voicing
 * @slot messages - notices about clip and sound, above the row
 * @fires nw-play-toggle - play or stop was pressed
 * @fires nw-seek - `{ seconds }`
 * @fires nw-region-set - `{ start, end, settled }`
 * @fires nw-loop-set - `{ loop }`
 * @fires nw-bypass-set - `{ bypass }`
 * @fires nw-clip-choose - `{ id }` of one of `clips`
 * @fires nw-clip-open - `{ file }`, a recording of one's own
 * @fires nw-hearing-read - the note about hearing was put away
 * @csspart play - the round button
 */
@customElement('nw-play-bar')
export class NwPlayBar extends LitElement {
  static override styles = [baseStyles, playBarStyles];

  @query('input[type=file]') private fileField!: HTMLInputElement;

  @state() private isNarrow = false;

  /** Whether it plays. */
  @property({ type: Boolean }) playing = false;

  /** Name of the clip; empty while there is none. */
  @property() clipTitle = '';

  /** Clips on offer, the present one included. */
  @property({ attribute: false }) clips: readonly MenuItem[] = [];

  /** Waveform of the clip. */
  @property({ attribute: false }) overview: Overview | undefined;

  /** Length of the clip in seconds. */
  @property({ type: Number }) duration: Seconds = 0;

  /** Place that is heard. */
  @property({ type: Number }) position: Seconds = 0;

  /** The part that plays; undefined for all of it. */
  @property({ attribute: false }) region: Region | undefined;

  /** Whether it starts over at the end. */
  @property({ type: Boolean }) loop = false;

  /** Whether the clip is heard without the line. */
  @property({ type: Boolean }) bypass = false;

  /** Output level now, in dB relative to full scale. */
  @property({ type: Number }) level: Decibels = Number.NEGATIVE_INFINITY;

  /** Highest output level of the last seconds. */
  @property({ type: Number }) hold: Decibels = Number.NEGATIVE_INFINITY;

  /** Whether something was cut lately to stay under full scale. */
  @property({ type: Boolean }) over = false;

  /** How much of a clip has been read, 0 to 1; undefined while none is being read. */
  @property({ attribute: false }) loading: number | undefined;

  /** Whether to show the note about hearing. */
  @property({ type: Boolean }) caution = false;

  readonly #widthObserver = new ResizeObserver(([entry]) => {
    this.isNarrow = (entry?.contentRect.width ?? Number.POSITIVE_INFINITY) <= NARROW;
  });

  override connectedCallback(): void {
    super.connectedCallback();
    this.#widthObserver.observe(this);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    this.#widthObserver.disconnect();
  }

  override firstUpdated(): void {
    // Neither has anything to show until a clip was read; their code need not be there earlier.
    void import('../nw-waveform/nw-waveform.ts');
    void import('../nw-level-meter/nw-level-meter.ts');
  }

  get #canPlay(): boolean {
    return this.duration > 0 && this.loading === undefined;
  }

  private handleChoice(event: CustomEvent<{ readonly id: string }>): void {
    event.stopPropagation(); // this bar says what was chosen in its own words
    if (event.detail.id === OPEN_FILE) this.chooseFile();
    else send(this, 'nw-clip-choose', { id: event.detail.id });
  }

  private handleFile(event: Event): void {
    event.stopPropagation();
    const file = this.fileField.files?.[0];
    this.fileField.value = ''; // so that the same file can be opened again
    if (file !== undefined) send(this, 'nw-clip-open', { file });
  }

  private handleDismiss(event: Event): void {
    event.stopPropagation();
    this.caution = false;
    send(this, 'nw-hearing-read', undefined);
  }

  private handleLoop(): void {
    this.loop = !this.loop;
    send(this, 'nw-loop-set', { loop: this.loop });
  }

  private handleBypass(): void {
    this.bypass = !this.bypass;
    send(this, 'nw-bypass-set', { bypass: this.bypass });
  }

  /** Asks to play or stop, as a press on the button does; nothing happens while there is no clip. */
  togglePlay(): void {
    if (this.#canPlay) send(this, 'nw-play-toggle', undefined);
  }

  /** Lets the user choose a recording; call it in the user's own click or key press. */
  chooseFile(): void {
    this.fileField.click();
  }

  #renderWave(): TemplateResult {
    if (this.loading === undefined) {
      return html`<nw-waveform
        .overview=${this.overview}
        .duration=${this.duration}
        .position=${this.position}
        .region=${this.region}
      ></nw-waveform>`;
    }
    const percent = Math.round(Math.min(Math.max(this.loading, 0), 1) * 100);
    return html`<div class="loading">
      <span id="loading">Reading the recording: ${percent}\u202f%</span>
      <div
        class="progress"
        role="progressbar"
        aria-labelledby="loading"
        aria-valuemin="0"
        aria-valuemax="100"
        aria-valuenow=${percent}
      >
        <div style="width:${percent}%"></div>
      </div>
    </div>`;
  }

  #renderToggle(words: string, note: string, pressed: boolean, handler: () => void): TemplateResult {
    return html`<button class="button toggle" aria-pressed=${pressed} title=${note} @click=${handler}>
      <span data-words=${words}>${words}</span>
    </button>`;
  }

  override render(): TemplateResult {
    const items: readonly MenuItem[] = [
      ...this.clips,
      { id: OPEN_FILE, label: 'Open a recording…', note: 'WAV, FLAC, MP3, OGG, M4A' },
    ];
    return html`<section class="bar" aria-label="Clip and playing">
      <div class="notes">
        <slot name="messages"></slot>
        ${
          this.caution
            ? html`<nw-notice kind="caution" dismissable @nw-dismiss=${this.handleDismiss}>
              Start low and protect your hearing: a knob or a swap can be louder than you expect.
            </nw-notice>`
            : nothing
        }
      </div>
      <div class="row">
        <button
          class="play"
          part="play"
          aria-label=${this.playing ? 'Stop' : 'Play'}
          title=${this.playing ? 'Stop (space)' : 'Play (space)'}
          ?disabled=${!this.#canPlay}
          @click=${this.togglePlay}
        >
          <svg viewBox="0 0 24 24" aria-hidden="true"><path d=${this.playing ? STOP_SIGN : PLAY_SIGN}></path></svg>
        </button>
        <div class="clip">
          <nw-menu
            upwards
            title=${this.clipTitle}
            spoken=${this.clipTitle === '' ? '' : `Clip: ${this.clipTitle}`}
            label=${buttonTitle(this.clipTitle, this.isNarrow ? LONGEST_NARROW_TITLE : LONGEST_TITLE) || 'Choose a clip'}
            .items=${items}
            @nw-choose=${this.handleChoice}
          ></nw-menu>
          <span class="time soft">${
            this.duration > 0 ? `${timeText(this.position)} of ${timeText(this.duration)}` : 'no clip yet'
          }</span>
        </div>
        <div class="wave">${this.#renderWave()}</div>
        <div class="toggles">
          ${this.#renderToggle('Loop', 'Start over at the end of the part that plays', this.loop, this.handleLoop)}
          ${this.#renderToggle('Bypass', 'Hear the clip without the line', this.bypass, this.handleBypass)}
        </div>
        <div class="side">
          <div class="words"><slot></slot></div>
          <nw-level-meter .level=${this.level} .hold=${this.hold} .over=${this.over}></nw-level-meter>
        </div>
      </div>
      <input type="file" hidden accept=${ACCEPTED} aria-label="A recording of your own" @change=${this.handleFile} />
    </section>`;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-play-bar': NwPlayBar;
  }
}
