import { describe, expect, it } from 'vitest';
import { JoinedNodes } from '../../../src/circuit/joined-nodes.ts';

describe('JoinedNodes', () => {
  it('gives joined nodes one name, in any order of joining', () => {
    const nodes = new JoinedNodes();
    nodes.join('a', 'b');
    nodes.join('c', 'd');
    expect(nodes.rootOf('a')).not.toBe(nodes.rootOf('c'));
    nodes.join('b', 'c');
    expect(new Set(['a', 'b', 'c', 'd'].map((node) => nodes.rootOf(node))).size).toBe(1);
    nodes.join('d', 'a');
    expect(nodes.rootOf('e')).toBe('e');
  });

  it('calls a group with ground ground', () => {
    const nodes = new JoinedNodes();
    nodes.join('a', '0');
    nodes.join('0', 'b');
    nodes.join('c', 'b');
    expect(['a', 'b', 'c', '0'].map((node) => nodes.rootOf(node))).toEqual(['0', '0', '0', '0']);
  });
});
