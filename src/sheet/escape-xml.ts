const ENTITIES: Readonly<Record<string, string>> = {
  '&': '&amp;',
  '<': '&lt;',
  '>': '&gt;',
  '"': '&quot;',
  "'": '&#39;',
};

/** Control characters but tab and line ends, half surrogates, and the two that are no characters: XML knows none. */
const UNKNOWN_TO_XML = /(?![\t\n\r])[\p{Cc}\p{Cs}\uFFFE\uFFFF]/gu;

/** Text as it may stand in an XML or HTML element or attribute; characters XML does not know are left out. */
export function escapeXml(text: string): string {
  return text.replace(UNKNOWN_TO_XML, '').replace(/[&<>"']/g, (character) => ENTITIES[character]!);
}
