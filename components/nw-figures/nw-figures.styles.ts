import { css } from 'lit';

/** Styles of `nw-figures`. */
export const figuresStyles = css`
  :host {
    display: block;
    container-type: inline-size;
  }
  dl {
    margin: 0;
    display: grid;
    gap: 8px 16px;
    grid-template-columns: repeat(auto-fill, minmax(112px, 1fr));
  }
  dt,
  .reference {
    color: var(--nw-ink-soft);
    font-size: 13px;
  }
  dd {
    margin: 0;
    font-weight: 620;
    font-size: 17px;
    line-height: 1.25;
  }
  dd .note {
    display: block;
    font-size: 13px;
    font-weight: 400;
    color: var(--nw-ink-soft);
  }
  .reference {
    margin: 8px 0 0;
    font-size: 12px;
    line-height: 1.3;
  }
`;
