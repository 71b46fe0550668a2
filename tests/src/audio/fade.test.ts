import { describe, expect, it, vi } from 'vitest';
import { FADE, fade, LEAD, raisedCosine, WARM_UP } from '../../../src/audio/fade.ts';

function curveOf(from: number, to: number): Float32Array {
  const setValueCurveAtTime = vi.fn();
  fade({ setValueCurveAtTime } as unknown as AudioParam, from, to, 3);
  const [curve, at, length] = setValueCurveAtTime.mock.lastCall!;
  expect([at, length]).toEqual([3, FADE]);
  return curve;
}

describe('fade', () => {
  it('keeps to the times that were measured to be free of clicks', () => {
    expect(WARM_UP).toBeGreaterThanOrEqual(0.02);
    expect(WARM_UP).toBeLessThanOrEqual(0.05);
    expect(LEAD).toBeGreaterThanOrEqual(0.02);
    expect(FADE).toBeGreaterThanOrEqual(0.01);
    expect(FADE).toBeLessThanOrEqual(0.02);
  });

  it('has its ends exactly, and its middle half-way', () => {
    const curve = curveOf(0.25, 0.75);
    expect([curve[0], curve[(curve.length - 1) / 2], curve.at(-1)]).toEqual([0.25, 0.5, 0.75]);
  });

  it('adds up to 1 with the fade the other way: equal gain, not equal power', () => {
    const [rise, fall] = [curveOf(0, 1), curveOf(1, 0)];
    // Two roundings to single precision.
    rise.forEach((value, index) => {
      expect(Math.abs(value + fall[index]! - 1)).toBeLessThanOrEqual(2 ** -24);
    });
  });

  it('is a raised cosine: flat at both ends, steepest in the middle', () => {
    expect(raisedCosine(0)).toBe(0);
    expect(raisedCosine(1)).toBe(1);
    expect(raisedCosine(1 / 3)).toBeCloseTo(0.25, 12);
    expect(raisedCosine(2 / 3)).toBeCloseTo(0.75, 12);
  });
});
