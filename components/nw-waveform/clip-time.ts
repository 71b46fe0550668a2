import type { Seconds } from '../../src/units.ts';

/** Splits a time after rounding it to tenths, so that 59.96 s becomes a minute and not "60.0". */
function parts(seconds: Seconds): { readonly minutes: number; readonly rest: string } {
  const tenths = Math.round(Math.max(Number.isFinite(seconds) ? seconds : 0, 0) * 10);
  return { minutes: Math.floor(tenths / 600), rest: ((tenths % 600) / 10).toFixed(1) };
}

/** A place in a clip in figures, to a tenth of a second: "0:03.1". Negative and non-finite times read as 0. */
export function timeText(seconds: Seconds): string {
  const { minutes, rest } = parts(seconds);
  return `${minutes}:${rest.padStart(4, '0')}`;
}

/** The same in words: "1 minute 4.2 seconds". */
export function spokenTime(seconds: Seconds): string {
  const { minutes, rest } = parts(seconds);
  const shown = `${Number(rest)} ${Number(rest) === 1 ? 'second' : 'seconds'}`;
  return minutes === 0 ? shown : `${minutes} ${minutes === 1 ? 'minute' : 'minutes'} ${shown}`;
}
