import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-voicings/nw-voicings.ts';
import type { NwVoicings } from '../../../components/nw-voicings/nw-voicings.ts';
import { VOICING_LETTERS } from '../../../src/design/design.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents } from '../sample-bench.ts';

const TYPES = ['choose', 'keep', 'rename', 'recolour', 'move', 'delete'].map((name) => `nw-voicing-${name}`);

async function make(count = 3): Promise<NwVoicings> {
  setTheme(undefined);
  const voicings = VOICING_LETTERS.slice(0, count).map((letter) => ({
    letter,
    name: `Name ${letter}`,
    colour: letter,
  }));
  return fixture<NwVoicings>(html`<nw-voicings .voicings=${voicings} active="B"></nw-voicings>`);
}

const buttons = (row: NwVoicings): HTMLButtonElement[] => [
  ...row.shadowRoot!.querySelectorAll<HTMLButtonElement>('.voicing'),
];

async function pick(row: NwVoicings, id: string): Promise<void> {
  const menu = row.shadowRoot!.querySelector('nw-menu')!;
  menu.dispatchEvent(new CustomEvent('nw-choose', { detail: { id }, bubbles: true, composed: true }));
  await row.updateComplete;
}

describe('nw-voicings', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('tells curves apart by letter and dash, not by colour alone', async () => {
    const dashes = buttons(await make(8)).map((button) =>
      button.querySelector('path')?.getAttribute('stroke-dasharray'),
    );
    expect(new Set(dashes).size).to.equal(8);
  });

  it('says which one was chosen, and that the present one is to be kept', async () => {
    const row = await make();
    const told = recordEvents(row, TYPES);
    buttons(row)[0]!.click();
    buttons(row)[3]!.click();
    expect(told).to.deep.equal([
      { type: 'nw-voicing-choose', detail: { letter: 'A' } },
      { type: 'nw-voicing-keep', detail: undefined },
    ]);
  });

  it('offers no ninth', async () => {
    expect(buttons(await make(8))).to.have.length(8);
  });

  it('renames on Enter, and not on Escape', async () => {
    const row = await make();
    const told = recordEvents(row, TYPES);
    await pick(row, 'rename');
    await sendKeys({ type: 'Dark room' });
    await sendKeys({ press: 'Enter' });
    await pick(row, 'rename');
    await sendKeys({ type: 'x' });
    await sendKeys({ press: 'Escape' });
    await row.updateComplete;
    expect(told).to.deep.equal([{ type: 'nw-voicing-rename', detail: { letter: 'B', name: 'Dark room' } }]);
  });

  it('moves, recolours and deletes the active one', async () => {
    const row = await make();
    const told = recordEvents(row, TYPES);
    for (const id of ['left', 'right', 'recolour', 'delete']) await pick(row, id);
    expect(told).to.deep.equal([
      { type: 'nw-voicing-move', detail: { letter: 'B', places: -1 } },
      { type: 'nw-voicing-move', detail: { letter: 'B', places: 1 } },
      { type: 'nw-voicing-recolour', detail: { letter: 'B', colour: 'C' } },
      { type: 'nw-voicing-delete', detail: { letter: 'B' } },
    ]);
  });
});
