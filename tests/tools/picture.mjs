import { fileURLToPath } from 'node:url';
import { chromium } from 'playwright-core';
import { createServer } from 'vite';
import { ensureChromium } from './browser.mjs';

/** `npm run picture`: takes the README's picture of the running bench anew. */
const configFile = fileURLToPath(new URL('../../.config/vite.config.ts', import.meta.url));
const target = fileURLToPath(new URL('../../components/bench.png', import.meta.url));

const server = await createServer({ configFile, logLevel: 'error', server: { port: 0 } });
await server.listen();
const browser = await chromium.launch({
  executablePath: await ensureChromium(),
  args: ['--no-sandbox', '--disable-gpu'],
});
const page = await browser.newPage({ viewport: { width: 1440, height: 900 }, colorScheme: 'light' });
await page.addInitScript(() =>
  localStorage.setItem('notchwork-preferences', JSON.stringify({ hearingNoteRead: true })),
);
await page.goto(server.resolvedUrls.local[0]);
await page.waitForFunction(() => document.querySelector('nw-app')?.bench.sound.gain.value !== undefined);
await page.evaluate(() => {
  const { bench } = document.querySelector('nw-app');
  const named = (title) => (design) => ({ ...design, title });
  bench.store.apply(named('Attic amplifier'), 'title');
});
await page.getByText('+ Keep as B').click();
await page.locator('nw-part-chip', { hasText: 'Treble cap' }).click();
await page.waitForTimeout(300);
await page.getByRole('button', { name: /hear 680/ }).click();
await page.waitForTimeout(500);
await page.screenshot({ path: target });
await browser.close();
await server.close();
