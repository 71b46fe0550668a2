import { describe, expect, it } from 'vitest';
import { keepDesign, restoreDesign } from '../../../src/bench/design-keeper.ts';
import { setKnob, setWords } from '../../../src/design/changes.ts';
import { defaultDesign } from '../../../src/design/design.ts';
import { createDesignStore } from '../../../src/design/store.ts';
import { rotation } from '../../../src/units.ts';

function memory() {
  const kept = new Map<string, string>();
  return {
    kept,
    getItem: (key: string) => kept.get(key) ?? null,
    setItem: (key: string, value: string) => {
      kept.set(key, value);
    },
  };
}

describe('keeping the design', () => {
  it('brings back what was settled last, and nothing that was only shown', () => {
    const storage = memory();
    const store = createDesignStore(defaultDesign());
    keepDesign(store, storage, () => {});
    expect(storage.kept.size).toBe(0);
    store.apply(setWords({ title: 'Loft' }), 'title');
    store.preview(setKnob('tone', 'bass', rotation(0.9)));
    const other = createDesignStore(defaultDesign());
    expect(restoreDesign(other, storage)).toBe('restored');
    expect(other.design.value.title).toBe('Loft');
    expect(other.design.value.voicings[0]!.line.tone.variants['three-knob']!.knobs['bass']).toBe(0.5);
  });

  it('stops when told', () => {
    const storage = memory();
    const store = createDesignStore(defaultDesign());
    keepDesign(store, storage, () => {})();
    store.apply(setWords({ title: 'Loft' }), 'title');
    expect(storage.kept.size).toBe(0);
  });

  it('finds nothing, or refuses what it cannot read and keeps a copy of it', () => {
    const storage = memory();
    const store = createDesignStore(defaultDesign());
    expect(restoreDesign(store, storage)).toBe('none');
    expect(restoreDesign(store, undefined)).toBe('none');
    storage.setItem('notchwork-design', '{"format":"notchwork-design","version":99}');
    expect(restoreDesign(store, storage)).toMatchObject({ problem: expect.stringMatching(/newer/) });
    expect(storage.kept.get('notchwork-design-unreadable')).toContain('99');
    expect(store.design.value.title).toBe('Untitled');
  });

  it('says once that the browser has no room', () => {
    const store = createDesignStore(defaultDesign());
    const told: string[] = [];
    const full = {
      getItem: () => null,
      setItem: () => {
        throw new DOMException('full', 'QuotaExceededError');
      },
    };
    keepDesign(store, full, (message) => told.push(message));
    store.apply(setWords({ title: 'One' }), 'title');
    store.apply(setWords({ title: 'Two' }), 'title');
    expect(told).toEqual([expect.stringMatching(/save it as a file/)]);
  });
});
