import type { Seconds } from '../units.ts';

/**
 * How long a new filter runs on the signal before it is heard. Measured at 48 kHz with a third-order
 * filter: the thump of a filter that starts at rest is −41 dB without, −56 dB at 20 ms, −68 dB at 50 ms.
 */
export const WARM_UP: Seconds = 0.05;

/** Length of a change of filter, gain or bypass. */
export const FADE: Seconds = 0.02;

/** How far ahead a fade is scheduled; the audio thread may be several blocks ahead of `currentTime`. */
export const LEAD: Seconds = 0.02;

/** Fade at the start and stop of the player, and at the seam of a loop. */
export const EDGE: Seconds = 0.005;

const POINTS = 1025; // the browser draws straight lines between them: −125 dB from the true curve

/** Raised cosine `(1 − cos πx)/2`, from 0 to 1; with its mirror image it adds up to 1 everywhere. */
const RISE = Float32Array.from({ length: POINTS }, (_, index) => raisedCosine(index / (POINTS - 1)));

/** The raised cosine at a place from 0 to 1. */
export function raisedCosine(place: number): number {
  return (1 - Math.cos(Math.PI * place)) / 2;
}

/**
 * Moves a parameter along a raised cosine. Curves of one parameter must not overlap; between two
 * fades that start together and last as long, the sum of like signals stays constant (equal gain).
 *
 * @param at when it begins, in the context's time, not earlier than the present.
 */
export function fade(param: AudioParam, from: number, to: number, at: Seconds, length: Seconds = FADE): void {
  param.setValueCurveAtTime(
    RISE.map((share) => from + (to - from) * share),
    at,
    length,
  );
}
