import { escapeXml } from './escape-xml.ts';
import {
  axisRange,
  axisTicks,
  GRID_FREQUENCIES,
  LABELLED,
  PLOT_FROM,
  PLOT_TO,
  type PlotCurve,
  type PlotQuantity,
  plotNumber,
  QUANTITIES,
  valueAt,
} from './plot-model.ts';

/** How a plot is drawn for paper. */
export interface PlotSvgOptions {
  /** Written above the plot. */
  readonly title: string;
  readonly quantity: PlotQuantity;
  /** What 0 dB is; written under the plot. @default nothing */
  readonly reference?: string;
  /** Width in pixels at 96 to the inch. @default 800 */
  readonly width?: number;
  /** Height of the whole picture. @default 460 */
  readonly height?: number;
}

/** The palette on white paper: the Okabe–Ito hues, deepened so that thin lines still stand out. */
const INK: Readonly<Record<PlotCurve['colour'], string>> = {
  a: '#0072b2',
  b: '#c44f00',
  c: '#00805d',
  d: '#a8377e',
  e: '#8a6400',
  f: '#2378a8',
  g: '#6f6a00',
  h: '#3d4752',
  soft: '#5a6673',
};

const WIDTHS: Readonly<Record<PlotCurve['strength'], number>> = { strong: 2, normal: 1.4, faint: 0.9 };

const FONT = "font-family=\"'Helvetica Neue', Arial, 'DejaVu Sans', sans-serif\"";

/**
 * A plot as an SVG text: vector lines and real text on a white ground, fit for a paper; the same
 * curves always give the same text.
 */
export function plotSvg(curves: readonly PlotCurve[], options: PlotSvgOptions): string {
  const { title, quantity, reference = '', width = 800, height = 460 } = options;
  const legend = curves.filter((curve) => curve.letter !== '');
  const area = {
    left: 58,
    top: 40,
    right: width - 28,
    bottom: height - 66 - 16 * Math.ceil(legend.length / 3),
  };
  const range = axisRange(quantity, curves);
  const { name, unit } = QUANTITIES[quantity];
  const span = Math.log(PLOT_TO / PLOT_FROM);
  const x = (frequency: number): number =>
    area.left + (Math.log(frequency / PLOT_FROM) / span) * (area.right - area.left);
  const y = (value: number): number =>
    area.top + ((range.max - value) / (range.max - range.min)) * (area.bottom - area.top);
  const at = (value: number): string => value.toFixed(2);
  const text = (words: string, left: number, top: number, more = ''): string =>
    `<text x="${at(left)}" y="${at(top)}" ${more}>${escapeXml(words)}</text>`;

  const grid = [
    ...GRID_FREQUENCIES.map((frequency) => `M${at(x(frequency))} ${at(area.top)}V${at(area.bottom)}`),
    ...axisTicks(quantity, range).map((value) => `M${at(area.left)} ${at(y(value))}H${at(area.right)}`),
  ].join('');
  const pathOf = (curve: PlotCurve): string => {
    let path = '';
    curve.frequencies.forEach((frequency, index) => {
      const value = curve.values[index]!;
      if (!Number.isFinite(value) || frequency < PLOT_FROM || frequency > PLOT_TO) return;
      path += `${path === '' ? 'M' : 'L'}${at(x(frequency))} ${at(y(value))}`;
    });
    return path;
  };
  const lines = curves.map((curve) => {
    const dash = curve.dash.length > 0 ? ` stroke-dasharray="${curve.dash.join(' ')}"` : '';
    return `<path d="${pathOf(curve)}" fill="none" stroke="${INK[curve.colour]}" stroke-width="${WIDTHS[curve.strength]}"${dash} stroke-linejoin="round" clip-path="url(#area)"/>`;
  });
  let last = Number.NEGATIVE_INFINITY;
  const letters = legend
    .map((curve) => ({ curve, top: y(valueAt(curve, 28_000)) }))
    .filter(({ top }) => Number.isFinite(top))
    .sort((first, second) => first.top - second.top)
    .map(({ curve, top }) => {
      last = Math.max(top - 5, last + 14);
      return text(
        curve.letter,
        x(28_000),
        last,
        `fill="${INK[curve.colour]}" font-weight="700" text-anchor="middle"`,
      );
    });
  const legendTop = area.bottom + 54;
  const legendItems = legend.map((curve, index) => {
    const left = area.left + (index % 3) * ((area.right - area.left) / 3);
    const top = legendTop + 16 * Math.floor(index / 3);
    const dash = curve.dash.length > 0 ? ` stroke-dasharray="${curve.dash.join(' ')}"` : '';
    return `<path d="M${at(left)} ${at(top - 4)}h28" stroke="${INK[curve.colour]}" stroke-width="${WIDTHS[curve.strength]}"${dash}/>${text(`${curve.letter} ${curve.label}`, left + 34, top)}`;
  });
  const values = legend.map(
    (curve) =>
      `${curve.letter} ${curve.label}: ${plotNumber(valueAt(curve, 1000), quantity)} ${unit} at 1 kHz`,
  );
  return [
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}" height="${height}" viewBox="0 0 ${width} ${height}" role="img" aria-labelledby="plot-title plot-desc" ${FONT} font-size="12" fill="#18212b">`,
    `<title id="plot-title">${escapeXml(title)}</title>`,
    `<desc id="plot-desc">${escapeXml(`${name} in ${unit} from 10 Hz to 40 kHz. ${values.join('; ')}.`)}</desc>`,
    `<defs><clipPath id="area"><rect x="${area.left}" y="${area.top}" width="${at(area.right - area.left)}" height="${at(area.bottom - area.top)}"/></clipPath></defs>`,
    `<rect width="${width}" height="${height}" fill="#fff"/>`,
    text(title, area.left, 22, 'font-size="15" font-weight="700"'),
    `<path d="${grid}" fill="none" stroke="#dfe3e5" stroke-width="0.75"/>`,
    `<rect x="${area.left}" y="${area.top}" width="${at(area.right - area.left)}" height="${at(area.bottom - area.top)}" fill="none" stroke="#87929b"/>`,
    ...LABELLED.map(({ frequency, text: words }) =>
      text(words, x(frequency), area.bottom + 16, 'text-anchor="middle"'),
    ),
    text(
      'Frequency in Hz',
      (area.left + area.right) / 2,
      area.bottom + 33,
      'text-anchor="middle" fill="#5a6673"',
    ),
    ...axisTicks(quantity, range).map((value) =>
      text(plotNumber(value, 'phase'), area.left - 8, y(value) + 4, 'text-anchor="end"'),
    ),
    `<text transform="translate(16 ${at((area.top + area.bottom) / 2)}) rotate(-90)" text-anchor="middle" fill="#5a6673">${escapeXml(`${name} in ${unit}`)}</text>`,
    ...lines,
    ...letters,
    ...legendItems,
    reference === '' ? '' : text(reference, area.left, height - 8, 'fill="#5a6673" font-size="11"'),
    '</svg>',
    '',
  ]
    .filter((line, index, all) => line !== '' || index === all.length - 1)
    .join('\n');
}
