import { expect, fixture, html, nextFrame, waitUntil } from '@open-wc/testing';
import { resetMouse, sendKeys } from '@web/test-runner-commands';
import { Chart } from 'chart.js';
import '../../../components/nw-plot/nw-plot.ts';
import type { NwPlot } from '../../../components/nw-plot/nw-plot.ts';
import { plotSvg } from '../../../src/sheet/plot-svg.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { sampleCurves } from '../chart/sample-curves.ts';
import { mouse } from '../mouse.ts';

/** A plot with its chart drawn, 600 pixels wide. */
async function plotOf(curves = sampleCurves(0, 2)): Promise<NwPlot> {
  setTheme(undefined);
  const box = await fixture<HTMLElement>(
    html`<div style="width:600px;height:300px;background:var(--nw-sheet)">
      <nw-plot style="height:300px" .curves=${curves} label="Magnitude of the line"></nw-plot>
    </div>`,
  );
  const plot = box.querySelector('nw-plot')!;
  await waitUntil(() => plot.hasAttribute('drawn'), 'the chart is drawn');
  return plot;
}

const slider = (plot: NwPlot): HTMLElement => plot.shadowRoot!.querySelector('[role=slider]')!;
const canvas = (plot: NwPlot): HTMLCanvasElement => plot.shadowRoot!.querySelector('canvas')!;
const chart = (plot: NwPlot) => Chart.getChart(canvas(plot))!;

/** Two frames: one in which the element draws, one to be sure that it has. */
async function drawn(plot: NwPlot): Promise<void> {
  await plot.updateComplete;
  await nextFrame();
  await nextFrame();
}

/** Names of the cursor's events, in order. */
function record(plot: NwPlot): string[] {
  const told: string[] = [];
  for (const type of ['input', 'change']) plot.addEventListener(type, () => told.push(type));
  return told;
}

/** Window coordinates of a frequency, at the middle of the plot's height. */
function place(plot: NwPlot, frequency: number): [x: number, y: number] {
  const { left, top, height } = canvas(plot).getBoundingClientRect();
  return [left + chart(plot).scales['x']!.getPixelForValue(frequency), top + height / 2];
}

describe('nw-plot', () => {
  afterEach(async () => {
    setTheme(undefined);
    await resetMouse();
  });

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes((await plotOf()).parentElement!);
  });

  it('says what it shows', async () => {
    const label = canvas(await plotOf()).getAttribute('aria-label')!;
    expect(label).to.match(/^Magnitude of the line\. Level in dB from 10 Hz to 40 kHz\. A Voicing a: /);
    // −4 − 8·exp(−(log2(1000/560)/2)²) = −4 − 8·exp(−0.1749) = −10.72, by hand
    expect(label).to.contain('−10.7\u202fdB at 1\u202fkHz');
  });

  it('speaks the frequency and the value of every curve at the cursor', async () => {
    const plot = await plotOf();
    expect(slider(plot).getAttribute('aria-valuetext')).to.equal(
      '1\u202fkHz: A −10.7\u202fdB, B −10.8\u202fdB',
    );
    plot.quantity = 'phase';
    plot.curves = [];
    await plot.updateComplete;
    expect(slider(plot).getAttribute('aria-valuetext')).to.equal('1\u202fkHz: no curve');
  });

  const keys: readonly (readonly [key: string, frequency: number])[] = [
    ['ArrowRight', 1000 * 2 ** (1 / 12)],
    ['ArrowUp', 1000 * 2 ** (1 / 12)],
    ['ArrowLeft', 1000 / 2 ** (1 / 12)],
    ['ArrowDown', 1000 / 2 ** (1 / 12)],
    ['Shift+ArrowRight', 1000 * 2 ** (1 / 48)],
    ['PageUp', 2000],
    ['PageDown', 500],
    ['Home', 10],
    ['End', 40_000],
  ];
  for (const [key, frequency] of keys) {
    it(`moves its cursor by ${key}, and tells`, async () => {
      const plot = await plotOf();
      const told = record(plot);
      slider(plot).focus();
      const [modifier, plain] = key.startsWith('Shift+') ? ['Shift', key.slice(6)] : [undefined, key];
      if (modifier) await sendKeys({ down: modifier });
      await sendKeys({ press: plain });
      if (modifier) await sendKeys({ up: modifier });
      expect(plot.cursor).to.be.closeTo(frequency, 1e-9 * frequency);
      expect(told).to.deep.equal(['input', 'change']);
    });
  }

  it('keeps its cursor on the axis', async () => {
    const plot = await plotOf();
    slider(plot).focus();
    await sendKeys({ press: 'End' });
    await sendKeys({ press: 'PageUp' });
    expect(plot.cursor).to.equal(40_000);
  });

  it('leaves other keys to the page', async () => {
    const plot = await plotOf();
    let prevented = false;
    plot.addEventListener('keydown', (event) => {
      prevented = event.defaultPrevented;
    });
    slider(plot).focus();
    await sendKeys({ press: 'a' });
    expect([prevented, plot.cursor]).to.deep.equal([false, 1000]);
  });

  it('follows the mouse from press to release, also beyond its edge', async () => {
    const plot = await plotOf();
    const told = record(plot);
    await mouse.move(...place(plot, 100));
    await mouse.down();
    // A pixel is about a sixtieth of an octave here; window coordinates are whole pixels.
    expect(plot.cursor).to.be.closeTo(100, 2);
    await mouse.move(...place(plot, 5000));
    expect(plot.cursor).to.be.closeTo(5000, 100);
    const { right } = plot.getBoundingClientRect();
    await mouse.move(right + 80, 5);
    expect(plot.cursor).to.equal(40_000);
    expect(told).not.to.contain('change');
    await mouse.up();
    expect(told.at(-1)).to.equal('change');
    const before = told.length;
    await mouse.move(...place(plot, 200));
    expect([plot.cursor, told.length]).to.deep.equal([40_000, before]);
    expect(plot.shadowRoot!.activeElement).to.equal(slider(plot));
  });

  it('is silent when the cursor is set from code', async () => {
    const plot = await plotOf();
    const told = record(plot);
    plot.cursor = 200;
    await drawn(plot);
    expect(told).to.deep.equal([]);
    expect(slider(plot).getAttribute('aria-valuenow')).to.equal('200');
  });

  it('lets its axis only grow while something moves, and settles it after', async () => {
    const plot = await plotOf();
    const range = () => [chart(plot).scales['y']!.min, chart(plot).scales['y']!.max];
    expect(range()).to.deep.equal([-24, 0]);
    plot.moving = true;
    plot.curves = sampleCurves(10, 2);
    await drawn(plot);
    expect(range()).to.deep.equal([-24, 12]);
    plot.curves = sampleCurves(-20, 2);
    await drawn(plot);
    expect(range()).to.deep.equal([-42, 12]); // the curves alone would take −42 … −18
    plot.moving = false;
    await drawn(plot);
    // The highest point lies a little under −24, the least axis is 24 dB long.
    expect(range()).to.deep.equal([-42, -18]);
  });

  it('takes the axis of another quantity at once, even while something moves', async () => {
    const plot = await plotOf();
    plot.moving = true;
    plot.quantity = 'phase';
    await drawn(plot);
    expect([chart(plot).scales['y']!.min, chart(plot).scales['y']!.max]).to.deep.equal([-45, 45]);
  });

  it('draws only once for many changes in a frame', async () => {
    const plot = await plotOf();
    await drawn(plot);
    let draws = 0;
    const own = chart(plot).update.bind(chart(plot));
    chart(plot).update = (mode) => {
      draws += 1;
      own(mode);
    };
    for (let step = 1; step <= 5; step += 1) {
      plot.curves = sampleCurves(-step, 2);
      await plot.updateComplete;
    }
    await drawn(plot);
    // A frame may end between two of the changes on a busy machine; five draws would be one each.
    expect(draws).to.be.within(1, 4);
  });

  it('reads its colours anew when the theme changes', async () => {
    setTheme('light');
    const plot = await plotOf();
    setTheme('dark');
    await nextFrame();
    await drawn(plot);
    expect(chart(plot).data.datasets[0]!.borderColor).to.equal(
      getComputedStyle(plot).getPropertyValue('--nw-curve-a').trim(),
    );
  });

  it('follows its size', async () => {
    const plot = await plotOf();
    plot.parentElement!.style.width = '420px';
    // Sizes are observed frame by frame, and frames are rare where several pages are tested at once.
    await waitUntil(() => chart(plot).width === 420, 'the chart is as wide as its place', {
      timeout: 10_000,
    });
    expect(canvas(plot).width).to.equal(Math.round(420 * devicePixelRatio));
  });

  it('gives its chart back when it is taken out, and makes it again', async () => {
    const plot = await plotOf();
    const parent = plot.parentElement!;
    const before = Object.keys(Chart.instances).length;
    for (let round = 0; round < 3; round += 1) {
      plot.remove();
      expect(chart(plot)).to.equal(undefined);
      expect(Object.keys(Chart.instances).length).to.equal(before - 1);
      plot.curves = sampleCurves(-round, 1);
      parent.append(plot);
      await waitUntil(() => plot.hasAttribute('drawn'), 'drawn again');
      expect(chart(plot).data.datasets.length).to.equal(1);
    }
    expect(Object.keys(Chart.instances).length).to.equal(before);
  });

  it('may be taken out before its library has come', async () => {
    const plot = document.createElement('nw-plot');
    document.body.append(plot);
    plot.remove();
    await import('../../../components/chart/plot-chart.ts');
    await nextFrame();
    expect(chart(plot as NwPlot)).to.equal(undefined);
  });

  it('draws on when values are not finite', async () => {
    const [curve] = sampleCurves(0, 1);
    const values = curve!.values.map((value, index) => (index % 7 === 0 ? Number.NEGATIVE_INFINITY : value));
    const plot = await plotOf([{ ...curve!, values }]);
    expect([chart(plot).scales['y']!.min, chart(plot).scales['y']!.max]).to.deep.equal([-24, 0]);
  });

  it('makes a picture on white, twice the size, in the dark theme too', async () => {
    setTheme('dark');
    const plot = await plotOf();
    const blob = await plot.toPng('Attic amplifier', '0 dB is the input');
    const bitmap = await createImageBitmap(blob);
    const svg = plotSvg(plot.curves, {
      title: 'Attic amplifier',
      quantity: 'magnitude',
      reference: '0 dB is the input',
    });
    const height = Number(/height="(\d+)"/.exec(svg)![1]);
    expect([bitmap.width, bitmap.height]).to.deep.equal([1600, 2 * height]);
    const context = new OffscreenCanvas(1, 1).getContext('2d')!;
    context.drawImage(bitmap, 0, 0);
    expect([...context.getImageData(0, 0, 1, 1).data]).to.deep.equal([255, 255, 255, 255]);
  });
});

describe('a plot as SVG, read by the browser', () => {
  it('is well-formed and names itself', () => {
    const text = plotSvg(sampleCurves(), {
      title: 'A & B <x>',
      quantity: 'magnitude',
      reference: 'what 0 dB is',
    });
    const parsed = new DOMParser().parseFromString(text, 'image/svg+xml');
    expect(parsed.querySelector('parsererror')).to.equal(null);
    const svg = parsed.documentElement;
    expect(svg.localName).to.equal('svg');
    expect(svg.querySelector('title')!.textContent).to.equal('A & B <x>');
    for (const id of svg.getAttribute('aria-labelledby')!.split(' ')) {
      expect(parsed.getElementById(id)!.textContent).not.to.equal('');
    }
    expect(svg.querySelectorAll('g path').length).to.equal(6);
  });

  it('keeps all its words inside the picture', async () => {
    for (const width of [360, 800]) {
      const labels = sampleCurves().map((curve) => ({ ...curve, label: 'A rather long name for a voicing' }));
      const box = await fixture<HTMLElement>(html`<div></div>`);
      box.innerHTML = plotSvg(labels, {
        title: 'Attic amplifier',
        quantity: 'magnitude',
        reference: '0 dB',
        width,
      });
      const edge = box.querySelector('svg')!.getBoundingClientRect();
      for (const words of box.querySelectorAll('text')) {
        const { left, right, top, bottom } = words.getBoundingClientRect();
        expect(left, words.textContent!).to.be.at.least(edge.left);
        expect(right, words.textContent!).to.be.at.most(edge.right);
        expect(top, words.textContent!).to.be.at.least(edge.top);
        expect(bottom, words.textContent!).to.be.at.most(edge.bottom);
      }
    }
  });
});
