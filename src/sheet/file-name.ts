/** Longest name without its ending; with a date and an ending it stays under what every system takes. */
const LONGEST = 60;

/** Names that some systems keep for devices. */
const RESERVED = /^(con|prn|aux|nul|com\d|lpt\d)$/;

/** A text as part of a file name: lower case letters, digits and hyphens, never empty. */
function slug(text: string): string {
  const plain = text
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, '-')
    .replace(/^-+|-+$/g, '');
  const cut = [...plain].slice(0, LONGEST).join('').replace(/-+$/, '');
  return cut === '' || RESERVED.test(cut) ? `design${cut === '' ? '' : `-${cut}`}` : cut;
}

/**
 * Name of a file that leaves the program: the design's title, what it is, and the day, as in
 * `attic-amplifier-curve-2026-03-14.csv`. Safe on every system.
 *
 * @param what what the file holds: "curve", "plot"; may be empty.
 * @param ending without the dot.
 */
export function fileName(title: string, what: string, date: Date, ending: string): string {
  const two = (value: number): string => String(value).padStart(2, '0');
  const day = `${date.getFullYear()}-${two(date.getMonth() + 1)}-${two(date.getDate())}`;
  return `${[slug(title), ...(what === '' ? [] : [slug(what)]), day].join('-')}.${ending}`;
}
