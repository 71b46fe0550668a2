import { css } from 'lit';

/**
 * The design tokens. They stand on the document's root, so that every element inherits them; the
 * theme follows the system unless `data-theme` on the root says otherwise.
 */
const light = css`
  --nw-paper: #f3f4f1;
  --nw-sheet: #ffffff;
  --nw-ink: #18212b;
  --nw-ink-soft: #5a6673;
  --nw-rule: #d4d9dc;
  --nw-hairline: #e7eae9;
  --nw-track: #87929b;
  --nw-accent: #0a6b70;
  --nw-accent-wash: #dcecec;
  --nw-on-accent: #ffffff;
  --nw-caution: #9a3412;
  --nw-wave: #9aa4ad;
  --nw-shadow: rgb(24 33 43 / 18%);
  --nw-veil: rgb(24 33 43 / 35%);
  --nw-curve-a: #0072b2;
  --nw-curve-b: #c44f00;
  --nw-curve-c: #00805d;
  --nw-curve-d: #a8377e;
  --nw-curve-e: #8a6400;
  --nw-curve-f: #2378a8;
  --nw-curve-g: #6f6a00;
  --nw-curve-h: #3d4752;
  color-scheme: light;
`;

const dark = css`
  --nw-paper: #10151b;
  --nw-sheet: #171e26;
  --nw-ink: #e6ebf0;
  --nw-ink-soft: #97a4b1;
  --nw-rule: #2c3743;
  --nw-hairline: #212a34;
  --nw-track: #667482;
  --nw-accent: #56c2c2;
  --nw-accent-wash: #16363a;
  --nw-on-accent: #10151b;
  --nw-caution: #fdba74;
  --nw-wave: #5d6b78;
  --nw-shadow: rgb(0 0 0 / 45%);
  --nw-veil: rgb(0 0 0 / 55%);
  --nw-curve-a: #56b4e9;
  --nw-curve-b: #f0903c;
  --nw-curve-c: #3fc79b;
  --nw-curve-d: #e08abb;
  --nw-curve-e: #e6b422;
  --nw-curve-f: #8ecbf0;
  --nw-curve-g: #e8e07a;
  --nw-curve-h: #c3ccd4;
  color-scheme: dark;
`;

const documentStyles = css`
  :root {
    ${light}
    --nw-radius: 10px;
    --nw-font: system-ui, 'Segoe UI', 'DejaVu Sans', sans-serif;
  }
  @media (prefers-color-scheme: dark) {
    :root:not([data-theme='light']) {
      ${dark}
    }
  }
  :root[data-theme='dark'] {
    ${dark}
  }
  body {
    margin: 0;
    background: var(--nw-paper);
    color: var(--nw-ink);
    font: 15px/1.4 var(--nw-font);
    font-variant-numeric: tabular-nums;
  }
`;

/** Puts the tokens into a document; doing so twice changes nothing. */
export function installTheme(target: Document): void {
  const sheet = documentStyles.styleSheet;
  if (sheet === undefined || target.adoptedStyleSheets.includes(sheet)) return;
  target.adoptedStyleSheets = [...target.adoptedStyleSheets, sheet];
}

/** What every element starts from: box sizing, buttons, focus, and nothing moving where that is asked for. */
export const baseStyles = css`
  :host {
    font: 15px/1.4 var(--nw-font);
    font-variant-numeric: tabular-nums;
    color: var(--nw-ink);
  }
  :host([hidden]) {
    display: none;
  }
  *,
  *::before,
  *::after {
    box-sizing: border-box;
  }
  .soft {
    color: var(--nw-ink-soft);
    font-size: 13px;
  }
  .button {
    font: inherit;
    font-weight: 550;
    color: var(--nw-ink);
    background: var(--nw-sheet);
    border: 1px solid var(--nw-rule);
    border-radius: 7px;
    min-height: 36px;
    padding: 0 14px;
    cursor: pointer;
  }
  .button:hover:not(:disabled) {
    border-color: var(--nw-track);
  }
  .button:disabled {
    color: var(--nw-ink-soft);
    opacity: 0.55;
    cursor: default;
  }
  .button.icon {
    padding: 0;
    width: 36px;
  }
  .button.primary {
    color: var(--nw-on-accent);
    background: var(--nw-accent);
    border-color: var(--nw-accent);
  }
  .button.quiet {
    border-color: transparent;
    background: none;
    color: var(--nw-ink-soft);
  }
  :is(button, input, select, textarea, a, [tabindex]):focus-visible {
    outline: 2px solid var(--nw-accent);
    outline-offset: 2px;
  }
  select,
  .field {
    font: inherit;
    color: var(--nw-ink);
    background: var(--nw-sheet);
    border: 1px solid var(--nw-rule);
    border-radius: 6px;
    min-height: 36px;
    padding: 0 8px;
    max-width: 100%;
  }
  .spoken-only {
    position: absolute;
    width: 1px;
    height: 1px;
    overflow: hidden;
    clip-path: inset(50%);
    white-space: nowrap;
  }
  @media (pointer: coarse) {
    .button,
    select,
    .field {
      min-height: 44px;
    }
    .button.icon {
      width: 44px;
    }
  }
  @media (prefers-reduced-motion: reduce) {
    *,
    *::before,
    *::after {
      transition: none !important;
      animation: none !important;
    }
  }
`;
