import { css } from 'lit';

/** Styles of `nw-waveform`. */
export const waveformStyles = css`
  :host {
    display: block;
    height: 48px;
    min-width: 0;
    --grip: 28px;
  }
  .stage {
    position: relative;
    height: 100%;
    touch-action: pan-y;
    user-select: none;
    cursor: pointer;
  }
  .stage.empty {
    cursor: default;
  }
  .picture {
    position: absolute;
    inset: 0;
    border-radius: 4px;
    overflow: hidden;
  }
  svg {
    display: block;
    width: 100%;
    height: 100%;
  }
  .wave {
    fill: var(--nw-wave);
  }
  .wave.chosen {
    fill: color-mix(in srgb, var(--nw-accent) 55%, var(--nw-wave));
  }
  .wash {
    position: absolute;
    inset-block: 0;
    background: var(--nw-accent-wash);
  }
  .nothing {
    position: absolute;
    inset: calc(50% - 0.5px) 0 auto;
    height: 1px;
    background: var(--nw-rule);
  }
  .line {
    position: absolute;
    inset-block: 0;
    width: 2px;
    margin-inline-start: -1px;
    pointer-events: none;
  }
  .edge {
    background: var(--nw-accent);
  }
  .edge::before {
    content: '';
    position: absolute;
    inset-block: calc(50% - 9px);
    width: 8px;
    height: 18px;
    border-radius: 4px;
    background: var(--nw-accent);
  }
  .edge.start::before {
    inset-inline-start: 0;
    border-start-start-radius: 0;
    border-end-start-radius: 0;
  }
  .edge.end::before {
    inset-inline-end: 0;
    border-start-end-radius: 0;
    border-end-end-radius: 0;
  }
  .playhead {
    background: var(--nw-ink);
  }
  .grip {
    position: absolute;
    inset-block: 50% auto;
    translate: 0 -50%;
    width: var(--grip);
    height: max(100%, 44px);
    cursor: ew-resize;
    touch-action: none;
    border-radius: 6px;
  }
  .grip.front {
    z-index: 1;
  }
  .grip:focus-visible,
  .place:focus-visible {
    outline-offset: -2px;
  }
  .place {
    position: absolute;
    inset: 0;
    border-radius: 4px;
  }
  .tag {
    position: absolute;
    inset-block-end: calc(100% + 2px);
    translate: -50% 0;
    padding: 1px 6px;
    border-radius: 5px;
    background: var(--nw-ink);
    color: var(--nw-sheet);
    font-size: 12px;
    font-weight: 550;
    pointer-events: none;
    white-space: nowrap;
  }
  @media (pointer: coarse) {
    :host {
      --grip: 44px;
    }
  }
  @media (forced-colors: active) {
    .wave,
    .wave.chosen {
      fill: CanvasText;
    }
    .line,
    .edge::before {
      background: Highlight;
    }
    .playhead {
      background: CanvasText;
    }
  }
`;
