import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-value-field/nw-value-field.ts';
import type { NwValueField } from '../../../components/nw-value-field/nw-value-field.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

async function fieldOf(value = 390e-12): Promise<NwValueField> {
  setTheme(undefined);
  return fixture<NwValueField>(
    html`<nw-value-field label="Treble capacitor" unit="F" .range=${[1e-12, 1e-6]} .value=${value}></nw-value-field>`,
  );
}

const input = (field: NwValueField): HTMLInputElement => field.shadowRoot!.querySelector('input')!;
const message = (field: NwValueField): string =>
  field.shadowRoot!.querySelector('.message')!.textContent!.trim();

/** Types a text over what is there and leaves the field. */
async function enter(field: NwValueField, text: string): Promise<void> {
  field.focus();
  input(field).value = '';
  await sendKeys({ type: text });
  await sendKeys({ press: 'Enter' });
  await field.updateComplete;
}

function record(field: NwValueField): number[] {
  const told: number[] = [];
  field.addEventListener('change', () => told.push(field.value));
  return told;
}

describe('nw-value-field', () => {
  it('is accessible in both themes, with a complaint too', async () => {
    const field = await fieldOf();
    await expectAccessibleInBothThemes(field);
    await enter(field, 'nonsense');
    await expectAccessibleInBothThemes(field);
  });

  it('takes a value as people write it', async () => {
    const field = await fieldOf();
    const told = record(field);
    await enter(field, '0,022u');
    expect(told).to.deep.equal([22e-9]);
    expect(input(field).value).to.equal('22\u202fnF');
  });

  it('keeps what was typed and the last good value, and says what it accepts', async () => {
    const field = await fieldOf();
    const told = record(field);
    for (const [text, words] of [
      ['223', /not guessed/],
      ['abc', /22n/],
      ['5', /out of range.*1\u202fpF to 1\u202fµF/],
      ['1e30', /out of range/],
      ['0', /out of range/],
    ] as const) {
      await enter(field, text);
      expect(input(field).value, text).to.equal(text);
      expect(message(field), text).to.match(words);
      expect(message(field), text).to.match(/390\u202fpF stays in force/);
      expect(input(field).getAttribute('aria-invalid')).to.equal('true');
    }
    expect([field.value, told]).to.deep.equal([390e-12, []]);
    await enter(field, '470p');
    expect([told, message(field)]).to.deep.equal([[470e-12], '']);
  });

  it('steps to the next preferred value by keys and by buttons', async () => {
    const field = await fieldOf();
    const told = record(field);
    field.focus();
    await sendKeys({ press: 'ArrowUp' });
    await sendKeys({ press: 'ArrowDown' });
    await sendKeys({ press: 'ArrowDown' });
    field.shadowRoot!.querySelectorAll('button')[1]!.click();
    expect(told).to.deep.equal([470e-12, 390e-12, 330e-12, 390e-12]);
  });

  it('says so at the end of its range', async () => {
    const field = await fieldOf(1e-6);
    field.shadowRoot!.querySelectorAll('button')[1]!.click();
    await field.updateComplete;
    expect(message(field)).to.match(
      /1\u202fpF to 1\u202fµF is accepted; the next value in E12 would be 1\.2\u202fµF/,
    );
    expect(field.value).to.equal(1e-6);
  });

  it('steps a decade with the Page keys, whatever the series', async () => {
    const field = await fieldOf();
    field.series = 'E24';
    await field.updateComplete;
    field.focus();
    await sendKeys({ press: 'PageUp' });
    expect(field.value).to.equal(3.9e-9);
    await sendKeys({ press: 'PageDown' });
    expect(field.value).to.equal(390e-12);
  });

  it('steps from what was just typed', async () => {
    const field = await fieldOf();
    const told = record(field);
    field.focus();
    input(field).value = '';
    await sendKeys({ type: '10n' });
    await sendKeys({ press: 'ArrowUp' });
    expect(told).to.deep.equal([12e-9]);
  });

  it('steps to nothing and back where nothing is accepted', async () => {
    const field = await fixture<NwValueField>(
      html`<nw-value-field label="Stopper" unit="Ω" .range=${[0, 1e6]} .value=${1}></nw-value-field>`,
    );
    field.focus();
    await sendKeys({ press: 'ArrowDown' });
    expect(field.value).to.equal(0);
    await sendKeys({ press: 'ArrowUp' });
    expect(field.value).to.equal(1);
  });

  it('offers the series where it is asked to, tells of it and steps through the new one', async () => {
    const field = await fieldOf();
    expect(field.shadowRoot!.querySelector('select')).to.equal(null);
    field.seriesChoice = true;
    await field.updateComplete;
    await expectAccessibleInBothThemes(field);
    const told: string[] = [];
    const changes = record(field);
    field.addEventListener('nw-series-set', (event) => told.push(event.detail.series));
    const select = field.shadowRoot!.querySelector('select')!;
    expect([...select.options].map((option) => option.value)).to.include.members([
      'E6',
      'E12',
      'E24',
      'E48',
      'E96',
      'E192',
    ]);
    expect(select.value).to.equal('E12');
    select.value = 'E96';
    select.dispatchEvent(new Event('change', { bubbles: true }));
    field.focus();
    await sendKeys({ press: 'ArrowUp' });
    // 392 is the member of E96 after 390 (IEC 60063).
    expect([told, changes]).to.deep.equal([['E96'], [392e-12]]);
  });

  it('works after being moved in the page', async () => {
    const field = await fieldOf();
    const parent = field.parentElement!;
    field.remove();
    parent.append(field);
    await enter(field, '1n');
    expect(field.value).to.equal(1e-9);
  });

  it('forgets what was typed on Escape', async () => {
    const field = await fieldOf();
    await enter(field, 'abc');
    await sendKeys({ press: 'Escape' });
    await field.updateComplete;
    expect([input(field).value, message(field)]).to.deep.equal(['390\u202fpF', '']);
  });

  it('says nothing when code sets it', async () => {
    const field = await fieldOf();
    const told = record(field);
    field.value = 1e-9;
    await field.updateComplete;
    expect([told, input(field).value]).to.deep.equal([[], '1\u202fnF']);
  });
});
