import { expect, fixture, html } from '@open-wc/testing';
import { setViewport } from '@web/test-runner-commands';
import '../../../components/nw-line/nw-line.ts';
import type { NwLine } from '../../../components/nw-line/nw-line.ts';
import { SLOTS } from '../../../src/blocks/block.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents, sampleBlock } from '../sample-bench.ts';

async function make(present: readonly string[] = ['driver', 'tone', 'power']): Promise<NwLine> {
  setTheme(undefined);
  const entries = SLOTS.map((slot) => ({ ...sampleBlock(slot), present: present.includes(slot) }));
  return fixture<NwLine>(
    html`<nw-line .entries=${entries} .chosen=${{ slot: 'tone', part: 'trebleCap' }}></nw-line>`,
  );
}

const blocks = (line: NwLine) => [...line.shadowRoot!.querySelectorAll('nw-block')];

describe('nw-line', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('shows every slot in the order of the signal', async () => {
    expect(blocks(await make()).map((entry) => entry.block.slot)).to.deep.equal([...SLOTS]);
  });

  it('tells only the block concerned which part is worked on', async () => {
    expect(blocks(await make()).map((entry) => entry.chosenPart)).to.deep.equal([
      '',
      '',
      '',
      '',
      'trebleCap',
      '',
      '',
    ]);
  });

  it('lets the events of its blocks through', async () => {
    const line = await make();
    const told = recordEvents(line, ['nw-present-set']);
    blocks(line)[0]!.shadowRoot!.querySelector('nw-switch')!.shadowRoot!.querySelector('input')!.click();
    expect(told).to.deep.equal([{ type: 'nw-present-set', detail: { slot: 'input', present: true } }]);
  });

  it('needs no horizontal scrolling, all blocks in, from 320 px on', async () => {
    for (const width of [320, 500, 900, 1300]) {
      await setViewport({ width, height: 800 });
      const line = await make(SLOTS);
      expect(document.documentElement.scrollWidth, `${width} px`).to.be.at.most(width);
      for (const block of blocks(line)) {
        expect(block.getBoundingClientRect().right, `${block.block.slot} at ${width} px`).to.be.at.most(
          line.getBoundingClientRect().right + 1,
        );
      }
      line.remove();
    }
    await setViewport({ width: 1280, height: 800 });
  });
});
