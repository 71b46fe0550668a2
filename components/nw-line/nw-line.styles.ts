import { css } from 'lit';

/**
 * Styles of `nw-line`.
 *
 * Blocks out of the line that lead it have a row of their own, so that the others stay large. The
 * piece of rail that leads to a block, with its arrow head, hangs out before the block: what hangs out
 * at the start of a row never makes a page wider, as it would at the end.
 */
export const lineStyles = css`
  :host {
    display: block;
    container-type: inline-size;
    --rail: var(--nw-track);
  }
  .rail {
    display: flex;
    flex-wrap: wrap;
    gap: 12px 22px;
    list-style: none;
    margin: 0;
    padding: 0;
  }
  li {
    position: relative;
    flex: var(--width) 1 calc(1px * var(--width));
    max-width: min(100%, calc(2px * var(--width)));
  }
  li.out {
    flex: 0 0 auto;
    background: linear-gradient(var(--rail), var(--rail)) 0 22px / 100% 1px no-repeat;
  }
  li.in,
  li.in ~ li {
    order: 2;
  }
  .rail:has(> li.out:first-child):has(> li.in)::before {
    content: '';
    order: 1;
    flex: 0 0 100%;
  }
  li.out:not(li.in ~ li) {
    margin-block-end: -12px;
  }
  li + li::after {
    content: '';
    position: absolute;
    inset-block-start: 22px;
    inset-inline-end: 100%;
    width: 22px;
    height: 1px;
    background: var(--rail);
  }
  li + li::before {
    content: '';
    position: absolute;
    z-index: 1;
    inset-block-start: 17.500px;
    inset-inline-end: calc(100% + 7px);
    border: 5px solid transparent;
    border-inline-start: 7px solid var(--rail);
    border-inline-end: 0;
  }
  li > nw-block {
    height: 100%;
  }
  @container (max-width: 620px) {
    .rail {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 18px;
    }
    li {
      max-width: none;
    }
    .rail:has(> li.out:first-child)::before {
      display: none;
    }
    li.out:not(li.in ~ li) {
      margin: 0;
    }
    li.out {
      background-position: 50% 0;
      background-size: 1px 100%;
    }
    li + li::after {
      inset: auto auto 100% 50%;
      width: 1px;
      height: 18px;
    }
    li + li::before {
      inset: auto auto calc(100% + 5px) calc(50% - 4.500px);
      border: 5px solid transparent;
      border-block-start: 7px solid var(--rail);
      border-block-end: 0;
    }
  }
`;
