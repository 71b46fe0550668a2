import { css } from 'lit';

/** Styles of `nw-level-meter`. */
export const levelMeterStyles = css`
  :host {
    display: block;
    width: 150px;
    min-width: 0;
  }
  .meter {
    display: flex;
    align-items: center;
    gap: 6px;
  }
  .bar {
    position: relative;
    flex: 1;
    height: 10px;
    border-radius: 5px;
    background: color-mix(in srgb, var(--nw-track) 22%, var(--nw-sheet));
    overflow: hidden;
  }
  .level {
    position: absolute;
    inset: 0;
    background: var(--nw-accent);
    transform-origin: left;
  }
  .hold {
    position: absolute;
    inset-block: 0;
    width: 2px;
    margin-inline-start: -2px;
    background: var(--nw-ink);
  }
  .over {
    flex: none;
    width: 14px;
    height: 14px;
    border: 1px solid var(--nw-track);
    border-radius: 50%;
    font-size: 12px;
    font-weight: 620;
    line-height: 12px;
    text-align: center;
  }
  .over.lit {
    border-color: var(--nw-caution);
    background: var(--nw-caution);
    color: var(--nw-sheet);
  }
  @media (forced-colors: active) {
    .bar {
      border: 1px solid CanvasText;
    }
    .level {
      background: Highlight;
    }
  }
`;
