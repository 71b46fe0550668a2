import { css } from 'lit';

/** Styles of `nw-swap-panel`. */
export const swapPanelStyles = css`
  :host {
    display: grid;
    gap: 12px;
  }
  h2 {
    font-size: 16px;
    font-weight: 620;
    margin: 0;
  }
  p {
    margin: 0;
    color: var(--nw-ink-soft);
  }
  table {
    border-collapse: collapse;
    width: 100%;
  }
  th,
  td {
    text-align: end;
    padding: 7px 6px;
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
    font-weight: 620;
  }
  tr.present th,
  tr.present td {
    color: var(--nw-accent);
  }
  tr.tried {
    background: var(--nw-accent-wash);
  }
  .key {
    font: inherit;
    font-size: 13px;
    min-width: 28px;
    min-height: 28px;
    color: var(--nw-ink);
    background: var(--nw-sheet);
    border: 1px solid var(--nw-rule);
    border-radius: 6px;
    cursor: pointer;
  }
  .actions {
    display: flex;
    flex-wrap: wrap;
    gap: 8px;
  }
  .settings {
    display: flex;
    flex-wrap: wrap;
    gap: 12px;
    align-items: start;
  }
  .settings label {
    display: grid;
    gap: 4px;
  }
  @media (pointer: coarse) {
    .key {
      min-width: 44px;
      min-height: 44px;
    }
  }
`;
