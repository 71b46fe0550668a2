/** What stands in for signs that people write about circuits; the rest is taken apart by Unicode. */
const STAND_INS: Readonly<Record<string, string>> = {
  '\u00b5': 'u',
  '\u03bc': 'u',
  '\u03a9': 'ohm',
  '\u2126': 'ohm',
  '−': '-',
  '–': '-',
  '—': '-',
  '×': 'x',
  '·': '*',
  '“': '"',
  '”': '"',
  '‘': "'",
  '’': "'",
  ß: 'ss',
};

/**
 * A text on one line in printable ASCII, because SPICE programs differ over anything else (one was
 * seen to hang on a µ in the title): "47 kΩ" becomes "47 kohm", accents are dropped, what is left is `?`.
 */
export function plainText(text: string): string {
  return text
    .replace(/[\u00b5\u03bc\u03a9\u2126−–—×·“”‘’ß]/g, (sign) => STAND_INS[sign]!)
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/[\p{C}\s]+/gu, ' ')
    .replace(/[^ -~]/gu, '?')
    .trim();
}
