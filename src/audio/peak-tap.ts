import type { Seconds } from '../units.ts';

const CHANNELS = 2;
const WINDOW: Seconds = 0.15; // longer than the pause between two frames, even on a busy page

/** Reads the largest sample that passed a node since the last reading, over two channels. */
export class PeakTap {
  readonly #context: BaseAudioContext;
  readonly #source: AudioNode;
  readonly #split: ChannelSplitterNode;
  readonly #analysers: readonly AnalyserNode[];
  readonly #samples: Float32Array<ArrayBuffer>;
  #readUpTo: Seconds;

  constructor(context: BaseAudioContext, source: AudioNode) {
    this.#context = context;
    this.#source = source;
    this.#split = context.createChannelSplitter(CHANNELS);
    const size = 2 ** Math.ceil(Math.log2(WINDOW * context.sampleRate));
    this.#samples = new Float32Array(size);
    this.#analysers = Array.from({ length: CHANNELS }, (_, channel) => {
      const analyser = context.createAnalyser();
      analyser.fftSize = size;
      this.#split.connect(analyser, channel);
      return analyser;
    });
    source.connect(this.#split);
    this.#readUpTo = context.currentTime;
  }

  /**
   * The largest amplitude since the last call, and how long that was. Of a pause longer than the
   * window only the end is seen; while the context's time stands still there is nothing new.
   */
  read(): { peak: number; elapsed: Seconds } {
    const now = this.#context.currentTime;
    const elapsed = now - this.#readUpTo;
    this.#readUpTo = now;
    // One block more than the clock says, as the clock moves in blocks.
    const fresh = Math.min(Math.round(elapsed * this.#context.sampleRate) + 128, this.#samples.length);
    let peak = 0;
    if (elapsed > 0) {
      for (const analyser of this.#analysers) {
        analyser.getFloatTimeDomainData(this.#samples);
        for (let index = this.#samples.length - fresh; index < this.#samples.length; index += 1) {
          const size = Math.abs(this.#samples[index]!);
          if (size > peak) peak = size;
        }
      }
    }
    return { peak, elapsed };
  }

  dispose(): void {
    this.#source.disconnect(this.#split);
    this.#split.disconnect();
    for (const analyser of this.#analysers) analyser.disconnect();
  }
}
