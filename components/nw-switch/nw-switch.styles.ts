import { css } from 'lit';

/** Styles of `nw-switch`. */
export const switchStyles = css`
  :host {
    display: inline-flex;
  }
  label {
    display: inline-flex;
    align-items: center;
    gap: 8px;
    min-height: 28px;
    cursor: pointer;
  }
  input {
    appearance: none;
    flex: none;
    width: 30px;
    height: 18px;
    margin: 0;
    border-radius: 9px;
    background: var(--nw-track);
    position: relative;
    cursor: pointer;
    transition: background 120ms;
  }
  input::after {
    content: '';
    position: absolute;
    inset-block-start: 2px;
    inset-inline-start: 2px;
    width: 14px;
    height: 14px;
    border-radius: 50%;
    background: var(--nw-sheet);
    transition: inset-inline-start 120ms;
  }
  input:checked {
    background: var(--nw-accent);
  }
  input:checked::after {
    inset-inline-start: 14px;
  }
  @media (pointer: coarse) {
    label {
      min-height: 44px;
      min-width: 44px;
      justify-content: flex-end;
    }
  }
`;
