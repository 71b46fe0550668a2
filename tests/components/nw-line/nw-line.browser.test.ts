import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys, setViewport } from '@web/test-runner-commands';
import type { NwBlock } from '../../../components/nw-block/nw-block.ts';
import '../../../components/nw-line/nw-line.ts';
import type { LineEntry, NwLine } from '../../../components/nw-line/nw-line.ts';
import { SLOTS } from '../../../src/blocks/block.ts';
import { blocksOf, defaultVariant } from '../../../src/blocks/catalogue.ts';
import { defaultSettings } from '../../../src/blocks/settings.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

/** A line of the catalogue's first blocks, in the order of the signal. */
function entriesOf(present: readonly string[]): LineEntry[] {
  return SLOTS.map((slot) => {
    const block = defaultVariant(slot);
    return {
      block,
      settings: defaultSettings(block),
      present: present.includes(slot),
      variants: blocksOf(slot),
    };
  });
}

const DEFAULT_LINE = ['driver', 'tone', 'power'];

describe('nw-line', () => {
  const make = async (present: readonly string[] = DEFAULT_LINE): Promise<NwLine> => {
    setTheme(undefined);
    return fixture<NwLine>(
      html`<nw-line .entries=${entriesOf(present)}><p slot="power">The loop may ring.</p></nw-line>`,
    );
  };
  const blocks = (line: NwLine): NwBlock[] => [...line.shadowRoot!.querySelectorAll('nw-block')];

  afterEach(async () => setViewport({ width: 1280, height: 900 }));

  it('is accessible in both themes, with blocks out of the line and with all in it', async () => {
    await expectAccessibleInBothThemes(await make());
    await expectAccessibleInBothThemes(await make(SLOTS));
  });

  it('has its blocks in the order of the signal, as a list', async () => {
    const line = await make();
    expect(blocks(line).map(({ block }) => block.slot)).to.deep.equal([...SLOTS]);
    expect(
      blocks(line)
        .filter(({ present }) => present)
        .map(({ block }) => block.slot),
    ).to.deep.equal(DEFAULT_LINE);
    expect(line.shadowRoot!.querySelectorAll('ol > li').length).to.equal(SLOTS.length);
  });

  for (const width of [320, 500, 760, 1052, 1440]) {
    it(`is never wider than its place: ${width} pixels`, async () => {
      await setViewport({ width, height: 900 });
      for (const present of [DEFAULT_LINE, SLOTS, []]) {
        const line = await make(present);
        await line.updateComplete;
        expect(document.documentElement.scrollWidth, present.join()).to.be.at.most(width);
        for (const block of blocks(line)) {
          const { left, right } = block.getBoundingClientRect();
          expect(left, block.block.slot).to.be.at.least(line.getBoundingClientRect().left - 0.5);
          expect(right, block.block.slot).to.be.at.most(line.getBoundingClientRect().right + 0.5);
          expect(block.scrollWidth, block.block.slot).to.be.at.most(Math.ceil(block.clientWidth));
        }
        line.remove();
      }
    });
  }

  it('stacks its blocks in a narrow place, the three knobs still beside each other', async () => {
    await setViewport({ width: 320, height: 900 });
    const line = await make();
    const rights = blocks(line).map((block) => Math.round(block.getBoundingClientRect().right));
    expect(new Set(rights).size).to.equal(1);
    const tops = [...blocks(line)[4]!.shadowRoot!.querySelectorAll('nw-knob')].map(
      (knob) => knob.getBoundingClientRect().top,
    );
    expect([tops.length, new Set(tops).size]).to.deep.equal([3, 1]);
  });

  it('sets the blocks in the line beside each other in a wide one, equally tall', async () => {
    await setViewport({ width: 1440, height: 900 });
    const line = await make();
    const [driver, tone, power] = blocks(line)
      .filter(({ present }) => present)
      .map((block) => block.getBoundingClientRect());
    expect([tone!.top, power!.top, tone!.bottom, power!.bottom]).to.deep.equal([
      driver!.top,
      driver!.top,
      driver!.bottom,
      driver!.bottom,
    ]);
    expect([driver!.right < tone!.left, tone!.right < power!.left]).to.deep.equal([true, true]);
    expect(tone!.width).to.be.above(driver!.width);
  });

  it('outlines the part being worked on in its own block only', async () => {
    const line = await make();
    line.chosen = { slot: 'tone', part: 'trebleCap' };
    await line.updateComplete;
    expect(blocks(line).map(({ chosenPart }) => chosenPart)).to.deep.equal([
      '',
      '',
      '',
      '',
      'trebleCap',
      '',
      '',
    ]);
  });

  it('hands a block what it has to say', async () => {
    const line = await make();
    const slot = line.shadowRoot!.querySelector<HTMLSlotElement>('slot[name=power]')!;
    expect(slot.assignedElements().map(({ textContent }) => textContent)).to.deep.equal([
      'The loop may ring.',
    ]);
    expect(slot.assignedElements()[0]!.getBoundingClientRect().height).to.be.above(0);
  });

  it('hands on variants and whether a block must stay', async () => {
    const line = await make();
    line.entries = line.entries.map((entry) => ({ ...entry, removable: entry.block.slot !== 'tone' }));
    await line.updateComplete;
    const tone = blocks(line)[4]!;
    expect([tone.variants, tone.removable, blocks(line)[3]!.removable]).to.deep.equal([
      blocksOf('tone'),
      false,
      true,
    ]);
  });

  it('lets its blocks’ events through, and none of its own when code sets it', async () => {
    const line = await make();
    const told: unknown[] = [];
    for (const name of ['nw-knob-move', 'nw-present-set'] as const) {
      line.addEventListener(name, (event) => told.push([name, event.detail.slot]));
    }
    line.entries = entriesOf(SLOTS);
    await line.updateComplete;
    expect(told).to.deep.equal([]);
    const parent = line.parentElement!;
    line.remove();
    parent.append(line);
    blocks(line)[4]!.shadowRoot!.querySelector('nw-knob')!.focus();
    await sendKeys({ press: 'ArrowUp' });
    blocks(line)[0]!.shadowRoot!.querySelector('nw-switch')!.shadowRoot!.querySelector('input')!.click();
    expect(told).to.deep.equal([
      ['nw-knob-move', 'tone'],
      ['nw-knob-move', 'tone'],
      ['nw-present-set', 'input'],
    ]);
  });
});
