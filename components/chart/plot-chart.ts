import {
  Chart,
  type ChartConfiguration,
  type ChartDataset,
  LinearScale,
  LineController,
  LineElement,
  LogarithmicScale,
  type Plugin,
  PointElement,
} from 'chart.js';
import {
  axisNumber,
  axisTicks,
  GRID_FREQUENCIES,
  labelledFrequencies,
  PLOT_FROM,
  PLOT_TO,
} from '../../src/sheet/plot-axes.ts';
import { type PlotCurve, type PlotQuantity, QUANTITIES } from '../../src/sheet/plot-model.ts';
import type { Hertz } from '../../src/units.ts';
import { fillPoints, type Point } from './curve-points.ts';
import { drawCursor, drawLetters, drawUnits, LETTER_MARGIN } from './plot-marks.ts';
import type { PlotPicture } from './plot-picture.ts';

Chart.register(LineController, LineElement, PointElement, LinearScale, LogarithmicScale);

const WIDTHS: Readonly<Record<PlotCurve['strength'], number>> = { strong: 2.6, normal: 1.6, faint: 1.1 };

/** Fixed, so that the plot does not shift when a number gets longer. */
const AXIS_WIDTH = 40;

/**
 * Solid lines get a dash longer than any screen: the library draws undashed lines by a shortcut that
 * merges the points of one pixel, which looks ragged on fine screens.
 */
const UNBROKEN = [60_000, 0];

function isAngle(quantity: PlotQuantity): boolean {
  return QUANTITIES[quantity].unit === '°';
}

function isLogarithmic(quantity: PlotQuantity): boolean {
  return QUANTITIES[quantity].scale === 'logarithmic';
}

type Style = Pick<ChartDataset<'line'>, 'borderColor' | 'borderDash' | 'borderWidth' | 'order'>;

function styleOf(curve: PlotCurve, { colours }: PlotPicture): Style {
  return {
    borderColor: colours.curves[curve.colour],
    borderDash: curve.dash.length > 0 ? [...curve.dash] : UNBROKEN,
    borderWidth: WIDTHS[curve.strength],
    order: curve.strength === 'strong' ? 0 : 1,
  };
}

function datasetOf(curve: PlotCurve, picture: PlotPicture): ChartDataset<'line', Point[]> {
  const data: Point[] = [];
  fillPoints(data, curve, isLogarithmic(picture.quantity));
  return { data, ...styleOf(curve, picture) };
}

/**
 * The chart of a plot: made once, then only its data and its limits change. Six curves of 512 points
 * take about 2 ms a frame: no animation, no parsing, no points, no events, ticks of our own.
 */
export class PlotChart {
  readonly #chart: Chart<'line', Point[]>;
  #picture: PlotPicture;

  constructor(canvas: HTMLCanvasElement, picture: PlotPicture) {
    this.#picture = picture;
    const marks: Plugin<'line'> = {
      id: 'marks',
      afterDatasetsDraw: (chart) => {
        const { quantity } = this.#picture;
        drawUnits(chart as Chart, this.#picture, isAngle(quantity) ? '' : QUANTITIES[quantity].unit);
        drawLetters(chart as Chart, this.#picture);
        drawCursor(chart as Chart, this.#picture);
      },
    };
    this.#chart = new Chart(canvas, this.#configuration(marks));
  }

  #configuration(marks: Plugin<'line'>): ChartConfiguration<'line', Point[]> {
    return {
      type: 'line',
      data: { datasets: this.#picture.curves.map((curve) => datasetOf(curve, this.#picture)) },
      plugins: [marks],
      options: {
        animation: false,
        parsing: false,
        normalized: true,
        events: [],
        responsive: true,
        maintainAspectRatio: false,
        layout: { padding: { top: 24, right: LETTER_MARGIN } },
        elements: { point: { radius: 0 }, line: { tension: 0 } },
        scales: { x: this.#frequencyAxis(), y: this.#valueAxis() },
      },
    };
  }

  #frequencyAxis(): NonNullable<NonNullable<ChartConfiguration<'line'>['options']>['scales']>[string] {
    let labels = new Map<number, string>();
    return {
      type: 'logarithmic',
      min: PLOT_FROM,
      max: PLOT_TO,
      afterBuildTicks: (axis) => {
        labels = new Map(labelledFrequencies(axis.width).map(({ frequency, text }) => [frequency, text]));
        axis.ticks = GRID_FREQUENCIES.map((value) => ({ value }));
      },
      grid: {
        tickLength: 4,
        color: ({ tick }) =>
          Number.isInteger(Math.log10(tick?.value ?? 0))
            ? this.#picture.colours.rule
            : this.#picture.colours.hairline,
      },
      border: { display: false },
      ticks: {
        autoSkip: false,
        maxRotation: 0,
        color: () => this.#picture.colours.soft,
        font: () => ({ family: this.#picture.colours.font, size: 12 }),
        callback: (value) => labels.get(Number(value)) ?? '',
      },
    };
  }

  #valueAxis(): NonNullable<NonNullable<ChartConfiguration<'line'>['options']>['scales']>[string] {
    return {
      type: isLogarithmic(this.#picture.quantity) ? 'logarithmic' : 'linear',
      min: this.#picture.range.min,
      max: this.#picture.range.max,
      afterBuildTicks: (axis) => {
        const range = { min: axis.min, max: axis.max };
        axis.ticks = axisTicks(this.#picture.quantity, range).map((value) => ({ value }));
      },
      afterFit: (axis) => {
        axis.width = AXIS_WIDTH;
      },
      grid: {
        tickLength: 0,
        color: ({ tick }) =>
          tick?.value === 0 ? this.#picture.colours.rule : this.#picture.colours.hairline,
      },
      border: { display: false },
      ticks: {
        autoSkip: false,
        padding: 8,
        color: () => this.#picture.colours.soft,
        font: () => ({ family: this.#picture.colours.font, size: 12 }),
        // Degrees carry their sign at every number: alone above the axis it would be lost.
        callback: (value) => `${axisNumber(Number(value))}${isAngle(this.#picture.quantity) ? '°' : ''}`,
      },
    };
  }

  /** Draws another picture: data in place, no animation, no parsing. */
  draw(picture: PlotPicture): void {
    const wasLogarithmic = isLogarithmic(this.#picture.quantity);
    this.#picture = picture;
    const { datasets } = this.#chart.data;
    datasets.length = Math.min(datasets.length, picture.curves.length);
    picture.curves.forEach((curve, index) => {
      const dataset = datasets[index];
      if (dataset === undefined) datasets.push(datasetOf(curve, picture));
      else {
        fillPoints(dataset.data, curve, isLogarithmic(picture.quantity));
        Object.assign(dataset, styleOf(curve, picture));
      }
    });
    const scales = this.#chart.options.scales!;
    if (wasLogarithmic !== isLogarithmic(picture.quantity)) scales['y'] = this.#valueAxis();
    scales['y']!.min = picture.range.min;
    scales['y']!.max = picture.range.max;
    this.#chart.update('none');
  }

  /** Frequency under a horizontal place in the canvas, clamped to the axis. */
  frequencyAt(x: number): Hertz {
    const value = Number(this.#chart.scales['x']!.getValueForPixel(x));
    return Math.min(Math.max(value, PLOT_FROM), PLOT_TO);
  }

  /** Horizontal place of a frequency in the canvas, in pixels. */
  placeOf(frequency: Hertz): number {
    return this.#chart.scales['x']!.getPixelForValue(frequency);
  }

  /** Releases the canvas. */
  destroy(): void {
    this.#chart.destroy();
  }
}
