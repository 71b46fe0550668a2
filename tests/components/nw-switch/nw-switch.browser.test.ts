import { expect, fixture, html } from '@open-wc/testing';
import { emulateMedia, sendKeys } from '@web/test-runner-commands';
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

  it('moves at once for people who want less motion', async () => {
    try {
      for (const [reducedMotion, expected] of [
        ['no-preference', '0.12s'],
        ['reduce', '0s'],
      ] as const) {
        await emulateMedia({ reducedMotion });
        const input = (await make()).shadowRoot!.querySelector('input')!;
        expect(getComputedStyle(input, '::after').transitionDuration, reducedMotion).to.equal(expected);
      }
    } finally {
      await emulateMedia({ reducedMotion: 'no-preference' });
    }
  });

  it('moves its thumb to the other side where the text runs from right to left', async () => {
    const element = await make();
    element.style.direction = 'rtl';
    const input = element.shadowRoot!.querySelector('input')!;
    expect(getComputedStyle(input, '::after').left).to.equal('14px');
    element.checked = true;
    await element.updateComplete;
    await Promise.all(input.getAnimations({ subtree: true }).map((animation) => animation.finished));
    expect(getComputedStyle(input, '::after').left).to.equal('2px');
  });

  it('works after being moved in the page', async () => {
    const element = await make();
    const parent = element.parentElement!;
    element.remove();
    parent.append(element);
    let told = 0;
    element.addEventListener('change', () => {
      told += 1;
    });
    element.shadowRoot!.querySelector('input')!.click();
    expect([told, element.checked]).to.deep.equal([1, true]);
  });
});
