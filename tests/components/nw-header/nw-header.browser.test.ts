import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-header/nw-header.ts';
import type { NwHeader } from '../../../components/nw-header/nw-header.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { recordEvents } from '../sample-bench.ts';

async function make(undoName = 'treble to 6.4'): Promise<NwHeader> {
  setTheme(undefined);
  return fixture<NwHeader>(
    html`<nw-header .designTitle=${'Attic amplifier'} note="· revision 3" .undoName=${undoName}></nw-header>`,
  );
}

const TYPES = ['nw-title-set', 'nw-undo', 'nw-redo', 'nw-theme-set'];

describe('nw-header', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('takes a title, but never an empty one', async () => {
    const header = await make();
    const told = recordEvents(header, TYPES);
    const field = header.shadowRoot!.querySelector('input')!;
    for (const title of ['  Loft  ', '   ', 'Attic amplifier']) {
      field.value = title;
      field.dispatchEvent(new Event('change'));
    }
    expect(told).to.deep.equal([{ type: 'nw-title-set', detail: { title: 'Loft' } }]);
  });

  it('names what undo takes back, and offers it only where there is something', async () => {
    const [undo, redo] = (await make()).shadowRoot!.querySelectorAll('button');
    expect([undo!.getAttribute('aria-label'), undo!.disabled, redo!.disabled]).to.deep.equal([
      'Undo: treble to 6.4',
      false,
      true,
    ]);
    expect((await make('')).shadowRoot!.querySelector('button')!.disabled).to.equal(true);
  });

  it('goes round the themes', async () => {
    const header = await make();
    const told = recordEvents(header, TYPES);
    for (const theme of ['system', 'light', 'dark'] as const) {
      header.theme = theme;
      await header.updateComplete;
      header.shadowRoot!.querySelectorAll('button')[2]!.click();
    }
    expect(told.map((entry) => (entry.detail as { theme: string }).theme)).to.deep.equal([
      'light',
      'dark',
      'system',
    ]);
  });
});
