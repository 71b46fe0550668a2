import { expect, fixture, html } from '@open-wc/testing';
import { sendKeys } from '@web/test-runner-commands';
import '../../../components/nw-knob/nw-knob.ts';
import type { NwKnob } from '../../../components/nw-knob/nw-knob.ts';
import { expectAccessibleInBothThemes, setTheme } from '../both-themes.ts';
import { mouse } from '../mouse.ts';

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
  const capture = HTMLElement.prototype.setPointerCapture;
  /** Synthetic events have no active pointer to capture; tests with the real mouse do without this. */
  const withoutCapture = (): void => {
    HTMLElement.prototype.setPointerCapture = () => {};
  };

  afterEach(() => {
    HTMLElement.prototype.setPointerCapture = capture;
  });

  it('is accessible in both themes', async () => {
    await expectAccessibleInBothThemes(await knobOf());
  });

  it('is accessible while a number is typed and refused', async () => {
    const knob = await knobOf();
    dial(knob).focus();
    await sendKeys({ press: '4' });
    await knob.updateComplete;
    await sendKeys({ type: '7' });
    await sendKeys({ press: 'Enter' });
    await knob.updateComplete;
    expect(knob.shadowRoot!.querySelector('[role=alert]')!.textContent).to.contain('0 to 10');
    await expectAccessibleInBothThemes(knob);
  });

  it('speaks what it is and its position, and shows the position in figures', async () => {
    const knob = await knobOf(0.502);
    expect(dial(knob).getAttribute('aria-valuetext')).to.equal('150 kilohms below the wiper, 50.2\u202f%');
    expect(dial(knob).getAttribute('aria-valuenow')).to.equal('5.02');
    expect(knob.shadowRoot!.querySelector('.value')!.textContent).to.equal('5.0');
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

  it('settles once for a key held down', async () => {
    const knob = await knobOf();
    const told = record(knob);
    dial(knob).focus();
    for (const repeat of [false, true, true]) {
      dial(knob).dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', repeat, cancelable: true }));
    }
    dial(knob).dispatchEvent(new KeyboardEvent('keyup', { key: 'ArrowUp' }));
    expect(told).to.deep.equal(['input 0.51', 'input 0.52', 'input 0.53', 'change 0.53']);
  });

  it('settles when the focus goes away under a key held down', async () => {
    const knob = await knobOf();
    const told = record(knob);
    dial(knob).focus();
    dial(knob).dispatchEvent(new KeyboardEvent('keydown', { key: 'ArrowUp', cancelable: true }));
    dial(knob).blur();
    expect(told).to.deep.equal(['input 0.51', 'change 0.51']);
  });

  it('follows the real mouse beyond its edge and settles when it is let go there', async () => {
    const knob = await knobOf();
    const told = record(knob);
    const { left, top, width, height } = dial(knob).getBoundingClientRect();
    const [x, y] = [Math.round(left + width / 2), Math.round(top + height / 2)];
    await mouse.move(x, y);
    await mouse.down();
    await mouse.move(x + 300, y + 45);
    await mouse.up();
    // 180 pixels are the whole range.
    expect(knob.position).to.be.closeTo(0.25, 1e-9);
    expect(told.at(-1)).to.equal('change 0.25');
    await mouse.move(x, y);
    expect(knob.position).to.be.closeTo(0.25, 1e-9);
  });

  it('puts the real mouse’s drag back on Escape, and then lets the mouse be', async () => {
    const knob = await knobOf();
    const told = record(knob);
    const { left, top, width, height } = dial(knob).getBoundingClientRect();
    await mouse.move(left + width / 2, top + height / 2);
    await mouse.down();
    await mouse.move(left + width / 2, top + height / 2 + 36);
    await sendKeys({ press: 'Escape' });
    await mouse.move(left + width / 2, top + height / 2 + 90);
    await mouse.up();
    expect(knob.position).to.equal(0.5);
    expect(told.at(-1)).to.equal('change 0.5');
  });

  it('follows a drag up and settles once', async () => {
    withoutCapture();
    const knob = await knobOf();
    const told = record(knob);
    pointer(knob, 'pointerdown', 200);
    pointer(knob, 'pointermove', 182);
    pointer(knob, 'pointermove', 164);
    pointer(knob, 'pointerup', 164);
    expect(told).to.deep.equal(['input 0.6', 'input 0.7', 'change 0.7']);
  });

  it('settles even where the drag ends where it began, and follows one finger at a time', async () => {
    withoutCapture();
    const knob = await knobOf();
    const told = record(knob);
    pointer(knob, 'pointerdown', 200);
    pointer(knob, 'pointermove', 182);
    pointer(knob, 'pointerdown', 100, { pointerId: 2 });
    pointer(knob, 'pointermove', 0, { pointerId: 2 });
    pointer(knob, 'pointermove', 200);
    pointer(knob, 'pointerup', 200);
    expect(told).to.deep.equal(['input 0.6', 'input 0.5', 'change 0.5']);
  });

  it('drags finely with Shift, without a jump when Shift is pressed on the way', async () => {
    withoutCapture();
    const knob = await knobOf();
    pointer(knob, 'pointerdown', 200);
    pointer(knob, 'pointermove', 182);
    pointer(knob, 'pointermove', 173, { shiftKey: true });
    expect(knob.position).to.be.closeTo(0.61, 1e-9);
  });

  it('goes back to where it was when the drag is cancelled, the capture lost or Escape pressed', async () => {
    withoutCapture();
    for (const end of ['pointercancel', 'lostpointercapture', 'Escape']) {
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

  it('takes many small scrolls of a touchpad as one step, and leaves zooming alone', async () => {
    const knob = await knobOf();
    dial(knob).focus();
    for (let count = 0; count < 5; count += 1) {
      dial(knob).dispatchEvent(new WheelEvent('wheel', { deltaY: 7, cancelable: true }));
    }
    expect(knob.position).to.be.closeTo(0.49, 1e-9);
    const zoom = new WheelEvent('wheel', { deltaY: 100, ctrlKey: true, cancelable: true });
    dial(knob).dispatchEvent(zoom);
    expect([zoom.defaultPrevented, knob.position]).to.deep.equal([false, 0.49]);
  });

  it('takes a typed share in per cent, and refuses what is beyond the dial', async () => {
    const knob = await knobOf();
    dial(knob).focus();
    await sendKeys({ press: '4' });
    await knob.updateComplete;
    await sendKeys({ type: '7' });
    await sendKeys({ press: 'Enter' });
    await knob.updateComplete;
    expect(knob.position).to.equal(0.5);
    expect(knob.shadowRoot!.querySelector<HTMLInputElement>('.entry')!.value).to.equal('47');
    await sendKeys({ type: '%' });
    await sendKeys({ press: 'Enter' });
    await knob.updateComplete;
    expect(knob.position).to.equal(0.47);
    expect(knob.shadowRoot!.activeElement).to.equal(dial(knob));
  });

  it('takes a readable entry when the focus leaves it, and drops nonsense', async () => {
    const knob = await knobOf();
    for (const [text, expected] of [
      ['3', 0.3],
      ['.', 0.3],
    ] as const) {
      dial(knob).focus();
      await sendKeys({ press: text });
      await knob.updateComplete;
      knob.shadowRoot!.querySelector<HTMLInputElement>('.entry')!.blur();
      await knob.updateComplete;
      expect([knob.position, knob.shadowRoot!.querySelector('.entry')]).to.deep.equal([expected, null]);
    }
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
    expect(dial(knob).getAttribute('aria-valuenow')).to.equal('9');
  });

  it('is large enough for a finger and works after being moved in the page', async () => {
    const knob = await knobOf();
    const { width, height } = dial(knob).getBoundingClientRect();
    expect(Math.min(width, height)).to.be.at.least(44);
    const parent = knob.parentElement!;
    withoutCapture();
    const told = record(knob);
    pointer(knob, 'pointerdown', 200);
    pointer(knob, 'pointermove', 182);
    knob.remove();
    expect(told, 'a move that was under way is settled').to.deep.equal(['input 0.6', 'change 0.6']);
    knob.position = 0.5;
    parent.append(knob);
    dial(knob).focus();
    await sendKeys({ press: 'ArrowUp' });
    expect(knob.position).to.be.closeTo(0.51, 1e-9);
  });
});
