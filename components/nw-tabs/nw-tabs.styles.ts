import { css } from 'lit';

/** Styles of `nw-tabs`. */
export const tabsStyles = css`
  :host {
    display: block;
    container-type: inline-size;
  }
  .list {
    display: flex;
    border-block-end: 1px solid var(--nw-rule);
    overflow-x: auto;
  }
  button {
    flex: 1 1 auto;
    font: inherit;
    color: var(--nw-ink-soft);
    background: none;
    border: 0;
    border-block-end: 3px solid transparent;
    min-height: 48px;
    padding: 0 clamp(4px, 2cqi, 10px);
    cursor: pointer;
  }
  button:hover {
    color: var(--nw-ink);
  }
  button[aria-selected='true'] {
    color: var(--nw-ink);
    font-weight: 620;
    border-color: var(--nw-accent);
  }
  button:focus-visible {
    outline-offset: -4px;
  }
  .panel {
    padding: 16px;
  }
`;
