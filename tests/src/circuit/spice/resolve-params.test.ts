import { describe, expect, it } from 'vitest';
import { parseNetlist } from '../../../../src/circuit/spice/parse-netlist.ts';
import { parameterLookup } from '../../../../src/circuit/spice/resolve-params.ts';

const paramsOf = (line: string) => parseNetlist(`t\nV1 in 0 AC 1\nR1 in out 1\n${line}`).params;

describe('parameterLookup', () => {
  it('prefers what is given and recalculates what depends on it', () => {
    const params = paramsOf('.param c={a+b} a=1 b={2*a}');
    expect(parameterLookup(params, new Map())('c')).toBe(3);
    expect(parameterLookup(params, new Map([['a', 10]]))('c')).toBe(30);
    expect(parameterLookup(params, new Map([['b', 5]]))('c')).toBe(6);
  });

  it('takes a long chain, each link calculated once', () => {
    // Without memory this would take 2^400 steps.
    const chain = Array.from({ length: 400 }, (_, index) => `p${index}={(p${index + 1}+p${index + 1})/2}`);
    expect(paramsOf(`.param ${chain.join(' ')} p400=7`)[0]!.value).toBe(7);
  });

  it('finds a circle of any length', () => {
    for (const line of ['.param a={a}', '.param a={b} b={c} c={a}']) {
      expect(() => paramsOf(line)).toThrow(expect.objectContaining({ code: 'netlist-syntax' }));
    }
  });
});
