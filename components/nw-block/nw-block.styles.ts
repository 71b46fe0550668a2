import { css } from 'lit';

/**
 * Styles of `nw-block`. Out of the line, name and switch lie on the rail, which runs on behind them.
 */
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
    padding: 7px 12px 12px;
  }
  .head {
    display: flex;
    justify-content: space-between;
    align-items: flex-start;
    gap: 8px;
  }
  .name {
    font: inherit;
    font-weight: 620;
    color: inherit;
    background: none;
    border: 0;
    border-radius: 4px;
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
    margin-block-start: -8px;
    width: fit-content;
    max-width: 100%;
    color: var(--nw-ink-soft);
    font-size: 13px;
    line-height: 1.3;
  }
  .choosable {
    position: relative;
    border-radius: 4px;
    padding-inline-end: 16px;
  }
  .choosable::after {
    content: '';
    position: absolute;
    inset-block-start: 4px;
    inset-inline-end: 3px;
    width: 6px;
    height: 6px;
    border: solid var(--nw-ink-soft);
    border-width: 0 1.500px 1.500px 0;
    rotate: 45deg;
  }
  .choosable:hover {
    color: var(--nw-ink);
  }
  .choosable:has(select:focus-visible) {
    outline: 2px solid var(--nw-accent);
    outline-offset: 2px;
  }
  .choosable select {
    position: absolute;
    inset: -4px -4px -4px 0;
    width: calc(100% + 4px);
    min-height: 0;
    opacity: 0;
    cursor: pointer;
  }
  .knobs {
    display: flex;
    flex-wrap: wrap;
    justify-content: center;
    gap: 8px 4px;
    margin-block: 2px;
  }
  .knobs > * {
    flex: 1 1 88px;
    max-width: 152px;
  }
  .chips {
    display: flex;
    flex-wrap: wrap;
    gap: 6px;
    margin-block-start: auto;
  }
  :host(:not([present])) .card {
    background: none;
    border: 0;
    padding: 0;
  }
  :host(:not([present])) .head {
    gap: 16px;
  }
  :host(:not([present])) :is(.name, nw-switch) {
    background: var(--nw-paper);
    min-height: 44px;
    padding: 0 8px;
    align-items: center;
  }
  :host(:not([present])) .name {
    color: var(--nw-ink-soft);
    font-weight: 550;
  }
  @media (pointer: coarse) {
    .card {
      padding-block-start: 0;
    }
    .name {
      min-height: 44px;
    }
    .choosable {
      min-height: 44px;
      margin-block-end: -14px;
    }
    .choosable select {
      inset-block: 0;
      height: 100%;
    }
  }
`;
