import { describe, expect, it } from 'vitest';
import type { PlotCurve } from '../../../src/sheet/plot-model.ts';
import { plotSvg } from '../../../src/sheet/plot-svg.ts';

const curve: PlotCurve = {
  id: 'a',
  letter: 'A',
  label: 'Stock & <odd>',
  colour: 'a',
  dash: [9, 5],
  strength: 'strong',
  frequencies: Float64Array.of(5, 10, 1000, 40_000, 50_000),
  values: Float64Array.of(0, -12, 0, -24, 0),
};

describe('plot as SVG', () => {
  const text = plotSvg([curve], {
    title: 'Attic <amplifier>',
    quantity: 'magnitude',
    reference: '0 dB is the driver’s unloaded output',
  });

  it('is the same text for the same curves', () => {
    expect(
      plotSvg([curve], {
        title: 'Attic <amplifier>',
        quantity: 'magnitude',
        reference: '0 dB is the driver’s unloaded output',
      }),
    ).toBe(text);
  });

  it('escapes what was typed', () => {
    expect(text).toContain('Attic &lt;amplifier&gt;');
    expect(text).toContain('Stock &amp; &lt;odd&gt;');
    expect(text).not.toMatch(/<odd>|<amplifier>/);
  });

  it('draws the points within the axis, and only those', () => {
    // Left and right ends of the plot area, and the middle of the axis 0 … −24 dB where −12 dB lies.
    expect(text).toMatch(/d="M58\.00 [\d.]+L[\d.]+ [\d.]+L772\.00 [\d.]+" fill="none" stroke="#0072b2"/);
  });

  it('says in words what it shows', () => {
    expect(text).toMatch(
      /<desc[^>]*>Level in dB from 10 Hz to 40 kHz\. A Stock[^<]*0\.0 dB at 1 kHz\.<\/desc>/,
    );
  });

  it('leaves out what is not finite', () => {
    const broken = { ...curve, values: Float64Array.of(0, Number.NaN, 0, Number.NEGATIVE_INFINITY, 0) };
    expect(plotSvg([broken], { title: 't', quantity: 'magnitude' })).not.toMatch(/NaN|Infinity/);
  });
});
