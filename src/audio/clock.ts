import type { Seconds } from '../units.ts';
import type { Scope } from './scope.ts';

/** Time as the chain sees it, so that the very same code runs live and in an offline rendering. */
export interface AudioClock {
  /** Time of the audio context. */
  readonly now: Seconds;
  /** Whether time passes; while it does not, nothing is heard and changes need no fade. */
  readonly running: boolean;
  /**
   * Calls `action` as soon as the context's time has reached `time`.
   *
   * @returns a function that calls it off.
   */
  at(time: Seconds, action: () => void): () => void;
}

const SLACK = 5; // ms: a timer that fires a little early is set again, not at once
const STANDSTILL = 250; // ms between looks while time does not pass

/** The clock of a live context; its timers belong to `scope`. */
export function contextClock(context: BaseAudioContext, scope: Scope): AudioClock {
  return {
    get now() {
      return context.currentTime;
    },
    get running() {
      return context.state === 'running';
    },
    at(time, action) {
      let cancel = (): void => {};
      const arm = (): void => {
        const wait = (time - context.currentTime) * 1000;
        cancel = scope.timeout(look, context.state === 'running' ? Math.max(wait, 0) + SLACK : STANDSTILL);
      };
      const look = (): void => {
        if (context.currentTime >= time) action();
        else arm();
      };
      arm();
      return () => cancel();
    },
  };
}
