import { expect, fixture, html, waitUntil } from '@open-wc/testing';
import { sendKeys, setViewport } from '@web/test-runner-commands';
import '../../../components/nw-app/nw-app.ts';
import type { NwApp } from '../../../components/nw-app/nw-app.ts';
import { activeVoicing } from '../../../src/design/design.ts';
import { writeWav } from '../../../src/sheet/wav.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

async function make(): Promise<NwApp> {
  localStorage.clear();
  setTheme(undefined);
  const app = await fixture<NwApp>(html`<nw-app></nw-app>`);
  await waitUntil(() => app.bench.sound.clip.value?.overview !== undefined, 'the demo clip', {
    timeout: 10_000,
  });
  await waitUntil(() => customElements.get('nw-swap-panel') !== undefined, 'the rest of the page');
  await app.updateComplete;
  return app;
}

const inside = <Found extends Element>(root: Element, ...path: string[]): Found =>
  path.reduce<Element>((from, selector) => from.shadowRoot!.querySelector(selector)!, root) as Found;
const block = (app: NwApp, slot: string): Element =>
  [...inside(app, 'nw-line').shadowRoot!.querySelectorAll('nw-block')].find(
    (entry) => entry.block.slot === slot,
  )!;
const tone = (app: NwApp) => activeVoicing(app.bench.store.design.value).line.tone.variants['three-knob']!;
const steps = (app: NwApp) => app.bench.store.history.value.past.map((step) => step.name);

function drop(name: string, bytes: Uint8Array<ArrayBuffer>): void {
  const transfer = new DataTransfer();
  transfer.items.add(new File([bytes], name));
  window.dispatchEvent(new DragEvent('drop', { dataTransfer: transfer, bubbles: true, cancelable: true }));
}

const message = (app: NwApp): string => app.bench.sound.message.value?.text ?? '';

/** A sine as a WAV file. */
function tones(sampleRate: number, seconds: number, level = 0.5): Uint8Array<ArrayBuffer> {
  const frames = Math.round(sampleRate * seconds);
  const samples = Float32Array.from(
    { length: frames },
    (_, frame) => level * Math.sin((2 * Math.PI * 220 * frame) / sampleRate),
  );
  return writeWav({ sampleRate, frames, channels: [samples] }, 24);
}

describe('nw-app', () => {
  afterEach(async () => {
    await setViewport({ width: 1280, height: 900 });
  });

  for (const [width, height] of [
    [1280, 900],
    [360, 780],
  ] as const) {
    it(`is accessible in both themes at ${width} × ${height}`, async () => {
      await setViewport({ width, height });
      await expectAccessibleInBothThemes(await make());
    });
  }

  it('needs no horizontal scrolling at 320 px', async () => {
    await setViewport({ width: 320, height: 700 });
    await make();
    expect(document.documentElement.scrollWidth).to.be.at.most(320);
  });

  it('turns a knob by key: curve and figures follow, one step can be undone and made again', async () => {
    const app = await make();
    const plot = inside<HTMLElement & { curves: readonly { values: Float64Array }[] }>(
      app,
      'nw-plot-panel',
      'nw-plot',
    );
    const before = plot.curves.at(-1)!.values;
    inside<HTMLElement>(block(app, 'tone'), 'nw-knob').focus();
    await sendKeys({ press: 'PageUp' });
    await app.updateComplete;
    expect(tone(app).knobs['treble']).to.equal(0.7);
    expect(plot.curves.at(-1)!.values).not.to.deep.equal(before);
    expect(steps(app)).to.deep.equal(['treble to 7.0']);
    await sendKeys({ down: 'Control' });
    await sendKeys({ press: 'z' });
    await sendKeys({ up: 'Control' });
    expect(tone(app).knobs['treble']).to.equal(0.6);
    await sendKeys({ down: 'Control' });
    await sendKeys({ press: 'y' });
    await sendKeys({ up: 'Control' });
    expect(tone(app).knobs['treble']).to.equal(0.7);
  });

  it('tries a value without a step, puts it back, and keeps one as one step', async () => {
    const app = await make();
    inside<HTMLElement>(block(app, 'tone'), 'nw-part-chip:nth-of-type(2)', 'button').click();
    await waitUntil(
      () => app.shadowRoot!.querySelector('nw-swap-panel')?.shadowRoot?.querySelector('.key') !== null,
    );
    const key = (index: number) =>
      [...inside(app, 'nw-swap-panel').shadowRoot!.querySelectorAll<HTMLElement>('.key')][index]!;
    key(5).click();
    await app.updateComplete;
    expect([tone(app).parts['trebleCap'], steps(app)]).to.deep.equal([560e-12, []]);
    await waitUntil(
      () => inside(app, 'nw-swap-panel', '.primary') !== null,
      'the value to be shown as tried',
    );
    key(5).click();
    expect([tone(app).parts['trebleCap'], steps(app)]).to.deep.equal([390e-12, []]);
    await waitUntil(() => inside(app, 'nw-swap-panel', '.primary') === null, 'the value to be put back');
    key(5).click();
    await waitUntil(() => inside(app, 'nw-swap-panel', '.primary') !== null, 'the button that keeps it');
    inside<HTMLElement>(app, 'nw-swap-panel', '.primary').click();
    expect(tone(app).parts['trebleCap']).to.equal(560e-12);
    expect(steps(app)).to.deep.equal(['treble capacitor 390\u202fpF to 560\u202fpF']);
  });

  it('keeps voicings and switches between them by figure keys', async () => {
    const app = await make();
    [...inside(app, 'nw-voicings').shadowRoot!.querySelectorAll<HTMLElement>('.voicing')].at(-1)!.click();
    expect(app.bench.store.design.value.active).to.equal('B');
    (document.activeElement as HTMLElement | null)?.blur();
    await sendKeys({ press: '1' });
    expect(app.bench.store.design.value.active).to.equal('A');
    await sendKeys({ press: '2' });
    expect(app.bench.store.design.value.active).to.equal('B');
  });

  it('takes a block out of the line and puts it back', async () => {
    const app = await make();
    const level = () => app.bench.active.value.analysis.spans.length;
    expect(level()).to.equal(2);
    inside<HTMLElement>(block(app, 'power'), 'nw-switch', 'input').click();
    expect(level()).to.equal(1);
    inside<HTMLElement>(block(app, 'power'), 'nw-switch', 'input').click();
    expect(level()).to.equal(2);
  });

  it('draws phase and the digital difference when asked, and keeps a pinned curve', async () => {
    const app = await make();
    const plot = inside<HTMLElement & { curves: readonly { id: string; values: Float64Array }[] }>(
      app,
      'nw-plot-panel',
      'nw-plot',
    );
    const press = (words: string) =>
      [...inside(app, 'nw-plot-panel').shadowRoot!.querySelectorAll<HTMLElement>('.toggle')]
        .find((button) => button.textContent!.trim() === words)!
        .click();
    press('Pin');
    await app.updateComplete;
    expect(plot.curves.map((curve) => curve.id)).to.include('pinned');
    for (const words of ['Phase', 'Digital difference']) {
      press(words);
      await waitUntil(() => plot.curves.at(-1)!.values.some(Number.isFinite), words);
    }
    // The topmost octave of the bilinear transform at 48 kHz lies below the circuit with its 47 pF load.
    const { frequencies, values } = plot.curves.at(-1)! as unknown as {
      frequencies: Float64Array;
      values: Float64Array;
    };
    expect(values[frequencies.findIndex((frequency) => frequency > 20_000)]).to.be.lessThan(-0.05);
    expect(Math.abs(values[0]!)).to.be.lessThan(1e-3);
  });

  it('follows the theme that was chosen', async () => {
    const app = await make();
    const button = [...inside(app, 'nw-header').shadowRoot!.querySelectorAll<HTMLElement>('button')][2]!;
    button.click();
    await app.updateComplete;
    expect(document.documentElement.dataset['theme']).to.equal('light');
    button.click();
    await app.updateComplete;
    expect(document.documentElement.dataset['theme']).to.equal('dark');
    button.click();
    await app.updateComplete;
    expect(document.documentElement.dataset['theme']).to.equal(undefined);
  });

  for (const [what, name, bytes, words] of [
    ['an empty file', 'empty.wav', new Uint8Array(0), /empty/],
    ['a text with the name of a WAV', 'diary.wav', new TextEncoder().encode('Dear diary'), /WAV/],
    ['a truncated WAV', 'cut.wav', tones(48_000, 0.5).slice(0, 20_000), /early/],
    [
      'something that no browser decodes',
      'odd.flac',
      new Uint8Array([0x66, 0x4c, 0x61, 0x43, 1, 2, 3, 4]),
      /./,
    ],
  ] as const) {
    it(`says what is wrong with ${what}, and keeps the clip it had`, async () => {
      const app = await make();
      drop(name, bytes as Uint8Array<ArrayBuffer>);
      await waitUntil(() => message(app) !== '', 'a message', { timeout: 10_000 });
      await app.updateComplete;
      expect(message(app)).to.match(words);
      expect(inside(app, 'nw-play-bar').querySelector('nw-notice')!.textContent).to.contain(message(app));
      expect(app.bench.sound.clip.value?.title).to.equal('Ringing chords');
      expect(app.bench.sound.loading.value).to.equal(undefined);
    });
  }

  for (const rate of [8000, 192_000]) {
    it(`takes a recording at ${rate} Hz`, async () => {
      const app = await make();
      drop('own take.wav', tones(rate, 0.5));
      await waitUntil(() => app.bench.sound.clip.value?.title === 'own take', 'the recording', {
        timeout: 10_000,
      });
      expect(app.bench.sound.clip.value!.clip.sampleRate).to.equal(rate);
      await waitUntil(() => app.bench.sound.gain.value !== undefined, 'its loudness', { timeout: 10_000 });
    });
  }

  it('takes a silent recording, and says that it is silent', async () => {
    const app = await make();
    drop('nothing.wav', tones(48_000, 0.5, 0));
    await waitUntil(() => app.bench.sound.clip.value?.title === 'nothing', 'the recording', {
      timeout: 10_000,
    });
    expect(message(app)).to.match(/silent/);
    await waitUntil(() => app.bench.sound.gain.value === undefined);
  });

  it('brings back the design when the page is opened again', async () => {
    const app = await make();
    inside<HTMLElement>(block(app, 'tone'), 'nw-knob').focus();
    await sendKeys({ press: 'PageUp' });
    await waitUntil(() => localStorage.getItem('notchwork-design') !== null, 'the design to be kept');
    app.remove();
    const again = await fixture<NwApp>(html`<nw-app></nw-app>`);
    await waitUntil(() => tone(again).knobs['treble'] === 0.7, 'the design to come back');
  });

  it('opens a design that is dropped, as one step; refuses a broken one and says why', async () => {
    const app = await make();
    const text = JSON.stringify({ ...app.bench.store.design.value, title: 'From a file' });
    drop('loft.json', new TextEncoder().encode(text) as Uint8Array<ArrayBuffer>);
    await waitUntil(() => app.bench.store.design.value.title === 'From a file', 'the design');
    expect(steps(app)).to.deep.equal(['opening “From a file”']);
    drop('broken.json', new TextEncoder().encode('{') as Uint8Array<ArrayBuffer>);
    await waitUntil(() => message(app).includes('broken.json'), 'a message');
    expect(app.bench.store.design.value.title).to.equal('From a file');
  });

  it('refuses a region without length', async () => {
    const app = await make();
    app.bench.sound.setRegion(2, 2, true);
    expect(message(app)).to.match(/no length/);
    expect(app.bench.sound.region.value).to.equal(undefined);
  });

  it('reaches every control by the Tab key alone', async () => {
    const app = await make();
    const wanted = new Set([
      'nw-knob',
      'nw-part-chip',
      'nw-switch',
      'nw-tabs',
      'nw-plot',
      'nw-waveform',
      'nw-menu',
      'nw-header',
      'nw-play-bar',
      'nw-voicings',
      'nw-plot-panel',
      'nw-block',
      'nw-listen-panel',
    ]);
    const reached = new Set<string>();
    (document.activeElement as HTMLElement | null)?.blur();
    for (let presses = 0; presses < 80; presses += 1) {
      await sendKeys({ press: 'Tab' });
      let focused = document.activeElement;
      while (focused?.shadowRoot?.activeElement) {
        reached.add(focused.localName);
        focused = focused.shadowRoot.activeElement;
      }
    }
    expect([...wanted].filter((name) => !reached.has(name))).to.deep.equal([]);
    expect(app.isConnected).to.equal(true);
  });

  it('works on after being taken out of the page and put back', async () => {
    const app = await make();
    const parent = app.parentElement!;
    app.remove();
    parent.append(app);
    await app.updateComplete;
    inside<HTMLElement>(block(app, 'tone'), 'nw-knob').focus();
    await sendKeys({ press: 'ArrowUp' });
    expect(tone(app).knobs['treble']).to.equal(0.61);
  });
});
