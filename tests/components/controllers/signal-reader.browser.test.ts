import { expect, fixture, html } from '@open-wc/testing';
import { signal } from '@preact/signals-core';
import { LitElement, html as template } from 'lit';
import { SignalReader } from '../../../components/controllers/signal-reader.ts';

const count = signal(0);

class TestReader extends LitElement {
  readonly reader = new SignalReader(this, () => count.value);
  renders = 0;

  override render() {
    this.renders += 1;
    return template`${this.reader.value}`;
  }
}
customElements.define('test-reader', TestReader);

describe('SignalReader', () => {
  it('draws its host again when a signal changes, and only then', async () => {
    count.value = 0;
    const element = await fixture<TestReader>(html`<test-reader></test-reader>`);
    const before = element.renders;
    count.value = 1;
    await element.updateComplete;
    expect([element.shadowRoot!.textContent, element.renders]).to.deep.equal(['1', before + 1]);
    count.value = 1;
    await element.updateComplete;
    expect(element.renders).to.equal(before + 1);
  });

  it('listens only while its host is connected', async () => {
    const element = await fixture<TestReader>(html`<test-reader></test-reader>`);
    const parent = element.parentElement!;
    element.remove();
    count.value = 7;
    await element.updateComplete;
    expect(element.shadowRoot!.textContent).not.to.equal('7');
    parent.append(element);
    await element.updateComplete;
    expect(element.shadowRoot!.textContent).to.equal('7');
  });
});
