import { css } from 'lit';

/** Styles of `nw-knob`. */
export const knobStyles = css`
  :host {
    display: inline-grid;
    align-content: start;
    justify-items: center;
    min-width: 88px;
    text-align: center;
  }
  .label {
    font-weight: 550;
  }
  .stage {
    position: relative;
    margin-block: 1px 3px;
  }
  .dial {
    position: relative;
    width: 88px;
    height: 84px;
    border-radius: 50%;
    cursor: ns-resize;
    touch-action: none;
    user-select: none;
  }
  .dial:focus-visible {
    outline-offset: 1px;
  }
  svg {
    width: 100%;
    height: 100%;
    overflow: visible;
  }
  .track {
    stroke: var(--nw-rule);
    stroke-width: 5;
    fill: none;
    stroke-linecap: round;
  }
  .filled {
    stroke: var(--nw-accent);
    stroke-width: 5;
    fill: none;
    stroke-linecap: round;
  }
  .ticks {
    stroke: var(--nw-track);
    stroke-width: 1.2;
  }
  .pointer {
    stroke: var(--nw-ink);
    stroke-width: 3;
    stroke-linecap: round;
  }
  .value,
  .entry {
    position: absolute;
    inset: 50% auto auto 50%;
    transform: translate(-50%, -50%);
    font-size: 18px;
    font-weight: 620;
    line-height: 1;
  }
  .entry {
    width: 56px;
    min-height: 30px;
    text-align: center;
    border: 1px solid var(--nw-accent);
    border-radius: 6px;
    background: var(--nw-sheet);
    color: var(--nw-ink);
    font: inherit;
    font-weight: 620;
  }
  .readout {
    color: var(--nw-ink-soft);
    font-size: 13px;
    min-height: 1.4em;
  }
  .entry[aria-invalid='true'] {
    border-color: var(--nw-caution);
  }
  .refused {
    color: var(--nw-caution);
  }
`;
