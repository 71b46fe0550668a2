import { expect, fixture, html } from '@open-wc/testing';
import { readPlotColours } from '../../../components/chart/plot-colours.ts';
import { setTheme } from '../both-themes.ts';

describe('colours of a plot', () => {
  afterEach(() => setTheme(undefined));

  it('are those of the theme in force', async () => {
    const element = await fixture(html`<div></div>`);
    setTheme('light');
    const light = readPlotColours(element);
    setTheme('dark');
    const dark = readPlotColours(element);
    for (const name of ['ink', 'soft', 'hairline', 'rule', 'ground'] as const) {
      expect(light[name], name).to.match(/^#[\da-f]{3,8}$/i);
      expect(dark[name], name).not.to.equal(light[name]);
    }
    expect(Object.values(light.curves).every((colour) => colour.startsWith('#'))).to.equal(true);
    expect(new Set(Object.values(light.curves)).size).to.equal(9); // eight voicings and the soft one
    expect(light.font).to.contain('sans-serif');
  });
});
