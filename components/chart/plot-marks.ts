import type { Chart } from 'chart.js';
import { type PlotCurve, valueAt } from '../../src/sheet/plot-model.ts';
import { spreadLabels } from '../../src/sheet/spread-labels.ts';
import { endValue } from './curve-points.ts';
import type { PlotPicture } from './plot-picture.ts';

/** Room for the letters at the right, in pixels. */
export const LETTER_MARGIN = 26;
const LETTER_GAP = 15;

function letteredCurves(picture: PlotPicture): readonly PlotCurve[] {
  return picture.curves.filter((curve) => curve.letter !== '');
}

/**
 * Letters in the margin at the curves' ends. Where curves end together the letters are pushed apart,
 * each with a short line to its own curve.
 */
export function drawLetters(chart: Chart, picture: PlotPicture): void {
  const { ctx, scales, chartArea } = chart;
  const ends = letteredCurves(picture)
    .map((curve) => ({ curve, y: scales['y']!.getPixelForValue(endValue(curve)) }))
    .filter(({ y }) => Number.isFinite(y));
  const wanted = ends.map(({ y }) => Math.min(Math.max(y, chartArea.top), chartArea.bottom));
  const places = spreadLabels(wanted, LETTER_GAP, chartArea.top + 2, chartArea.bottom - 2);
  ctx.save();
  ctx.font = `620 13px ${picture.colours.font}`;
  ctx.textAlign = 'center';
  ctx.textBaseline = 'middle';
  ctx.lineWidth = 1;
  ends.forEach(({ curve }, index) => {
    const colour = picture.colours.curves[curve.colour];
    ctx.strokeStyle = colour;
    ctx.fillStyle = colour;
    ctx.beginPath();
    ctx.moveTo(chartArea.right, wanted[index]!);
    ctx.lineTo(chartArea.right + 7, places[index]!);
    ctx.stroke();
    ctx.fillText(curve.letter, chartArea.right + 15, places[index]! + 0.5);
  });
  ctx.restore();
}

/** The reading cursor: a dashed line, and a dot where it crosses each lettered curve. */
export function drawCursor(chart: Chart, picture: PlotPicture): void {
  if (picture.cursor === undefined) return;
  const { ctx, chartArea, scales } = chart;
  const x = scales['x']!.getPixelForValue(picture.cursor);
  ctx.save();
  ctx.strokeStyle = picture.colours.soft;
  ctx.lineWidth = 1;
  ctx.setLineDash([3, 3]);
  ctx.beginPath();
  ctx.moveTo(x, chartArea.top);
  ctx.lineTo(x, chartArea.bottom);
  ctx.stroke();
  ctx.setLineDash([]);
  // The strongest curve's dot lies on top.
  const dotted = letteredCurves(picture).toSorted(
    (a, b) => Number(a.strength === 'strong') - Number(b.strength === 'strong'),
  );
  for (const curve of dotted) {
    const y = scales['y']!.getPixelForValue(valueAt(curve, picture.cursor));
    if (!(y >= chartArea.top && y <= chartArea.bottom)) continue;
    ctx.beginPath();
    ctx.arc(x, y, curve.strength === 'strong' ? 4.5 : 3.5, 0, 2 * Math.PI);
    ctx.fillStyle = picture.colours.curves[curve.colour];
    ctx.strokeStyle = picture.colours.ground;
    ctx.lineWidth = 1.5;
    ctx.fill();
    ctx.stroke();
  }
  ctx.restore();
}

/** The units at the ends of the axes: above the vertical one, right of the horizontal one. */
export function drawUnits(chart: Chart, picture: PlotPicture, unit: string): void {
  const { ctx, chartArea } = chart;
  ctx.save();
  ctx.font = `12px ${picture.colours.font}`;
  ctx.fillStyle = picture.colours.soft;
  ctx.textBaseline = 'middle';
  ctx.textAlign = 'right';
  ctx.fillText(unit, chartArea.left - 8, chartArea.top - 15);
  ctx.fillText('Hz', chartArea.right + LETTER_MARGIN - 2, chartArea.bottom + 15);
  ctx.restore();
}
