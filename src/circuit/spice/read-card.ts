import type { ElementKind, NodePair } from '../wiring.ts';
import { GROUND } from '../wiring.ts';
import { readValue } from './expression.ts';
import type { NetlistCard, NetlistSource } from './netlist.ts';
import type { Tokens } from './tokenise.ts';

const KINDS: Readonly<Record<string, ElementKind>> = {
  R: 'resistor',
  C: 'capacitor',
  L: 'inductor',
  G: 'transconductance',
  E: 'voltage-gain',
};

/** What may start a card, for messages. */
export const CARD_LETTERS = 'a card R, C, L, G, E or V, .param, .end or a comment';

/** A node's name as it is compared: in lower case, and `0` for `gnd` too, as SPICE does. */
export function nodeName(written: string): string {
  const lower = written.toLowerCase();
  return lower === 'gnd' ? GROUND : lower;
}

function readNodes(tokens: Tokens, what: string): NodePair {
  return [nodeName(tokens.word(`the first ${what}`)), nodeName(tokens.word(`the second ${what}`))];
}

/**
 * Reads a card R, C or L (`name a b value`), or G or E (`name a b controlA controlB value`).
 *
 * @returns `undefined` where the line starts with another letter; nothing is taken then.
 * @throws NotchworkError `netlist-syntax` with the place of what is wrong.
 */
export function readCard(tokens: Tokens): NetlistCard | undefined {
  const kind = KINDS[tokens.next.toUpperCase()];
  if (kind === undefined) return undefined;
  const { place } = tokens;
  const name = tokens.word('a name');
  const nodes = readNodes(tokens, 'node');
  const isControlled = kind === 'transconductance' || kind === 'voltage-gain';
  const control = isControlled ? readNodes(tokens, 'controlling node') : undefined;
  const value = readValue(tokens);
  tokens.end();
  return { kind, name, nodes, ...(control && { control }), value, place };
}

/** Takes an optional number that must be this one. */
function takeExactly(tokens: Tokens, value: number, expected: string): boolean {
  if (!/[\d.+-]/.test(tokens.next) || tokens.isAtEnd) return false;
  const { offset } = tokens;
  const { program } = readValue(tokens);
  const [only] = program;
  if (!('number' in only!) || only.number !== value) tokens.refuse(expected, offset);
  return true;
}

/**
 * Reads the source, `V… a b [[DC] value] AC [1 [0]]`: an AC source of 1 V and phase 0. A direct
 * voltage is read over, as it does not matter to the linear circuit.
 */
export function readSource(tokens: Tokens): NetlistSource | undefined {
  if (tokens.next.toUpperCase() !== 'V') return undefined;
  const { place } = tokens;
  const name = tokens.word('a name');
  const nodes = readNodes(tokens, 'node');
  let hasAc = false;
  while (!tokens.isAtEnd) {
    const { offset } = tokens;
    const word = tokens.peekWord().toLowerCase();
    if (word === 'ac' && !hasAc) {
      tokens.word('AC');
      hasAc = true;
      if (takeExactly(tokens, 1, 'AC 1; all gains are read against 1 V'))
        takeExactly(tokens, 0, 'no phase, or 0');
    } else if (word === 'dc') {
      tokens.word('DC');
      readValue(tokens);
    } else if (/[\d.+{-]/.test(tokens.next)) {
      readValue(tokens);
    } else {
      tokens.refuse('AC 1', offset);
    }
  }
  if (!hasAc) tokens.refuse('AC 1');
  return { name, nodes, place };
}
