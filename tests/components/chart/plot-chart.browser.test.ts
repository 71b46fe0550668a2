import { expect, fixture, html } from '@open-wc/testing';
import { Chart } from 'chart.js';
import { PlotChart } from '../../../components/chart/plot-chart.ts';
import { type PlotColours, readPlotColours } from '../../../components/chart/plot-colours.ts';
import type { PlotPicture } from '../../../components/chart/plot-picture.ts';
import { axisRange } from '../../../src/sheet/plot-axes.ts';
import type { PlotCurve, PlotQuantity } from '../../../src/sheet/plot-model.ts';
import { setTheme } from '../both-themes.ts';
import { sampleCurves } from './sample-curves.ts';

function pictureOf(
  curves: readonly PlotCurve[],
  colours: PlotColours,
  quantity: PlotQuantity = 'magnitude',
): PlotPicture {
  return { curves, quantity, range: axisRange(quantity, curves), cursor: 1000, colours };
}

/** Heights of the pixels of a colour, within 24 of 255 in each channel, in a rectangle in CSS pixels. */
function rowsOf(canvas: HTMLCanvasElement, hex: string, area: readonly number[]): number[] {
  const [left, top, right, bottom] = area.map((value) => Math.round(value * devicePixelRatio));
  const width = right! - left!;
  const { data } = canvas.getContext('2d')!.getImageData(left!, top!, width, bottom! - top!);
  const wanted = [1, 3, 5].map((place) => Number.parseInt(hex.slice(place, place + 2), 16));
  const rows: number[] = [];
  for (let index = 0; index < data.length; index += 4) {
    const isNear = wanted.every((value, channel) => Math.abs(data[index + channel]! - value) < 24);
    if (isNear && data[index + 3]! > 200) rows.push(Math.floor(index / 4 / width) / devicePixelRatio);
  }
  return rows;
}

describe('the chart of a plot', () => {
  let canvas: HTMLCanvasElement;
  let colours: PlotColours;
  let chart: PlotChart;

  beforeEach(async () => {
    setTheme('light');
    const box = await fixture<HTMLElement>(
      html`<div style="width:800px;height:400px"><canvas></canvas></div>`,
    );
    canvas = box.querySelector('canvas')!;
    colours = readPlotColours(box);
    chart = new PlotChart(canvas, pictureOf(sampleCurves(), colours));
  });

  afterEach(() => {
    chart.destroy();
    setTheme(undefined);
  });

  it('draws each curve in its own colour', () => {
    const { chartArea } = Chart.getChart(canvas)!;
    const area = [chartArea.left, chartArea.top, chartArea.right, chartArea.bottom];
    for (const { colour } of sampleCurves()) {
      expect(rowsOf(canvas, colours.curves[colour], area).length, colour).to.be.greaterThan(50);
    }
  });

  it('puts a letter for each curve beside the end, none on another', () => {
    const { chartArea } = Chart.getChart(canvas)!;
    // The strip of the letters alone, right of the lines that lead to them.
    const strip = [chartArea.right + 9, 0, chartArea.right + 24, 400];
    const middles = sampleCurves().map(({ colour }) => {
      const rows = rowsOf(canvas, colours.curves[colour], strip);
      expect(rows.length, colour).to.be.greaterThan(4);
      return rows.reduce((sum, row) => sum + row, 0) / rows.length;
    });
    // The curves end within 0.5 dB of each other, a letter is about ten pixels high.
    for (let rank = 1; rank < middles.length; rank += 1) {
      expect(middles[rank]! - middles[rank - 1]!).to.be.greaterThan(11);
    }
  });

  it('takes new data without making new points', () => {
    const { data } = Chart.getChart(canvas)!;
    const [before] = data.datasets[0]!.data;
    chart.draw(pictureOf(sampleCurves(-6), colours));
    expect(data.datasets[0]!.data[0]).to.equal(before);
    expect((data.datasets[0]!.data[0] as { y: number }).y).to.be.closeTo(-10, 0.1); // 6 under about −4
  });

  it('adds and drops curves', () => {
    chart.draw(pictureOf(sampleCurves(0, 2), colours));
    expect(Chart.getChart(canvas)!.data.datasets.length).to.equal(2);
    chart.draw(pictureOf(sampleCurves(0, 4), colours));
    expect(Chart.getChart(canvas)!.data.datasets.length).to.equal(4);
    chart.draw(pictureOf([], colours));
    expect(Chart.getChart(canvas)!.data.datasets.length).to.equal(0);
  });

  it('changes to ohms and back', () => {
    const ohms = sampleCurves().map((curve) => ({
      ...curve,
      values: curve.values.map((value) => 100 + value),
    }));
    chart.draw(pictureOf(ohms, colours, 'impedance'));
    const scale = () => Chart.getChart(canvas)!.scales['y']!;
    expect(scale().type).to.equal('logarithmic');
    // Halfway up a logarithmic axis from 50 to 500 stands the root of 50 × 500.
    const middle = (scale().top + scale().bottom) / 2;
    expect(scale().getValueForPixel(middle)).to.be.closeTo(Math.sqrt(scale().min * scale().max), 0.5);
    chart.draw(pictureOf(sampleCurves(), colours));
    expect(scale().type).to.equal('linear');
    expect([scale().min, scale().max]).to.deep.equal([-24, 0]);
  });

  it('knows which frequency lies where, and keeps to the axis', () => {
    expect(chart.frequencyAt(chart.placeOf(1000))).to.be.closeTo(1000, 1e-6);
    expect(chart.frequencyAt(-500)).to.equal(10);
    expect(chart.frequencyAt(5000)).to.equal(40_000);
    const third = (chart.placeOf(10_000) - chart.placeOf(10)) / 3;
    expect(chart.placeOf(100) - chart.placeOf(10)).to.be.closeTo(third, 1e-6);
  });

  it('survives curves of nothing', () => {
    const nothing = sampleCurves().map((curve) => ({ ...curve, values: curve.values.map(() => Number.NaN) }));
    expect(() => chart.draw(pictureOf(nothing, colours))).not.to.throw();
  });

  it('gives the canvas back', () => {
    chart.destroy();
    expect(Chart.getChart(canvas)).to.equal(undefined);
    chart = new PlotChart(canvas, pictureOf(sampleCurves(), colours));
    expect(Chart.getChart(canvas)).not.to.equal(undefined);
  });

  it('tells how long a frame takes', () => {
    const frames = 120;
    const pictures = Array.from({ length: 12 }, (_, index) => pictureOf(sampleCurves(-index / 4), colours));
    for (const picture of pictures) chart.draw(picture); // warm up
    const began = performance.now();
    for (let frame = 0; frame < frames; frame += 1) chart.draw(pictures[frame % pictures.length]!);
    const each = (performance.now() - began) / frames;
    // Printed, not judged: a busy machine is no reason to fail.
    console.log(`chart update, six curves of 512 points: ${each.toFixed(2)} ms a frame`);
    expect(each).to.be.greaterThan(0);
  });
});
