import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-menu/nw-menu.ts';
import type { NwMenu } from '../../../components/nw-menu/nw-menu.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

const ITEMS = [
  { id: 'one', label: 'One' },
  { id: 'two', label: 'Two', note: 'the second' },
  { id: 'off', label: 'Off', disabled: true },
  { id: 'four', label: 'Four' },
];

describe('nw-menu', () => {
  const make = async (): Promise<NwMenu> => {
    setTheme(undefined);
    return fixture<NwMenu>(html`<nw-menu label="Save a copy" .items=${ITEMS}></nw-menu>`);
  };
  const button = (menu: NwMenu): HTMLButtonElement => menu.shadowRoot!.querySelector('.button')!;
  const focused = (menu: NwMenu): string => menu.shadowRoot!.activeElement?.textContent?.trim() ?? '';
  const open = async (menu: NwMenu): Promise<void> => {
    button(menu).focus();
    await sendKeys({ press: 'Enter' });
    await menu.updateComplete;
  };

  it('is accessible in both themes, closed and open', async () => {
    const menu = await make();
    await expectAccessibleInBothThemes(menu);
    await open(menu);
    await expectAccessibleInBothThemes(menu);
  });

  it('opens with the focus on the first entry, goes round by arrows and passes over what is off', async () => {
    const menu = await make();
    await open(menu);
    expect(focused(menu)).to.equal('One');
    await sendKeys({ press: 'ArrowDown' });
    await sendKeys({ press: 'ArrowDown' });
    expect(focused(menu)).to.equal('Four');
    await sendKeys({ press: 'ArrowDown' });
    expect(focused(menu)).to.equal('One');
    await sendKeys({ press: 'End' });
    expect(focused(menu)).to.equal('Four');
  });

  it('opens by the arrow keys from either end', async () => {
    for (const [key, expected] of [
      ['ArrowDown', 'One'],
      ['ArrowUp', 'Four'],
    ] as const) {
      const menu = await make();
      button(menu).focus();
      await sendKeys({ press: key });
      await menu.updateComplete;
      expect(focused(menu), key).to.equal(expected);
    }
  });

  it('is closed after being moved in the page, and opens again', async () => {
    const menu = await make();
    await open(menu);
    const parent = menu.parentElement!;
    menu.remove();
    parent.append(menu);
    await menu.updateComplete;
    expect(button(menu).getAttribute('aria-expanded')).to.equal('false');
    await open(menu);
    expect(focused(menu)).to.equal('One');
  });

  it('tells what was chosen, closes, and gives the focus back', async () => {
    const menu = await make();
    let chosen = '';
    menu.addEventListener('nw-choose', (event) => {
      chosen = event.detail.id;
    });
    await open(menu);
    await sendKeys({ press: 'ArrowDown' });
    await sendKeys({ press: 'Enter' });
    await menu.updateComplete;
    expect([chosen, focused(menu), menu.shadowRoot!.querySelector('.list')]).to.deep.equal([
      'two',
      'Save a copy',
      null,
    ]);
  });

  it('closes on Escape and when the focus leaves it', async () => {
    const menu = await make();
    await open(menu);
    await sendKeys({ press: 'Escape' });
    await menu.updateComplete;
    expect(button(menu).getAttribute('aria-expanded')).to.equal('false');
    await open(menu);
    (menu.shadowRoot!.activeElement as HTMLElement).blur();
    await menu.updateComplete;
    expect(button(menu).getAttribute('aria-expanded')).to.equal('false');
  });
});
