import { css } from 'lit';

/** Styles of `nw-voicings`. */
export const voicingsStyles = css`
  :host {
    display: block;
    min-width: 0;
  }
  .row {
    display: flex;
    flex-wrap: wrap;
    gap: 4px;
    align-items: center;
  }
  .voicing {
    font: inherit;
    font-size: 14px;
    display: inline-flex;
    align-items: center;
    gap: 7px;
    color: var(--nw-ink-soft);
    background: none;
    border: 1px solid transparent;
    border-radius: 7px;
    min-height: 36px;
    padding: 0 10px;
    cursor: pointer;
    max-width: 22ch;
  }
  .voicing[aria-pressed='true'] {
    color: var(--nw-ink);
    border-color: var(--voicing);
    background: var(--nw-accent-wash);
  }
  .letter {
    color: var(--voicing);
    font-weight: 620;
  }
  .name {
    overflow: hidden;
    text-overflow: ellipsis;
    white-space: nowrap;
  }
  svg {
    width: 26px;
    height: 8px;
    flex: none;
    stroke: var(--voicing);
  }
  .rename {
    width: 16ch;
  }
  @media (pointer: coarse) {
    .voicing {
      min-height: 44px;
    }
  }
`;
