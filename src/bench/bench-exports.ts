import type { Signal } from '@preact/signals-core';
import { messageOf } from '../errors.ts';
import { fileName } from '../sheet/file-name.ts';
import type { WavBits } from '../sheet/wav.ts';
import type { Bench } from './bench.ts';
import { saveFile } from './save-file.ts';

/** What can leave the bench. */
export type ExportKind = 'design' | 'csv' | 'png' | 'svg' | 'wav24' | 'wav32';

/** A rendering that is under way. */
export interface RenderProgress {
  /** Share done, 0 to 1. */
  readonly share: number;
  /** Calls it off. */
  cancel(): void;
}

/** Draws the present plot for paper. */
export interface PlotDrawing {
  svg(title: string): Promise<string>;
  png(title: string): Promise<Blob>;
}

/** Everything that leaves the bench, one naming rule for all of it. */
export class BenchExports {
  readonly #bench: Bench;
  readonly #plot: PlotDrawing;
  readonly #rendering: Signal<RenderProgress | undefined>;

  /**
   * @param plot draws the present plot, as a picture and as vectors.
   * @param rendering is told of a rendering under way; undefined while there is none.
   */
  constructor(bench: Bench, plot: PlotDrawing, rendering: Signal<RenderProgress | undefined>) {
    this.#bench = bench;
    this.#plot = plot;
    this.#rendering = rendering;
  }

  #name(what: string, ending: string): string {
    return fileName(this.#bench.store.design.peek().title, what, new Date(), ending);
  }

  /** Saves one thing; what goes wrong is said beside the sound. */
  async save(kind: ExportKind): Promise<void> {
    try {
      if (kind === 'design') await this.#saveDesign();
      else if (kind === 'csv') await this.#saveCsv();
      else if (kind === 'png' || kind === 'svg') await this.#savePlot(kind);
      else await this.#saveWav(kind === 'wav24' ? 24 : 32);
    } catch (error) {
      if (error instanceof DOMException && error.name === 'AbortError') return;
      this.#bench.sound.say({ kind: 'error', text: messageOf(error) });
    }
  }

  async #saveDesign(): Promise<void> {
    const { writeDesign } = await import('../design/read-design.ts');
    saveFile(writeDesign(this.#bench.store.design.peek()), this.#name('', 'json'), 'application/json');
  }

  async #saveCsv(): Promise<void> {
    const { lineCsv } = await import('./leaving.ts');
    const rate = this.#bench.sound.sampleRate.peek();
    saveFile(lineCsv(this.#bench.active.peek().analysis, rate), this.#name('curve', 'csv'), 'text/csv');
  }

  async #savePlot(kind: 'png' | 'svg'): Promise<void> {
    const { title } = this.#bench.store.design.peek();
    if (kind === 'png') saveFile(await this.#plot.png(title), this.#name('plot', 'png'), 'image/png');
    else saveFile(await this.#plot.svg(title), this.#name('plot', 'svg'), 'image/svg+xml');
  }

  /** The recording through the line, at its own rate, at the loudness that is heard. */
  async #saveWav(bits: WavBits): Promise<void> {
    const clip = this.#bench.sound.clip.peek();
    if (clip === undefined || this.#rendering.peek() !== undefined) return;
    const abort = new AbortController();
    const progress = (share: number): void => {
      this.#rendering.value = {
        share,
        cancel: () => abort.abort(new DOMException('cancelled', 'AbortError')),
      };
    };
    progress(0);
    try {
      const [{ renderOffline }, { writeWav }, { lineFilters }] = await Promise.all([
        import('../audio/offline-render.ts'),
        import('../sheet/wav.ts'),
        import('./line-filters.ts'),
      ]);
      const { letter, analysis } = this.#bench.active.peek();
      const sections = lineFilters(analysis.spans, clip.clip.sampleRate).flatMap((filter) => filter.sections);
      const matched = this.#bench.preferences.value.peek().matched;
      const gain = matched ? (this.#bench.sound.gain.peek() ?? 0) : 0;
      const rendered = await renderOffline(clip.clip, sections, {
        gain,
        signal: abort.signal,
        onProgress: progress,
      });
      saveFile(writeWav(rendered, bits), this.#name(`${clip.title} ${letter}`, 'wav'), 'audio/wav');
    } finally {
      this.#rendering.value = undefined;
    }
  }
}
