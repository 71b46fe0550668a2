import { describe, expect, it } from 'vitest';
import { type Design, defaultDesign } from '../../../src/design/design.ts';
import { readDesign, writeDesign } from '../../../src/design/read-design.ts';
import { NotchworkError } from '../../../src/errors.ts';

// biome-ignore lint/suspicious/noExplicitAny: the tests break files in ways that no type describes
type Broken = Record<string, any>;

const design = defaultDesign();

/** The file of a default design after a change to its plain object. */
function changed(change: (file: Broken) => void): string {
  const file = JSON.parse(writeDesign(design));
  change(file);
  return JSON.stringify(file);
}

function errorOf(text: string): NotchworkError {
  try {
    readDesign(text);
  } catch (error) {
    if (error instanceof NotchworkError) return error;
    throw error;
  }
  throw new Error('the text was accepted');
}

describe('reading a design', () => {
  it('gives back what was written', () => {
    expect(readDesign(writeDesign(design))).toEqual(design);
  });

  it('keeps fields it does not know, at every level', () => {
    const read = readDesign(
      changed((file) => {
        file['later'] = { kept: true };
        file['voicings'][0].hue = 'own';
        file['voicings'][0].line.tone.variants['three-knob'].futures = [1];
      }),
    ) as Design & Broken;
    expect(read['later']).toEqual({ kept: true });
    const again = JSON.parse(writeDesign(read));
    expect(again.voicings[0].hue).toBe('own');
    expect(again.voicings[0].line.tone.variants['three-knob'].futures).toEqual([1]);
  });

  it('completes what an older file left out', () => {
    const read = readDesign(
      changed((file) => {
        delete file['voicings'][0].line.tone.variants['three-knob'].parts.slope;
        delete file['voicings'][0].line.speaker;
        delete file['author'];
      }),
    );
    expect(read).toEqual(design);
  });

  it.each<[string, (file: Broken) => void, RegExp]>([
    [
      'a foreign format',
      (file) => {
        file['format'] = 'other';
      },
      /format/,
    ],
    [
      'a version that is no number',
      (file) => {
        file['version'] = 'one';
      },
      /version/,
    ],
    [
      'a part out of range',
      (file) => {
        file['voicings'][0].line.tone.variants['three-knob'].parts.slope = -1;
      },
      /slope.*-1/,
    ],
    [
      'a part that is no number',
      (file) => {
        file['voicings'][0].line.tone.variants['three-knob'].parts.slope = null;
      },
      /slope/,
    ],
    [
      'a knob beyond its stop',
      (file) => {
        file['voicings'][0].line.tone.variants['three-knob'].knobs.bass = 1.5;
      },
      /bass/,
    ],
    [
      'an unknown option',
      (file) => {
        file['voicings'][0].line.tone.variants['three-knob'].choices.load = 'moon';
      },
      /load.*moon/,
    ],
    [
      'an unknown variant',
      (file) => {
        file['voicings'][0].line.tone.variant = 'nine-knob';
      },
      /nine-knob/,
    ],
    [
      'no voicing',
      (file) => {
        file['voicings'] = [];
      },
      /voicings/,
    ],
    [
      'a letter used twice',
      (file) => {
        file['voicings'].push(file['voicings'][0]);
      },
      /letter/,
    ],
    [
      'an active letter that is not there',
      (file) => {
        file['active'] = 'C';
      },
      /active/,
    ],
  ])('refuses %s and says where', (_, change, message) => {
    const error = errorOf(changed(change));
    expect(error.code).toBe('design-invalid');
    expect(error.message).toMatch(message);
  });

  it('refuses what is not JSON, not an object, or empty', () => {
    for (const text of ['', '{', 'null', '[]', '"text"', '7']) {
      expect(errorOf(text).code).toBe('design-invalid');
    }
  });

  it('refuses a newer version without touching anything', () => {
    const error = errorOf(
      changed((file) => {
        file['version'] = 99;
      }),
    );
    expect(error.code).toBe('design-too-new');
    expect(error.message).toMatch(/99/);
  });

  it('lets no file reach the prototype of anything', () => {
    const hostile = writeDesign(design).replace('"notes": ""', '"notes": "", "__proto__": {"polluted": 1}');
    readDesign(hostile);
    expect(({} as Record<string, unknown>)['polluted']).toBeUndefined();
  });
});
