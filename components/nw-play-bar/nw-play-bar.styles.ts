import { css } from 'lit';

/** Styles of `nw-play-bar`. */
export const playBarStyles = css`
  :host {
    display: block;
    container-type: inline-size;
    background: var(--nw-sheet);
    border-block-start: 1px solid var(--nw-rule);
  }
  .bar {
    padding: 10px 20px;
  }
  .notes {
    display: grid;
    gap: 4px;
  }
  .notes > nw-notice,
  ::slotted([slot='messages']) {
    margin-block-end: 6px;
  }
  .row {
    display: grid;
    grid-template-columns: auto auto minmax(120px, 1fr) auto auto;
    grid-template-areas: 'play clip wave toggles side';
    align-items: center;
    gap: 6px 16px;
  }
  .play {
    grid-area: play;
    display: grid;
    place-items: center;
    width: 52px;
    height: 52px;
    padding: 0;
    border: 0;
    border-radius: 50%;
    background: var(--nw-accent);
    color: var(--nw-on-accent);
    cursor: pointer;
  }
  .play:hover:not(:disabled) {
    background: color-mix(in srgb, var(--nw-accent) 88%, var(--nw-ink));
  }
  .play:disabled {
    background: var(--nw-hairline);
    color: var(--nw-track);
    cursor: default;
  }
  .play svg {
    width: 22px;
    height: 22px;
    fill: currentColor;
  }
  .clip {
    grid-area: clip;
    display: grid;
    gap: 2px;
    justify-items: start;
    min-width: 0;
  }
  .time {
    padding-inline-start: 1px;
    white-space: nowrap;
  }
  .wave {
    grid-area: wave;
    display: grid;
    min-width: 0;
  }
  .loading {
    display: grid;
    gap: 6px;
    color: var(--nw-ink-soft);
    font-size: 13px;
  }
  .progress {
    height: 6px;
    border-radius: 3px;
    background: var(--nw-hairline);
    overflow: hidden;
  }
  .progress div {
    height: 100%;
    background: var(--nw-accent);
  }
  .toggles {
    grid-area: toggles;
    display: flex;
    gap: 6px;
  }
  .toggle {
    padding: 0 10px;
    font-weight: 400;
    color: var(--nw-ink-soft);
  }
  .toggle[aria-pressed='true'] {
    color: var(--nw-ink);
    font-weight: 550;
    background: var(--nw-accent-wash);
    border-color: var(--nw-accent);
  }
  .toggle span {
    display: inline-grid;
  }
  /* Keeps the width of the heavier state, so that nothing beside it moves. */
  .toggle span::after {
    content: attr(data-words);
    height: 0;
    overflow: hidden;
    visibility: hidden;
    font-weight: 550;
  }
  .side {
    grid-area: side;
    display: flex;
    align-items: center;
    gap: 16px;
  }
  .words {
    grid-area: words;
    text-align: end;
    font-size: 13px;
    max-width: 260px;
  }
  nw-level-meter {
    grid-area: meter;
    width: 170px;
  }
  @container (max-width: 1240px) {
    .side {
      flex-direction: column;
      align-items: stretch;
      gap: 4px;
      min-width: 140px;
    }
    nw-level-meter {
      width: 100%;
    }
  }
  @container (max-width: 700px) {
    .bar {
      padding: 8px 12px;
    }
    .row {
      grid-template-columns: auto minmax(0, 1fr) auto auto;
      grid-template-areas:
        'play clip clip meter'
        'wave wave toggles toggles'
        'words words words words';
      gap: 8px 10px;
    }
    .play {
      width: 48px;
      height: 48px;
    }
    .side {
      display: contents;
    }
    .words {
      max-width: none;
      text-align: start;
    }
    nw-level-meter {
      width: clamp(60px, 20cqi, 150px);
    }
    nw-waveform {
      height: 44px;
    }
  }
`;
