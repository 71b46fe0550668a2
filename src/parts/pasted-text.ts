/** Figures that Unicode's own tidying would turn into ordinary ones and so change the number: 10² is not 102. */
const SPECIAL_FIGURES =
  /[\u00b2\u00b3\u00b9\u00bc-\u00be\u2070-\u209f\u2150-\u218f\u2460-\u249b\u24ea-\u24ff]/;

/** Grouping by spaces in threes (ISO 80000-1, 7.3.1, from memory); it can mean nothing else. */
const GROUPED = /^([+-]?\d{1,3}(?: \d{3})+)(?! ?\d)/;

/** Text without what pasting brings along, or why it cannot be taken as one number. */
export type TidyText =
  | { readonly ok: true; readonly text: string }
  | { readonly ok: false; readonly why: string };

/**
 * Takes out of a typed or pasted value what cannot be seen and what means nothing: spaces of every
 * width, line ends, joiners, direction marks, variation selectors and other combining marks; turns full-width letters and both
 * micro signs into one form, dashes used as minus into `-`.
 *
 * A space between figures goes only where it groups them in threes (1 000 000); `4 7` is refused, and
 * so are raised, lowered and circled figures and fractions.
 */
export function tidyPasted(text: string): TidyText {
  if (SPECIAL_FIGURES.test(text)) {
    return { ok: false, why: 'has raised, lowered or fraction figures, which are not guessed.' };
  }
  const plain = text
    .normalize('NFKC') // first: it can itself bring spaces and marks to light
    .replace(/\s/gu, ' ')
    .replace(/[\p{Cf}\p{Cc}\p{Mn}]/gu, '')
    .normalize('NFKC')
    .replace(/ +/g, ' ')
    .replace(/[\u2010-\u2014\u2212]/g, '-')
    .trim();
  const joined = plain.replace(GROUPED, (group) => group.replaceAll(' ', ''));
  if (/[\d.,] [\d.,]/.test(joined)) return { ok: false, why: 'has a space inside the number.' };
  return { ok: true, text: joined.replaceAll(' ', '') };
}
