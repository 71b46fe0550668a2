import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-curve-table/nw-curve-table.ts';
import type { NwCurveTable } from '../../../components/nw-curve-table/nw-curve-table.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { sampleCurves } from '../chart/sample-curves.ts';

async function tableOf(): Promise<NwCurveTable> {
  setTheme(undefined);
  const helper = { ...sampleCurves()[2]!, letter: '' };
  const box = await fixture<HTMLElement>(
    html`<div style="background:var(--nw-sheet)">
      <nw-curve-table .curves=${[...sampleCurves(0, 2), helper]}></nw-curve-table>
    </div>`,
  );
  return box.querySelector('nw-curve-table')!;
}

const cells = (table: NwCurveTable, selector: string): string[] =>
  [...table.shadowRoot!.querySelectorAll(selector)].map((cell) => cell.textContent!.trim());

describe('nw-curve-table', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes((await tableOf()).parentElement!);
  });

  it('lists the third-octaves of ISO 266 from 20 Hz to 20 kHz', async () => {
    const rows = cells(await tableOf(), 'tbody th');
    expect(rows.length).to.equal(31);
    expect([rows[0], rows[2], rows[17], rows[30]]).to.deep.equal([
      '20\u202fHz',
      '31.5\u202fHz',
      '1\u202fkHz',
      '20\u202fkHz',
    ]);
  });

  it('has a column for each lettered curve, and its value', async () => {
    const table = await tableOf();
    expect(cells(table, 'thead th')).to.deep.equal(['Frequency', 'A Voicing a', 'B Voicing b']);
    // −4 − 8·exp(−(log2(1000/560)/2)²) = −10.72, by hand; the second curve is 0.1 dB lower.
    expect(cells(table, 'tbody tr:nth-child(18) td')).to.deep.equal(['−10.7', '−10.8']);
  });

  it('names what it lists and in which unit', async () => {
    const table = await tableOf();
    expect(cells(table, 'caption')[0]).to.match(/^Level in dB /);
    table.quantity = 'phase';
    await table.updateComplete;
    expect(cells(table, 'caption')[0]).to.match(/^Phase in degrees /);
    expect(cells(table, 'tbody tr:nth-child(18) td')[0]).to.equal('−11');
  });

  it('scrolls sideways inside itself where it is too wide, and by keyboard', async () => {
    const table = await tableOf();
    table.parentElement!.style.width = '160px';
    const scroll = table.shadowRoot!.querySelector<HTMLElement>('.scroll')!;
    expect(table.offsetWidth).to.equal(160);
    expect(scroll.scrollWidth).to.be.greaterThan(scroll.clientWidth);
    expect(scroll.tabIndex).to.equal(0);
  });
});
