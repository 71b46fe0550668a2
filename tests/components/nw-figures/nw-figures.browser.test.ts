import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-figures/nw-figures.ts';
import type { Figure, NwFigures } from '../../../components/nw-figures/nw-figures.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

const FIGURES: readonly Figure[] = [
  { label: 'At the cursor, 1\u202fkHz', value: '−9.8\u202fdB' },
  { label: 'Mid dip', value: '−11.8\u202fdB', note: 'at 560\u202fHz' },
];

async function figuresOf(figures = FIGURES): Promise<NwFigures> {
  setTheme(undefined);
  const box = await fixture<HTMLElement>(
    html`<div style="background:var(--nw-sheet)">
      <nw-figures .figures=${figures} reference="0 dB is the driver’s unloaded output"></nw-figures>
    </div>`,
  );
  return box.querySelector('nw-figures')!;
}

describe('nw-figures', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes((await figuresOf()).parentElement!);
  });

  it('names each value, with its note, and says what 0 dB is', async () => {
    const { shadowRoot } = await figuresOf();
    const read = (selector: string) =>
      [...shadowRoot!.querySelectorAll(selector)].map((element) =>
        element.textContent!.trim().replace(/\s+/g, ' '),
      );
    expect(read('dt')).to.deep.equal(['At the cursor, 1 kHz', 'Mid dip']);
    expect(read('dd')).to.deep.equal(['−9.8 dB', '−11.8 dB at 560 Hz']);
    expect(read('.reference')).to.deep.equal(['0 dB is the driver’s unloaded output']);
  });

  it('makes values heavier than their names', async () => {
    const { shadowRoot } = await figuresOf();
    const weight = (selector: string) =>
      Number(getComputedStyle(shadowRoot!.querySelector(selector)!).fontWeight);
    expect(weight('dd')).to.be.greaterThan(weight('dt'));
  });

  it('follows its figures', async () => {
    const element = await figuresOf();
    element.figures = [{ label: 'Level', value: '0.0 dB' }];
    await element.updateComplete;
    expect(element.shadowRoot!.querySelectorAll('dd').length).to.equal(1);
  });

  it('stays within 236 pixels, the room a small phone has', async () => {
    const element = await figuresOf();
    element.parentElement!.style.width = '236px';
    const list = element.shadowRoot!.querySelector('dl')!;
    expect(list.scrollWidth).to.be.at.most(236);
  });
});
