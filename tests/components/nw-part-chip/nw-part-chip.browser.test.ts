import { expect, fixture, html } from '@open-wc/testing';
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
});
