import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-switch/nw-switch.ts';
import type { NwSwitch } from '../../../components/nw-switch/nw-switch.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

describe('nw-switch', () => {
  const make = async (): Promise<NwSwitch> => {
    setTheme(undefined);
    return fixture<NwSwitch>(html`<nw-switch label="Loop">Loop</nw-switch>`);
  };

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('is switched by the space bar and tells once', async () => {
    const element = await make();
    const told: boolean[] = [];
    element.addEventListener('change', () => told.push(element.checked));
    element.shadowRoot!.querySelector('input')!.focus();
    await sendKeys({ press: 'Space' });
    await sendKeys({ press: 'Space' });
    expect(told).to.deep.equal([true, false]);
  });

  it('says nothing when code sets it', async () => {
    const element = await make();
    let told = 0;
    element.addEventListener('change', () => {
      told += 1;
    });
    element.checked = true;
    await element.updateComplete;
    expect([told, element.shadowRoot!.querySelector('input')!.checked]).to.deep.equal([0, true]);
  });
});
