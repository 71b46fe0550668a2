import { spawn, spawnSync } from 'node:child_process';
import { mkdtempSync, rmSync } from 'node:fs';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { chromium } from 'playwright-core';
import puppeteer from 'puppeteer-core';

/** A file that the page handed over for saving. */
export interface SavedFile {
  readonly name: string;
  readonly bytes: Uint8Array;
}

/** The part of a page that playwright and puppeteer share. */
interface Page {
  goto(url: string): Promise<unknown>;
  evaluate<Result>(script: string): Promise<Result>;
  readonly mouse: { click(x: number, y: number): Promise<void> };
  readonly keyboard: { press(key: never): Promise<void>; type(text: string): Promise<void> };
  readonly touchscreen?: unknown;
}

/** Finds an element through shadow roots: every selector is looked up in the root of the one before. */
const DEEP = `(path) => path.reduce((from, selector) => {
  const root = from.shadowRoot ?? from;
  const [css, text] = selector.split('=>');
  const all = [...root.querySelectorAll(css)];
  const found = text === undefined ? all[0] : all.find((entry) => entry.textContent.includes(text) || (entry.shadowRoot?.textContent ?? '').includes(text) || (entry.getAttribute('aria-label') ?? '').includes(text) || entry.label === text);
  if (!found) throw new Error('not found: ' + path.join(' / ') + ' at ' + selector);
  return found;
}, document)`;

/** Keeps what would be saved, instead of asking where to. */
const KEEP_FILES = `(() => {
  window.savedFiles = [];
  const click = HTMLAnchorElement.prototype.click;
  HTMLAnchorElement.prototype.click = function () {
    if (!this.download) return click.call(this);
    const name = this.download;
    fetch(this.href).then((answer) => answer.arrayBuffer()).then((buffer) => {
      let text = '';
      for (const byte of new Uint8Array(buffer)) text += String.fromCharCode(byte);
      window.savedFiles.push({ name, base64: btoa(text) });
    });
  };
})()`;

/**
 * Firefox starts no sound without a device. Where this machine has a PulseAudio program, one of our own
 * runs with a device that leads nowhere; elsewhere the machine's own sound is used.
 */
function startSoundDevice(): { readonly environment: Record<string, string>; stop(): void } {
  const runtime = mkdtempSync(join(tmpdir(), 'notchwork-sound-'));
  const environment = { XDG_RUNTIME_DIR: runtime, PULSE_RUNTIME_PATH: runtime, HOME: runtime };
  const modules = ['module-null-sink', 'module-native-protocol-unix'].map((name) => `--load=${name}`);
  const daemon = spawn('pulseaudio', ['-n', '--exit-idle-time=-1', '--daemonize=no', ...modules], {
    env: { ...process.env, ...environment },
    stdio: 'ignore',
  });
  let isMissing = false;
  daemon.on('error', () => {
    isMissing = true;
  });
  return {
    environment: spawnSync('pulseaudio', ['--version']).status === 0 ? environment : {},
    stop: () => {
      if (!isMissing) daemon.kill();
      rmSync(runtime, { recursive: true, force: true });
    },
  };
}

/** Drives a page as a person would, through either browser. */
export class PageDriver {
  readonly #page: Page;
  readonly #close: () => Promise<void>;
  readonly #problems: string[];

  private constructor(page: Page, problems: string[], close: () => Promise<void>) {
    this.#page = page;
    this.#problems = problems;
    this.#close = close;
  }

  /** Opens a page in Chromium. */
  static async chromium(executablePath: string, width = 1440, height = 900): Promise<PageDriver> {
    const browser = await chromium.launch({
      executablePath,
      args: ['--no-sandbox', '--disable-gpu', '--disable-dev-shm-usage', '--mute-audio'],
    });
    const page = await browser.newPage({ viewport: { width, height } });
    const problems: string[] = [];
    page.on('pageerror', (error) => problems.push(error.message));
    await page.addInitScript(KEEP_FILES);
    return new PageDriver(page as unknown as Page, problems, () => browser.close());
  }

  /** Opens a page in Firefox. */
  static async firefox(executablePath: string, width = 1440, height = 900): Promise<PageDriver> {
    const device = startSoundDevice();
    const browser = await puppeteer.launch({
      browser: 'firefox',
      executablePath,
      headless: true,
      env: { ...process.env, ...device.environment },
    });
    const page = await browser.newPage();
    await page.setViewport({ width, height });
    const problems: string[] = [];
    page.on('pageerror', (error) => problems.push(error instanceof Error ? error.message : String(error)));
    await page.evaluateOnNewDocument(KEEP_FILES);
    return new PageDriver(page as unknown as Page, problems, async () => {
      await browser.close();
      device.stop();
    });
  }

  /** Errors that the page threw and nobody caught. */
  get problems(): readonly string[] {
    return this.#problems;
  }

  async open(url: string): Promise<void> {
    await this.#page.goto(url);
  }

  /** Evaluates an expression in which `element` is the element at a path. */
  read<Result>(path: readonly string[], expression: string): Promise<Result> {
    return this.#page.evaluate<Result>(
      `(() => { const element = (${DEEP})(${JSON.stringify(path)}); return ${expression}; })()`,
    );
  }

  /** Evaluates an expression in the page. */
  run<Result>(expression: string): Promise<Result> {
    return this.#page.evaluate<Result>(expression);
  }

  /** Presses the mouse in the middle of an element. */
  async click(...path: string[]): Promise<void> {
    await this.read(path, "(element.scrollIntoView({ block: 'center', behavior: 'instant' }), 0)");
    const [x, y] = await this.read<[number, number]>(
      path,
      '(() => { const r = element.getBoundingClientRect(); return [r.x + r.width / 2, r.y + r.height / 2]; })()',
    );
    await this.#page.mouse.click(x, y);
  }

  /** Puts the focus on an element, as Tab would in the end. */
  async focus(...path: string[]): Promise<void> {
    await this.read(path, '(element.focus(), 0)');
  }

  async press(...keys: string[]): Promise<void> {
    for (const key of keys) await this.#page.keyboard.press(key as never);
  }

  async type(text: string): Promise<void> {
    await this.#page.keyboard.type(text);
  }

  /** Waits until an expression about an element is true, with a deadline that fails the test. */
  async until(path: readonly string[], expression: string, what: string, seconds = 20): Promise<void> {
    const deadline = Date.now() + seconds * 1000;
    let last: unknown;
    while (Date.now() < deadline) {
      try {
        if (await this.read(path, expression)) return;
      } catch (error) {
        last = error;
      }
      await new Promise((resolve) => setTimeout(resolve, 50));
    }
    const said = await this.read<string>(
      ['nw-app', 'nw-play-bar'],
      "[...element.querySelectorAll('nw-notice')].map((entry) => entry.textContent.trim()).join(' ')",
    );
    throw new Error(
      `Waited ${seconds} s in vain for: ${what}; the page says: “${said}”${last === undefined ? '' : ` (${last})`}`,
    );
  }

  /** Drops a file on the page. */
  async drop(name: string, bytes: Uint8Array): Promise<void> {
    const base64 = Buffer.from(bytes).toString('base64');
    await this.run(`(() => {
      const bytes = Uint8Array.from(atob('${base64}'), (character) => character.charCodeAt(0));
      const transfer = new DataTransfer();
      transfer.items.add(new File([bytes], ${JSON.stringify(name)}));
      window.dispatchEvent(new DragEvent('drop', { dataTransfer: transfer, bubbles: true, cancelable: true }));
    })()`);
  }

  /** The next file that the page saves whose name ends so. */
  async saved(ending: string): Promise<SavedFile> {
    await this.until(
      ['body'],
      `window.savedFiles.some((file) => file.name.endsWith('${ending}'))`,
      `a saved ${ending} file`,
      60,
    );
    const file = await this.run<{ name: string; base64: string }>(
      `window.savedFiles.splice(window.savedFiles.findIndex((file) => file.name.endsWith('${ending}')), 1)[0]`,
    );
    return { name: file.name, bytes: new Uint8Array(Buffer.from(file.base64, 'base64')) };
  }

  async close(): Promise<void> {
    await this.#close();
  }
}
