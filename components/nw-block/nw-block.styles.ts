import { css } from 'lit';

/** Styles of `nw-block`. */
export const blockStyles = css`
  :host {
    display: block;
    min-width: 0;
  }
  .card {
    height: 100%;
    display: flex;
    flex-direction: column;
    gap: 8px;
    background: var(--nw-sheet);
    border: 1px solid var(--nw-rule);
    border-radius: var(--nw-radius);
    padding: 8px 12px 12px;
  }
  .head {
    display: flex;
    align-items: flex-start;
    gap: 8px;
  }
  .names {
    flex: 1;
    min-width: 0;
  }
  .name {
    font: inherit;
    font-weight: 620;
    color: inherit;
    background: none;
    border: 0;
    padding: 2px 0;
    min-height: 28px;
    cursor: pointer;
    text-align: start;
    text-decoration: underline transparent;
    text-underline-offset: 3px;
  }
  .name:hover {
    text-decoration-color: var(--nw-track);
  }
  .doing {
    display: block;
    color: var(--nw-ink-soft);
    font-size: 13px;
    line-height: 1.3;
  }
  .knobs {
    display: flex;
    flex-wrap: wrap;
    justify-content: space-evenly;
    gap: 4px 8px;
  }
  .chips {
    display: flex;
    flex-wrap: wrap;
    gap: 6px;
    margin-block-start: auto;
  }
  :host(:not([present])) .card {
    background: none;
    border-style: dashed;
    padding: 3px 8px 3px 12px;
  }
  :host(:not([present])) .name {
    color: var(--nw-ink-soft);
    font-weight: 550;
  }
  @media (pointer: coarse) {
    .name {
      min-height: 44px;
    }
  }
`;
