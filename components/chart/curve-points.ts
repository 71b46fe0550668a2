import { PLOT_FROM, PLOT_TO } from '../../src/sheet/plot-axes.ts';
import type { PlotCurve } from '../../src/sheet/plot-model.ts';

/** A point as the chart wants it; NaN lifts the pen. */
export interface Point {
  x: number;
  y: number;
}

/**
 * Writes a curve into an array of points, reusing the points that are there, so that a drag makes no
 * rubbish to collect. What is not finite (or not positive, on a logarithmic axis) becomes one gap;
 * frequencies outside the axis are left out.
 */
export function fillPoints(points: Point[], { frequencies, values }: PlotCurve, isLogarithmic = false): void {
  let count = 0;
  let isGap = true; // no gap before the first point
  const put = (x: number, y: number): void => {
    const point = points[count];
    if (point === undefined) points.push({ x, y });
    else {
      point.x = x;
      point.y = y;
    }
    count += 1;
  };
  for (let index = 0; index < frequencies.length; index += 1) {
    const x = frequencies[index]!;
    const y = values[index]!;
    if (x < PLOT_FROM || x > PLOT_TO) continue;
    const isPoint = Number.isFinite(y) && !(isLogarithmic && y <= 0);
    if (isPoint) put(x, y);
    else if (!isGap) put(x, Number.NaN);
    isGap = !isPoint;
  }
  points.length = count;
}

/** The last finite value of a curve on the axis; NaN where there is none. */
export function endValue({ frequencies, values }: PlotCurve): number {
  for (let index = values.length - 1; index >= 0; index -= 1) {
    if (frequencies[index]! <= PLOT_TO && Number.isFinite(values[index])) return values[index]!;
  }
  return Number.NaN;
}
