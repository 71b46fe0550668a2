import { signal } from '@preact/signals-core';
import { html, LitElement, nothing, type TemplateResult } from 'lit';
import { customElement, query, state } from 'lit/decorators.js';
import { DEMO_CLIPS } from '../../demo-audio/clips.ts';
import { type Bench, createBench } from '../../src/bench/bench.ts';
import type { ExportKind, RenderProgress } from '../../src/bench/bench-exports.ts';
import { filtering } from '../../src/bench/filtering.ts';
import { pageKey, takesKey } from '../../src/bench/keyboard.ts';
import { lineFigures } from '../../src/bench/line-figures.ts';
import { matchedVoicings } from '../../src/bench/matched-voicings.ts';
import { plotCurves } from '../../src/bench/plot-curves.ts';
import { SwapSession } from '../../src/bench/swap-session.ts';
import { SLOTS, type SlotName } from '../../src/blocks/block.ts';
import { blocksOf } from '../../src/blocks/catalogue.ts';
import type { PlacedBlock } from '../../src/blocks/span.ts';
import { durationOf } from '../../src/clip/clip.ts';
import { placedBlock } from '../../src/design/placed-line.ts';
import { freeLetter } from '../../src/design/voicings.ts';
import type { PlotCurve } from '../../src/sheet/plot-model.ts';
import { SignalReader } from '../controllers/signal-reader.ts';
import '../nw-header/nw-header.ts';
import '../nw-line/nw-line.ts';
import type { LineEntry } from '../nw-line/nw-line.ts';
import '../nw-menu/nw-menu.ts';
import type { MenuItem } from '../nw-menu/nw-menu.ts';
import '../nw-notice/nw-notice.ts';
import '../nw-play-bar/nw-play-bar.ts';
import '../nw-plot-panel/nw-plot-panel.ts';
import type { NwSwapPanel } from '../nw-swap-panel/nw-swap-panel.ts';
import type { NwTabs, Tab } from '../nw-tabs/nw-tabs.ts';
import '../nw-voicings/nw-voicings.ts';
import { baseStyles, installTheme } from '../theme.ts';
import { AppActions } from './app-actions.ts';
import { appStyles } from './nw-app.styles.ts';

const TABS: readonly Tab[] = [
  { id: 'listen', label: 'Listen' },
  { id: 'swap', label: 'Swap' },
];

const OPEN_DESIGN = 'open-design';

const FILES: readonly MenuItem[] = [
  { id: OPEN_DESIGN, label: 'Open a design…' },
  { id: 'design', label: 'Save the design' },
  { id: 'csv', label: 'Curve as CSV' },
  { id: 'svg', label: 'Plot as SVG' },
  { id: 'png', label: 'Plot as PNG' },
  { id: 'wav24', label: 'Clip through the line, 24-bit WAV' },
  { id: 'wav32', label: 'Clip through the line, float WAV' },
];

const PLOT_TITLES = {
  magnitude: 'Level of the line',
  phase: 'Phase of the line',
  difference: 'Level of the digital filters less that of the circuit',
} as const;

const REFERENCE = {
  magnitude:
    '0 dB is the driver’s unloaded output. The power stage counts from its own gain at 1 kHz, presence down.',
  phase: 'Of the whole line.',
  difference: '0 dB is the circuit itself.',
} as const;

/**
 * The whole page: it holds the bench, hands values down and turns what the elements say into changes.
 */
@customElement('nw-app')
export class NwApp extends LitElement {
  static override styles = [baseStyles, appStyles];

  /** The bench on this page; it lives as long as the element. */
  readonly bench: Bench = createBench();

  @query('input[type=file]') private designField!: HTMLInputElement;

  @state() private tab = 'listen';

  @state() private drawer: SlotName | undefined;

  @state() private dropping = false;

  readonly #swap = new SwapSession(this.bench.store, this.bench.settled);
  readonly #rendering = signal<RenderProgress | undefined>(undefined);
  readonly #actions = new AppActions(this.bench, this.#swap);
  readonly #curves = new SignalReader(this, () => this.#readCurves());
  readonly #design = new SignalReader(this, () => ({
    design: this.bench.store.design.value,
    history: this.bench.store.history.value,
    preferences: this.bench.preferences.value.value,
    active: this.bench.active.value,
    cursor: this.bench.cursor.value,
    pinned: this.bench.pinned.value,
    moving: this.bench.moving.value,
    swap: this.#swap.subject.value,
    tried: this.#swap.tried.value,
    series: this.#swap.series.value,
    rendering: this.#rendering.value,
  }));
  readonly #sound = new SignalReader(this, () => {
    const { sound } = this.bench;
    return {
      clip: sound.clip.value,
      loading: sound.loading.value,
      region: sound.region.value,
      loop: sound.loop.value,
      bypass: sound.bypass.value,
      playing: sound.playing.value,
      message: sound.message.value,
      gains: matchedVoicings(this.bench),
    };
  });
  #frame: number | undefined;
  #keeping: Promise<() => void> | undefined;

  override connectedCallback(): void {
    super.connectedCallback();
    installTheme(document);
    for (const name of this.#actions.names) this.addEventListener(name, this.#actions.handle);
    window.addEventListener('keydown', this.#handlePageKey);
    window.addEventListener('dragover', this.#handleDragOver);
    window.addEventListener('dragleave', this.#handleDragLeave);
    window.addEventListener('drop', this.#handleDrop);
    this.#watchMeter();
    setTimeout(() => this.#loadTheRest(), 0);
    this.#keeping = this.#actions.keepDesign();
    if (this.bench.sound.clip.peek() === undefined) this.#actions.chooseClip(DEMO_CLIPS[0]!.id);
  }

  override disconnectedCallback(): void {
    super.disconnectedCallback();
    window.removeEventListener('keydown', this.#handlePageKey);
    window.removeEventListener('dragover', this.#handleDragOver);
    window.removeEventListener('dragleave', this.#handleDragLeave);
    window.removeEventListener('drop', this.#handleDrop);
    if (this.#frame !== undefined) cancelAnimationFrame(this.#frame);
    this.#frame = undefined;
    void this.#keeping?.then((stop) => stop());
    this.#keeping = undefined;
  }

  override updated(): void {
    const { theme } = this.#design.value.preferences;
    if (theme === 'system') delete document.documentElement.dataset['theme'];
    else document.documentElement.dataset['theme'] = theme;
    document.title = `${this.#design.value.design.title} – Notchwork`;
  }

  #readCurves(): readonly PlotCurve[] {
    const { plotView, showBlocks } = this.bench.preferences.value.value;
    return plotCurves({
      view: plotView,
      voicings: this.bench.voicings.value,
      active: this.bench.active.value.letter,
      pinned: this.bench.pinned.value,
      showBlocks,
      sampleRate: this.bench.sound.sampleRate.value,
      filtering: filtering.value,
    });
  }

  #file(id: string): void {
    if (id === OPEN_DESIGN) this.designField.click();
    else void this.#save(id as ExportKind);
  }

  private handleDesignFile(): void {
    const file = this.designField.files?.[0];
    this.designField.value = ''; // so that the same file can be opened again
    if (file !== undefined) this.#actions.openFile(file);
  }

  async #save(kind: ExportKind): Promise<void> {
    const { BenchExports } = await import('../../src/bench/bench-exports.ts');
    const plot = {
      svg: (title: string) => this.#drawSvg(title),
      png: async (title: string) => {
        const { rasterise } = await import('../chart/rasterise.ts');
        return rasterise(await this.#drawSvg(title), 2);
      },
    };
    await new BenchExports(this.bench, plot, this.#rendering).save(kind);
  }

  async #drawSvg(title: string): Promise<string> {
    const { plotSvg } = await import('../../src/sheet/plot-svg.ts');
    const view = this.bench.preferences.value.peek().plotView;
    return plotSvg(this.#curves.value, {
      title: `${title}: ${PLOT_TITLES[view].toLowerCase()}`,
      quantity: view,
      reference: REFERENCE[view],
    });
  }

  /** Elements that the first screen does not show come after it. */
  #loadTheRest(): void {
    void import('../nw-tabs/nw-tabs.ts');
    void import('../nw-listen-panel/nw-listen-panel.ts');
    void import('../nw-parts-drawer/nw-parts-drawer.ts');
    void import('../nw-swap-panel/nw-swap-panel.ts');
  }

  /** Position and level move by themselves while something plays: they are fetched once a frame. */
  #watchMeter(): void {
    this.#frame = requestAnimationFrame(() => {
      const bar = this.renderRoot.querySelector('nw-play-bar');
      if (bar && this.isConnected) {
        const { sound } = this.bench;
        const { level, hold, limited } = sound.meter();
        bar.position = sound.position();
        bar.level = level;
        bar.hold = hold;
        bar.over = limited;
      }
      if (this.isConnected) this.#watchMeter();
    });
  }

  readonly #handlePageKey = (event: KeyboardEvent): void => {
    const focused = event.composedPath()[0];
    if (event.defaultPrevented || takesKey(focused instanceof Element ? focused : undefined, event.key))
      return;
    const meaning = pageKey(event);
    if (meaning === undefined || this.drawer !== undefined) return;
    event.preventDefault();
    this.#actions.key(meaning);
  };

  readonly #handleDragOver = (event: DragEvent): void => {
    if (!event.dataTransfer?.types.includes('Files')) return;
    event.preventDefault();
    this.dropping = true;
  };

  readonly #handleDragLeave = (event: DragEvent): void => {
    if (event.relatedTarget === null) this.dropping = false;
  };

  readonly #handleDrop = (event: DragEvent): void => {
    this.dropping = false;
    const file = event.dataTransfer?.files[0];
    if (file === undefined) return;
    event.preventDefault();
    this.#actions.openFile(file);
  };

  private handleTab(event: Event): void {
    const tabs = event.target as NwTabs;
    if (tabs.localName === 'nw-tabs') this.tab = tabs.chosen;
  }

  #shelf(): TemplateResult {
    const { preferences, design, swap, tried, series } = this.#design.value;
    return this.tab === 'swap'
      ? html`<nw-swap-panel
          .subject=${swap}
          .series=${series}
          .tried=${tried}
          .nextLetter=${freeLetter(design) ?? ''}
          @change=${(event: Event) => this.#swap.setSeries((event.target as NwSwapPanel).series)}
        ></nw-swap-panel>`
      : html`<nw-listen-panel
          .matched=${preferences.matched}
          .rate=${preferences.contextRate}
          .voicings=${this.#sound.value.gains}
        ></nw-listen-panel>`;
  }

  #plot(): TemplateResult {
    const { design, preferences, active, cursor, pinned, moving } = this.#design.value;
    const view = preferences.plotView;
    return html`<nw-plot-panel
      .curves=${this.#curves.value}
      .figures=${lineFigures(active.analysis, cursor)}
      .words=${{ title: PLOT_TITLES[view], reference: REFERENCE[view] }}
      .view=${view}
      .blocks=${preferences.showBlocks}
      .table=${preferences.showTable}
      .pinned=${pinned !== undefined}
      .moving=${moving}
      .cursor=${cursor}
    >
      <nw-voicings slot="voicings" .voicings=${design.voicings} .active=${design.active}></nw-voicings>
      ${
        active.analysis.problem === undefined
          ? nothing
          : html`<nw-notice slot="messages" kind="error"
            >${active.analysis.problem} The curve is the last one that could be computed.</nw-notice
          >`
      }
    </nw-plot-panel>`;
  }

  #drawer(): TemplateResult {
    const { line } = this.bench.store.voicing.value;
    const placed = this.drawer === undefined ? undefined : placedBlock(this.drawer, line[this.drawer]);
    return html`<nw-parts-drawer
      .block=${placed?.block}
      .settings=${placed?.settings}
      .variants=${this.drawer === undefined ? [] : blocksOf(this.drawer)}
      @close=${() => {
        this.drawer = undefined;
      }}
      >${placed === undefined ? nothing : this.#stress(placed)}</nw-parts-drawer
    >`;
  }

  /** Direct voltages of the driver and its network, in the drawer of either. */
  #stress({ block }: PlacedBlock): TemplateResult | typeof nothing {
    if (block.slot !== 'driver' && block.slot !== 'tone') return nothing;
    void import('../nw-stress-table/nw-stress-table.ts');
    const { placed } = this.#design.value.active.analysis;
    return html`<nw-stress-table slot="stress" .block=${block} .placed=${placed}></nw-stress-table>`;
  }

  #playBar(): TemplateResult {
    const { clip, loading, region, loop, bypass, playing, message, gains } = this.#sound.value;
    const { preferences, rendering, design } = this.#design.value;
    const gain = gains.find((entry) => entry.letter === design.active)?.gain;
    return html`<nw-play-bar
      @pointerover=${() => this.bench.sound.prepare()}
      @focusin=${() => this.bench.sound.prepare()}
      .playing=${playing}
      .clipTitle=${clip?.title ?? ''}
      .clips=${DEMO_CLIPS.map(({ id, title, description }) => ({ id, label: title, note: description }))}
      .overview=${clip?.overview}
      .duration=${clip === undefined ? 0 : durationOf(clip.clip)}
      .region=${region}
      .loop=${loop}
      .bypass=${bypass}
      .loading=${loading}
      .caution=${!preferences.hearingNoteRead}
    >
      <span class="matching"
        >${
          !preferences.matched
            ? 'True levels'
            : html`Loudness matched${gain === undefined ? nothing : html` · ${design.active} ${gain < 0 ? '−' : '+'}${Math.abs(gain).toFixed(1)} dB`}`
        }</span
      >
      ${
        message === undefined
          ? nothing
          : html`<nw-notice slot="messages" .kind=${message.kind} dismissable @nw-dismiss=${() => this.bench.sound.dismiss()}
            >${message.text}</nw-notice
          >`
      }
      ${
        rendering === undefined
          ? nothing
          : html`<div slot="messages" class="rendering">
            <span>Rendering</span>
            <progress max="1" .value=${rendering.share} aria-label="Rendering the clip"></progress>
            <button class="button" @click=${() => rendering.cancel()}>Cancel</button>
          </div>`
      }
    </nw-play-bar>`;
  }

  override render(): TemplateResult {
    const { design, history, preferences, swap } = this.#design.value;
    const { line } = this.bench.store.voicing.value;
    const entries = SLOTS.map(
      (slot): LineEntry => ({
        ...placedBlock(slot, line[slot]),
        present: line[slot].present,
        variants: blocksOf(slot),
      }),
    );
    return html`
      <nw-header
        .designTitle=${design.title}
        .note=${`· revision ${design.revision}`}
        .undoName=${history.past.at(-1)?.name ?? ''}
        .redoName=${history.future[0]?.name ?? ''}
        .theme=${preferences.theme}
      >
        <nw-menu
          label="Files"
          .items=${FILES}
          @nw-choose=${(event: CustomEvent<{ id: string }>) => this.#file(event.detail.id)}
        ></nw-menu>
        <input type="file" hidden accept=".json,application/json" @change=${this.handleDesignFile} />
      </nw-header>
      <div class="middle ${this.dropping ? 'dropping' : ''}">
        <main>
          ${this.#plot()}
          <nw-line
            .entries=${entries}
            .chosen=${swap}
            @nw-part-choose=${() => {
              this.tab = 'swap';
            }}
            @nw-drawer-open=${(event: CustomEvent<{ slot: SlotName }>) => {
              this.drawer = event.detail.slot;
            }}
          ></nw-line>
          ${this.#drawer()}
        </main>
        <aside aria-label="Shelf">
          <nw-tabs label="Tasks" .tabs=${TABS} .chosen=${this.tab} @change=${this.handleTab}>${this.#shelf()}</nw-tabs>
        </aside>
      </div>
      ${this.#playBar()}
    `;
  }
}

declare global {
  interface HTMLElementTagNameMap {
    'nw-app': NwApp;
  }
}
