import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-block/nw-block.ts';
import type { NwBlock } from '../../../components/nw-block/nw-block.ts';
import { withPart } from '../../../src/blocks/settings.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents, sampleBlock } from '../sample-bench.ts';

async function make(present = true): Promise<NwBlock> {
  setTheme(undefined);
  const { block, settings } = sampleBlock('tone');
  return fixture<NwBlock>(
    html`<nw-block .block=${block} .settings=${settings} .present=${present}></nw-block>`,
  );
}

const TYPES = ['nw-knob-move', 'nw-part-choose', 'nw-present-set', 'nw-drawer-open'];

describe('nw-block', () => {
  it('is accessible in both themes, in the line and out of it', async () => {
    await expectAccessibleInBothThemes(await make());
    await expectAccessibleInBothThemes(await make(false));
  });

  it('shows knobs with their resistances, parts with their values, and what it is doing', async () => {
    const element = await make();
    const knobs = [...element.shadowRoot!.querySelectorAll('nw-knob')];
    expect(knobs.map((knob) => `${knob.label} ${knob.readout}`)).to.deep.equal([
      'Treble 150k · 100k',
      'Bass 75k · 425k',
      'Middle 12k5 · 12k5',
    ]);
    const chips = [...element.shadowRoot!.querySelectorAll('nw-part-chip')];
    expect(chips.map((chip) => `${chip.label} ${chip.value}`)).to.include('Treble cap 390\u202fpF');
    expect(element.shadowRoot!.querySelector('.doing')!.textContent).to.equal('three knobs, mid to wiper');
  });

  it('says which knob moved and whether it has settled', async () => {
    const element = await make();
    const told = recordEvents(element, TYPES);
    element.shadowRoot!.querySelector('nw-knob')!.focus();
    await sendKeys({ press: 'ArrowUp' });
    expect(told).to.deep.equal([
      { type: 'nw-knob-move', detail: { slot: 'tone', knob: 'treble', position: 0.61, settled: false } },
      { type: 'nw-knob-move', detail: { slot: 'tone', knob: 'treble', position: 0.61, settled: true } },
    ]);
  });

  it('says which part was pressed, that it was taken out, and that its name was pressed', async () => {
    const element = await make();
    const told = recordEvents(element, TYPES);
    element.shadowRoot!.querySelector('nw-part-chip')!.shadowRoot!.querySelector('button')!.click();
    element.shadowRoot!.querySelector('nw-switch')!.shadowRoot!.querySelector('input')!.click();
    element.shadowRoot!.querySelector<HTMLElement>('.name')!.click();
    expect(told).to.deep.equal([
      { type: 'nw-part-choose', detail: { slot: 'tone', part: 'slope' } },
      { type: 'nw-present-set', detail: { slot: 'tone', present: false } },
      { type: 'nw-drawer-open', detail: { slot: 'tone' } },
    ]);
  });

  it('follows its settings without saying anything', async () => {
    const element = await make();
    const told = recordEvents(element, TYPES);
    element.settings = withPart(element.settings, 'trebleCap', 1e-9);
    await element.updateComplete;
    const values = [...element.shadowRoot!.querySelectorAll('nw-part-chip')].map((chip) => chip.value);
    expect(values).to.include('1\u202fnF');
    expect(told).to.deep.equal([]);
  });
});
