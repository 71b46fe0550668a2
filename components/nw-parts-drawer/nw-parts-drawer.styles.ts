import { css } from 'lit';

/** Styles of `nw-parts-drawer`. */
export const partsDrawerStyles = css`
  dialog {
    width: min(760px, 100vw);
    max-width: none;
    height: 100dvh;
    max-height: none;
    margin: 0 0 0 auto;
    padding: 0;
    border: 0;
    border-inline-start: 1px solid var(--nw-rule);
    background: var(--nw-sheet);
    color: var(--nw-ink);
  }
  dialog::backdrop {
    background: rgb(0 0 0 / 35%);
  }
  .inside {
    padding: 16px 20px 32px;
    display: grid;
    gap: 16px;
  }
  header {
    display: flex;
    align-items: center;
    gap: 12px;
  }
  h2 {
    font-size: 17px;
    font-weight: 620;
    margin: 0;
    flex: 1;
  }
  h3 {
    font-size: 15px;
    font-weight: 620;
    margin: 8px 0 0;
  }
  .choices {
    display: grid;
    gap: 12px;
  }
  .choices label,
  .choice {
    display: grid;
    gap: 4px;
  }
  ul {
    list-style: none;
    margin: 0;
    padding: 0;
    display: grid;
  }
  li {
    display: grid;
    grid-template-columns: 3.5em minmax(0, 1fr) auto;
    gap: 4px 12px;
    align-items: start;
    padding: 10px 0;
    border-block-start: 1px solid var(--nw-hairline);
  }
  .designator {
    color: var(--nw-ink-soft);
    padding-block-start: 7px;
  }
  .what {
    font-weight: 550;
  }
  .what p {
    margin: 2px 0 0;
    font-weight: 400;
  }
  .taper {
    display: flex;
    flex-wrap: wrap;
    gap: 8px;
    align-items: center;
    grid-column: 2 / -1;
  }
  .taper .field {
    width: 6em;
  }
  @media (max-width: 520px) {
    .inside {
      padding: 12px;
    }
    li {
      grid-template-columns: 3em minmax(0, 1fr);
    }
    nw-value-field {
      grid-column: 2;
    }
  }
`;
