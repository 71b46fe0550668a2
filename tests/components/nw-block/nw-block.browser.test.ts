import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import type { BenchEvents } from '../../../components/events.ts';
import '../../../components/nw-block/nw-block.ts';
import type { NwBlock } from '../../../components/nw-block/nw-block.ts';
import type { NwKnob } from '../../../components/nw-knob/nw-knob.ts';
import { defaultSettings } from '../../../src/blocks/settings.ts';
import { toneJames } from '../../../src/blocks/tone-james.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

const VARIANTS = [toneThreeKnob, toneJames];

/** Everything the block says, as it arrives outside a further shadow root. */
function record(element: Element): [name: string, detail: unknown][] {
  const told: [string, unknown][] = [];
  const names: readonly (keyof BenchEvents)[] = [
    'nw-knob-move',
    'nw-part-choose',
    'nw-present-set',
    'nw-variant-set',
    'nw-drawer-open',
  ];
  for (const name of names) {
    element.parentElement!.addEventListener(name, (event) =>
      told.push([name, (event as CustomEvent).detail]),
    );
  }
  return told;
}

describe('nw-block', () => {
  const make = async (present = true): Promise<NwBlock> => {
    setTheme(undefined);
    return fixture<NwBlock>(
      html`<nw-block
        .block=${toneThreeKnob}
        .settings=${defaultSettings(toneThreeKnob)}
        .present=${present}
        .variants=${VARIANTS}
        ><p>Beside it</p></nw-block
      >`,
    );
  };
  const inside = <Found extends Element = HTMLElement>(block: NwBlock, selector: string): Found =>
    block.shadowRoot!.querySelector<Found>(selector)!;
  const knobs = (block: NwBlock): NwKnob[] => [...block.shadowRoot!.querySelectorAll('nw-knob')];
  const chips = (block: NwBlock): string[] =>
    [...block.shadowRoot!.querySelectorAll('nw-part-chip')].map(({ label, value }) => `${label} ${value}`);

  it('is accessible in both themes, in the line and out of it', async () => {
    await expectAccessibleInBothThemes(await make());
    await expectAccessibleInBothThemes(await make(false));
  });

  it('shows its name, what it does now, its knobs with resistances and its parts with values', async () => {
    const block = await make();
    expect(inside(block, '.name').textContent!.trim()).to.equal('Tone network');
    expect(inside(block, '.doing').textContent).to.contain('three knobs, mid to wiper');
    expect(knobs(block).map(({ label, position, readout }) => [label, position, readout])).to.deep.equal([
      ['Treble', 0.6, '150k · 100k'],
      ['Bass', 0.5, '75k of 500k'],
      ['Middle', 0.5, '12k5 · 12k5'],
    ]);
    expect(chips(block)).to.include.members(['Treble cap 390\u202fpF', 'Slope 47\u202fkΩ']);
  });

  it('leaves out the potentiometers, which its knobs show, and parts that its wiring does not use', async () => {
    const block = await make();
    expect(chips(block).join()).not.to.contain('pot');
    const before = chips(block).length;
    block.settings = { ...block.settings, choices: { ...block.settings.choices, load: 'none' } };
    await block.updateComplete;
    expect(chips(block).length).to.be.below(before);
  });

  it('keeps only name and switch out of the line', async () => {
    const block = await make(false);
    expect([knobs(block).length, chips(block).length, inside(block, '.doing')]).to.deep.equal([0, 0, null]);
    expect(inside(block, 'nw-switch')).not.to.equal(null);
  });

  it('tells of a knob while it moves and when it has settled', async () => {
    const block = await make();
    const told = record(block);
    knobs(block)[0]!.focus();
    await sendKeys({ press: 'ArrowUp' });
    const move = { slot: 'tone', knob: 'treble', position: 0.61 };
    expect(told).to.deep.equal([
      ['nw-knob-move', { ...move, settled: false }],
      ['nw-knob-move', { ...move, settled: true }],
    ]);
  });

  it('puts a knob back where nobody outside took the move over', async () => {
    const block = await make();
    knobs(block)[0]!.focus();
    await sendKeys({ press: 'End' });
    block.requestUpdate();
    await block.updateComplete;
    expect(knobs(block)[0]!.position).to.equal(0.6);
  });

  it('tells which part was pressed and outlines the chosen one', async () => {
    const block = await make();
    const told = record(block);
    const chip = [...block.shadowRoot!.querySelectorAll('nw-part-chip')].find(
      ({ label }) => label === 'Treble cap',
    )!;
    chip.shadowRoot!.querySelector('button')!.focus();
    await sendKeys({ press: 'Enter' });
    expect(told).to.deep.equal([['nw-part-choose', { slot: 'tone', part: 'trebleCap' }]]);
    expect(chip.chosen).to.equal(false);
    block.chosenPart = 'trebleCap';
    await block.updateComplete;
    expect(chip.chosen).to.equal(true);
  });

  it('is taken out of the line by its switch, unless it must stay', async () => {
    const block = await make();
    const told = record(block);
    inside(inside<NwBlock>(block, 'nw-switch'), 'input').focus();
    await sendKeys({ press: 'Space' });
    expect(told).to.deep.equal([['nw-present-set', { slot: 'tone', present: false }]]);
    block.removable = false;
    await block.updateComplete;
    expect(inside(block, 'nw-switch')).to.equal(null);
  });

  it('offers other circuits behind what it does now, and only where there are several', async () => {
    const block = await make();
    const told = record(block);
    const select = inside<HTMLSelectElement>(block, 'select');
    expect([...select.options].map(({ value }) => value)).to.deep.equal(['three-knob', 'james']);
    expect(select.value).to.equal('three-knob');
    select.focus();
    await sendKeys({ press: 'ArrowDown' });
    expect(told).to.deep.equal([['nw-variant-set', { slot: 'tone', variant: 'james' }]]);
    block.variants = [toneThreeKnob];
    await block.updateComplete;
    expect([inside(block, 'select'), inside(block, '.doing').textContent]).to.deep.equal([
      null,
      'three knobs, mid to wiper',
    ]);
  });

  it('shows the circuit in force again where another was chosen and not taken', async () => {
    const block = await make();
    const select = inside<HTMLSelectElement>(block, 'select');
    select.value = 'james';
    select.dispatchEvent(new Event('change', { bubbles: true }));
    block.requestUpdate();
    await block.updateComplete;
    expect(select.value).to.equal('three-knob');
  });

  it('opens its parts by its name', async () => {
    const block = await make();
    const told = record(block);
    inside(block, '.name').focus();
    await sendKeys({ press: 'Enter' });
    expect(told).to.deep.equal([['nw-drawer-open', { slot: 'tone' }]]);
  });

  it('shows what is put into it while it is in the line', async () => {
    const block = await make();
    const slot = inside<HTMLSlotElement>(block, 'slot:not([name])');
    expect(slot.assignedElements().map(({ textContent }) => textContent)).to.deep.equal(['Beside it']);
  });

  it('says nothing when code sets it, and works after being moved in the page', async () => {
    const block = await make();
    const told = record(block);
    block.settings = {
      ...block.settings,
      knobs: { ...block.settings.knobs, treble: defaultSettings(toneThreeKnob).knobs['bass']! },
    };
    block.present = false;
    await block.updateComplete;
    block.present = true;
    await block.updateComplete;
    expect(told).to.deep.equal([]);
    const parent = block.parentElement!;
    block.remove();
    parent.append(block);
    knobs(block)[0]!.focus();
    await sendKeys({ press: 'Home' });
    expect(told.length).to.equal(2);
  });
});
