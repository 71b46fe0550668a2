import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-notice/nw-notice.ts';
import type { NwNotice } from '../../../components/nw-notice/nw-notice.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

describe('nw-notice', () => {
  const make = async (kind: NwNotice['kind'], dismissable = false): Promise<NwNotice> => {
    setTheme(undefined);
    return fixture<NwNotice>(html`<nw-notice .kind=${kind} .dismissable=${dismissable}>Words</nw-notice>`);
  };

  for (const kind of ['info', 'caution', 'error'] as const) {
    it(`is accessible in both themes: ${kind}`, async () => {
      await expectAccessibleInBothThemes(await make(kind, true));
    });
  }

  it('is an alert only where it is an error', async () => {
    const role = async (kind: NwNotice['kind']) =>
      (await make(kind)).shadowRoot!.querySelector('.box')!.getAttribute('role');
    expect([await role('error'), await role('caution'), await role('info')]).to.deep.equal([
      'alert',
      'status',
      'status',
    ]);
  });

  it('can be put away only where that is allowed', async () => {
    expect((await make('info')).shadowRoot!.querySelector('button')).to.equal(null);
    const notice = await make('info', true);
    let told = 0;
    notice.addEventListener('nw-dismiss', () => {
      told += 1;
    });
    notice.shadowRoot!.querySelector('button')!.click();
    expect(told).to.equal(1);
  });

  it('is put away by keyboard, and its words are what was put into it', async () => {
    const notice = await make('caution', true);
    let told = 0;
    notice.parentElement!.addEventListener('nw-dismiss', () => {
      told += 1;
    });
    notice.shadowRoot!.querySelector('button')!.focus();
    await sendKeys({ press: 'Enter' });
    expect(told).to.equal(1);
    const [text] = notice.shadowRoot!.querySelector('slot')!.assignedNodes();
    expect(text!.textContent).to.equal('Words');
  });

  it('is still there after being moved in the page: only its owner takes it away', async () => {
    const notice = await make('info', true);
    const parent = notice.parentElement!;
    notice.shadowRoot!.querySelector('button')!.click();
    expect(notice.isConnected).to.equal(true);
    notice.remove();
    parent.append(notice);
    expect(notice.shadowRoot!.querySelector('[role=status]')).not.to.equal(null);
  });
});
