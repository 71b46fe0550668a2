/** Anything that can be listened to; DOM targets and audio contexts are. */
type Listenable = Pick<EventTarget, 'addEventListener' | 'removeEventListener'>;

/**
 * Owns what has to be released: listeners, timers, nodes. Disposal releases everything in the
 * reverse order of adding; what is added after disposal is released at once, so that nothing
 * that arrives late can leak.
 */
export class Scope {
  readonly #releases = new Set<() => void>();
  #disposed = false;

  /** Whether {@link dispose} was called. */
  get disposed(): boolean {
    return this.#disposed;
  }

  /** How many things are held; 0 after disposal. */
  get size(): number {
    return this.#releases.size;
  }

  /**
   * Takes over a release.
   *
   * @returns a function that releases it now, once; later calls do nothing.
   */
  add(release: () => void): () => void {
    let done = false;
    const once = (): void => {
      if (done) return;
      done = true;
      this.#releases.delete(once);
      release();
    };
    if (this.#disposed) once();
    else this.#releases.add(once);
    return once;
  }

  /** Listens until disposal, or until the returned function is called. */
  listen(target: Listenable, type: string, handler: (event: Event) => void): () => void {
    target.addEventListener(type, handler);
    return this.add(() => target.removeEventListener(type, handler));
  }

  /**
   * Calls `action` once after a delay, unless disposal or the returned function comes first.
   *
   * @param delay in milliseconds.
   */
  timeout(action: () => void, delay: number): () => void {
    if (this.#disposed) return () => {};
    let forget = (): void => {};
    const handle = setTimeout(() => {
      forget();
      action();
    }, delay);
    forget = this.add(() => clearTimeout(handle));
    return forget;
  }

  /** Releases everything, newest first. Calling it again does nothing. */
  dispose(): void {
    this.#disposed = true;
    for (const release of [...this.#releases].reverse()) release();
  }
}
