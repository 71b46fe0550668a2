import { existsSync } from 'node:fs';
import { dirname, join } from 'node:path';
import { chromium } from 'playwright-core';
import { createServer } from 'vite';
import type { Row } from './harness.ts';

/** The folder with package.json, seen from wherever this file was bundled to. */
function projectRoot(): string {
  let folder = process.cwd();
  while (!existsSync(join(folder, 'package.json'))) folder = dirname(folder);
  return folder;
}

/**
 * Runs in the page: milliseconds for a frame of six curves of 512 points, once through the chart of
 * the plot and once as bare lines on a canvas, one right after the other; a pixel is read back from both,
 * so that the drawing is really done.
 */
const MEASURE = `(async () => {
  const { PlotChart } = await import('/components/chart/plot-chart.ts');
  const frequencies = Float64Array.from({ length: 512 }, (_, index) => 10 * 4000 ** (index / 511));
  const letters = ['a', 'b', 'c', 'd', 'e', 'f'];
  const curvesAt = (time) => letters.map((colour, place) => ({
    id: colour, letter: colour.toUpperCase(), label: colour, colour, dash: [], strength: 'normal', frequencies,
    values: frequencies.map((frequency) => -12 - 8 * Math.cos(Math.log(frequency) + place + time)),
  }));
  const colours = { ink: '#000', soft: '#555', hairline: '#eee', rule: '#ccc', ground: '#fff',
    curves: Object.fromEntries([...letters, 'g', 'h', 'soft'].map((letter) => [letter, '#0072b2'])) };
  const picture = (time) => ({ curves: curvesAt(time), quantity: 'magnitude', range: { min: -24, max: 0 }, cursor: 1000, colours });
  const frames = Array.from({ length: 40 }, (_, index) => picture(index / 10));
  const host = document.createElement('div');
  host.style.cssText = 'position:fixed;inset:0;width:860px;height:380px';
  const canvas = document.createElement('canvas');
  host.append(canvas);
  document.body.append(host);
  const chart = new PlotChart(canvas, frames[0]);
  const bare = document.createElement('canvas');
  bare.width = 860; bare.height = 380;
  const context = bare.getContext('2d');
  const drawBare = ({ curves }) => {
    context.clearRect(0, 0, 860, 380);
    for (const { frequencies, values } of curves) {
      context.beginPath();
      for (let index = 0; index < frequencies.length; index += 1) context.lineTo(103 * Math.log(frequencies[index] / 10), -15 * values[index]);
      context.stroke();
    }
    context.getImageData(0, 0, 1, 1);
  };
  const time = (draw) => { const start = performance.now(); for (const frame of frames) draw(frame); return (performance.now() - start) / frames.length; };
  const drawChart = (frame) => { chart.draw(frame); canvas.getContext('2d').getImageData(0, 0, 1, 1); };
  for (let warm = 0; warm < 5; warm += 1) { time(drawChart); time(drawBare); }
  const pairs = Array.from({ length: 15 }, () => [time(drawChart), time(drawBare)]);
  const middle = (values) => values.sort((a, b) => a - b)[values.length >> 1];
  return { ratio: middle(pairs.map(([a, b]) => a / b)), milliseconds: middle(pairs.map(([a]) => a)) };
})()`;

/** A frame of the plot against bare lines on a canvas; needs a browser, and is left out without one. */
export async function rows(): Promise<readonly Row[]> {
  const root = projectRoot();
  const { findChromium } = await import(join(root, 'tests/tools/browser.mjs'));
  const executablePath = findChromium();
  if (executablePath === undefined) return [];
  const server = await createServer({
    configFile: join(root, '.config/vite.config.ts'),
    logLevel: 'error',
    server: { port: 0 },
  });
  await server.listen();
  const browser = await chromium.launch({ executablePath, args: ['--no-sandbox', '--disable-gpu'] });
  try {
    const page = await browser.newPage();
    await page.goto(`${server.resolvedUrls!.local[0]}LICENSE`);
    const { ratio, milliseconds } = (await page.evaluate(MEASURE)) as { ratio: number; milliseconds: number };
    return [
      {
        what: `a frame of six curves in the plot (${milliseconds.toFixed(1)} ms), against bare lines`,
        ratio,
      },
    ];
  } finally {
    await browser.close();
    await server.close();
  }
}
