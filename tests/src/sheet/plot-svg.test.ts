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
  values: Float64Array.of(0, -12, -6, -18, 0),
};

/** Points of the first curve path in a picture. */
function points(svg: string): readonly (readonly [number, number])[] {
  const path = /<path d="([^"]+)" fill="none" stroke="#0072b2" stroke-width="2"/.exec(svg)![1]!;
  return path
    .split(/[ML]/)
    .slice(1)
    .map((pair) => pair.split(' ').map(Number) as [number, number]);
}

describe('plot as SVG', () => {
  const options = {
    title: 'Attic <amplifier>',
    quantity: 'magnitude',
    reference: '0 dB is the driver’s unloaded output',
  } as const;
  const text = plotSvg([curve], options);

  it('is the same text for the same curves', () => {
    expect(plotSvg([structuredClone(curve)], { ...options })).toBe(text);
  });

  it('escapes what was typed', () => {
    expect(text).toContain('Attic &lt;amplifier&gt;');
    expect(text).toContain('Stock &amp; &lt;odd&gt;');
    expect(text).not.toMatch(/<odd>|<amplifier>/);
  });

  it('draws the points on the axis where they belong, and no others', () => {
    // The area runs from x 62 to 762 and y 44 to 374 for 10 Hz … 40 kHz and 0 … −24 dB.
    const third = 62 + (700 * 2) / Math.log10(4000);
    const expected = [
      [62, 44 + 330 / 2],
      [third, 44 + 330 / 4],
      [762, 44 + (330 * 3) / 4],
    ];
    const drawn = points(text);
    expect(drawn.length).toBe(expected.length);
    drawn.forEach(([x, y], index) => {
      // Coordinates are written to a hundredth of a pixel.
      expect(x).toBeCloseTo(expected[index]![0]!, 2);
      expect(y).toBeCloseTo(expected[index]![1]!, 2);
    });
  });

  it('draws ohms on a logarithmic axis', () => {
    const ohms = {
      ...curve,
      frequencies: Float64Array.of(10, 100, 1000),
      values: Float64Array.of(10, 100, 31.622_776_6),
    };
    const [low, high, middle] = points(plotSvg([ohms], { title: 't', quantity: 'impedance' }));
    expect(middle![1]).toBeCloseTo((low![1] + high![1]) / 2, 2);
  });

  it('writes its axes, units, legend, reference and what 1 kHz reads', () => {
    for (const words of [
      'Level in dB',
      'Frequency in Hz',
      '>20k<',
      '>−24<',
      'A Stock',
      'driver’s unloaded output',
    ]) {
      expect(text).toContain(words);
    }
    expect(text).toMatch(
      /<desc[^>]*>Level in dB from 10 Hz to 40 kHz\. A Stock[^<]*−6\.0\u202fdB at 1\u202fkHz/,
    );
    expect(text).toContain('stroke-dasharray="9 5"');
  });

  it('lifts the pen where a value is not finite', () => {
    const broken = {
      ...curve,
      frequencies: Float64Array.of(10, 20, 30, 40, 50),
      values: Float64Array.of(0, -1, Number.NaN, -1, Number.NEGATIVE_INFINITY),
    };
    const svg = plotSvg([broken], { title: 't', quantity: 'magnitude' });
    expect(svg).not.toMatch(/NaN|Infinity|undefined/);
    expect(/<path d="(M[^M"]+M[^M"]+)" fill="none" stroke="#0072b2"/.test(svg)).toBe(true);
  });

  it('puts letters apart where curves end together', () => {
    const second = { ...curve, letter: 'B', colour: 'b' } as const;
    const svg = plotSvg([curve, second], { title: 't', quantity: 'magnitude' });
    const places = [...svg.matchAll(/y="([\d.]+)"[^>]*font-weight="700" font-size="13"/g)].map((match) =>
      Number(match[1]),
    );
    expect(places.length).toBe(2);
    expect(Math.abs(places[0]! - places[1]!)).toBeGreaterThanOrEqual(14);
  });

  it('names its parts as told, so that two can stand in one page', () => {
    expect(plotSvg([curve], { ...options, id: 'second' })).not.toMatch(/plot-(title|words|area)/);
  });

  it('grows for its legend and cuts labels that would run out of it', () => {
    const many = Array.from({ length: 7 }, (_, index) => ({
      ...curve,
      label: `${'long '.repeat(20)}${index}`,
    }));
    const height = (svg: string): number => Number(/height="(\d+)"/.exec(svg)![1]);
    const svg = plotSvg(many, { title: 't', quantity: 'magnitude' });
    expect(height(svg)).toBeGreaterThan(height(plotSvg([curve], { title: 't', quantity: 'magnitude' })));
    expect(svg).toMatch(/>A long [^<]*…</);
  });

  it('draws nothing but its axes without curves', () => {
    expect(plotSvg([], { title: '', quantity: 'phase' })).toContain('Phase in degrees');
  });
});
