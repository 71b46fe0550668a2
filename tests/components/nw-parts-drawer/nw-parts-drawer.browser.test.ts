import { expect, fixture, html, waitUntil } from '@open-wc/testing';
import { sendKeys, setViewport } from '@web/test-runner-commands';
import type { BenchEvents } from '../../../components/events.ts';
import '../../../components/nw-parts-drawer/nw-parts-drawer.ts';
import type { NwPartsDrawer } from '../../../components/nw-parts-drawer/nw-parts-drawer.ts';
import type { NwValueField } from '../../../components/nw-value-field/nw-value-field.ts';
import type { Block } from '../../../src/blocks/block.ts';
import { defaultSettings } from '../../../src/blocks/settings.ts';
import { toneJames } from '../../../src/blocks/tone-james.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { mouse } from '../mouse.ts';

function record(element: Element): [name: string, detail: unknown][] {
  const told: [string, unknown][] = [];
  const names: readonly (keyof BenchEvents)[] = [
    'nw-part-set',
    'nw-choice-set',
    'nw-taper-set',
    'nw-variant-set',
  ];
  for (const name of names) {
    element.parentElement!.addEventListener(name, (event) =>
      told.push([name, (event as CustomEvent).detail]),
    );
  }
  element.addEventListener('close', () => told.push(['close', undefined]));
  return told;
}

describe('nw-parts-drawer', () => {
  const make = async (block: Block | undefined = toneThreeKnob): Promise<NwPartsDrawer> => {
    setTheme(undefined);
    const drawer = await fixture<NwPartsDrawer>(
      html`<nw-parts-drawer
        .block=${block}
        .settings=${block && defaultSettings(block)}
        .variants=${[toneThreeKnob, toneJames]}
        ><p slot="drawing">Drawing</p>
        <p slot="stress">Stress</p></nw-parts-drawer
      >`,
    );
    return drawer;
  };
  const all = <Found extends Element = HTMLElement>(drawer: NwPartsDrawer, selector: string): Found[] => [
    ...drawer.shadowRoot!.querySelectorAll<Found>(selector),
  ];
  const dialog = (drawer: NwPartsDrawer): HTMLDialogElement => all<HTMLDialogElement>(drawer, 'dialog')[0]!;
  const field = (drawer: NwPartsDrawer, label: string): NwValueField =>
    all<NwValueField>(drawer, 'nw-value-field').find((entry) => entry.label === label)!;
  const pick = (select: HTMLSelectElement, value: string): void => {
    select.value = value;
    select.dispatchEvent(new Event('change', { bubbles: true }));
  };
  /** A closing dialog tells of it in a task of its own. */
  const afterTasks = (): Promise<void> => new Promise((resolve) => setTimeout(resolve, 20));
  const midpoint = (drawer: NwPartsDrawer): HTMLInputElement =>
    all<HTMLInputElement>(drawer, 'input[type=number]')[0]!;
  const type = (input: HTMLInputElement, value: string): void => {
    input.value = value;
    input.dispatchEvent(new Event('change', { bubbles: true }));
  };

  afterEach(async () => setViewport({ width: 1280, height: 900 }));

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('lists its parts with designator, name, help and value, and how a taper runs', async () => {
    const drawer = await make();
    expect(
      all(drawer, '.designator')
        .map(({ textContent }) => textContent)
        .slice(0, 5),
    ).to.deep.equal(['VR1', 'VR2', 'VR3', 'R1', 'C1']);
    const row = all(drawer, 'li')[4]!;
    expect(row.textContent).to.contain('Treble capacitor').and.to.contain('Raise it and');
    expect(field(drawer, 'Treble capacitor').value).to.equal(390e-12);
    expect(all<HTMLSelectElement>(drawer, '.taper select').map(({ value }) => value)).to.deep.equal([
      'linear',
      'audio',
      'linear',
    ]);
    expect(midpoint(drawer).value).to.equal('15');
  });

  it('says beside the parts what can kill', async () => {
    const drawer = await make();
    const words = all(drawer, 'nw-notice[kind=caution]')[0]!.textContent!;
    for (const fact of [/hundreds of volts/, /unplugged/, /charge/, /qualified/, /electrical code/]) {
      expect(words).to.match(fact);
    }
  });

  it('tells of a new value, another option, another circuit', async () => {
    const drawer = await make();
    const told = record(drawer);
    const treble = field(drawer, 'Treble capacitor');
    treble.focus();
    await sendKeys({ press: 'ArrowUp' });
    const [circuit, middle] = all<HTMLSelectElement>(drawer, '.choices select');
    pick(middle!, 'rheostat');
    pick(circuit!, 'james');
    expect(told).to.deep.equal([
      ['nw-part-set', { slot: 'tone', part: 'trebleCap', value: 470e-12 }],
      ['nw-choice-set', { slot: 'tone', choice: 'middleWiring', value: 'rheostat' }],
      ['nw-variant-set', { slot: 'tone', variant: 'james' }],
    ]);
  });

  it('tells of another taper: a curved one with the usual midpoint, a straight one with a half', async () => {
    const drawer = await make();
    const told = record(drawer);
    const [treble, bass] = all<HTMLSelectElement>(drawer, '.taper select');
    pick(treble!, 'reverse-audio');
    pick(bass!, 'linear');
    type(midpoint(drawer), '12.5');
    expect(told).to.deep.equal([
      ['nw-taper-set', { slot: 'tone', knob: 'treble', taper: { law: 'reverse-audio', midpoint: 0.15 } }],
      ['nw-taper-set', { slot: 'tone', knob: 'bass', taper: { law: 'linear', midpoint: 0.5 } }],
      ['nw-taper-set', { slot: 'tone', knob: 'bass', taper: { law: 'audio', midpoint: 0.125 } }],
    ]);
  });

  for (const typed of ['0', '1.9', '50', '-3', '']) {
    it(`refuses a midpoint of “${typed}”, says what it accepts and keeps what was typed`, async () => {
      const drawer = await make();
      const told = record(drawer);
      type(midpoint(drawer), typed);
      await drawer.updateComplete;
      expect([told, midpoint(drawer).value]).to.deep.equal([[], typed]);
      expect(midpoint(drawer).getAttribute('aria-invalid')).to.equal('true');
      expect(all(drawer, '#midpoint-bass')[0]!.textContent).to.equal(
        '2 to 49 % is accepted; 15 % stays in force.',
      );
      await expectAccessibleInBothThemes(drawer);
      type(midpoint(drawer), '20');
      await drawer.updateComplete;
      expect(midpoint(drawer).getAttribute('aria-invalid')).to.equal('false');
      expect(told.length).to.equal(1);
    });
  }

  it('keeps a series for each kind of part, and offers none for figures that nobody buys', async () => {
    const drawer = await make();
    const treble = field(drawer, 'Treble capacitor');
    pick(treble.shadowRoot!.querySelector('select')!, 'E24');
    await drawer.updateComplete;
    const series = (label: string): string => field(drawer, label).series;
    expect([series('Bass capacitor'), series('Slope resistor')]).to.deep.equal(['E24', 'E12']);
    const offered = all<NwValueField>(drawer, 'nw-value-field').map(({ label, seriesChoice }) => [
      label,
      seriesChoice,
    ]);
    const quantities = Object.values(toneThreeKnob.parts).filter(({ kind }) => kind === 'quantity');
    expect(quantities.length).to.be.above(0);
    for (const [label, isOffered] of offered) {
      expect(isOffered, String(label)).to.equal(!quantities.some((part) => part.label === label));
    }
  });

  it('does not carry what was typed for one circuit over to the parts of another', async () => {
    const drawer = await make();
    const slope = field(drawer, 'Treble potentiometer').shadowRoot!.querySelector('input')!;
    slope.focus();
    slope.value = '';
    await sendKeys({ type: 'abc' });
    await sendKeys({ press: 'Enter' });
    // Same parts, same values: only the circuit's name tells them apart.
    const twin: Block = { ...toneThreeKnob, variant: 'twin', title: 'Twin' };
    drawer.variants = [toneThreeKnob, twin];
    drawer.block = twin;
    await drawer.updateComplete;
    const shown = all<NwValueField>(drawer, 'nw-value-field').map(
      (entry) => entry.shadowRoot!.querySelector('input')!.value,
    );
    expect(shown).not.to.include('abc');
    expect(all<HTMLSelectElement>(drawer, '.choices select')[0]!.value).to.equal('twin');
  });

  it('opens with its heading in focus, the rest of the page out of reach', async () => {
    const drawer = await make();
    expect(dialog(drawer).matches(':modal')).to.equal(true);
    expect(drawer.shadowRoot!.activeElement!.textContent).to.equal('Tone network: Three knobs');
  });

  it('closes on Escape, tells of it and gives the focus back', async () => {
    const opener = await fixture<HTMLButtonElement>(html`<button>Open</button>`);
    opener.focus();
    const drawer = await make();
    const told = record(drawer);
    await sendKeys({ press: 'Escape' });
    await waitUntil(() => told.length > 0, 'it told of having closed');
    expect([dialog(drawer).open, told]).to.deep.equal([false, [['close', undefined]]]);
    expect(document.activeElement).to.equal(opener);
  });

  it('keeps open when Escape only takes back what was typed', async () => {
    const drawer = await make();
    field(drawer, 'Treble capacitor').focus();
    await sendKeys({ type: 'abc' });
    await sendKeys({ press: 'Escape' });
    await afterTasks();
    expect(dialog(drawer).open).to.equal(true);
    await sendKeys({ press: 'Escape' });
    await afterTasks();
    expect(dialog(drawer).open).to.equal(false);
  });

  it('closes by its button and by a press beside it, not by a press that only ends there', async () => {
    const drawer = await make();
    const { left, top } = dialog(drawer).getBoundingClientRect();
    await mouse.move(left + 60, top + 300);
    await mouse.down();
    await mouse.move(left - 60, top + 300);
    await mouse.up();
    expect(dialog(drawer).open).to.equal(true);
    await mouse.down();
    await mouse.up();
    expect(dialog(drawer).open).to.equal(false);
    const other = await make();
    all<HTMLButtonElement>(other, 'header button')[0]!.click();
    expect(dialog(other).open).to.equal(false);
  });

  it('opens and closes by code without a word', async () => {
    const drawer = await make();
    const told = record(drawer);
    drawer.block = undefined;
    await drawer.updateComplete;
    await afterTasks();
    expect([dialog(drawer).open, told]).to.deep.equal([false, []]);
    drawer.block = toneJames;
    drawer.settings = defaultSettings(toneJames);
    await drawer.updateComplete;
    expect([dialog(drawer).matches(':modal'), told]).to.deep.equal([true, []]);
  });

  it('is still open and modal after being moved in the page, and has told nothing', async () => {
    const drawer = await make();
    const told = record(drawer);
    const parent = drawer.parentElement!;
    drawer.remove();
    parent.append(drawer);
    await afterTasks();
    expect([dialog(drawer).matches(':modal'), told]).to.deep.equal([true, []]);
  });

  it('has places for the drawing and for what the parts have to stand', async () => {
    const drawer = await make();
    const shown = all<HTMLSlotElement>(drawer, 'slot[name]').map(({ name, assignedElements }) => [
      name,
      typeof assignedElements,
    ]);
    expect(shown.map(([name]) => name)).to.deep.equal(['drawing', 'stress']);
    for (const paragraph of drawer.querySelectorAll('p')) {
      expect(paragraph.getBoundingClientRect().height, paragraph.slot).to.be.above(0);
    }
  });

  it('fits a narrow screen without scrolling sideways', async () => {
    await setViewport({ width: 320, height: 800 });
    const drawer = await make();
    expect(dialog(drawer).getBoundingClientRect().width).to.be.at.most(320);
    expect(dialog(drawer).scrollWidth).to.be.at.most(dialog(drawer).clientWidth);
  });
});
