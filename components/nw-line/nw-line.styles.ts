import { css } from 'lit';

/** Styles of `nw-line`. */
export const lineStyles = css`
  :host {
    display: block;
    container-type: inline-size;
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
    flex: calc(1 + 2 * var(--knobs, 0)) 1 calc(130px + 95px * var(--knobs, 0));
    max-width: 100%;
  }
  li.out {
    flex: 0 0 auto;
  }
  li::after {
    content: '';
    position: absolute;
    inset-block-start: 22px;
    inset-inline-start: calc(100% + 1px);
    width: 21px;
    height: 1px;
    background: var(--nw-rule);
  }
  li::before {
    content: '';
    position: absolute;
    z-index: 1;
    inset-block-start: 17.500px;
    inset-inline-start: calc(100% + 8px);
    border: 5px solid transparent;
    border-inline-start: 7px solid var(--nw-track);
    border-inline-end: 0;
  }
  li:last-child::before,
  li:last-child::after {
    display: none;
  }
  li > nw-block {
    height: 100%;
  }
  li.break {
    flex: 0 0 100%;
    height: 0;
    margin-block-start: -12px;
  }
  li.break::before,
  li.break::after,
  li:has(+ li.break)::before,
  li:has(+ li.break)::after {
    display: none;
  }
  @container (max-width: 620px) {
    li.break {
      display: none;
    }
    .rail {
      display: grid;
      grid-template-columns: minmax(0, 1fr);
      gap: 18px;
    }
    li::after {
      inset: 100% auto auto 50%;
      width: 1px;
      height: 18px;
    }
    li::before {
      inset: calc(100% + 6px) auto auto calc(50% - 4.500px);
      border: 5px solid transparent;
      border-block-start: 7px solid var(--nw-track);
      border-block-end: 0;
    }
  }
`;
