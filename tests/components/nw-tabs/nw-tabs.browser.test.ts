import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-tabs/nw-tabs.ts';
import type { NwTabs } from '../../../components/nw-tabs/nw-tabs.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

const TABS = ['Listen', 'Swap', 'Sheet'].map((label) => ({ id: label.toLowerCase(), label }));

describe('nw-tabs', () => {
  const make = async (): Promise<NwTabs> => {
    setTheme(undefined);
    return fixture<NwTabs>(html`<nw-tabs label="Tasks" .tabs=${TABS} chosen="listen"><p>Panel</p></nw-tabs>`);
  };
  const tabs = (element: NwTabs): HTMLElement[] => [
    ...element.shadowRoot!.querySelectorAll<HTMLElement>('[role=tab]'),
  ];

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  for (const [key, expected] of [
    ['ArrowRight', 'swap'],
    ['ArrowLeft', 'sheet'],
    ['End', 'sheet'],
    ['Home', 'listen'],
  ] as const) {
    it(`answers ${key}`, async () => {
      const element = await make();
      tabs(element)[0]!.focus();
      await sendKeys({ press: key });
      await element.updateComplete;
      expect(element.chosen).to.equal(expected);
    });
  }

  it('mirrors the arrows where the text runs from right to left', async () => {
    const element = await make();
    element.style.direction = 'rtl';
    tabs(element)[0]!.focus();
    await sendKeys({ press: 'ArrowLeft' });
    await element.updateComplete;
    expect([element.chosen, element.shadowRoot!.activeElement?.textContent?.trim()]).to.deep.equal([
      'swap',
      'Swap',
    ]);
  });

  it('can be reached by the Tab key before anything is chosen', async () => {
    const element = await make();
    element.chosen = '';
    await element.updateComplete;
    expect(tabs(element).map((tab) => tab.tabIndex)).to.deep.equal([0, -1, -1]);
  });

  it('says nothing when code sets it, and works after being moved in the page', async () => {
    const element = await make();
    let told = 0;
    element.addEventListener('change', () => {
      told += 1;
    });
    element.chosen = 'sheet';
    await element.updateComplete;
    const parent = element.parentElement!;
    element.remove();
    parent.append(element);
    expect(told).to.equal(0);
    tabs(element)[1]!.click();
    expect([told, element.chosen]).to.deep.equal([1, 'swap']);
  });

  it('has one tab in the order of the Tab key, and tells of a choice once', async () => {
    const element = await make();
    let told = 0;
    element.addEventListener('change', () => {
      told += 1;
    });
    tabs(element)[1]!.click();
    tabs(element)[1]!.click();
    await element.updateComplete;
    expect(tabs(element).map((tab) => tab.tabIndex)).to.deep.equal([-1, 0, -1]);
    expect(told).to.equal(1);
  });
});
