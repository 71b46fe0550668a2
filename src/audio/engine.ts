import { computed, signal } from '@preact/signals-core';
import { messageOf, NotchworkError } from '../errors.ts';
import { contextClock } from './clock.ts';
import { type ContextOptions, openContext } from './context.ts';
import type { Engine, EngineOptions, EngineState, SoundState } from './engine-types.ts';
import { LiveChain } from './live-chain.ts';
import { PeakMeter } from './meter.ts';
import { CEILING } from './output-stage.ts';
import { PeakTap } from './peak-tap.ts';
import { Player } from './player.ts';
import { prepareBuffer } from './prepare-buffer.ts';
import { Scope } from './scope.ts';

const USUAL_RATE = 48_000;

const PROBLEMS: Readonly<Partial<Record<SoundState, string>>> = {
  interrupted:
    'The system has taken the sound away for a moment (a call, or another program). Press play to go on.',
  stalled: 'The sound device does not answer; it may have been unplugged. Connect one and press play again.',
};

/**
 * Opens the sound: context, player, chain and meter, wired here and nowhere else. Load this module on
 * first use (`await import('…/engine.ts')`), and call it in the user's own click: browsers let sound
 * start only there.
 *
 * @throws NotchworkError `audio-unavailable` where there is no Web Audio or the rate is refused.
 * @example
 * const engine = await createEngine({ sampleRate: 48_000 });
 * engine.setLine({ filters: [{ key: 'tone', sections }] });
 * await engine.load(clip);
 * await engine.play();
 */
export async function createEngine(options: EngineOptions & Partial<ContextOptions> = {}): Promise<Engine> {
  const sound = openContext({ ...options, sampleRate: options.sampleRate ?? USUAL_RATE });
  const { raw, tone } = sound;
  const scope = new Scope();
  const clock = contextClock(raw, scope);
  const chain = new LiveChain({ context: raw, clock, destination: raw.destination });
  const playing = signal(false);
  const refusal = signal<string | undefined>(undefined);
  const player = new Player({
    tone,
    clock,
    target: chain.input,
    onEnded: () => {
      playing.value = false;
    },
  });
  const tap = new PeakTap(raw, chain.tap);
  const meter = new PeakMeter(CEILING);
  scope.add(() => chain.dispose());
  scope.add(() => tap.dispose());
  scope.add(() => player.dispose());
  let loads = 0;

  return {
    state: computed<EngineState>(() => ({
      sound: sound.state.value,
      playing: playing.value,
      problem: PROBLEMS[sound.state.value] ?? refusal.value,
    })),
    sampleRate: raw.sampleRate,
    async load(clip, signal) {
      loads += 1;
      const own = loads;
      const { buffer, peak } = await prepareBuffer(raw, clip, signal);
      // A clip that was asked for later may have been ready earlier.
      if (own !== loads || scope.disposed) return;
      player.load(buffer);
      playing.value = false;
      chain.setSource(peak);
    },
    async play() {
      if (player.duration === 0) {
        throw new NotchworkError(
          'clip-empty',
          'There is no clip to play. Open a recording or choose a demo clip.',
        );
      }
      refusal.value = undefined;
      try {
        await sound.start();
      } catch (error) {
        refusal.value = messageOf(error);
        throw error;
      }
      player.play(chain.readyAt);
      playing.value = true;
    },
    stop() {
      player.stop();
      playing.value = false;
    },
    seek: (place) => player.seek(place),
    setRegion: (region) => player.setRegion(region),
    setLoop: (on) => player.setLoop(on),
    position: () => player.position(),
    setLine: (setting) => chain.setLine(setting),
    setGain: (gain) => chain.setGain(gain),
    setBypass: (on) => chain.setBypass(on),
    setMuted: (on) => chain.setMuted(on),
    meter() {
      const { peak, elapsed } = tap.read();
      return { ...meter.update(peak, elapsed), headroom: chain.headroom };
    },
    async dispose() {
      playing.value = false;
      scope.dispose();
      await sound.close();
    },
  };
}
