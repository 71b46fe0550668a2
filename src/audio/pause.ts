/**
 * Lets the page do other things between two pieces of long work.
 *
 * @throws AbortError (the signal's reason) once the signal is aborted.
 */
export async function pause(signal?: AbortSignal): Promise<void> {
  signal?.throwIfAborted();
  await new Promise<void>((resolve) => {
    const { port1, port2 } = new MessageChannel();
    port1.onmessage = () => {
      port1.close();
      resolve();
    };
    port2.postMessage(undefined);
  });
  signal?.throwIfAborted();
}
