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
    user-select: none;
    cursor: crosshair;
  }
  .canvas,
  .cursor {
    position: absolute;
    inset: 0;
  }
  .cursor {
    border-radius: 6px;
  }
  .cursor:focus-visible {
    outline-offset: -2px;
  }
`;
