import { css } from 'lit';

/** Styles of `nw-listen-panel`. */
export const listenPanelStyles = css`
  :host {
    display: grid;
    gap: 14px;
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
  label.rate {
    display: grid;
    gap: 4px;
    justify-items: start;
  }
  dl {
    display: grid;
    grid-template-columns: 1fr auto;
    gap: 4px 12px;
    margin: 0;
  }
  dd {
    margin: 0;
    font-weight: 620;
    text-align: end;
  }
`;
