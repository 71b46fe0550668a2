import { css } from 'lit';

/** Styles of `nw-curve-table`. */
export const curveTableStyles = css`
  :host {
    display: block;
  }
  .scroll {
    overflow-x: auto;
    border-radius: 4px;
  }
  table {
    border-collapse: collapse;
    width: 100%;
  }
  th,
  td {
    text-align: end;
    padding: 4px 12px;
    border-block-end: 1px solid var(--nw-hairline);
    white-space: nowrap;
  }
  thead th {
    position: sticky;
    inset-block-start: 0;
    background: var(--nw-sheet);
    font-weight: 550;
  }
  tbody th {
    font-weight: 400;
    color: var(--nw-ink-soft);
  }
  caption {
    text-align: start;
    color: var(--nw-ink-soft);
    font-size: 13px;
    padding: 6px 0;
  }
`;
