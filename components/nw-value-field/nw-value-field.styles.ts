import { css } from 'lit';

/** Styles of `nw-value-field`. */
export const valueFieldStyles = css`
  :host {
    display: inline-grid;
    gap: 4px;
    min-width: 0;
  }
  .row {
    display: flex;
    gap: 4px;
  }
  .field {
    width: 12ch;
    min-width: 0;
    flex: 1 1 auto;
    font-weight: 620;
  }
  .field[aria-invalid='true'] {
    border-color: var(--nw-caution);
  }
  .message {
    color: var(--nw-caution);
    font-size: 13px;
    max-width: 34ch;
  }
`;
