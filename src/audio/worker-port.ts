import type { ErrorCode } from '../errors.ts';
import { NotchworkError } from '../errors.ts';

/** What a worker sends back: an answer, or an error that survives the way between threads. */
type WorkerAnswer<Answer> =
  | { readonly answer: Answer }
  | { readonly problem: { readonly code: ErrorCode | undefined; readonly message: string } };

/** The part of a worker's global scope that is used; the page's types describe a window instead. */
interface WorkerScope {
  onmessage: ((event: MessageEvent) => void) | null;
  postMessage(message: unknown, transfer: Transferable[]): void;
}

/**
 * Answers every message of the page, inside a worker.
 *
 * @param handle makes the answer, and names what may be moved instead of copied.
 */
export function serve<Question, Answer>(
  handle: (question: Question) => { answer: Answer; transfer: Transferable[] },
): void {
  const scope = globalThis as unknown as WorkerScope;
  scope.onmessage = (event) => {
    try {
      const { answer, transfer } = handle(event.data as Question);
      scope.postMessage({ answer }, transfer);
    } catch (error) {
      const code = error instanceof NotchworkError ? error.code : undefined;
      const message = error instanceof Error ? error.message : String(error);
      scope.postMessage({ problem: { code, message } }, []);
    }
  };
}

/** A worker that is asked one thing at a time and can be called off at any moment. */
export class WorkerPort {
  readonly #worker: Worker;
  readonly #signal: AbortSignal | undefined;

  constructor(worker: Worker, signal?: AbortSignal) {
    this.#worker = worker;
    this.#signal = signal;
  }

  /**
   * Asks, and waits for the answer.
   *
   * @throws the worker's own error; the signal's reason (AbortError) once it is aborted.
   */
  ask<Answer>(question: unknown, transfer: Transferable[] = []): Promise<Answer> {
    return new Promise((resolve, reject) => {
      const signal = this.#signal;
      if (signal?.aborted) {
        reject(signal.reason);
        return;
      }
      const abort = (): void => {
        this.#worker.terminate();
        settle();
        reject(signal?.reason);
      };
      const settle = (): void => {
        signal?.removeEventListener('abort', abort);
        this.#worker.onmessage = null;
        this.#worker.onerror = null;
      };
      signal?.addEventListener('abort', abort, { once: true });
      this.#worker.onmessage = (event: MessageEvent<WorkerAnswer<Answer>>) => {
        settle();
        if ('answer' in event.data) resolve(event.data.answer);
        else reject(errorOf(event.data.problem));
      };
      this.#worker.onerror = (event) => {
        settle();
        const why = event.message || 'its code could not be loaded';
        reject(
          errorOf({
            code: undefined,
            message: `The work in the background stopped: ${why}. Reload the page.`,
          }),
        );
      };
      this.#worker.postMessage(question, transfer);
    });
  }

  /** Ends the worker. */
  close(): void {
    this.#worker.terminate();
  }
}

function errorOf({ code, message }: { code: ErrorCode | undefined; message: string }): NotchworkError {
  return new NotchworkError(code ?? 'audio-unavailable', message);
}
