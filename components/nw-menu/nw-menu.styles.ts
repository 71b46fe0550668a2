import { css } from 'lit';

/** Styles of `nw-menu`. */
export const menuStyles = css`
  :host {
    display: inline-block;
    position: relative;
  }
  .list {
    position: absolute;
    inset-block-start: calc(100% + 4px);
    inset-inline-end: 0;
    z-index: 20;
    min-width: 220px;
    max-width: min(320px, 90vw);
    padding: 6px;
    background: var(--nw-sheet);
    border: 1px solid var(--nw-rule);
    border-radius: var(--nw-radius);
    box-shadow: 0 8px 24px var(--nw-shadow);
  }
  :host([upwards]) .list {
    inset-block: auto calc(100% + 4px);
    inset-inline: 0 auto;
  }
  .item {
    display: block;
    width: 100%;
    font: inherit;
    text-align: start;
    color: var(--nw-ink);
    background: none;
    border: 0;
    border-radius: 6px;
    padding: 8px 10px;
    min-height: 40px;
    cursor: pointer;
  }
  .item:hover,
  .item:focus-visible {
    background: var(--nw-accent-wash);
  }
  .item:focus-visible {
    outline-offset: -2px;
  }
  .note {
    display: block;
    color: var(--nw-ink-soft);
    font-size: 13px;
  }
  .item:disabled {
    color: var(--nw-ink-soft);
    cursor: default;
  }
`;
