import Papa from 'papaparse';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { readWav } from '../../src/clip/wav-reader.ts';
import { writeWav } from '../../src/sheet/wav.ts';
import { whiteNoise } from '../src/clip/signals.ts';
import { findChromium, findFirefox } from '../tools/browser.mjs';
import { serveBuiltPage } from './built-page.ts';
import { lineResponseByHand, renderByHand } from './independent-line.ts';
import { PageDriver } from './page-driver.ts';

const BAR = ['nw-app', 'nw-play-bar'];
const block = (name: string): string[] => ['nw-app', 'nw-line', `nw-block=>${name}`];
const knob = (of: string, name: string): string[] => [...block(of), `nw-knob=>${name}`, '.dial'];

const browsers: [name: string, open: () => Promise<PageDriver>][] = [
  ['Chromium', () => PageDriver.chromium(findChromium() ?? '')],
];
const firefox = findFirefox();
if (firefox !== undefined) browsers.push(['Firefox', () => PageDriver.firefox(firefox)]);

let page: Awaited<ReturnType<typeof serveBuiltPage>>;
beforeAll(async () => {
  page = await serveBuiltPage();
});
afterAll(async () => {
  await page?.close();
});

describe.each(browsers)('the main job in %s', (_, open) => {
  it('plays, turns, swaps, takes a recording, saves curve and clip', async () => {
    const driver = await open();
    try {
      await driver.open(page.url);
      await driver.until(BAR, 'element.duration > 7', 'the demo clip to be read');
      await driver.until(
        ['nw-app', 'nw-plot-panel', 'nw-plot'],
        "element.shadowRoot.querySelector('canvas').width > 300",
        'the plot to be drawn',
      );

      await driver.click(...BAR, '.play');
      await driver.until(BAR, 'element.playing', 'the clip to play');
      await driver.until(BAR, 'element.level > -60 && element.position > 0.2', 'sound to come out');

      const figures = () =>
        driver.read<string>(
          ['nw-app', 'nw-plot-panel', 'nw-figures'],
          "element.shadowRoot.textContent.replace(/\\s+/g, ' ')",
        );
      const before = await figures();
      await driver.focus(...knob('Tone network', 'Treble'));
      await driver.press('PageUp', 'PageUp', 'PageUp', 'ArrowDown', 'ArrowDown');
      await driver.until(
        knob('Tone network', 'Treble'),
        "element.getAttribute('aria-valuenow') === '8.8'",
        'the treble knob to stand at 8.8',
      );
      expect(await figures()).not.toBe(before);

      await driver.click(...block('Tone network'), 'nw-part-chip=>Treble cap', 'button');
      await driver.until(
        ['nw-app', 'nw-swap-panel'],
        "element.shadowRoot.textContent.includes('Treble capacitor')",
        'the swap panel',
      );
      const present = await figures();
      await driver.click('nw-app', 'nw-swap-panel', 'button=>hear 560');
      await driver.until(
        ['nw-app', 'nw-swap-panel'],
        "element.shadowRoot.textContent.includes('Keep 560')",
        'the value to be tried',
      );
      expect(await figures()).not.toBe(present);
      await driver.click('nw-app', 'nw-swap-panel', '.primary');
      await driver.until(
        [...block('Tone network')],
        'element.settings.parts.trebleCap === 560e-12',
        'the value to be kept',
      );
      expect(await driver.read(BAR, 'element.playing')).toBe(true);

      await driver.click('nw-app', 'nw-tabs', 'button=>Listen');
      await driver.click('nw-app', 'nw-listen-panel', 'nw-switch', 'input');

      const clip = { ...whiteNoise(7, 0.3), sampleRate: 48_000 };
      await driver.drop('own-take.wav', writeWav(clip, 32));
      await driver.until(
        BAR,
        "element.clipTitle === 'own-take' && element.duration < 0.31 && element.loading === undefined",
        'the recording to be taken',
      );

      const values = { treble: 0.88, trebleCap: 560e-12, presence: 0.4 };
      await driver.click('nw-app', 'nw-menu=>Files', 'button');
      await driver.click('nw-app', 'nw-menu=>Files', '.item=>Curve as CSV');
      const csv = await driver.saved('.csv');
      const table = Papa.parse<Record<string, string>>(new TextDecoder().decode(csv.bytes).trimEnd(), {
        header: true,
      });
      expect(csv.name).toMatch(/^untitled-curve-\d{4}-\d\d-\d\d\.csv$/);
      expect(table.data).toHaveLength(512);
      for (const row of table.data) {
        const { re, im } = lineResponseByHand(values, 2 * Math.PI * Number(row['frequency_hz']));
        expect(Number(row['magnitude_db'])).toBeCloseTo(20 * Math.log10(Math.hypot(re, im)), 8);
        const turned = Number(row['phase_deg']) - (Math.atan2(im, re) * 180) / Math.PI;
        expect(turned - 360 * Math.round(turned / 360)).toBeCloseTo(0, 7);
      }

      await driver.click('nw-app', 'nw-menu=>Files', 'button');
      await driver.click('nw-app', 'nw-menu=>Files', '.item=>float WAV');
      const rendered = readWav((await driver.saved('.wav')).bytes);
      expect(rendered.frames).toBeGreaterThanOrEqual(clip.frames);
      const expected = renderByHand(clip.channels[0]!, 48_000, values);
      let worst = 0;
      expected.forEach((value, index) => {
        worst = Math.max(worst, Math.abs(value - rendered.channels[0]![index]!));
      });
      expect(worst).toBeLessThan(1e-6);
      expect(driver.problems).toEqual([]);
    } finally {
      await driver.close();
    }
  });
});
