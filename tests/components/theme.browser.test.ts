import { expect } from '@open-wc/testing';
import { installTheme } from '../../components/theme.ts';
import { setTheme } from './both-themes.ts';

type Colour = readonly [red: number, green: number, blue: number];

function token(name: string): Colour {
  const hex = getComputedStyle(document.documentElement).getPropertyValue(name).trim();
  expect(hex, name).to.match(/^#[\da-f]{6}$/);
  return [1, 3, 5].map((start) => Number.parseInt(hex.slice(start, start + 2), 16)) as unknown as Colour;
}

/** Relative luminance: WCAG 2.2, definition of relative luminance (W3C, 2023). */
function luminance(colour: Colour): number {
  const [red, green, blue] = colour.map((channel) => {
    const share = channel / 255;
    return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4;
  }) as unknown as Colour;
  return 0.2126 * red + 0.7152 * green + 0.0722 * blue;
}

/** Contrast ratio: WCAG 2.2, definition of contrast ratio. */
function contrast(first: string, second: string): number {
  const [dark, light] = [luminance(token(first)), luminance(token(second))].sort((a, b) => a - b);
  return (light! + 0.05) / (dark! + 0.05);
}

const CURVES = [...'abcdefgh'].map((letter) => `--nw-curve-${letter}`);

describe('theme', () => {
  afterEach(() => setTheme(undefined));

  it('measures black on white as 21 : 1, as WCAG has it', () => {
    expect((luminance([255, 255, 255]) + 0.05) / (luminance([0, 0, 0]) + 0.05)).to.be.closeTo(21, 1e-9);
  });

  for (const theme of ['light', 'dark'] as const) {
    describe(theme, () => {
      beforeEach(() => setTheme(theme));

      it('has text of at least 4.5 : 1 (WCAG 1.4.3)', () => {
        for (const [text, ground] of [
          ['--nw-ink', '--nw-paper'],
          ['--nw-ink', '--nw-sheet'],
          ['--nw-ink', '--nw-accent-wash'],
          ['--nw-ink-soft', '--nw-paper'],
          ['--nw-ink-soft', '--nw-sheet'],
          ['--nw-ink-soft', '--nw-accent-wash'],
          ['--nw-caution', '--nw-sheet'],
          ['--nw-caution', '--nw-paper'],
          ['--nw-on-accent', '--nw-accent'],
          ...CURVES.map((curve) => [curve, '--nw-sheet'] as const),
        ] as const) {
          expect(contrast(text, ground), `${text} on ${ground}`).to.be.at.least(4.5);
        }
      });

      it('has controls of at least 3 : 1 (WCAG 1.4.11)', () => {
        for (const [control, ground] of [
          ['--nw-accent', '--nw-sheet'],
          ['--nw-accent', '--nw-paper'],
          ['--nw-track', '--nw-sheet'],
        ] as const) {
          expect(contrast(control, ground), `${control} on ${ground}`).to.be.at.least(3);
        }
      });

      it('has eight curve colours, no two the same', () => {
        expect(new Set(CURVES.map((curve) => token(curve).join())).size).to.equal(8);
      });

      it('tells the browser’s own controls', () => {
        expect(getComputedStyle(document.documentElement).colorScheme).to.equal(theme);
      });
    });
  }

  it('follows the system where nothing was chosen', () => {
    setTheme(undefined);
    const isDark = matchMedia('(prefers-color-scheme: dark)').matches;
    const followed = token('--nw-paper');
    setTheme(isDark ? 'dark' : 'light');
    expect(token('--nw-paper')).to.deep.equal(followed);
    setTheme(isDark ? 'light' : 'dark');
    expect(token('--nw-paper')).not.to.deep.equal(followed);
  });

  it('is put into a document once, however often it is asked', () => {
    installTheme(document);
    const { length } = document.adoptedStyleSheets;
    installTheme(document);
    expect(document.adoptedStyleSheets.length).to.equal(length);
  });
});
