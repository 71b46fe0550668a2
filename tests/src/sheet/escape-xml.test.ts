import { describe, expect, it } from 'vitest';
import { escapeXml } from '../../../src/sheet/escape-xml.ts';

describe('text in XML', () => {
  it('escapes the five that mean something', () => {
    expect(escapeXml(`<a href="x" title='y'>&`)).toBe('&lt;a href=&quot;x&quot; title=&#39;y&#39;&gt;&amp;');
  });

  it('keeps letters, emoji, tabs and line ends', () => {
    expect(escapeXml('Ω µ 低 🎸\t\r\n')).toBe('Ω µ 低 🎸\t\r\n');
  });

  it('leaves out what XML does not know: controls, half surrogates, non-characters', () => {
    expect(escapeXml('a\u0000b\u0008c\u001fd\ud800e\uffff')).toBe('abcde');
  });
});
