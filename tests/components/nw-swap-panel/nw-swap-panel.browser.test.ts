import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-swap-panel/nw-swap-panel.ts';
import type { NwSwapPanel } from '../../../components/nw-swap-panel/nw-swap-panel.ts';
import { createBench } from '../../../src/bench/bench.ts';
import { SwapSession } from '../../../src/bench/swap-session.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents } from '../sample-bench.ts';

const TYPES = ['nw-swap-try', 'nw-swap-keep', 'nw-swap-end', 'nw-part-set'];

async function make(tried?: number): Promise<NwSwapPanel> {
  setTheme(undefined);
  const bench = createBench();
  const session = new SwapSession(bench.store, bench.settled);
  session.choose('tone', 'trebleCap');
  return fixture<NwSwapPanel>(
    html`<nw-swap-panel .subject=${session.subject.value} .tried=${tried} nextLetter="B"></nw-swap-panel>`,
  );
}

const keys = (panel: NwSwapPanel): HTMLButtonElement[] => [
  ...panel.shadowRoot!.querySelectorAll<HTMLButtonElement>('.key'),
];

describe('nw-swap-panel', () => {
  it('is accessible in both themes: empty, with a part, with a value tried', async () => {
    setTheme(undefined);
    await expectAccessibleInBothThemes(await fixture(html`<nw-swap-panel></nw-swap-panel>`));
    await expectAccessibleInBothThemes(await make());
    await expectAccessibleInBothThemes(await make(470e-12));
  });

  it('lists the neighbours with what each would change, and the cautions', async () => {
    const panel = await make();
    const rows = [...panel.shadowRoot!.querySelectorAll('tbody tr')].map(
      (row) => row.querySelector('th')!.textContent,
    );
    expect(rows).to.deep.equal(
      ['220', '270', '330', '390', '470', '560', '680'].map((value) => `${value}\u202fpF`),
    );
    expect(panel.shadowRoot!.querySelector('tr.present')!.textContent).to.contain('now');
    expect(panel.shadowRoot!.textContent).to.contain('hundreds of volts');
  });

  it('says which value is to be heard, kept or put back', async () => {
    const panel = await make(470e-12);
    const told = recordEvents(panel, TYPES);
    keys(panel)[5]!.click();
    keys(panel)[4]!.click();
    for (const button of panel.shadowRoot!.querySelectorAll<HTMLButtonElement>('.actions .button'))
      button.click();
    expect(told).to.deep.equal([
      { type: 'nw-swap-try', detail: { value: 560e-12 } },
      { type: 'nw-swap-end', detail: undefined },
      { type: 'nw-swap-keep', detail: { value: 470e-12, into: 'present' } },
      { type: 'nw-swap-keep', detail: { value: 470e-12, into: 'voicing' } },
      { type: 'nw-swap-end', detail: undefined },
    ]);
  });

  it('takes a typed value', async () => {
    const panel = await make();
    const told = recordEvents(panel, TYPES);
    panel.shadowRoot!.querySelector('nw-value-field')!.shadowRoot!.querySelectorAll('button')[1]!.click();
    expect(told).to.deep.equal([
      { type: 'nw-part-set', detail: { slot: 'tone', part: 'trebleCap', value: 470e-12 } },
    ]);
  });
});
