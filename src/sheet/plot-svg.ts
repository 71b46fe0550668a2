import { escapeXml } from './escape-xml.ts';
import {
  type AxisRange,
  axisNumber,
  axisRange,
  axisTicks,
  GRID_FREQUENCIES,
  labelledFrequencies,
  PLOT_FROM,
  PLOT_TO,
} from './plot-axes.ts';
import { type PlotCurve, type PlotQuantity, QUANTITIES } from './plot-model.ts';
import { plotSentences } from './plot-words.ts';
import { spreadLabels } from './spread-labels.ts';

/** How a plot is drawn for paper. */
export interface PlotSvgOptions {
  /** Written above the plot. */
  readonly title: string;
  readonly quantity: PlotQuantity;
  /** What 0 dB is; written under the plot. @default nothing */
  readonly reference?: string;
  /** Width in pixels at 96 to the inch, at least 320. @default 800 */
  readonly width?: number;
  /** Height of the plot with its axes; the legend comes below it. @default 420 */
  readonly height?: number;
  /** Begins the identifiers inside, so that several plots can stand in one page. @default 'plot' */
  readonly id?: string;
}

/** Colours on white paper: those of the light theme, so that print and screen agree. */
const PAPER = {
  ground: '#ffffff',
  ink: '#18212b',
  soft: '#5a6673',
  grid: '#e1e5e6',
  decade: '#c5cccf',
  frame: '#87929b',
};
const INK: Readonly<Record<PlotCurve['colour'], string>> = {
  a: '#0072b2',
  b: '#c44f00',
  c: '#00805d',
  d: '#a8377e',
  e: '#8a6400',
  f: '#2378a8',
  g: '#6f6a00',
  h: '#3d4752',
  soft: PAPER.soft,
};
const WIDTHS: Readonly<Record<PlotCurve['strength'], number>> = { strong: 2, normal: 1.4, faint: 0.9 };
const MARGIN = { left: 62, top: 44, right: 38, bottom: 46 };
const LEGEND_ROW = 18;
const LEGEND_COLUMN = 220; // least width of an entry
const LETTER_GAP = 14;

/** Where things lie on the picture, in pixels. */
interface Frame {
  readonly width: number;
  readonly area: {
    readonly left: number;
    readonly top: number;
    readonly right: number;
    readonly bottom: number;
  };
  readonly range: AxisRange;
  x(frequency: number): number;
  y(value: number): number;
}

function frameOf(quantity: PlotQuantity, range: AxisRange, width: number, height: number): Frame {
  const area = {
    left: MARGIN.left,
    top: MARGIN.top,
    right: width - MARGIN.right,
    bottom: height - MARGIN.bottom,
  };
  const span = Math.log(PLOT_TO / PLOT_FROM);
  const bend = QUANTITIES[quantity].scale === 'logarithmic' ? Math.log : (value: number): number => value;
  const tall = bend(range.max) - bend(range.min);
  return {
    width,
    area,
    range,
    x: (frequency) => area.left + (Math.log(frequency / PLOT_FROM) / span) * (area.right - area.left),
    y: (value) => area.top + ((bend(range.max) - bend(value)) / tall) * (area.bottom - area.top),
  };
}

/** A coordinate with a hundredth of a pixel, without useless zeros: the same curves give the same text. */
function at(value: number): string {
  return String(Number(value.toFixed(2)) + 0);
}

function text(words: string, left: number, top: number, more = ''): string {
  return `<text x="${at(left)}" y="${at(top)}"${more === '' ? '' : ` ${more}`}>${escapeXml(words)}</text>`;
}

function stroke({ colour, strength, dash }: PlotCurve): string {
  const dashes = dash.length > 0 ? ` stroke-dasharray="${dash.join(' ')}"` : '';
  return `fill="none" stroke="${INK[colour]}" stroke-width="${WIDTHS[strength]}"${dashes}`;
}

/** Path of a curve; it breaks where a value is not finite. */
function curvePath({ frequencies, values }: PlotCurve, { x, y }: Frame, isLogarithmic: boolean): string {
  let path = '';
  let isDrawing = false;
  for (let index = 0; index < frequencies.length; index += 1) {
    const frequency = frequencies[index]!;
    const value = values[index]!;
    const isPoint = Number.isFinite(value) && !(isLogarithmic && value <= 0);
    if (isPoint && frequency >= PLOT_FROM && frequency <= PLOT_TO) {
      path += `${isDrawing ? 'L' : 'M'}${at(x(frequency))} ${at(y(value))}`;
      isDrawing = true;
    } else isDrawing = false;
  }
  return path;
}

function gridLines(frame: Frame, ticks: readonly number[]): string[] {
  const { area, x, y } = frame;
  const vertical = (frequency: number): string => `M${at(x(frequency))} ${at(area.top)}V${at(area.bottom)}`;
  const isDecade = (frequency: number): boolean => Number.isInteger(Math.log10(frequency));
  const level = ticks.map((tick) => `M${at(area.left)} ${at(y(tick))}H${at(area.right)}`).join('');
  const minor = GRID_FREQUENCIES.filter((frequency) => !isDecade(frequency)).map(vertical);
  const decades = GRID_FREQUENCIES.filter(isDecade).map(vertical);
  return [
    `<path d="${level}${minor.join('')}" fill="none" stroke="${PAPER.grid}" stroke-width="0.75"/>`,
    `<path d="${decades.join('')}" fill="none" stroke="${PAPER.decade}" stroke-width="0.75"/>`,
  ];
}

function axisWords(frame: Frame, ticks: readonly number[], quantity: PlotQuantity): string[] {
  const { area, x, y } = frame;
  const { name, unit } = QUANTITIES[quantity];
  const middle = (area.top + area.bottom) / 2;
  const soft = `text-anchor="middle" fill="${PAPER.soft}"`;
  return [
    ...labelledFrequencies(area.right - area.left).map((label) =>
      text(label.text, x(label.frequency), area.bottom + 17, 'text-anchor="middle"'),
    ),
    text('Frequency in Hz', (area.left + area.right) / 2, area.bottom + 36, soft),
    ...ticks.map((tick) => text(axisNumber(tick), area.left - 8, y(tick) + 4, 'text-anchor="end"')),
    `<text transform="translate(18 ${at(middle)}) rotate(-90)" ${soft}>${escapeXml(
      `${name} in ${unit === '°' ? 'degrees' : unit}`,
    )}</text>`,
  ];
}

/** Letters in the margin beside the curves' ends, pushed apart where they would lie on each other. */
function letters(curves: readonly PlotCurve[], { area, y }: Frame): string[] {
  const ends = curves.flatMap((curve) => {
    const last = curve.values.findLast(
      (value, index) => Number.isFinite(value) && curve.frequencies[index]! <= PLOT_TO,
    );
    return last === undefined ? [] : [{ curve, place: y(last) }];
  });
  const visible = ends.filter(({ place }) => Number.isFinite(place));
  const wanted = visible.map(({ place }) => Math.min(Math.max(place, area.top), area.bottom));
  const places = spreadLabels(wanted, LETTER_GAP, area.top + 4, area.bottom - 4);
  return visible.flatMap(({ curve }, index) => [
    `<path d="M${at(area.right)} ${at(wanted[index]!)}L${at(area.right + 10)} ${at(places[index]!)}" fill="none" stroke="${INK[curve.colour]}" stroke-width="0.75"/>`,
    text(
      curve.letter,
      area.right + 18,
      places[index]! + 4.5,
      `fill="${INK[curve.colour]}" font-weight="700" font-size="13" text-anchor="middle"`,
    ),
  ]);
}

function legend(curves: readonly PlotCurve[], { area }: Frame, top: number, columns: number): string[] {
  const column = (area.right - area.left) / columns;
  const letterWidth = column - 46;
  return curves.flatMap((curve, index) => {
    const left = area.left + (index % columns) * column;
    const line = top + LEGEND_ROW * Math.floor(index / columns);
    const label = [...`${curve.letter} ${curve.label}`];
    const fits = Math.max(4, Math.floor(letterWidth / 6.6)); // mean width of a letter at 12 px
    const shown =
      label.length <= fits
        ? label.join('')
        : `${label
            .slice(0, fits - 1)
            .join('')
            .trimEnd()}…`;
    return [`<path d="M${at(left)} ${at(line - 4)}h32" ${stroke(curve)}/>`, text(shown, left + 40, line)];
  });
}

/**
 * A plot as an SVG text: vector lines and real text on white, with axes, units, letters at the curves'
 * ends, a legend, and a description in words. The same curves always give the same text.
 */
export function plotSvg(curves: readonly PlotCurve[], options: PlotSvgOptions): string {
  const { title, quantity, reference = '', width = 800, height = 420, id = 'plot' } = options;
  const range = axisRange(quantity, curves);
  const ticks = axisTicks(quantity, range);
  const frame = frameOf(quantity, range, width, height);
  const { area } = frame;
  const lettered = curves.filter((curve) => curve.letter !== '');
  const columns = Math.max(1, Math.floor((area.right - area.left) / LEGEND_COLUMN));
  const legendTop = height + 12;
  const legendBottom = height + LEGEND_ROW * Math.ceil(lettered.length / columns);
  const full = legendBottom + (reference === '' ? 8 : 28);
  const isLogarithmic = QUANTITIES[quantity].scale === 'logarithmic';
  const size = `x="${area.left}" y="${area.top}" width="${at(area.right - area.left)}" height="${at(area.bottom - area.top)}"`;
  // The strongest curve is drawn last, over the others.
  const drawn = [...curves].sort((first, second) => WIDTHS[first.strength] - WIDTHS[second.strength]);
  return `${[
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${full}" viewBox="0 0 ${width} ${full}" role="img" aria-labelledby="${id}-title ${id}-words" font-family="Helvetica, Arial, 'DejaVu Sans', sans-serif" font-size="12" fill="${PAPER.ink}">`,
    `<title id="${id}-title">${escapeXml(title)}</title>`,
    `<desc id="${id}-words">${escapeXml(plotSentences(curves, quantity))}</desc>`,
    `<clipPath id="${id}-area"><rect ${size}/></clipPath>`,
    `<rect width="${width}" height="${full}" fill="${PAPER.ground}"/>`,
    text(title, area.left, 26, 'font-size="15" font-weight="700"'),
    ...gridLines(frame, ticks),
    `<rect ${size} fill="none" stroke="${PAPER.frame}"/>`,
    ...axisWords(frame, ticks, quantity),
    `<g clip-path="url(#${id}-area)" stroke-linejoin="round">`,
    ...drawn.map((curve) => `<path d="${curvePath(curve, frame, isLogarithmic)}" ${stroke(curve)}/>`),
    '</g>',
    ...letters(lettered, frame),
    ...legend(lettered, frame, legendTop, columns),
    ...(reference === '' ? [] : [text(reference, area.left, full - 10, `fill="${PAPER.soft}"`)]),
    '</svg>',
  ].join('\n')}\n`;
}
