import { assertPlayable, type DigitalSection, isSilent } from '../filter/section.ts';

/** A cascade of filter nodes, not yet connected to anything outside itself. */
export interface SectionNodes {
  /** Nodes in the order of the signal, each connected to the next; empty passes the signal as it is. */
  readonly nodes: readonly AudioNode[];
  /** Takes them apart. What feeds the first one is disconnected by whoever connected it. */
  dispose(): void;
}

/**
 * Checks sections before any node is made of them; the browser lets an unstable filter through, and
 * it turns to NaN for good.
 *
 * @throws NotchworkError `filter-invalid` or `filter-unstable`. A section that is all 0 is allowed
 *   here: it is played as silence.
 */
export function checkSections(sections: readonly DigitalSection[]): void {
  for (const section of sections) {
    if (section.feedforward.length === 0 || !isSilent([section])) assertPlayable(section);
  }
}

/** A section of order 0 is a plain gain, which costs nothing to make. */
function nodeOf(context: BaseAudioContext, { feedforward, feedback }: DigitalSection): AudioNode {
  if (feedback.slice(1).every((value) => value === 0) && feedforward.slice(1).every((value) => value === 0)) {
    const gain = context.createGain();
    gain.gain.value = feedforward[0]!;
    return gain;
  }
  return context.createIIRFilter([...feedforward], [...feedback]);
}

/**
 * Builds one IIR node for each section, in series. Making a node costs the main thread 3.6 ms at
 * 48 kHz and 14 ms at 192 kHz, so build only what changed.
 *
 * @throws NotchworkError `filter-invalid` or `filter-unstable` before any node is made.
 */
export function buildSections(context: BaseAudioContext, sections: readonly DigitalSection[]): SectionNodes {
  checkSections(sections);
  const nodes = isSilent(sections) ? [mute(context)] : sections.map((section) => nodeOf(context, section));
  nodes.forEach((node, index) => {
    nodes[index - 1]?.connect(node);
  });
  return {
    nodes,
    dispose() {
      for (const node of nodes) node.disconnect();
    },
  };
}

function mute(context: BaseAudioContext): AudioNode {
  const gain = context.createGain();
  gain.gain.value = 0;
  return gain;
}
