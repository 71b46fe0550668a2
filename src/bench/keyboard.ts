/** What a key press means to the whole page. */
export type PageKey =
  | { readonly kind: 'play' }
  | { readonly kind: 'voicing'; readonly index: number }
  | { readonly kind: 'undo' }
  | { readonly kind: 'redo' };

/** The parts of a key event that decide. */
export interface PressedKey {
  readonly key: string;
  readonly ctrlKey: boolean;
  readonly metaKey: boolean;
  readonly shiftKey: boolean;
  readonly altKey: boolean;
}

/**
 * What a key means while nothing is being typed: space plays and stops, 1 to 8 choose a voicing,
 * Ctrl or Command with Z undoes (with Shift, or with Y, redoes). `undefined` for any other.
 */
export function pageKey(event: PressedKey): PageKey | undefined {
  if (event.altKey) return undefined;
  const key = event.key.toLowerCase();
  if (event.ctrlKey || event.metaKey) {
    if (key === 'z') return { kind: event.shiftKey ? 'redo' : 'undo' };
    return key === 'y' && !event.shiftKey ? { kind: 'redo' } : undefined;
  }
  if (event.key === ' ') return { kind: 'play' };
  return /^[1-8]$/.test(event.key) ? { kind: 'voicing', index: Number(event.key) - 1 } : undefined;
}

/** Roles whose elements use the keys themselves. */
const OWN_KEYS = new Set(['button', 'menuitem', 'tab', 'switch', 'radio', 'option']);

/**
 * Whether the element that has the focus takes this key itself: a text field everything, a button the
 * space bar, a knob (a slider) the figures.
 */
export function takesKey(focused: Element | undefined, key: string): boolean {
  if (focused === undefined) return false;
  const tag = focused.localName;
  if (tag === 'textarea' || tag === 'select') return true;
  if (tag === 'input') return (focused as HTMLInputElement).type !== 'checkbox' || key === ' ';
  if ((focused as HTMLElement).isContentEditable) return true;
  const role = focused.getAttribute('role') ?? '';
  if (role === 'slider') return /^[\d.,]$/.test(key) && focused.classList.contains('dial');
  return key === ' ' && (tag === 'button' || tag === 'a' || tag === 'summary' || OWN_KEYS.has(role));
}
