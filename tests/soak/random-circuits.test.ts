import { describe, expect, it } from 'vitest';
import { compile } from '../../src/circuit/compile.ts';
import { factor } from '../../src/filter/factor.ts';
import { responseAt } from '../../src/response/curve.ts';
import { seededRandom } from '../../src/study/blind-trial.ts';
import type { TransferFunction } from '../../src/transfer-function.ts';
import { solveNodal } from '../src/circuit/nodal-solver.ts';
import { randomCircuit } from '../src/circuit/random-wiring.ts';

/** Product of sections at a frequency, as decibels. */
function sectionsLevel(sections: readonly TransferFunction[], frequency: number): number {
  return sections.reduce((sum, section) => {
    const { re, im } = responseAt(section, frequency);
    return sum + 20 * Math.log10(Math.hypot(re, im));
  }, 0);
}

describe('soak', () => {
  it('20,000 random RC circuits: engine against nodal analysis, sections against the whole', () => {
    const random = seededRandom(Date.now() % 2 ** 31);
    let worst = 0;
    for (let index = 0; index < 20_000; index += 1) {
      const { wiring, values } = randomCircuit(random, 3 + Math.floor(random() * 7), {
        inductors: false,
        controlled: false,
      });
      const transfer = compile({ ...wiring, outputs: [wiring.outputs[0]!] }).transfer(values);
      const frequency = 20 * 1000 ** random();
      const [expected] = solveNodal(wiring, values, 2 * Math.PI * frequency);
      const got = responseAt(transfer, frequency);
      const size = Math.hypot(expected!.re, expected!.im);
      if (size < 1e-6) continue; // under −120 dB the elimination's own rounding shows
      worst = Math.max(worst, Math.hypot(got.re - expected!.re, got.im - expected!.im) / size);
      const level = 20 * Math.log10(Math.hypot(got.re, got.im));
      expect(Math.abs(sectionsLevel(factor(transfer), frequency) - level)).toBeLessThan(1e-8);
    }
    expect(worst).toBeLessThan(1e-7);
  });
});
