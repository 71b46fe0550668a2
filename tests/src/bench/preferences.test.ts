import { describe, expect, it } from 'vitest';
import {
  createPreferences,
  keepPreferences,
  type PreferenceStorage,
  readPreferences,
} from '../../../src/bench/preferences.ts';

function memory(text?: string): NonNullable<PreferenceStorage> & { text: string | undefined } {
  return {
    text,
    getItem() {
      return this.text ?? null;
    },
    setItem(_: string, value: string) {
      this.text = value;
    },
  };
}

describe('preferences', () => {
  it('are read back as they were kept', () => {
    const storage = memory();
    createPreferences(storage).set({ theme: 'dark', contextRate: 96_000 });
    const read = readPreferences(storage);
    expect([read.theme, read.contextRate]).toEqual(['dark', 96_000]);
  });

  it('keep only what belongs to the browser', () => {
    const storage = memory();
    createPreferences(storage).set({ plotView: 'phase' });
    expect(readPreferences(storage).plotView).toBe('magnitude');
    expect(storage.text).not.toContain('plotView');
  });

  it.each(['{', '[]', 'null', '{"theme":"neon","contextRate":1}', '{"__proto__":{"theme":"dark"}}'])(
    'fall back for %s',
    (text) => {
      expect(readPreferences(memory(text))).toEqual(readPreferences(undefined));
    },
  );

  it('do without a storage that throws', () => {
    const refusing: PreferenceStorage = {
      getItem: () => null,
      setItem: () => {
        throw new DOMException('full', 'QuotaExceededError');
      },
    };
    expect(() => keepPreferences(refusing, readPreferences(refusing))).not.toThrow();
  });
});
