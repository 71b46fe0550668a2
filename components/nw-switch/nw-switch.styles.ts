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
    inset: 2px auto auto 2px;
    width: 14px;
    height: 14px;
    border-radius: 50%;
    background: var(--nw-sheet);
    transition: translate 120ms;
  }
  input:checked {
    background: var(--nw-accent);
  }
  input:checked::after {
    translate: 12px 0;
  }
  @media (pointer: coarse) {
    label {
      min-height: 44px;
    }
  }
`;
