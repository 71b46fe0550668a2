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
  type AxisRange,
  axisTicks,
  GRID_FREQUENCIES,
  LABELLED,
  PLOT_FROM,
  PLOT_TO,
  type PlotCurve,
  type PlotQuantity,
  plotNumber,
  valueAt,
} from '../../src/sheet/plot-model.ts';
import type { Hertz } from '../../src/units.ts';

Chart.register(LineController, LineElement, PointElement, LinearScale, LogarithmicScale);

/** Colours of a drawing, already resolved: a canvas knows nothing of custom properties. */
export interface PlotColours {
  readonly ink: string;
  readonly soft: string;
  readonly hairline: string;
  readonly rule: string;
  readonly ground: string;
  readonly curves: Readonly<Record<PlotCurve['colour'], string>>;
}

/** Everything the chart draws. */
export interface PlotPicture {
  readonly curves: readonly PlotCurve[];
  readonly quantity: PlotQuantity;
  readonly range: AxisRange;
  /** Reading cursor; undefined draws none. */
  readonly cursor: Hertz | undefined;
  readonly colours: PlotColours;
}

type Point = { x: number; y: number };

const WIDTHS: Readonly<Record<PlotCurve['strength'], number>> = { strong: 2.5, normal: 1.6, faint: 1.1 };

/** Writes a curve's finite points into an array, reusing the points that are there. */
function fillPoints(points: Point[], { frequencies, values }: PlotCurve): void {
  let count = 0;
  for (let index = 0; index < frequencies.length; index += 1) {
    const y = values[index]!;
    if (!Number.isFinite(y)) continue;
    const point = points[count];
    if (point === undefined) points.push({ x: frequencies[index]!, y });
    else {
      point.x = frequencies[index]!;
      point.y = y;
    }
    count += 1;
  }
  points.length = count;
}

function datasetOf(curve: PlotCurve, colours: PlotColours): ChartDataset<'line', Point[]> {
  const data: Point[] = [];
  fillPoints(data, curve);
  return { data, ...styleOf(curve, colours) };
}

function styleOf(curve: PlotCurve, colours: PlotColours): Pick<ChartDataset<'line'>, 'borderColor' | 'borderDash' | 'borderWidth' | 'order'> {
  return {
    borderColor: colours.curves[curve.colour],
    borderDash: [...curve.dash],
    borderWidth: WIDTHS[curve.strength],
    order: curve.strength === 'strong' ? 0 : 1,
  };
}

/** Letters at the right ends of the curves, pushed apart where they would lie on each other. */
function drawLetters(chart: Chart, picture: PlotPicture): void {
  const { ctx, scales } = chart;
  const lettered = picture.curves
    .filter((curve) => curve.letter !== '')
    .map((curve) => ({ curve, y: scales['y']!.getPixelForValue(valueAt(curve, 28_000)) }))
    .filter((entry) => Number.isFinite(entry.y))
    .sort((first, second) => first.y - second.y);
  let last = Number.NEGATIVE_INFINITY;
  ctx.save();
  ctx.font = `620 13px ${Chart.defaults.font.family}`;
  ctx.textAlign = 'center';
  ctx.textBaseline = 'bottom';
  for (const { curve, y } of lettered) {
    const place = Math.max(y - 4, last + 14);
    last = place;
    ctx.fillStyle = picture.colours.curves[curve.colour];
    ctx.fillText(curve.letter, scales['x']!.getPixelForValue(28_000), place);
  }
  ctx.restore();
}

function drawCursor(chart: Chart, picture: PlotPicture): void {
  if (picture.cursor === undefined) return;
  const { ctx, chartArea, scales } = chart;
  const x = scales['x']!.getPixelForValue(picture.cursor);
  ctx.save();
  ctx.strokeStyle = picture.colours.soft;
  ctx.setLineDash([3, 3]);
  ctx.beginPath();
  ctx.moveTo(x, chartArea.top);
  ctx.lineTo(x, chartArea.bottom);
  ctx.stroke();
  ctx.setLineDash([]);
  for (const curve of picture.curves) {
    if (curve.letter === '') continue;
    const y = scales['y']!.getPixelForValue(valueAt(curve, picture.cursor));
    if (!(y >= chartArea.top && y <= chartArea.bottom)) continue;
    ctx.beginPath();
    ctx.arc(x, y, 4, 0, 2 * Math.PI);
    ctx.fillStyle = picture.colours.curves[curve.colour];
    ctx.strokeStyle = picture.colours.ground;
    ctx.lineWidth = 1.5;
    ctx.fill();
    ctx.stroke();
  }
  ctx.restore();
}

/** The chart of a plot: made once, then only its data and its limits change. */
export class PlotChart {
  readonly #chart: Chart<'line', Point[]>;
  #picture: PlotPicture;

  constructor(canvas: HTMLCanvasElement, picture: PlotPicture) {
    this.#picture = picture;
    const marks: Plugin<'line'> = {
      id: 'marks',
      afterDatasetsDraw: (chart) => {
        drawLetters(chart as Chart, this.#picture);
        drawCursor(chart as Chart, this.#picture);
      },
    };
    this.#chart = new Chart(canvas, this.#configuration(marks));
  }

  #configuration(marks: Plugin<'line'>): ChartConfiguration<'line', Point[]> {
    const { colours } = this.#picture;
    const labels = new Map(LABELLED.map(({ frequency, text }) => [frequency, text]));
    return {
      type: 'line',
      data: { datasets: this.#picture.curves.map((curve) => datasetOf(curve, colours)) },
      plugins: [marks],
      options: {
        animation: false,
        parsing: false,
        normalized: true,
        events: [],
        responsive: true,
        maintainAspectRatio: false,
        resizeDelay: 0,
        layout: { padding: { top: 8, right: 6 } },
        elements: { point: { radius: 0 }, line: { tension: 0 } },
        scales: {
          x: {
            type: 'logarithmic',
            min: PLOT_FROM,
            max: PLOT_TO,
            afterBuildTicks: (axis) => {
              axis.ticks = GRID_FREQUENCIES.map((value) => ({ value }));
            },
            grid: { color: () => this.#picture.colours.hairline, tickLength: 4 },
            border: { display: false },
            ticks: {
              autoSkip: false,
              maxRotation: 0,
              color: () => this.#picture.colours.soft,
              callback: (value) => labels.get(Number(value)) ?? '',
            },
          },
          y: {
            type: 'linear',
            min: this.#picture.range.min,
            max: this.#picture.range.max,
            afterBuildTicks: (axis) => {
              axis.ticks = axisTicks(this.#picture.quantity, { min: axis.min, max: axis.max }).map((value) => ({ value }));
            },
            afterFit: (axis) => {
              axis.width = 44; // fixed, so that the plot does not shift when a label gets longer
            },
            grid: {
              color: (context) => (context.tick?.value === 0 ? this.#picture.colours.rule : this.#picture.colours.hairline),
            },
            border: { display: false },
            ticks: {
              color: () => this.#picture.colours.soft,
              callback: (value) => plotNumber(Number(value), 'phase'),
            },
          },
        },
      },
    };
  }

  /** Draws another picture: data in place, no animation, no parsing. */
  draw(picture: PlotPicture): void {
    this.#picture = picture;
    const { datasets } = this.#chart.data;
    datasets.length = Math.min(datasets.length, picture.curves.length);
    picture.curves.forEach((curve, index) => {
      const dataset = datasets[index];
      if (dataset === undefined) datasets.push(datasetOf(curve, picture.colours));
      else {
        fillPoints(dataset.data, curve);
        Object.assign(dataset, styleOf(curve, picture.colours));
      }
    });
    const scale = this.#chart.options.scales!['y']!;
    scale.min = picture.range.min;
    scale.max = picture.range.max;
    this.#chart.update('none');
  }

  /** Frequency under a horizontal place in the canvas, clamped to the axis. */
  frequencyAt(x: number): Hertz {
    const value = Number(this.#chart.scales['x']!.getValueForPixel(x));
    return Math.min(Math.max(value, PLOT_FROM), PLOT_TO);
  }

  /** Releases the canvas. */
  destroy(): void {
    this.#chart.destroy();
  }
}
