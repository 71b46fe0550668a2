import { css } from 'lit';

/** Styles of `nw-plot-panel`. */
export const plotPanelStyles = css`
  :host {
    display: block;
    min-width: 0;
  }
  .card {
    display: grid;
    grid-template-rows: auto minmax(0, 1fr);
    height: 100%;
    background: var(--nw-sheet);
    border: 1px solid var(--nw-rule);
    border-radius: var(--nw-radius);
    overflow: hidden;
  }
  .bar {
    display: flex;
    flex-wrap: wrap;
    align-items: center;
    gap: 2px 8px;
    padding: 4px 12px;
    border-block-end: 1px solid var(--nw-hairline);
  }
  .views {
    display: flex;
    flex-wrap: wrap;
    gap: 2px;
    margin-inline-start: auto;
  }
  .body {
    display: grid;
    grid-template-columns: minmax(0, 1fr) 196px;
    min-height: 0;
  }
  .plot {
    min-width: 0;
    min-height: 0;
    padding: 12px 4px 4px 8px;
    display: grid;
  }
  .plot nw-plot {
    min-height: 0;
    height: 100%;
  }
  .plot.table {
    overflow: auto;
    padding: 0 12px;
  }
  .figures {
    border-inline-start: 1px solid var(--nw-hairline);
    padding: 8px 14px;
    overflow: auto;
  }
  .toggle {
    font: inherit;
    font-size: 14px;
    color: var(--nw-ink-soft);
    background: none;
    border: 1px solid transparent;
    border-radius: 6px;
    padding: 0 10px;
    min-height: 36px;
    cursor: pointer;
  }
  .toggle:hover {
    color: var(--nw-ink);
  }
  .toggle[aria-pressed='true'],
  .toggle[aria-checked='true'] {
    color: var(--nw-ink);
    font-weight: 550;
    background: var(--nw-accent-wash);
  }
  .toggle:focus-visible {
    outline: 2px solid var(--nw-accent);
    outline-offset: 1px;
  }
  @media (max-width: 760px) {
    /* The plot alone stays at the top while the line scrolls under it, so nothing around it may hold it. */
    :host,
    .card,
    .body {
      display: contents;
    }
    .bar,
    .figures,
    .plot {
      background: var(--nw-sheet);
      border: 1px solid var(--nw-rule);
      border-radius: var(--nw-radius);
    }
    .bar {
      padding: 4px 8px;
    }
    .plot {
      height: 210px;
      position: sticky;
      inset-block-start: 0;
      z-index: 5;
    }
    .figures {
      padding: 8px 14px;
      overflow: visible;
    }
    .views {
      margin-inline-start: 0;
      gap: 0;
    }
    .toggle {
      padding: 0 7px;
      font-size: 13px;
    }
  }
  @media (pointer: coarse) {
    .toggle {
      min-height: 44px;
    }
  }
`;
