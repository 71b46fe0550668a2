import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { tidyPasted } from '../../../src/parts/pasted-text.ts';

const taken = (text: string): string | undefined => {
  const tidy = tidyPasted(text);
  return tidy.ok ? tidy.text : undefined;
};

describe('pasted text', () => {
  it.each([
    ['22 nF', '22nF', 'a plain space'],
    ['22\u00a0nF', '22nF', 'a no-break space'],
    ['22\u202fnF', '22nF', 'a narrow no-break space'],
    ['22\u2009nF', '22nF', 'a thin space'],
    ['\t22 nF\r\n', '22nF', 'a table cell and a line end'],
    ['\ufeff22\u200bn\u2060F\u00ad', '22nF', 'marks without width'],
    ['\u202a22n\u202c\u2066\u2069', '22n', 'direction marks'],
    ['22n\ufe0f', '22n', 'a variation selector'],
    ['２２ｎＦ', '22nF', 'full-width letters'],
    ['\u22125', '-5', 'a real minus sign'],
    ['\u20135', '-5', 'a dash for a minus'],
    ['1\u202f000\u202f000', '1000000', 'grouping in threes'],
    ['12 000 Ω', '12000Ω', 'grouping before a unit'],
    ['4 k 7', '4k7', 'spaces around the prefix'],
    ['', '', 'nothing'],
    [' \u200b ', '', 'nothing that can be seen'],
  ])('%j is taken as %j: %s', (text, expected) => {
    expect(taken(text)).toBe(expected);
  });

  it('has both micro signs in one form', () => {
    expect(taken('\u00b5')).toBe(taken('\u03bc'));
  });

  it('has both ohm signs in one form', () => {
    expect(taken('\u2126')).toBe('\u03a9');
  });

  it.each([
    ['4 7', /space inside/],
    ['1 00', /space inside/],
    ['1 0000', /space inside/],
    ['1000 000', /space inside/],
    ['4. 7', /space inside/],
    ['10²', /raised/],
    ['10⁻⁹', /raised/],
    ['x₂', /raised/],
    ['½', /fraction/],
    ['①', /raised/],
  ])('%j is refused', (text, why) => {
    const tidy = tidyPasted(text);
    expect(tidy.ok ? '' : tidy.why).toMatch(why);
  });

  it('never changes a figure: the digits that come out are those that went in, or it is refused', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        const tidy = tidyPasted(text);
        const digits = (from: string): string => from.replace(/\D/g, '');
        if (tidy.ok) expect(digits(tidy.text)).toBe(digits(text.normalize('NFKC')));
      }),
    );
  });

  it('is left alone by a second tidying', () => {
    fc.assert(
      fc.property(fc.string({ unit: 'grapheme' }), (text) => {
        const once = taken(text);
        if (once !== undefined) expect(taken(once)).toBe(once);
      }),
    );
  });
});
