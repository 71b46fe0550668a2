import { BlockRenderer, type RenderStart } from './render-blocks.ts';
import { serve } from './worker-port.ts';

/** What the page sends: how to begin, then one block after the other. */
export type RenderQuestion =
  | { readonly start: RenderStart }
  | { readonly block: readonly Float32Array<ArrayBuffer>[] };

let renderer: BlockRenderer | undefined;

serve<RenderQuestion, readonly Float32Array[]>((question) => {
  if ('start' in question) {
    renderer = new BlockRenderer(question.start);
    return { answer: [], transfer: [] };
  }
  const answer = renderer?.process(question.block) ?? [];
  return { answer, transfer: answer.map((samples) => samples.buffer) };
});
