import { NotchworkError } from '../errors.ts';
import type { Rotation, TrackRatio } from '../units.ts';

/**
 * How a potentiometer's track resistance follows its rotation. `midpoint` is the share of the track
 * between the anticlockwise end and the wiper at half rotation (0 < midpoint < 0.5, usually 0.10 to
 * 0.20); it is the property printed in data sheets and is ignored by the linear law.
 */
export interface Taper {
  readonly law: 'linear' | 'audio' | 'reverse-audio';
  readonly midpoint: number;
}

/** A straight-line taper. */
export const LINEAR: Taper = { law: 'linear', midpoint: 0.5 };
/** The usual audio taper: 15 % of the track at half rotation (common practice, no source). */
export const AUDIO: Taper = { law: 'audio', midpoint: 0.15 };
/** The audio taper turned round. */
export const REVERSE_AUDIO: Taper = { law: 'reverse-audio', midpoint: 0.15 };

/** Logarithm of `b`; written so that it stays finite down to the smallest midpoint a double can hold. */
function logBase(midpoint: number): number {
  return 2 * (Math.log1p(-midpoint) - Math.log(midpoint));
}

/** Below this the exponential is the straight line to the last digit of a double. */
const STRAIGHT = 1e-9;
/** Above this `b` would leave the doubles, and `1` is lost beside it. */
const STEEP = 700;

/** Exponential track through (0, 0), (½, midpoint) and (1, 1). */
function audioRatio(turn: number, midpoint: number): number {
  const log = logBase(midpoint);
  if (turn === 0 || turn === 1 || Math.abs(log) < STRAIGHT) return turn;
  if (log > STEEP) return Math.exp((turn - 1) * log);
  return Math.expm1(turn * log) / Math.expm1(log);
}

/** The rotation at which {@link audioRatio} gives `ratio`. */
function audioTurn(ratio: number, midpoint: number): number {
  const log = logBase(midpoint);
  if (ratio === 0 || ratio === 1 || Math.abs(log) < STRAIGHT) return ratio;
  if (log > STEEP) return Math.max(0, 1 + Math.log(ratio) / log);
  return Math.log1p(ratio * Math.expm1(log)) / log;
}

function assertMidpoint(taper: Taper): void {
  if (taper.law !== 'linear' && !(taper.midpoint > 0 && taper.midpoint < 1)) {
    throw new NotchworkError(
      'value-out-of-range',
      `Taper midpoint is ${taper.midpoint}; it is the share of the track at half rotation, between 0 and 1 (0.15 is usual).`,
    );
  }
}

/**
 * Share of the track between the anticlockwise end and the wiper, exactly 0 and 1 at the stops.
 * The audio law is `(bˣ − 1)/(b − 1)` with `b = ((1 − m)/m)²`, which passes through the midpoint `m`.
 *
 * @throws NotchworkError `value-out-of-range` for a midpoint outside 0 to 1.
 */
export function trackRatio(taper: Taper, turn: Rotation): TrackRatio {
  assertMidpoint(taper);
  switch (taper.law) {
    case 'linear':
      return turn as number as TrackRatio;
    case 'audio':
      return audioRatio(turn, taper.midpoint) as TrackRatio;
    case 'reverse-audio':
      return (1 - audioRatio(1 - turn, taper.midpoint)) as TrackRatio;
  }
}

/** The rotation that gives a track ratio: the inverse of {@link trackRatio}. */
export function rotationOf(taper: Taper, ratio: TrackRatio): Rotation {
  assertMidpoint(taper);
  switch (taper.law) {
    case 'linear':
      return ratio as number as Rotation;
    case 'audio':
      return audioTurn(ratio, taper.midpoint) as Rotation;
    case 'reverse-audio':
      return (1 - audioTurn(1 - ratio, taper.midpoint)) as Rotation;
  }
}
