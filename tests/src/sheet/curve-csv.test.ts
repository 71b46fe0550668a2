import fc from 'fast-check';
import Papa from 'papaparse';
import { describe, expect, it } from 'vitest';
import { curveCsv } from '../../../src/sheet/curve-csv.ts';

const rows = [
  { frequency: 10, magnitude: -1 / 3, phase: 1e-9, digital: -0.5 },
  { frequency: 30_000, magnitude: Number.NEGATIVE_INFINITY, phase: -179.5, digital: Number.NaN },
];

describe('curve as CSV', () => {
  // Read back by Papa Parse, a CSV library from the npm registry.
  it('keeps every digit', () => {
    const parsed = Papa.parse<string[]>(curveCsv(rows, false).trimEnd());
    expect(parsed.errors).toEqual([]);
    expect(parsed.data[0]).toEqual(['frequency_hz', 'magnitude_db', 'phase_deg']);
    expect(parsed.data[1]!.map(Number)).toEqual([10, -1 / 3, 1e-9]);
    expect(parsed.data[2]).toEqual(['30000', '-Infinity', '-179.5']);
  });

  it('has a column for the digital filter, empty where it has no level', () => {
    const parsed = Papa.parse<Record<string, string>>(curveCsv(rows, true).trimEnd(), { header: true });
    expect(parsed.data.map((row) => row['digital_magnitude_db'])).toEqual(['-0.5', '']);
  });

  it('ends every line with a line feed', () => {
    expect(curveCsv([], false)).toBe('frequency_hz,magnitude_db,phase_deg\n');
  });

  it('gives back every number bit for bit', () => {
    const number = fc.double({ noNaN: true });
    fc.assert(
      fc.property(fc.array(fc.tuple(number, number, number), { minLength: 1, maxLength: 20 }), (values) => {
        const text = curveCsv(
          values.map(([frequency, magnitude, phase]) => ({ frequency, magnitude, phase })),
          false,
        );
        const read = Papa.parse<string[]>(text.trimEnd()).data.slice(1);
        // Adding 0 makes a plain zero of −0, the one number that loses its sign in text.
        expect(read.map((row) => row.map(Number))).toEqual(
          values.map((row) => row.map((value) => value + 0)),
        );
      }),
    );
  });
});
