import { effect } from '@preact/signals-core';
import type { ReactiveController, ReactiveControllerHost } from 'lit';

/**
 * Draws its host again whenever a signal that `read` looks at changes, while the host is connected.
 * `value` is what `read` last returned.
 */
export class SignalReader<Value> implements ReactiveController {
  readonly #host: ReactiveControllerHost;
  readonly #read: () => Value;
  #stop: (() => void) | undefined;
  value: Value;

  constructor(host: ReactiveControllerHost, read: () => Value) {
    this.#host = host;
    this.#read = read;
    this.value = read();
    host.addController(this);
  }

  hostConnected(): void {
    this.#stop = effect(() => {
      this.value = this.#read();
      this.#host.requestUpdate();
    });
  }

  hostDisconnected(): void {
    this.#stop?.();
    this.#stop = undefined;
  }
}
