import type { Decibels, Degrees, Hertz } from '../units.ts';

/** One line of a curve's table. */
export interface CurveRow {
  readonly frequency: Hertz;
  readonly magnitude: Decibels;
  /** Principal value, −180 to 180. */
  readonly phase: Degrees;
  /** Level of the digital filter; given in every row or in none. Empty above half the sample rate. */
  readonly digital?: Decibels | undefined;
}

function cell(value: number | undefined): string {
  return value === undefined || Number.isNaN(value) ? '' : String(value);
}

/**
 * A curve as CSV (RFC 4180, lines end in LF): `frequency_hz,magnitude_db,phase_deg` and, where
 * `digital` is true, `digital_magnitude_db`. Numbers keep full double precision.
 */
export function curveCsv(rows: readonly CurveRow[], digital: boolean): string {
  const header = ['frequency_hz', 'magnitude_db', 'phase_deg', ...(digital ? ['digital_magnitude_db'] : [])];
  const lines = rows.map((row) =>
    [row.frequency, row.magnitude, row.phase, ...(digital ? [row.digital] : [])].map(cell).join(','),
  );
  return `${[header.join(','), ...lines].join('\n')}\n`;
}
