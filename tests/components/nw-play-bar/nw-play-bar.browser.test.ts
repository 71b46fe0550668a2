import { aTimeout, expect, fixture, html, waitUntil } from '@open-wc/testing';
import { sendKeys, setViewport } from '@web/test-runner-commands';
import '../../../components/nw-play-bar/nw-play-bar.ts';
import '../../../components/nw-level-meter/nw-level-meter.ts';
import '../../../components/nw-waveform/nw-waveform.ts';
import type { NwPlayBar } from '../../../components/nw-play-bar/nw-play-bar.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

const CLIPS = [
  { id: 'ringing', label: 'Ringing chords' },
  { id: 'line', label: 'Single-note line' },
];

async function barOf(properties: Partial<NwPlayBar> = {}): Promise<NwPlayBar> {
  setTheme(undefined);
  const high = Float32Array.from({ length: 300 }, (_, index) => Math.abs(Math.sin(index / 30)) / 2);
  const bar = await fixture<NwPlayBar>(html`<nw-play-bar><span>Loudness matched</span></nw-play-bar>`);
  Object.assign(bar, {
    clipTitle: 'Ringing chords',
    clips: CLIPS,
    overview: { high, low: high.map((value) => -value) },
    duration: 8,
    position: 3.14,
    ...properties,
  });
  await bar.updateComplete;
  return bar;
}

const find = <Found extends HTMLElement>(bar: NwPlayBar, selector: string): Found =>
  bar.shadowRoot!.querySelector<Found>(selector)!;
const play = (bar: NwPlayBar): HTMLButtonElement => find(bar, '.play');
const toggle = (bar: NwPlayBar, words: string): HTMLButtonElement =>
  [...bar.shadowRoot!.querySelectorAll<HTMLButtonElement>('.toggle')].find(
    (button) => button.textContent!.trim() === words,
  )!;

const TYPES = [
  'nw-play-toggle',
  'nw-seek',
  'nw-region-set',
  'nw-loop-set',
  'nw-bypass-set',
  'nw-clip-choose',
  'nw-clip-open',
  'nw-hearing-read',
  'nw-choose',
  'nw-dismiss',
] as const;

/** Everything that the bar lets out, heard from outside as the page hears it. */
function record(bar: NwPlayBar): { readonly type: string; readonly detail: unknown }[] {
  const told: { type: string; detail: unknown }[] = [];
  for (const type of TYPES) {
    bar.parentElement!.addEventListener(type, (event) =>
      told.push({ type, detail: (event as CustomEvent).detail ?? undefined }),
    );
  }
  return told;
}

/** Opens the clip menu; its entries. */
async function openMenu(bar: NwPlayBar): Promise<HTMLElement[]> {
  const menu = find(bar, 'nw-menu');
  menu.shadowRoot!.querySelector('button')!.click();
  await waitUntil(() => menu.shadowRoot!.querySelector('[role=menuitem]') !== null, 'the menu is open');
  return [...menu.shadowRoot!.querySelectorAll<HTMLElement>('[role=menuitem]')];
}

describe('nw-play-bar', () => {
  afterEach(() => setTheme(undefined));

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(
      await barOf({ caution: true, loop: true, region: { start: 1, end: 3 } }),
    );
  });

  it('is accessible while a recording is read, and without a clip', async () => {
    await expectAccessibleInBothThemes(await barOf({ loading: 0.4 }));
    await expectAccessibleInBothThemes(await barOf({ duration: 0, overview: undefined, clipTitle: '' }));
  });

  it('plays and stops by its button', async () => {
    const bar = await barOf();
    const told = record(bar);
    expect(play(bar).getAttribute('aria-label')).to.equal('Play');
    play(bar).click();
    expect(told).to.deep.equal([{ type: 'nw-play-toggle', detail: undefined }]);
    bar.playing = true;
    await bar.updateComplete;
    expect(play(bar).getAttribute('aria-label')).to.equal('Stop');
  });

  it('plays and stops by keyboard', async () => {
    const bar = await barOf();
    const told = record(bar);
    play(bar).focus();
    await sendKeys({ press: 'Enter' });
    expect(told.map(({ type }) => type)).to.deep.equal(['nw-play-toggle']);
  });

  it('plays and stops for whoever wires the keys of the page', async () => {
    const bar = await barOf();
    const told = record(bar);
    bar.togglePlay();
    expect(told.length).to.equal(1);
  });

  it('does not play without a clip, nor while one is read', async () => {
    for (const properties of [{ duration: 0 }, { loading: 0.5 }]) {
      const bar = await barOf(properties);
      const told = record(bar);
      bar.togglePlay();
      play(bar).click();
      expect(told).to.deep.equal([]);
      expect(play(bar).disabled).to.equal(true);
    }
  });

  it('says where it is in the clip', async () => {
    const bar = await barOf();
    expect(find(bar, '.time').textContent).to.equal('0:03.1 of 0:08.0');
    bar.duration = 0;
    await bar.updateComplete;
    expect(find(bar, '.time').textContent).to.equal('no clip yet');
  });

  it('switches loop and bypass', async () => {
    const bar = await barOf();
    const told = record(bar);
    for (const words of ['Loop', 'Bypass', 'Loop']) {
      toggle(bar, words).click();
      await bar.updateComplete;
    }
    expect(told).to.deep.equal([
      { type: 'nw-loop-set', detail: { loop: true } },
      { type: 'nw-bypass-set', detail: { bypass: true } },
      { type: 'nw-loop-set', detail: { loop: false } },
    ]);
    expect(toggle(bar, 'Bypass').getAttribute('aria-pressed')).to.equal('true');
  });

  it('lets the waveform’s events through', async () => {
    const bar = await barOf();
    const told = record(bar);
    find(bar, 'nw-waveform').shadowRoot!.querySelector<HTMLElement>('.place')!.focus();
    await sendKeys({ press: 'Home' });
    expect(told).to.deep.equal([{ type: 'nw-seek', detail: { seconds: 0 } }]);
  });

  it('offers the clips and a recording of one’s own', async () => {
    const bar = await barOf();
    const told = record(bar);
    const entries = await openMenu(bar);
    expect(entries.map((entry) => entry.textContent!.trim().split('\n')[0])).to.have.length(3);
    entries[1]!.click();
    expect(told).to.deep.equal([{ type: 'nw-clip-choose', detail: { id: 'line' } }]);
  });

  it('asks for a file where one’s own is wanted', async () => {
    const bar = await barOf();
    const told = record(bar);
    let asked = 0;
    find<HTMLInputElement>(bar, 'input').click = () => {
      asked += 1;
    };
    (await openMenu(bar)).at(-1)!.click();
    expect([asked, told.length]).to.deep.equal([1, 0]);
  });

  it('hands on the file that was chosen, the same one twice too', async () => {
    const bar = await barOf();
    const told = record(bar);
    const field = find<HTMLInputElement>(bar, 'input');
    for (let round = 0; round < 2; round += 1) {
      const transfer = new DataTransfer();
      transfer.items.add(new File(['x'], 'take.wav', { type: 'audio/wav' }));
      field.files = transfer.files;
      field.dispatchEvent(new Event('change', { bubbles: true }));
    }
    expect(told.map(({ detail }) => (detail as { file: File }).file.name)).to.deep.equal([
      'take.wav',
      'take.wav',
    ]);
    expect(field.value).to.equal('');
  });

  it('does nothing when the file dialogue is left without a file', async () => {
    const bar = await barOf();
    const told = record(bar);
    find(bar, 'input').dispatchEvent(new Event('change', { bubbles: true }));
    expect(told).to.deep.equal([]);
  });

  it('shows how much of a recording has been read', async () => {
    const bar = await barOf({ loading: 0.426 });
    const progress = find(bar, '[role=progressbar]');
    expect(progress.getAttribute('aria-valuenow')).to.equal('43');
    expect(find(bar, '.loading').textContent).to.contain('43');
  });

  it('warns of loud sound until the note is put away, in words of its own', async () => {
    const bar = await barOf({ caution: true });
    const told = record(bar);
    expect(find(bar, 'nw-notice').textContent).to.contain('protect your hearing');
    find(bar, 'nw-notice').shadowRoot!.querySelector('button')!.click();
    await bar.updateComplete;
    expect(find(bar, 'nw-notice')).to.equal(null);
    expect(told.map(({ type }) => type)).to.deep.equal(['nw-hearing-read']);
  });

  it('is silent when set from code', async () => {
    const bar = await barOf();
    const told = record(bar);
    Object.assign(bar, {
      loop: true,
      bypass: true,
      playing: true,
      position: 5,
      region: { start: 1, end: 2 },
    });
    await bar.updateComplete;
    expect(told).to.deep.equal([]);
  });

  it('keeps within a phone of 320 pixels, its targets large enough', async () => {
    await setViewport({ width: 320, height: 568 });
    try {
      const bar = await barOf({ clipTitle: 'A recording with a name that goes on and on.wav', loop: true });
      await waitUntil(() => find(bar, 'nw-menu').getAttribute('label')!.length <= 14, 'the title is cut');
      await aTimeout(0);
      expect(document.documentElement.scrollWidth).to.be.at.most(320);
      const clip = find(bar, 'nw-menu').getBoundingClientRect();
      const meter = find(bar, 'nw-level-meter').getBoundingClientRect();
      expect(clip.right).to.be.at.most(meter.left);
      expect(play(bar).getBoundingClientRect().width).to.be.at.least(44);
      expect(find(bar, 'nw-waveform').getBoundingClientRect().width).to.be.at.least(120);
    } finally {
      await setViewport({ width: 800, height: 600 });
    }
  });

  it('works again after it was taken out', async () => {
    const bar = await barOf();
    const parent = bar.parentElement!;
    bar.remove();
    parent.append(bar);
    await bar.updateComplete;
    const told = record(bar);
    play(bar).click();
    expect(told.length).to.equal(1);
  });
});
