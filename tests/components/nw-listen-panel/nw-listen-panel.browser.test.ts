import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-listen-panel/nw-listen-panel.ts';
import type { NwListenPanel } from '../../../components/nw-listen-panel/nw-listen-panel.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents } from '../sample-bench.ts';

async function make(): Promise<NwListenPanel> {
  setTheme(undefined);
  const voicings = [
    { letter: 'A', name: 'Stock', gain: 5.34 },
    { letter: 'B', name: 'Dark', gain: -1.2 },
    { letter: 'C', name: 'Off', gain: undefined },
  ];
  return fixture<NwListenPanel>(
    html`<nw-listen-panel .matched=${true} .rate=${48_000} .voicings=${voicings}></nw-listen-panel>`,
  );
}

describe('nw-listen-panel', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('shows what matching does to each voicing', async () => {
    const gains = [...(await make()).shadowRoot!.querySelectorAll('dd')].map((entry) => entry.textContent);
    expect(gains).to.deep.equal(['+5.3 dB', '−1.2 dB', 'silent']);
  });

  it('says that matching was switched and another rate chosen', async () => {
    const panel = await make();
    const told = recordEvents(panel, ['nw-matched-set', 'nw-rate-set']);
    panel.shadowRoot!.querySelector('nw-switch')!.shadowRoot!.querySelector('input')!.click();
    const select = panel.shadowRoot!.querySelector('select')!;
    select.value = '192000';
    select.dispatchEvent(new Event('change'));
    expect(told).to.deep.equal([
      { type: 'nw-matched-set', detail: { matched: false } },
      { type: 'nw-rate-set', detail: { rate: 192_000 } },
    ]);
  });
});
