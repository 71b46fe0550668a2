import { describe, expect, it } from 'vitest';
import { PeakMeter } from '../../../src/audio/meter.ts';

const CEILING = 10 ** (-1 / 20);
const FRAME = 1 / 60;

function run(meter: PeakMeter, peak: number, seconds: number) {
  let reading = meter.update(peak, FRAME);
  for (let count = 1; count < Math.round(seconds / FRAME); count += 1) reading = meter.update(peak, FRAME);
  return reading;
}

describe('PeakMeter', () => {
  it('shows silence as −Infinity', () => {
    expect(new PeakMeter(CEILING).update(0, FRAME)).toEqual({
      level: Number.NEGATIVE_INFINITY,
      hold: Number.NEGATIVE_INFINITY,
      limited: false,
    });
  });

  it('rises at once to half of full scale, −6.02 dB', () => {
    const { level, hold } = new PeakMeter(CEILING).update(0.5, FRAME);
    expect(level).toBeCloseTo(-6.0206, 4);
    expect(hold).toBe(level);
  });

  it('falls 20 dB in 1.7 s (peak programme meter type I of IEC 60268-10, from memory)', () => {
    const meter = new PeakMeter(CEILING);
    meter.update(0.5, FRAME);
    const { level } = run(meter, 0, 1.7);
    // 102 frames of 1/60 s are 1.7 s to within rounding.
    expect(level).toBeCloseTo(-26.0206, 3);
  });

  it('holds the highest level for 2 s, then lets it fall', () => {
    const meter = new PeakMeter(CEILING);
    meter.update(0.5, FRAME);
    expect(run(meter, 0.05, 1.9).hold).toBeCloseTo(-6.0206, 4);
    const later = run(meter, 0.05, 0.6).hold;
    // 0.5 s past the hold at 20 dB in 1.7 s: 5.9 dB lower, give or take a frame (0.2 dB).
    expect(later).toBeGreaterThan(-12.2);
    expect(later).toBeLessThan(-11.6);
    expect(run(meter, 0.05, 3).hold).toBeCloseTo(-26.0206, 4);
  });

  it('starts the hold anew at every higher peak', () => {
    const meter = new PeakMeter(CEILING);
    meter.update(0.25, FRAME);
    run(meter, 0, 1.9);
    meter.update(0.5, FRAME);
    expect(run(meter, 0, 1.9).hold).toBeCloseTo(-6.0206, 4);
  });

  it('shows what the limiter cut as the ceiling, and says for 2 s that it did', () => {
    const meter = new PeakMeter(CEILING);
    const cut = meter.update(1.5, FRAME);
    expect(cut.level).toBeCloseTo(-1, 9);
    expect(cut.limited).toBe(true);
    expect(run(meter, 0.5, 1.9).limited).toBe(true);
    expect(run(meter, 0.5, 0.2).limited).toBe(false);
  });

  it('does not call the ceiling itself limited', () => {
    expect(new PeakMeter(CEILING).update(CEILING, FRAME).limited).toBe(false);
  });
});
