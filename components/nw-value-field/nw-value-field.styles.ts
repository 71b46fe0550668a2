import { css } from 'lit';

/** Styles of `nw-value-field`. */
export const valueFieldStyles = css`
  :host {
    display: inline-grid;
    grid-template-columns: minmax(0, auto);
    min-width: 0;
    max-width: 100%;
  }
  .row {
    display: flex;
    gap: 4px;
  }
  .row > * {
    flex: none;
  }
  .row > .field {
    width: 12ch;
    min-width: 0;
    flex: 1 1 auto;
    font-weight: 620;
  }
  .field[aria-invalid='true'] {
    border-color: var(--nw-caution);
  }
  .series {
    color: var(--nw-ink-soft);
    font-size: 13px;
    border-color: transparent;
    background: none;
    padding-inline: 4px 0;
  }
  .series:hover {
    border-color: var(--nw-rule);
  }
  .message {
    color: var(--nw-caution);
    font-size: 13px;
    max-width: 34ch;
  }
  .message:not(:empty) {
    margin-block-start: 4px;
  }
`;
