import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-knob/nw-knob.ts';
import type { NwKnob } from '../../../components/nw-knob/nw-knob.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';

async function knobOf(position = 0.5): Promise<NwKnob> {
  setTheme(undefined);
  return fixture<NwKnob>(
    html`<nw-knob label="Treble" .position=${position} .fallback=${0.6} readout="150k · 100k" spoken="150 kilohms below the wiper"></nw-knob>`,
  );
}

const dial = (knob: NwKnob): HTMLElement => knob.shadowRoot!.querySelector('.dial')!;

/** Everything the knob says, as "input 0.51". */
function record(knob: NwKnob): string[] {
  const told: string[] = [];
  for (const type of ['input', 'change']) {
    knob.addEventListener(type, () => told.push(`${type} ${Number(knob.position.toFixed(4))}`));
  }
  return told;
}

function pointer(knob: NwKnob, type: string, clientY: number, more: PointerEventInit = {}): void {
  dial(knob).dispatchEvent(
    new PointerEvent(type, {
      pointerId: 1,
      clientY,
      button: 0,
      bubbles: true,
      composed: true,
      cancelable: true,
      ...more,
    }),
  );
}

describe('nw-knob', () => {
  beforeEach(() => {
    // Synthetic events have no active pointer to capture.
    HTMLElement.prototype.setPointerCapture = () => {};
  });

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await knobOf());
  });

  it('speaks its position and what it is', async () => {
    const knob = await knobOf();
    expect(dial(knob).getAttribute('aria-valuetext')).to.equal('5.0, 150 kilohms below the wiper');
    expect(dial(knob).getAttribute('aria-valuenow')).to.equal('5.0');
  });

  for (const [key, expected] of [
    ['ArrowUp', 0.51],
    ['ArrowRight', 0.51],
    ['ArrowDown', 0.49],
    ['ArrowLeft', 0.49],
    ['PageUp', 0.6],
    ['PageDown', 0.4],
    ['Home', 0],
    ['End', 1],
    ['Delete', 0.6],
  ] as const) {
    it(`answers ${key}`, async () => {
      const knob = await knobOf();
      const told = record(knob);
      dial(knob).focus();
      await sendKeys({ press: key });
      expect(told).to.deep.equal([`input ${expected}`, `change ${expected}`]);
    });
  }

  it('moves finely with Shift', async () => {
    const knob = await knobOf();
    dial(knob).focus();
    await sendKeys({ down: 'Shift' });
    await sendKeys({ press: 'ArrowUp' });
    await sendKeys({ up: 'Shift' });
    expect(knob.position).to.be.closeTo(0.502, 1e-9);
  });

  it('mirrors left and right where the text runs from right to left', async () => {
    const knob = await knobOf();
    knob.style.direction = 'rtl';
    dial(knob).focus();
    await sendKeys({ press: 'ArrowLeft' });
    expect(knob.position).to.be.closeTo(0.51, 1e-9);
  });

  it('stays within its ends and says nothing there', async () => {
    const knob = await knobOf(1);
    const told = record(knob);
    dial(knob).focus();
    await sendKeys({ press: 'ArrowUp' });
    expect([knob.position, told]).to.deep.equal([1, []]);
  });

  it('follows a drag up, beyond its edge too, and settles once', async () => {
    const knob = await knobOf();
    const told = record(knob);
    pointer(knob, 'pointerdown', 200);
    pointer(knob, 'pointermove', 182);
    pointer(knob, 'pointermove', 164);
    pointer(knob, 'pointerup', 164);
    expect(told).to.deep.equal(['input 0.6', 'input 0.7', 'change 0.7']);
  });

  it('drags finely with Shift, without a jump when Shift is pressed on the way', async () => {
    const knob = await knobOf();
    pointer(knob, 'pointerdown', 200);
    pointer(knob, 'pointermove', 182);
    pointer(knob, 'pointermove', 173, { shiftKey: true });
    expect(knob.position).to.be.closeTo(0.61, 1e-9);
  });

  it('goes back to where it was when the drag is cancelled or Escape is pressed', async () => {
    for (const end of ['pointercancel', 'Escape']) {
      const knob = await knobOf();
      pointer(knob, 'pointerdown', 200);
      pointer(knob, 'pointermove', 100);
      if (end === 'Escape') {
        dial(knob).focus();
        await sendKeys({ press: 'Escape' });
      } else pointer(knob, end, 100);
      expect(knob.position, end).to.equal(0.5);
      pointer(knob, 'pointermove', 50);
      expect(knob.position, end).to.equal(0.5);
    }
  });

  it('returns to its default on a double click', async () => {
    const knob = await knobOf(0.1);
    dial(knob).dispatchEvent(new MouseEvent('dblclick', { bubbles: true }));
    expect(knob.position).to.equal(0.6);
  });

  it('turns with the wheel only while it has the focus', async () => {
    const knob = await knobOf();
    const wheel = () => dial(knob).dispatchEvent(new WheelEvent('wheel', { deltaY: -100, cancelable: true }));
    wheel();
    expect(knob.position).to.equal(0.5);
    dial(knob).focus();
    const told = record(knob);
    wheel();
    wheel();
    await new Promise((resolve) => setTimeout(resolve, 400));
    expect(told).to.deep.equal(['input 0.51', 'input 0.52', 'change 0.52']);
  });

  it('is set by typing a number; Escape and nonsense leave it', async () => {
    const knob = await knobOf();
    const told = record(knob);
    dial(knob).focus();
    await sendKeys({ press: '7' });
    await knob.updateComplete;
    await sendKeys({ type: ',5' });
    await sendKeys({ press: 'Enter' });
    expect(told).to.deep.equal(['input 0.75', 'change 0.75']);
    await sendKeys({ press: '3' });
    await knob.updateComplete;
    await sendKeys({ press: 'Escape' });
    await sendKeys({ press: '3' });
    await knob.updateComplete;
    await sendKeys({ type: 'x' });
    await sendKeys({ press: 'Enter' });
    expect(knob.position).to.equal(0.75);
  });

  it('says nothing when code sets it', async () => {
    const knob = await knobOf();
    const told = record(knob);
    knob.position = 0.9;
    await knob.updateComplete;
    expect(told).to.deep.equal([]);
    expect(dial(knob).getAttribute('aria-valuenow')).to.equal('9.0');
  });

  it('is large enough for a finger and works after being moved in the page', async () => {
    const knob = await knobOf();
    const { width, height } = dial(knob).getBoundingClientRect();
    expect(Math.min(width, height)).to.be.at.least(44);
    const parent = knob.parentElement!;
    knob.remove();
    parent.append(knob);
    dial(knob).focus();
    await sendKeys({ press: 'ArrowUp' });
    expect(knob.position).to.be.closeTo(0.51, 1e-9);
  });
});
