import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-part-chip/nw-part-chip.ts';
import type { NwPartChip } from '../../../components/nw-part-chip/nw-part-chip.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

describe('nw-part-chip', () => {
  const make = async (chosen = false): Promise<NwPartChip> => {
    setTheme(undefined);
    return fixture<NwPartChip>(
      html`<nw-part-chip label="Treble cap" value="390 pF" .chosen=${chosen}></nw-part-chip>`,
    );
  };

  it('is accessible in both themes, chosen or not', async () => {
    await expectAccessibleInBothThemes(await make());
    await expectAccessibleInBothThemes(await make(true));
  });

  it('says whether it is chosen', async () => {
    const chip = await make();
    const button = chip.shadowRoot!.querySelector('button')!;
    expect(button.getAttribute('aria-pressed')).to.equal('false');
    chip.chosen = true;
    await chip.updateComplete;
    expect(button.getAttribute('aria-pressed')).to.equal('true');
  });

  it('lets a press through as a click', async () => {
    const chip = await make();
    let clicks = 0;
    chip.addEventListener('click', () => {
      clicks += 1;
    });
    chip.shadowRoot!.querySelector('button')!.click();
    expect(clicks).to.equal(1);
  });

  it('is reached and pressed by keyboard, after being moved in the page too', async () => {
    const chip = await make();
    const parent = chip.parentElement!;
    chip.remove();
    parent.append(chip);
    let clicks = 0;
    chip.addEventListener('click', () => {
      clicks += 1;
    });
    chip.shadowRoot!.querySelector('button')!.focus();
    await sendKeys({ press: 'Enter' });
    await sendKeys({ press: 'Space' });
    expect(clicks).to.equal(2);
  });

  it('says nothing and stays unchosen until code says otherwise', async () => {
    const chip = await make();
    let told = 0;
    for (const type of ['input', 'change', 'click'] as const) {
      chip.addEventListener(type, () => {
        told += 1;
      });
    }
    chip.value = '470 pF';
    chip.chosen = true;
    await chip.updateComplete;
    expect([told, chip.shadowRoot!.textContent!.replace(/\s+/g, ' ').trim()]).to.deep.equal([
      0,
      'Treble cap470 pF',
    ]);
    chip.chosen = false;
    await chip.updateComplete;
    chip.shadowRoot!.querySelector('button')!.click();
    expect([told, chip.chosen]).to.deep.equal([1, false]);
  });
});
