import { describe, expect, it } from 'vitest';
import { bilinear } from '../../../src/filter/bilinear.ts';
import { assertPlayable, isSilent } from '../../../src/filter/section.ts';
import { product, seeded } from './polynomials.ts';

describe('sections that may be played', () => {
  it.each([
    ['a plain gain', { feedforward: [0.5], feedback: [1] }],
    ['a pole just inside the circle', { feedforward: [1, 0], feedback: [1, -(1 - 2 ** -52)] }],
    ['a pole just inside on the other side', { feedforward: [1, 0], feedback: [1, 1 - 2 ** -52] }],
    [
      'three poles crowded near z = 1',
      { feedforward: [1, 0, 0, 0], feedback: product([1, -0.9999], [1, -0.9998], [1, -0.9997]) },
    ],
    ['a pure delay', { feedforward: [0, 0, 1], feedback: [1, 0, 0] }],
    [
      'twenty coefficients',
      { feedforward: new Array<number>(20).fill(0.1), feedback: [1, ...new Array<number>(19).fill(0)] },
    ],
  ])('include %s', (_, section) => {
    expect(() => assertPlayable(section)).not.toThrow();
  });

  it('include every stable analogue section at every rate, 500 random ones', () => {
    const random = seeded(41);
    for (let round = 0; round < 500; round++) {
      const taus = [1, 2, 3].map(() => 10 ** (-1 - 6 * random()));
      const section = { numerator: [0, taus[0]!], denominator: product(...taus.map((tau) => [1, tau])) };
      for (const rate of [44100, 192000]) {
        const digital = bilinear(section, rate);
        expect(() => assertPlayable(digital)).not.toThrow();
      }
    }
  });
});

describe('silence', () => {
  it('is a section whose feedforward is all 0, anywhere in the cascade', () => {
    const open = { feedforward: [1, 0.5], feedback: [1, 0] };
    const shut = { feedforward: [0, 0], feedback: [1, 0] };
    expect(isSilent([open, open])).toBe(false);
    expect(isSilent([open, shut])).toBe(true);
    expect(isSilent([])).toBe(false);
  });
});
