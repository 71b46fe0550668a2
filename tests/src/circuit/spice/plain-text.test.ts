import { describe, expect, it } from 'vitest';
import { plainText } from '../../../../src/circuit/spice/plain-text.ts';

describe('plainText', () => {
  it.each([
    ['Tone network', 'Tone network'],
    ['47\u202fk\u03a9, 22\u00a0\u00b5F', '47 kohm, 22 uF'],
    ['100\u2126 10\u03bcF', '100ohm 10uF'],
    ['Höhen, Größe, ﬁlter', 'Hohen, Grosse, filter'],
    ['−3 dB — “flat” × 2', '-3 dB - "flat" x 2'],
    ['one\r\n\ttwo\u2028three\u0000', 'one two three'],
    ['低音 🎸', '?? ?'],
    ['  ', ''],
  ])('%j becomes %j', (text, expected) => {
    expect(plainText(text)).toBe(expected);
  });
});
