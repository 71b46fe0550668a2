import { css } from 'lit';

/** Styles of `nw-header`. */
export const headerStyles = css`
  :host {
    display: block;
    background: var(--nw-sheet);
    border-block-end: 1px solid var(--nw-rule);
  }
  .row {
    display: flex;
    align-items: center;
    flex-wrap: wrap;
    gap: 8px 16px;
    padding: 4px 20px;
    min-height: 52px;
    box-sizing: border-box;
  }
  .mark {
    display: flex;
    align-items: center;
    gap: 10px;
    font-weight: 620;
    margin: 0;
    font-size: 15px;
  }
  .mark svg {
    width: 30px;
    height: 20px;
    color: var(--nw-accent);
  }
  .design {
    display: flex;
    align-items: baseline;
    gap: 8px;
    flex: 1 1 80px;
    min-width: 0;
    color: var(--nw-ink-soft);
  }
  .title {
    font: inherit;
    font-weight: 620;
    color: var(--nw-ink);
    background: none;
    border: 1px solid transparent;
    border-radius: 6px;
    padding: 6px 8px;
    min-height: 32px;
    field-sizing: content;
    min-width: 8ch;
    max-width: 30ch;
    text-overflow: ellipsis;
  }
  .title:hover {
    border-color: var(--nw-rule);
  }
  .title:focus-visible {
    outline: 2px solid var(--nw-accent);
    outline-offset: 1px;
  }
  .tools {
    display: flex;
    align-items: center;
    gap: 8px;
    margin-inline-start: auto;
  }
  .revision {
    white-space: nowrap;
  }
  @media (max-width: 620px) {
    .row {
      padding: 4px 12px;
    }
    .revision,
    .word {
      display: none;
    }
  }
`;
