import { expect, fixture, html } from '@open-wc/testing';
import '../../../components/nw-level-meter/nw-level-meter.ts';
import type { NwLevelMeter } from '../../../components/nw-level-meter/nw-level-meter.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

async function meterOf(level: number, hold: number, over = false): Promise<NwLevelMeter> {
  setTheme(undefined);
  const box = await fixture<HTMLElement>(
    html`<div style="background:var(--nw-sheet)">
      <nw-level-meter .level=${level} .hold=${hold} .over=${over}></nw-level-meter>
    </div>`,
  );
  return box.querySelector('nw-level-meter')!;
}

const meter = (element: NwLevelMeter): HTMLElement => element.shadowRoot!.querySelector('[role=meter]')!;

/** Share of the bar that a part of it reaches. */
function reach(element: NwLevelMeter, selector: string): number {
  const bar = element.shadowRoot!.querySelector('.bar')!.getBoundingClientRect();
  return (element.shadowRoot!.querySelector(selector)!.getBoundingClientRect().right - bar.left) / bar.width;
}

describe('nw-level-meter', () => {
  it('is accessible in both themes, also when something was cut', async () => {
    const element = await meterOf(-14, -9);
    await expectAccessibleInBothThemes(element.parentElement!);
    element.over = true;
    await element.updateComplete;
    await expectAccessibleInBothThemes(element.parentElement!);
  });

  it('says level and peak in words', async () => {
    const element = await meterOf(-14.4, -0.2);
    expect(meter(element).getAttribute('aria-valuetext')).to.equal('minus 14 decibels, peak 0 decibels');
    expect(meter(element).getAttribute('aria-valuenow')).to.equal('-14');
  });

  it('fills its scale in decibels, −48 to 0', async () => {
    const element = await meterOf(-24, -12);
    // Half and three quarters of 48 dB; a pixel of 130 is under 0.01.
    expect(reach(element, '.level')).to.be.closeTo(0.5, 0.01);
    expect(reach(element, '.hold')).to.be.closeTo(0.75, 0.01);
  });

  it('is empty for silence, and for what is no level', async () => {
    for (const level of [Number.NEGATIVE_INFINITY, Number.NaN, -90]) {
      const element = await meterOf(level, level);
      expect(reach(element, '.level'), String(level)).to.be.closeTo(0, 0.001);
      expect(meter(element).getAttribute('aria-valuetext')).to.equal('silent, peak silent');
      expect(meter(element).getAttribute('aria-valuenow')).to.equal('-48');
    }
  });

  it('stays within its scale above full scale', async () => {
    const element = await meterOf(6, 12);
    expect(reach(element, '.level')).to.be.closeTo(1, 0.001);
    expect(meter(element).getAttribute('aria-valuenow')).to.equal('0');
  });

  it('marks with a sign, not by colour alone, that something was cut', async () => {
    const element = await meterOf(-1, -1, true);
    expect(element.shadowRoot!.querySelector('.over')!.textContent).to.equal('!');
    expect(meter(element).getAttribute('aria-valuetext')).to.contain('cut to stay under full scale');
    element.over = false;
    await element.updateComplete;
    expect(element.shadowRoot!.querySelector('.over')!.textContent).to.equal('');
  });

  it('does not move when the mark comes', async () => {
    const element = await meterOf(-1, -1);
    const width = () => element.shadowRoot!.querySelector('.bar')!.getBoundingClientRect().width;
    const before = width();
    element.over = true;
    await element.updateComplete;
    expect(width()).to.equal(before);
  });
});
