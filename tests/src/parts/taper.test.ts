import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import {
  AUDIO,
  LINEAR,
  REVERSE_AUDIO,
  rotationOf,
  type Taper,
  trackRatio,
} from '../../../src/parts/taper.ts';
import { type Rotation, rotation, type TrackRatio } from '../../../src/units.ts';

const at = (taper: Taper, turn: number): number => trackRatio(taper, turn as Rotation);
const back = (taper: Taper, ratio: number): number => rotationOf(taper, ratio as TrackRatio);

/** Every law, with any midpoint that a data sheet could print. */
const anyTaper: fc.Arbitrary<Taper> = fc.record({
  law: fc.constantFrom('linear', 'audio', 'reverse-audio'),
  midpoint: fc.double({ min: 0.02, max: 0.5, noNaN: true }),
});
const anyTurn = fc.double({ min: 0, max: 1, noNaN: true });

describe('taper', () => {
  it('goes exactly from 0 to 1, both ways, whatever the law', () => {
    fc.assert(
      fc.property(anyTaper, (taper) => {
        expect([at(taper, 0), at(taper, 1), back(taper, 0), back(taper, 1)]).toEqual([0, 1, 0, 1]);
      }),
    );
  });

  it('never turns back, and stays within the track', () => {
    fc.assert(
      fc.property(anyTaper, anyTurn, anyTurn, (taper, first, second) => {
        const [low, high] = first < second ? [first, second] : [second, first];
        expect(at(taper, low)).toBeLessThanOrEqual(at(taper, high));
        expect(at(taper, low)).toBeGreaterThanOrEqual(0);
        expect(at(taper, high)).toBeLessThanOrEqual(1);
      }),
    );
  });

  it('rises strictly where two positions can be told apart', () => {
    for (const taper of [LINEAR, AUDIO, REVERSE_AUDIO]) {
      for (let step = 0; step < 1000; step += 1) {
        expect(at(taper, (step + 1) / 1000)).toBeGreaterThan(at(taper, step / 1000));
      }
    }
  });

  it('is undone by its inverse', () => {
    fc.assert(
      fc.property(anyTaper, anyTurn, (taper, turn) => {
        // Near the flat end a rounding of the ratio (1e-16) is worth up to (1-m)²/m² times as much turn.
        const steepness = ((1 - taper.midpoint) / taper.midpoint) ** 2;
        expect(Math.abs(back(taper, at(taper, turn)) - turn)).toBeLessThan(4e-16 * (2 + steepness));
        expect(Math.abs(at(taper, back(taper, turn)) - turn)).toBeLessThan(
          4e-15 * (2 + Math.log(steepness + 1)),
        );
      }),
    );
  });

  // Data sheets print the share of the track at half rotation; 10, 15 and 20 % are the usual audio
  // tapers (common practice, no source).
  it.each([0.1, 0.15, 0.2])('audio of %s passes its midpoint at half rotation', (midpoint) => {
    expect(at({ law: 'audio', midpoint }, 0.5)).toBeCloseTo(midpoint, 15);
    expect(at({ law: 'reverse-audio', midpoint }, 0.5)).toBeCloseTo(1 - midpoint, 15);
  });

  it('audio of 10 % has the quarters that its exponential gives', () => {
    // b = 81, b^¼ = 3: (3 − 1)/80 and (27 − 1)/80, by hand.
    expect(at({ law: 'audio', midpoint: 0.1 }, 0.25)).toBeCloseTo(0.025, 15);
    expect(at({ law: 'audio', midpoint: 0.1 }, 0.75)).toBeCloseTo(0.325, 15);
  });

  it('reverse audio is audio seen from the other end', () => {
    fc.assert(
      fc.property(anyTurn, (turn) => {
        // One subtraction on either side rounds by half a unit of 1.
        expect(at(REVERSE_AUDIO, turn) + at(AUDIO, 1 - turn)).toBeCloseTo(1, 15);
      }),
    );
  });

  it('linear is the rotation itself, to the last bit', () => {
    fc.assert(fc.property(anyTurn, (turn) => at(LINEAR, turn) === turn && back(LINEAR, turn) === turn));
  });

  it('goes over into the straight line as the midpoint goes to half', () => {
    for (const midpoint of [0.5, 0.5 - 1e-12, 0.5 - 1e-9, 0.5 - 1e-6]) {
      for (const turn of [0.1, 0.37, 0.9]) {
        // The exponential is off the line by at most 0.5·(½ − m) at these places.
        expect(Math.abs(at({ law: 'audio', midpoint }, turn) - turn)).toBeLessThan(
          1e-15 + (0.5 - midpoint) * 2,
        );
      }
    }
  });

  it('stays a number at midpoints that only a damaged file has', () => {
    for (const midpoint of [5e-324, 1e-200, 1e-155, 1e-150, 1e-10, 1 - 1e-15]) {
      for (const law of ['audio', 'reverse-audio'] as const) {
        for (const turn of [0, 1e-12, 0.5, 1 - 1e-12, 1]) {
          expect(at({ law, midpoint }, turn)).toBeGreaterThanOrEqual(0);
          expect(at({ law, midpoint }, turn)).toBeLessThanOrEqual(1);
          expect(back({ law, midpoint }, turn)).toBeGreaterThanOrEqual(0);
          expect(back({ law, midpoint }, turn)).toBeLessThanOrEqual(1);
        }
        const ends = [at({ law, midpoint }, 0), at({ law, midpoint }, 1)];
        expect([...ends, back({ law, midpoint }, 0), back({ law, midpoint }, 1)]).toEqual([0, 1, 0, 1]);
        expect(at({ law, midpoint }, rotation(0.5))).toBeCloseTo(
          law === 'audio' ? midpoint : 1 - midpoint,
          12,
        );
      }
    }
  });

  it.each([0, 1, -0.1, 1.2, Number.NaN, Number.POSITIVE_INFINITY])('refuses a midpoint of %s', (midpoint) => {
    expect(() => at({ law: 'audio', midpoint }, 0.5)).toThrow(/midpoint/);
    expect(() => back({ law: 'reverse-audio', midpoint }, 0.5)).toThrow(/midpoint/);
    expect(at({ law: 'linear', midpoint }, 0.5)).toBe(0.5);
  });
});
