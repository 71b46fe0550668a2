import { computed, effect, type ReadonlySignal, signal } from '@preact/signals-core';
import type { Engine, MeterReading, Region } from '../audio/engine-types.ts';
import { WorkerPort } from '../audio/worker-port.ts';
import { type Clip, durationOf, regionOf } from '../clip/clip.ts';
import type { WeightedSpectrum } from '../clip/loudness-through.ts';
import type { Overview } from '../clip/overview.ts';
import { messageOf, NotchworkError } from '../errors.ts';
import type { Decibels, Hertz, Seconds } from '../units.ts';
import type { ClipQuestion } from './clip-analysis.worker.ts';
import { filtering, loadFiltering } from './filtering.ts';
import type { LineAnalysis } from './line-analysis.ts';

/** The recording on the bench. */
export interface BenchClip {
  /** Id of a demo clip; empty for one of the user's own. */
  readonly id: string;
  readonly title: string;
  readonly clip: Clip;
  readonly overview: Overview | undefined;
}

/** A sentence about the sound, and how bad it is. */
export interface SoundMessage {
  readonly kind: 'info' | 'caution' | 'error';
  readonly text: string;
}

/** What the sound of the bench needs from the rest of it. */
export interface SoundInputs {
  /** The line that is heard. */
  readonly line: ReadonlySignal<LineAnalysis>;
  /** Rate asked for the audio context. */
  readonly contextRate: ReadonlySignal<Hertz>;
  /** Whether the line is made as loud as the clip is without it. */
  readonly matched: ReadonlySignal<boolean>;
}

const SILENCE: MeterReading = {
  level: Number.NEGATIVE_INFINITY,
  hold: Number.NEGATIVE_INFINITY,
  limited: false,
  headroom: 0,
};

/** Buckets of a waveform: more than any screen has columns. */
const BUCKETS = 4000;

async function askAnalyst<Answer>(question: ClipQuestion, signal: AbortSignal): Promise<Answer> {
  const worker = new Worker(new URL('./clip-analysis.worker.ts', import.meta.url), { type: 'module' });
  const port = new WorkerPort(worker, signal);
  try {
    return await port.ask<Answer>(question);
  } finally {
    port.close();
  }
}

function isAbort(thrown: unknown): boolean {
  return thrown instanceof DOMException && thrown.name === 'AbortError';
}

/**
 * The sound of the bench: the recording, the player and the line in it. The audio libraries are
 * loaded when something is first played; until then everything else works without them.
 */
export class BenchSound {
  readonly #inputs: SoundInputs;
  readonly #clip = signal<BenchClip | undefined>(undefined);
  readonly #loading = signal<number | undefined>(undefined);
  readonly #engine = signal<Engine | undefined>(undefined);
  readonly #region = signal<Region | undefined>(undefined);
  readonly #loop = signal(true);
  readonly #bypass = signal(false);
  readonly #message = signal<SoundMessage | undefined>(undefined);
  readonly #spectrum = signal<WeightedSpectrum | undefined>(undefined);
  readonly #starting = signal(false);
  #loads = new AbortController();
  #analyses = new AbortController();
  #loadedInEngine: Clip | undefined;
  readonly #stops: (() => void)[] = [];

  readonly clip: ReadonlySignal<BenchClip | undefined> = this.#clip;
  /** Share of a recording that was read; undefined while none is being read. */
  readonly loading: ReadonlySignal<number | undefined> = this.#loading;
  readonly region: ReadonlySignal<Region | undefined> = this.#region;
  readonly loop: ReadonlySignal<boolean> = this.#loop;
  readonly bypass: ReadonlySignal<boolean> = this.#bypass;
  readonly playing = computed(() => this.#engine.value?.state.value.playing ?? false);
  /** What there is to say about recording and sound; the engine's own troubles come first. */
  readonly message = computed<SoundMessage | undefined>(() => {
    const problem = this.#engine.value?.state.value.problem;
    return problem === undefined ? this.#message.value : { kind: 'error', text: problem };
  });
  /** Rate that the line's filters run at. */
  readonly sampleRate = computed(() => this.#engine.value?.sampleRate ?? this.#inputs.contextRate.value);
  /** Loudness matching of the line that is heard, in dB; undefined where there is nothing to match yet. */
  readonly gain = computed<Decibels | undefined>(() => this.gainOf(this.#inputs.line.value));

  constructor(inputs: SoundInputs) {
    this.#inputs = inputs;
    this.#stops.push(
      effect(() => this.#sendLine()),
      effect(() => {
        const engine = this.#engine.value;
        if (engine === undefined) return;
        engine.setLoop(this.#loop.value);
        engine.setBypass(this.#bypass.value);
      }),
    );
  }

  /**
   * Gain that makes a line as loud as the clip is without it; undefined where clip or line is silent.
   * Reads signals, so that whoever calls it in an effect hears of changes.
   */
  gainOf({ spans }: LineAnalysis): Decibels | undefined {
    const spectrum = this.#spectrum.value;
    const parts = filtering.value;
    if (spectrum === undefined || parts === undefined) return undefined;
    try {
      return parts.matchingGain(spectrum, spans, this.sampleRate.value);
    } catch {
      return undefined; // an unstable line: it is muted, and the reason stands with it
    }
  }

  /** Brings the engine's line up to date; an unusable line is muted and the reason said. */
  #sendLine(): void {
    const engine = this.#engine.value;
    const { spans, problem } = this.#inputs.line.value;
    const gain = this.#inputs.matched.value ? (this.gain.value ?? 0) : 0;
    const parts = filtering.value;
    if (engine === undefined || parts === undefined) return;
    try {
      engine.setLine({ filters: parts.lineFilters(spans, engine.sampleRate), gain });
      engine.setMuted(problem !== undefined);
    } catch (error) {
      engine.setMuted(true);
      this.#message.value = { kind: 'error', text: `The line is silent: ${messageOf(error)}` };
    }
  }

  /** Takes a recording: reads it, shows it, and makes it the one that plays. */
  async open(file: Blob, title: string, id = ''): Promise<void> {
    this.#loads.abort(new DOMException('another recording was chosen', 'AbortError'));
    this.#loads = new AbortController();
    const { signal } = this.#loads;
    this.#loading.value = 0;
    this.#message.value = undefined;
    try {
      const { decodeClip } = await import('../audio/decode.ts');
      const { clip, notice } = await decodeClip(file, {
        signal,
        onProgress: (share) => {
          if (!signal.aborted) this.#loading.value = share;
        },
      });
      if (signal.aborted) return;
      this.#engine.peek()?.stop();
      this.#region.value = undefined;
      this.#clip.value = { id, title, clip, overview: undefined };
      if (notice !== undefined) this.#message.value = { kind: 'caution', text: notice };
      this.#loading.value = undefined;
      await Promise.all([
        loadFiltering(),
        this.#drawOverview(clip, signal),
        this.#analyse(),
        this.#loadIntoEngine(),
      ]);
    } catch (error) {
      if (isAbort(error)) return;
      this.#message.value = { kind: 'error', text: messageOf(error) };
    } finally {
      if (!signal.aborted) this.#loading.value = undefined;
    }
  }

  async #drawOverview(clip: Clip, signal: AbortSignal): Promise<void> {
    const overview = await askAnalyst<Overview>({ kind: 'overview', clip, buckets: BUCKETS }, signal);
    const now = this.#clip.peek();
    if (now?.clip === clip) this.#clip.value = { ...now, overview };
  }

  /** Analyses the region's loudness anew; an earlier analysis is called off. */
  async #analyse(): Promise<void> {
    this.#analyses.abort(new DOMException('the region changed', 'AbortError'));
    this.#analyses = new AbortController();
    const now = this.#clip.peek();
    if (now === undefined) return;
    const region = this.#region.peek();
    const part = region === undefined ? now.clip : regionOf(now.clip, region.start, region.end);
    const own = { ...part, channels: part.channels.map((channel) => channel.slice()) };
    try {
      const question: ClipQuestion = { kind: 'spectrum', clip: own };
      this.#spectrum.value = await askAnalyst<WeightedSpectrum>(question, this.#analyses.signal);
    } catch (error) {
      if (!isAbort(error)) throw error;
    }
  }

  async #loadIntoEngine(): Promise<void> {
    const engine = this.#engine.peek();
    const clip = this.#clip.peek()?.clip;
    if (engine === undefined || clip === undefined || this.#loadedInEngine === clip) return;
    this.#loadedInEngine = clip;
    await engine.load(clip);
    engine.setRegion(this.#region.peek());
  }

  /**
   * Loads the audio code ahead of the press that needs it: some browsers forget the user's click while
   * code is still on its way, and then refuse to start sound.
   */
  prepare(): void {
    void import('../audio/engine.ts').catch(() => {}); // pressing play tries again and says what is wrong
  }

  /** Plays or stops. Call it in the user's own click or key press: browsers start sound only there. */
  async toggle(): Promise<void> {
    if (this.playing.peek()) {
      this.#engine.peek()?.stop();
      return;
    }
    if (this.#clip.peek() === undefined || this.#starting.peek()) return;
    this.#starting.value = true;
    this.#message.value = undefined;
    try {
      await this.#ensureEngine();
      await this.#loadIntoEngine();
      await this.#engine.peek()?.play();
    } catch (error) {
      this.#message.value = { kind: 'error', text: messageOf(error) };
    } finally {
      this.#starting.value = false;
    }
  }

  /** Makes the engine where there is none, or one of another rate where that was asked for. */
  async #ensureEngine(): Promise<void> {
    const rate = this.#inputs.contextRate.peek();
    const present = this.#engine.peek();
    if (present !== undefined && present.sampleRate === rate && present.state.peek().sound !== 'closed')
      return;
    const [{ createEngine }] = await Promise.all([import('../audio/engine.ts'), loadFiltering()]);
    const engine = await createEngine({ sampleRate: rate });
    this.#loadedInEngine = undefined;
    this.#engine.value = engine;
    await present?.dispose();
  }

  /** Changes the context's rate now, playing on where it played. */
  async changeRate(): Promise<void> {
    const engine = this.#engine.peek();
    if (engine === undefined || engine.sampleRate === this.#inputs.contextRate.peek()) return;
    const { playing } = engine.state.peek();
    const place = engine.position();
    try {
      await this.#ensureEngine();
      await this.#loadIntoEngine();
      this.#engine.peek()?.seek(place);
      if (playing) await this.#engine.peek()?.play();
    } catch (error) {
      this.#message.value = { kind: 'error', text: messageOf(error) };
    }
  }

  /** Goes to a place in the recording. */
  seek(place: Seconds): void {
    this.#engine.peek()?.seek(place);
  }

  /** Plays only a part; the whole recording for undefined or for all of it. */
  setRegion(start: Seconds, end: Seconds, settled: boolean): void {
    const clip = this.#clip.peek()?.clip;
    if (clip === undefined) return;
    const whole = start <= 0 && end >= durationOf(clip);
    const region = whole ? undefined : { start, end };
    try {
      if (!(end > start))
        throw new NotchworkError(
          'value-out-of-range',
          'The region has no length; drag one of its edges out.',
        );
      this.#region.value = region;
      if (!settled) return;
      this.#engine.peek()?.setRegion(region);
      this.#analyse().catch((error: unknown) => {
        this.#message.value = { kind: 'error', text: messageOf(error) };
      });
    } catch (error) {
      this.#message.value = { kind: 'error', text: messageOf(error) };
    }
  }

  setLoop(loop: boolean): void {
    this.#loop.value = loop;
  }

  setBypass(bypass: boolean): void {
    this.#bypass.value = bypass;
  }

  /** Puts the present message away. */
  dismiss(): void {
    this.#message.value = undefined;
  }

  /** Says something about the sound from outside: a file that was no recording. */
  say(message: SoundMessage): void {
    this.#message.value = message;
  }

  /** Place that is heard, in seconds. */
  position(): Seconds {
    return this.#engine.peek()?.position() ?? 0;
  }

  /** What the meter shows; call it once a frame. */
  meter(): MeterReading {
    return this.#engine.peek()?.meter() ?? SILENCE;
  }

  /** Stops and releases everything. */
  async dispose(): Promise<void> {
    for (const stop of this.#stops) stop();
    this.#loads.abort(new DOMException('the bench was closed', 'AbortError'));
    this.#analyses.abort(new DOMException('the bench was closed', 'AbortError'));
    await this.#engine.peek()?.dispose();
  }
}
