import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-parts-drawer/nw-parts-drawer.ts';
import type { NwPartsDrawer } from '../../../components/nw-parts-drawer/nw-parts-drawer.ts';
import { blocksOf } from '../../../src/blocks/catalogue.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents, sampleBlock } from '../sample-bench.ts';

async function make(): Promise<NwPartsDrawer> {
  setTheme(undefined);
  const { block, settings } = sampleBlock('tone');
  return fixture<NwPartsDrawer>(
    html`<nw-parts-drawer .block=${block} .settings=${settings} .variants=${blocksOf('tone')}></nw-parts-drawer>`,
  );
}

const dialog = (drawer: NwPartsDrawer): HTMLDialogElement => drawer.shadowRoot!.querySelector('dialog')!;
const select = (drawer: NwPartsDrawer, index: number): HTMLSelectElement =>
  [...drawer.shadowRoot!.querySelectorAll('select')][index]!;

function choose(element: HTMLSelectElement, value: string): void {
  element.value = value;
  element.dispatchEvent(new Event('change', { bubbles: true }));
}

describe('nw-parts-drawer', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('opens with its block, closes on Escape and by its button, and says so', async () => {
    const drawer = await make();
    let closed = 0;
    drawer.addEventListener('close', () => {
      closed += 1;
    });
    expect(dialog(drawer).open).to.equal(true);
    await sendKeys({ press: 'Escape' });
    await new Promise((resolve) => setTimeout(resolve, 50));
    expect([dialog(drawer).open, closed]).to.deep.equal([false, 1]);
  });

  it('lists every part in use with help, and the cautions', async () => {
    const drawer = await make();
    const text = drawer.shadowRoot!.textContent!;
    for (const words of [
      'Treble capacitor',
      'Slope resistor',
      'Raise it and',
      'hundreds of volts',
      'electrical code',
    ]) {
      expect(text, words).to.contain(words);
    }
  });

  it('says which circuit, choice, part and taper were set', async () => {
    const drawer = await make();
    const told = recordEvents(drawer, ['nw-variant-set', 'nw-choice-set', 'nw-part-set', 'nw-taper-set']);
    choose(select(drawer, 0), 'james');
    choose(select(drawer, 1), 'rheostat');
    const taper = [...drawer.shadowRoot!.querySelectorAll<HTMLSelectElement>('.taper select')][0]!;
    choose(taper, 'audio');
    const field = drawer.shadowRoot!.querySelector('nw-value-field')!;
    field.shadowRoot!.querySelectorAll('button')[1]!.click();
    expect(told).to.deep.equal([
      { type: 'nw-variant-set', detail: { slot: 'tone', variant: 'james' } },
      { type: 'nw-choice-set', detail: { slot: 'tone', choice: 'middleWiring', value: 'rheostat' } },
      {
        type: 'nw-taper-set',
        detail: { slot: 'tone', knob: 'treble', taper: { law: 'audio', midpoint: 0.15 } },
      },
      { type: 'nw-part-set', detail: { slot: 'tone', part: 'treblePot', value: 270e3 } },
    ]);
  });

  it('can be closed and opened again', async () => {
    const drawer = await make();
    const { block } = drawer;
    drawer.block = undefined;
    await drawer.updateComplete;
    expect(dialog(drawer).open).to.equal(false);
    drawer.block = block;
    await drawer.updateComplete;
    expect(dialog(drawer).open).to.equal(true);
  });
});
