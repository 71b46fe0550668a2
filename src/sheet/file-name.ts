/** Longest part of a name, in letters: of four bytes each at most, it stays under 255 with a date and an ending. */
const LONGEST = 48;

/** Names that some systems keep for devices. */
const RESERVED = /^(con|prn|aux|nul|com\d|lpt\d)$/;

/** A text as part of a file name: lower case letters of any script, digits and hyphens; never empty. */
function slug(text: string): string {
  const plain = text
    .normalize('NFKC') // one code point for an accented letter, plain forms for full-width ones
    .toLowerCase()
    .replace(/[^\p{L}\p{M}\p{N}]+/gu, '-')
    .replace(/^-+|-+$/g, '');
  const cut = [...plain].slice(0, LONGEST).join('').replace(/-+$/, '');
  if (cut === '') return 'design';
  return RESERVED.test(cut) ? `design-${cut}` : cut;
}

/** The day of a date in the user's own time zone, as in "2026-03-14". */
function dayOf(date: Date): string {
  const two = (value: number): string => String(value).padStart(2, '0');
  return `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
}

/**
 * Name of a file that leaves the program: the design's title, what it is, and the day, as in
 * `attic-amplifier-curve-2026-03-14.csv`. Safe on every system; an invalid date is left out.
 *
 * @param what what the file holds: "curve", "plot"; may be empty.
 * @param ending without the dot.
 */
export function fileName(title: string, what: string, date: Date, ending: string): string {
  const day = Number.isNaN(date.getTime()) ? [] : [dayOf(date)];
  return `${[slug(title), ...(what === '' ? [] : [slug(what)]), ...day].join('-')}.${ending}`;
}
