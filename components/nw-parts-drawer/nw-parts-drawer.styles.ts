import { css } from 'lit';

/** Styles of `nw-parts-drawer`. Its heading takes the focus only to be read when the drawer opens. */
export const partsDrawerStyles = css`
  dialog {
    width: min(760px, 100%);
    max-width: none;
    height: 100dvh;
    max-height: none;
    margin: 0;
    margin-inline-start: auto;
    padding: 0;
    border: 0;
    border-inline-start: 1px solid var(--nw-rule);
    background: var(--nw-sheet);
    color: var(--nw-ink);
    overscroll-behavior: contain;
  }
  dialog[open] {
    display: flex;
    flex-direction: column;
  }
  dialog::backdrop {
    background: var(--nw-veil);
  }
  header {
    position: sticky;
    inset-block-start: 0;
    z-index: 1;
    display: flex;
    align-items: center;
    gap: 12px;
    padding: 10px 20px;
    background: var(--nw-sheet);
    border-block-end: 1px solid var(--nw-hairline);
  }
  h2 {
    font-size: 17px;
    font-weight: 620;
    margin: 0;
    flex: 1;
  }
  h2[tabindex]:focus-visible {
    outline: none;
  }
  .inside {
    flex: 1;
    display: grid;
    align-content: start;
    gap: 18px;
    padding: 14px 20px 32px;
  }
  p {
    margin: 0;
  }
  h3 {
    font-size: 15px;
    font-weight: 620;
    margin: 4px 0 -10px;
  }
  .choices {
    display: grid;
    grid-template-columns: repeat(auto-fit, minmax(min(240px, 100%), 1fr));
    gap: 16px 20px;
  }
  .choices:empty {
    display: none;
  }
  .choices label {
    display: grid;
    align-content: start;
    gap: 4px;
  }
  .name {
    font-weight: 550;
  }
  ul {
    list-style: none;
    margin: 0;
    padding: 0;
  }
  li {
    display: grid;
    grid-template-columns: 2.500em minmax(0, 1fr) auto;
    gap: 6px 12px;
    align-items: start;
    padding: 12px 0;
  }
  li + li {
    border-block-start: 1px solid var(--nw-hairline);
  }
  .designator {
    color: var(--nw-ink-soft);
  }
  .taper {
    display: flex;
    flex-wrap: wrap;
    gap: 4px 8px;
    align-items: center;
    grid-column: 2 / -1;
  }
  .taper .field {
    width: 5.500em;
  }
  .taper .field[aria-invalid='true'] {
    border-color: var(--nw-caution);
  }
  .message {
    color: var(--nw-caution);
    font-size: 13px;
    flex-basis: 100%;
  }
  .message:empty {
    display: none;
  }
  @media (max-width: 620px) {
    header {
      padding: 8px 12px;
    }
    .inside {
      padding: 12px 12px 32px;
    }
    li {
      grid-template-columns: 2.500em minmax(0, 1fr);
    }
    nw-value-field {
      grid-column: 1 / -1;
    }
    .taper {
      grid-column: 1 / -1;
    }
  }
`;
