import { expect, fixture, html } from '@open-wc/testing';
import { resetMouse, sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-waveform/nw-waveform.ts';
import type { NwWaveform } from '../../../components/nw-waveform/nw-waveform.ts';
import type { Region } from '../../../src/audio/engine-types.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { mouse } from '../mouse.ts';

const WIDTH = 400;

/** A waveform of 8 s, 400 pixels wide: 50 pixels a second. */
async function waveformOf(region?: Region, duration = 8): Promise<NwWaveform> {
  setTheme(undefined);
  const high = Float32Array.from({ length: 900 }, (_, index) => Math.abs(Math.sin(index / 90)) / 2);
  const box = await fixture<HTMLElement>(
    html`<div style="width:${WIDTH}px;padding:60px;background:var(--nw-sheet)">
      <nw-waveform
        .overview=${{ high, low: high.map((value) => -value) }}
        .duration=${duration}
        .position=${2}
        .region=${region}
      ></nw-waveform>
    </div>`,
  );
  return box.querySelector('nw-waveform')!;
}

const sliders = (wave: NwWaveform): HTMLElement[] => [
  ...wave.shadowRoot!.querySelectorAll<HTMLElement>('[role=slider]'),
];
const edge = (wave: NwWaveform, name: 'start' | 'end'): HTMLElement =>
  wave.shadowRoot!.querySelector(`.grip.${name}`)!;
const head = (wave: NwWaveform): HTMLElement => wave.shadowRoot!.querySelector('.place')!;

interface Told {
  readonly type: string;
  readonly detail: unknown;
}

function record(wave: NwWaveform): Told[] {
  const told: Told[] = [];
  for (const type of ['nw-seek', 'nw-region-set'] as const) {
    wave.addEventListener(type, (event) => told.push({ type, detail: event.detail }));
  }
  return told;
}

const lastRegion = (told: Told[]) =>
  told.findLast(({ type }) => type === 'nw-region-set')!.detail as Region & { readonly settled: boolean };

/** Window coordinates of a place, at a share of the height. */
function at(wave: NwWaveform, seconds: number, height = 0.1): [number, number] {
  const box = wave.getBoundingClientRect();
  return [box.left + (seconds / 8) * WIDTH, box.top + height * box.height];
}

async function drag(wave: NwWaveform, from: number, to: number): Promise<void> {
  await mouse.move(...at(wave, from));
  await mouse.down();
  await mouse.move(...at(wave, (from + to) / 2));
  await mouse.move(...at(wave, to));
}

describe('nw-waveform', () => {
  afterEach(async () => {
    setTheme(undefined);
    await resetMouse();
  });

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes((await waveformOf({ start: 1, end: 5 })).parentElement!);
  });

  it('speaks its place and the ends of its part as times', async () => {
    const wave = await waveformOf({ start: 1, end: 5.25 });
    expect(sliders(wave).map((slider) => slider.getAttribute('aria-valuetext'))).to.deep.equal([
      '2 seconds of 8 seconds',
      '1 second',
      '5.3 seconds',
    ]);
    wave.region = undefined;
    await wave.updateComplete;
    expect(edge(wave, 'end').getAttribute('aria-valuetext')).to.equal('8 seconds');
  });

  it('goes to a place that is pressed', async () => {
    const wave = await waveformOf();
    const told = record(wave);
    await mouse.move(...at(wave, 6));
    await mouse.down();
    await mouse.up();
    expect(told.length).to.equal(1);
    // A whole pixel is a fiftieth of a second.
    expect((told[0]!.detail as { seconds: number }).seconds).to.be.closeTo(6, 0.03);
    expect(wave.region).to.equal(undefined);
  });

  it('chooses the part that is dragged over, and tells while it grows', async () => {
    const wave = await waveformOf();
    const told = record(wave);
    await drag(wave, 6, 3);
    expect(lastRegion(told).settled).to.equal(false);
    await mouse.up();
    const { start, end, settled } = lastRegion(told);
    expect([start, end].map((seconds) => Math.round(seconds * 10) / 10)).to.deep.equal([3, 6]);
    expect(settled).to.equal(true);
    expect(told.some(({ type }) => type === 'nw-seek')).to.equal(false);
    expect(wave.region).to.deep.equal({ start, end });
  });

  it('moves one end by dragging it, counted from where it was', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    // An owner that follows every move must not make it run away.
    wave.addEventListener('nw-region-set', (event) => {
      wave.region = { start: event.detail.start, end: event.detail.end };
    });
    const told = record(wave);
    await mouse.move(...at(wave, 5.2)); // beside the line, in its grip
    await mouse.down();
    for (const place of [5.7, 6.2, 6.7, 7.2]) await mouse.move(...at(wave, place));
    await mouse.up();
    expect(lastRegion(told).start).to.equal(2);
    expect(lastRegion(told).end).to.be.closeTo(7, 0.05);
  });

  it('does nothing when an end is only pressed', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const told = record(wave);
    await mouse.move(...at(wave, 5.2));
    await mouse.down();
    await mouse.up();
    expect(told).to.deep.equal([]);
  });

  it('takes both ends of the shortest part, also at the end of the clip', async () => {
    const wave = await waveformOf({ start: 7.9, end: 8 });
    const told = record(wave);
    await drag(wave, 7.9, 5);
    await mouse.up();
    expect(lastRegion(told).start).to.be.lessThan(6);
    expect(lastRegion(told).end).to.equal(8);
  });

  it('calls a drag off with Escape', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const told = record(wave);
    head(wave).focus();
    await drag(wave, 6, 7.5);
    await sendKeys({ press: 'Escape' });
    await mouse.up();
    expect(lastRegion(told)).to.deep.equal({ start: 2, end: 5, settled: true });
    expect(told.some(({ type }) => type === 'nw-seek')).to.equal(false);
  });

  it('chooses the whole by a double click', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const told = record(wave);
    wave.shadowRoot!.querySelector('.stage')!.dispatchEvent(new MouseEvent('dblclick', { bubbles: true }));
    expect(lastRegion(told)).to.deep.equal({ start: 0, end: 8, settled: true });
    expect(wave.region).to.equal(undefined);
  });

  const edgeKeys: readonly (readonly [key: string, start: number, end: number])[] = [
    ['ArrowRight', 2.1, 5.1],
    ['ArrowUp', 2.1, 5.1],
    ['ArrowLeft', 1.9, 4.9],
    ['ArrowDown', 1.9, 4.9],
    ['PageUp', 3, 6],
    ['PageDown', 1, 4],
    ['Home', 0, 2.1],
    ['End', 4.9, 8],
  ];
  for (const [key, start, end] of edgeKeys) {
    it(`moves each end by ${key}`, async () => {
      for (const [name, expected] of [
        ['start', start],
        ['end', end],
      ] as const) {
        const wave = await waveformOf({ start: 2, end: 5 });
        const told = record(wave);
        edge(wave, name).focus();
        await sendKeys({ press: key });
        // Sums of tenths are off by rounding alone.
        expect(lastRegion(told)[name]).to.be.closeTo(expected, 1e-9);
        expect(lastRegion(told).settled).to.equal(true);
      }
    });
  }

  it('moves finely with Shift', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const told = record(wave);
    edge(wave, 'start').focus();
    await sendKeys({ down: 'Shift' });
    await sendKeys({ press: 'ArrowRight' });
    await sendKeys({ up: 'Shift' });
    expect(lastRegion(told).start).to.be.closeTo(2.01, 1e-9);
  });

  it('goes to a place by keys, within the clip', async () => {
    const wave = await waveformOf();
    const told = record(wave);
    head(wave).focus();
    for (const key of ['ArrowRight', 'PageDown', 'End', 'Home']) await sendKeys({ press: key });
    expect(told.map(({ detail }) => (detail as { seconds: number }).seconds)).to.deep.equal([2.1, 1, 8, 0]);
  });

  it('chooses the whole by Delete', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const told = record(wave);
    edge(wave, 'start').focus();
    await sendKeys({ press: 'Delete' });
    expect(lastRegion(told)).to.deep.equal({ start: 0, end: 8, settled: true });
  });

  it('takes longer steps in long clips', async () => {
    const wave = await waveformOf(undefined, 1200);
    const told = record(wave);
    head(wave).focus();
    await sendKeys({ press: 'ArrowRight' });
    expect(told[0]!.detail).to.deep.equal({ seconds: 2 + 1.2 }); // a thousandth of twenty minutes
  });

  it('is silent when set from code', async () => {
    const wave = await waveformOf();
    const told = record(wave);
    Object.assign(wave, { position: 4, region: { start: 1, end: 2 } });
    await wave.updateComplete;
    expect(told).to.deep.equal([]);
  });

  it('puts its lines where the times are', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const places = ['.playhead', '.edge.start', '.edge.end'].map((selector) => {
      const { left, width } = wave.shadowRoot!.querySelector(selector)!.getBoundingClientRect();
      return (left + width / 2 - wave.getBoundingClientRect().left) / 50;
    });
    [2, 2, 5].forEach((seconds, index) => {
      expect(places[index]).to.be.closeTo(seconds, 0.02); // a pixel
    });
  });

  it('has grips at least 44 pixels high that stay inside its width', async () => {
    const wave = await waveformOf();
    const own = wave.getBoundingClientRect();
    for (const name of ['start', 'end'] as const) {
      const { left, right, height } = edge(wave, name).getBoundingClientRect();
      expect(height).to.be.at.least(44);
      expect(left).to.be.at.least(own.left - 0.5);
      expect(right).to.be.at.most(own.right + 0.5);
    }
  });

  it('shows a plain line and nothing to take while there is no clip', async () => {
    const wave = await waveformOf();
    const told = record(wave);
    Object.assign(wave, { duration: 0, overview: undefined });
    await wave.updateComplete;
    expect(sliders(wave)).to.deep.equal([]);
    await mouse.move(...at(wave, 4));
    await mouse.down();
    await mouse.up();
    expect(told).to.deep.equal([]);
  });

  it('forgets a drag when it is taken out, and works again', async () => {
    const wave = await waveformOf({ start: 2, end: 5 });
    const told = record(wave);
    await drag(wave, 6, 7);
    const parent = wave.parentElement!;
    wave.remove();
    await mouse.up();
    parent.append(wave);
    await wave.updateComplete;
    const before = told.length;
    await mouse.move(...at(wave, 6.5));
    await mouse.down();
    await mouse.up();
    expect(told.slice(before).map(({ type }) => type)).to.deep.equal(['nw-seek']);
  });
});
