import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-plot-panel/nw-plot-panel.ts';
import type { NwPlotPanel } from '../../../components/nw-plot-panel/nw-plot-panel.ts';
import { createBench } from '../../../src/bench/bench.ts';
import { lineFigures } from '../../../src/bench/line-figures.ts';
import { plotCurves } from '../../../src/bench/plot-curves.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents } from '../sample-bench.ts';

async function make(table = false): Promise<NwPlotPanel> {
  setTheme(undefined);
  const bench = createBench();
  const curves = plotCurves({
    view: 'magnitude',
    voicings: bench.voicings.value,
    active: 'A',
    pinned: undefined,
    showBlocks: false,
    sampleRate: 48_000,
    filtering: undefined,
  });
  const panel = await fixture<NwPlotPanel>(
    html`<nw-plot-panel
      style="height: 400px"
      .curves=${curves}
      .figures=${lineFigures(bench.active.value.analysis, 1000)}
      .words=${{ title: 'Level of the line', reference: '0 dB is the driver’s unloaded output.' }}
      .table=${table}
    ></nw-plot-panel>`,
  );
  return panel;
}

const toggle = (panel: NwPlotPanel, words: string): HTMLButtonElement =>
  [...panel.shadowRoot!.querySelectorAll<HTMLButtonElement>('.toggle')].find(
    (button) => button.textContent!.trim() === words,
  )!;

describe('nw-plot-panel', () => {
  it('is accessible in both themes, as a plot and as a table', async () => {
    await expectAccessibleInBothThemes(await make());
    await expectAccessibleInBothThemes(await make(true));
  });

  it('says what 0 dB is, beside the figures that people quote', async () => {
    const text = (await make()).shadowRoot!.querySelector('nw-figures')!.shadowRoot!.textContent!;
    for (const words of ['0 dB is the driver’s unloaded output', 'Mid dip', 'Level at 1', 'over 1'])
      expect(text).to.contain(words);
  });

  it('says what was asked for', async () => {
    const panel = await make();
    const told = recordEvents(panel, ['nw-pin-set', 'nw-blocks-set', 'nw-table-set', 'nw-view-set']);
    for (const words of ['Pin', 'Blocks', 'Table', 'Phase', 'Digital difference'])
      toggle(panel, words).click();
    expect(told).to.deep.equal([
      { type: 'nw-pin-set', detail: { pinned: true } },
      { type: 'nw-blocks-set', detail: { show: true } },
      { type: 'nw-table-set', detail: { show: true } },
      { type: 'nw-view-set', detail: { view: 'phase' } },
      { type: 'nw-view-set', detail: { view: 'difference' } },
    ]);
  });

  it('shows the curves in numbers at the preferred frequencies when asked', async () => {
    const panel = await make(true);
    const rows = panel.shadowRoot!.querySelector('nw-curve-table')!.shadowRoot!.querySelectorAll('tbody tr');
    expect(rows.length).to.be.at.least(30);
  });
});
