import { effect } from '@preact/signals-core';
import { describe, expect, it } from 'vitest';
import { setKnob, setWords } from '../../../src/design/changes.ts';
import { defaultDesign } from '../../../src/design/design.ts';
import { createDesignStore } from '../../../src/design/store.ts';
import { rotation } from '../../../src/units.ts';

describe('design store', () => {
  it('tells readers of previews, but keeps one step only', () => {
    const store = createDesignStore(defaultDesign());
    let seen = 0;
    const stop = effect(() => {
      store.design.value;
      seen += 1;
    });
    for (const position of [0.1, 0.2, 0.3]) store.preview(setKnob('tone', 'bass', rotation(position)));
    store.apply(setKnob('tone', 'bass', rotation(0.4)), 'Bass to 4.0');
    stop();
    expect(seen).toBe(5);
    expect(store.history.value.past.map((step) => step.name)).toEqual(['Bass to 4.0']);
  });

  it('undoes and redoes', () => {
    const first = defaultDesign();
    const store = createDesignStore(first);
    store.apply(setWords({ title: 'One' }), 'Title');
    store.undo();
    expect(store.design.value).toBe(first);
    store.redo();
    expect(store.design.value.title).toBe('One');
  });

  it('shows the active voicing', () => {
    const store = createDesignStore(defaultDesign());
    expect(store.voicing.value.letter).toBe('A');
  });

  it('starts over when a design is opened', () => {
    const store = createDesignStore(defaultDesign());
    store.apply(setWords({ title: 'One' }), 'Title');
    store.open({ ...defaultDesign(), title: 'Other' });
    expect(store.history.value.past).toHaveLength(0);
    expect(store.design.value.title).toBe('Other');
  });
});
