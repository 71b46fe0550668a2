import { css } from 'lit';

/** Styles of `nw-stress-table`. */
export const stressTableStyles = css`
  :host {
    display: grid;
    gap: 8px;
    min-width: 0;
  }
  h3 {
    font-size: 15px;
    font-weight: 620;
    margin: 8px 0 0;
  }
  .scroll {
    overflow-x: auto;
  }
  table {
    border-collapse: collapse;
    width: 100%;
  }
  th,
  td {
    text-align: end;
    padding: 5px 8px;
    border-block-end: 1px solid var(--nw-hairline);
    white-space: nowrap;
  }
  th:first-child {
    text-align: start;
  }
  thead th {
    color: var(--nw-ink-soft);
    font-weight: 400;
    font-size: 13px;
  }
  tbody th {
    font-weight: 550;
    white-space: normal;
  }
  p {
    margin: 0;
  }
`;
