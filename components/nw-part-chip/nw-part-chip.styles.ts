import { css } from 'lit';

/** Styles of `nw-part-chip`. */
export const partChipStyles = css`
  :host {
    display: inline-block;
    max-width: 100%;
  }
  button {
    font: inherit;
    font-size: 13px;
    color: var(--nw-ink-soft);
    background: var(--nw-paper);
    border: 1px solid var(--nw-rule);
    border-radius: 7px;
    min-height: 30px;
    padding: 2px 8px;
    cursor: pointer;
    text-align: start;
  }
  button:hover {
    border-color: var(--nw-track);
  }
  button[aria-pressed='true'] {
    border-color: var(--nw-accent);
    box-shadow: inset 0 0 0 1px var(--nw-accent);
  }
  .value {
    color: var(--nw-ink);
    font-weight: 620;
    margin-inline-start: 6px;
    white-space: nowrap;
  }
  @media (pointer: coarse) {
    button {
      min-height: 44px;
    }
  }
`;
