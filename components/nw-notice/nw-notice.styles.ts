import { css } from 'lit';

/** Styles of `nw-notice`. */
export const noticeStyles = css`
  :host {
    display: block;
  }
  .box {
    display: flex;
    gap: 8px;
    align-items: center;
    border-inline-start: 3px solid var(--nw-accent);
    padding: 6px 4px 6px 12px;
    color: var(--nw-ink-soft);
    font-size: 14px;
  }
  .text {
    flex: 1;
    overflow-wrap: anywhere;
  }
  .caution,
  .error {
    border-color: var(--nw-caution);
  }
  .error {
    color: var(--nw-ink);
    font-weight: 550;
  }
  button {
    font: inherit;
    color: var(--nw-ink-soft);
    background: none;
    border: 0;
    border-radius: 6px;
    min-width: 32px;
    min-height: 32px;
    cursor: pointer;
  }
  @media (pointer: coarse) {
    button {
      min-width: 44px;
      min-height: 44px;
    }
  }
`;
