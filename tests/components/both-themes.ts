import { expect } from '@open-wc/testing';
import { installTheme } from '../../components/theme.ts';

/** Sets the theme as the switch on the page does; undefined follows the system again. */
export function setTheme(theme: 'light' | 'dark' | undefined): void {
  installTheme(document);
  if (theme === undefined) delete document.documentElement.dataset['theme'];
  else document.documentElement.dataset['theme'] = theme;
}

/** axe (with its contrast rules) finds nothing, in the light theme and in the dark one. */
export async function expectAccessibleInBothThemes(element: Element): Promise<void> {
  try {
    for (const theme of ['light', 'dark'] as const) {
      setTheme(theme);
      // Transitions of up to 120 ms must have ended before colours are compared.
      await Promise.all(document.getAnimations().map((animation) => animation.finished));
      await expect(element).to.be.accessible();
    }
  } finally {
    setTheme(undefined);
  }
}
