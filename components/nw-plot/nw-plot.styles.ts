import { css } from 'lit';

/** Styles of `nw-plot`. */
export const plotStyles = css`
  :host {
    display: block;
    min-height: 160px;
  }
  .area {
    position: relative;
    height: 100%;
    min-height: inherit;
    touch-action: pan-y;
    cursor: crosshair;
    border-radius: 6px;
  }
  .canvas {
    position: absolute;
    inset: 0;
  }
  .unit {
    position: absolute;
    inset: 0 auto auto 8px;
    font-size: 12px;
    color: var(--nw-ink-soft);
    pointer-events: none;
  }
`;
