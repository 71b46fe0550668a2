import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-stress-table/nw-stress-table.ts';
import type { NwStressTable } from '../../../components/nw-stress-table/nw-stress-table.ts';
import { blocksOf } from '../../../src/blocks/catalogue.ts';
import { defaultSettings } from '../../../src/blocks/settings.ts';
import type { PlacedBlock } from '../../../src/blocks/span.ts';
import { defaultLine } from '../../../src/design/design.ts';
import { placedLine } from '../../../src/design/placed-line.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

const placed = placedLine(defaultLine());
const tone = placed.find((entry) => entry.block.slot === 'tone')!;

async function make(line: readonly PlacedBlock[] = placed): Promise<NwStressTable> {
  setTheme(undefined);
  return fixture<NwStressTable>(
    html`<nw-stress-table .block=${tone.block} .placed=${line}></nw-stress-table>`,
  );
}

describe('nw-stress-table', () => {
  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await make());
  });

  it('gives the treble capacitor the driver’s voltage warm, the supply cold, and a rating above both', async () => {
    const rows = [...(await make()).shadowRoot!.querySelectorAll('tbody tr')].map((row) =>
      row.textContent!.replace(/\s+/g, ' '),
    );
    const treble = rows.find((row) => row.includes('Treble capacitor'))!;
    // Common practice, no source: the network’s capacitors block all of the direct voltage at its input.
    const [warm, cold] = [...treble.matchAll(/(\d+(?:\.\d+)?) V/g)].map((match) => Number(match[1]));
    expect([warm, cold]).to.deep.equal([180, 300]);
    expect(Number(/(\d+) V\s*$/.exec(treble)![1])).to.be.at.least(300);
  });

  it('says why there is no table', async () => {
    expect((await make([tone])).shadowRoot!.textContent).to.contain('Nothing here is under direct voltage');
    const [follower] = blocksOf('driver').filter((block) => block.variant === 'cathode-follower');
    const settings = defaultSettings(follower!);
    const overdriven: PlacedBlock = {
      block: follower!,
      settings: { ...settings, parts: { ...settings.parts, gridVoltage: 1000 } },
    };
    expect((await make([overdriven, tone])).shadowRoot!.textContent).to.match(/grid/);
  });
});
