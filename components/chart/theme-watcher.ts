import type { ReactiveController, ReactiveControllerHost } from 'lit';

/**
 * Calls back when the theme changes, by the system or by the switch on the page, while the host is
 * connected. For drawings on a canvas, which do not follow custom properties by themselves.
 */
export class ThemeWatcher implements ReactiveController {
  readonly #changed: () => void;
  readonly #scheme = matchMedia('(prefers-color-scheme: dark)');
  readonly #observer: MutationObserver;

  constructor(host: ReactiveControllerHost, changed: () => void) {
    this.#changed = changed;
    this.#observer = new MutationObserver(changed);
    host.addController(this);
  }

  hostConnected(): void {
    this.#scheme.addEventListener('change', this.#changed);
    this.#observer.observe(document.documentElement, { attributeFilter: ['data-theme', 'style', 'class'] });
  }

  hostDisconnected(): void {
    this.#scheme.removeEventListener('change', this.#changed);
    this.#observer.disconnect();
  }
}
