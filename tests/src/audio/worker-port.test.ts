import { describe, expect, it, vi } from 'vitest';
import { WorkerPort } from '../../../src/audio/worker-port.ts';
import { NotchworkError } from '../../../src/errors.ts';

/** A worker whose answers the test gives. */
class FakeWorker {
  onmessage: ((event: { data: unknown }) => void) | null = null;
  onerror: ((event: { message: string }) => void) | null = null;
  readonly postMessage = vi.fn();
  readonly terminate = vi.fn();
}

function make(signal?: AbortSignal) {
  const worker = new FakeWorker();
  return { worker, port: new WorkerPort(worker as unknown as Worker, signal) };
}

describe('WorkerPort', () => {
  it('passes the question on, moving what may be moved, and returns the answer', async () => {
    const { worker, port } = make();
    const buffer = new ArrayBuffer(8);
    const pending = port.ask('question', [buffer]);
    worker.onmessage!({ data: { answer: 42 } });
    expect(await pending).toBe(42);
    expect(worker.postMessage).toHaveBeenCalledWith('question', [buffer]);
  });

  it('brings an error over with its code', async () => {
    const { worker, port } = make();
    const pending = port.ask('question');
    worker.onmessage!({ data: { problem: { code: 'clip-empty', message: 'nothing in it' } } });
    await expect(pending).rejects.toMatchObject({ code: 'clip-empty', message: 'nothing in it' });
    await expect(pending).rejects.toBeInstanceOf(NotchworkError);
  });

  it('tells of a worker that could not be loaded', async () => {
    const { worker, port } = make();
    const pending = port.ask('question');
    worker.onerror!({ message: '' });
    await expect(pending).rejects.toThrow('could not be loaded');
  });

  it('ends the worker when called off, and rejects with the reason', async () => {
    const controller = new AbortController();
    const { worker, port } = make(controller.signal);
    const pending = port.ask('question');
    controller.abort();
    await expect(pending).rejects.toMatchObject({ name: 'AbortError' });
    expect(worker.terminate).toHaveBeenCalledTimes(1);
  });

  it('asks nothing once it is called off', async () => {
    const { worker, port } = make(AbortSignal.abort());
    await expect(port.ask('question')).rejects.toMatchObject({ name: 'AbortError' });
    expect(worker.postMessage).not.toHaveBeenCalled();
  });

  it('no longer listens to the signal after the answer', async () => {
    const controller = new AbortController();
    const { worker, port } = make(controller.signal);
    const pending = port.ask('question');
    worker.onmessage!({ data: { answer: 1 } });
    await pending;
    controller.abort();
    expect(worker.terminate).not.toHaveBeenCalled();
    port.close();
    expect(worker.terminate).toHaveBeenCalledTimes(1);
  });
});
