import { css } from 'lit';

/** Styles of `nw-app`. */
export const appStyles = css`
  :host {
    display: grid;
    grid-template-rows: auto minmax(0, 1fr) auto;
    height: 100dvh;
    background: var(--nw-paper);
  }
  .middle {
    display: grid;
    grid-template-columns: minmax(0, 1fr) 348px;
    min-height: 0;
  }
  main {
    display: flex;
    flex-direction: column;
    gap: 14px;
    padding: 14px 20px;
    overflow: auto;
    min-width: 0;
  }
  nw-plot-panel {
    flex: 1 0 386px;
    min-height: 386px;
  }
  nw-line {
    flex: none;
  }
  aside {
    background: var(--nw-sheet);
    border-inline-start: 1px solid var(--nw-rule);
    overflow: auto;
    min-width: 0;
  }
  .dropping {
    outline: 3px dashed var(--nw-accent);
    outline-offset: -8px;
  }
  .rendering {
    display: flex;
    align-items: center;
    gap: 12px;
    padding-block: 4px;
  }
  .rendering progress {
    flex: 1;
    accent-color: var(--nw-accent);
  }
  .matching {
    font-size: 13px;
    text-align: end;
    white-space: nowrap;
  }
  @media (max-width: 1020px) {
    .middle {
      grid-template-columns: minmax(0, 1fr) 300px;
    }
    main {
      padding: 12px;
    }
  }
  @media (max-width: 760px) {
    :host {
      display: block;
      height: auto;
      padding-block-end: 12px;
    }
    .middle {
      display: block;
    }
    main {
      padding: 8px;
      overflow: visible;
    }
    nw-plot-panel {
      min-height: 0;
    }
    aside {
      border: 1px solid var(--nw-rule);
      border-radius: var(--nw-radius);
      margin: 8px;
      overflow: visible;
    }
    nw-play-bar {
      position: sticky;
      inset-block-end: 0;
      z-index: 10;
    }
  }
`;
