import { describe, expect, it } from 'vitest';
import { NUMBER, spiceNumber } from '../../../../src/circuit/spice/number.ts';

function read(text: string) {
  NUMBER.lastIndex = 0;
  const match = NUMBER.exec(text);
  return match?.[0] === text ? spiceNumber(match[1]!, match[2]!) : undefined;
}

describe('spiceNumber', () => {
  // The scale factors of SPICE (L. W. Nagel, SPICE2, ERL-M520, Berkeley, 1975; from memory), and what it ignores.
  it.each<[string, number]>([
    ['10', 10],
    ['4.7', 4.7],
    ['.5', 0.5],
    ['5.', 5],
    ['1e3', 1000],
    ['1E-9', 1e-9],
    ['22f', 22e-15],
    ['390p', 390e-12],
    ['22n', 22e-9],
    ['0.022u', 0.022e-6],
    ['5m', 5e-3],
    ['4.7k', 4700],
    ['1meg', 1e6],
    ['1MEG', 1e6],
    ['1Megohm', 1e6],
    ['2g', 2e9],
    ['1t', 1e12],
    ['1M', 1e-3], // the trap: a capital M is milli too
    ['1F', 1e-15], // and a farad is a femto
    ['10kOhm', 10e3],
    ['22nF', 22e-9],
    ['100uF', 100e-6],
    ['1H', 1],
    ['5V', 5],
    ['22\u00b5F', 22e-6],
    ['22\u03bc', 22e-6],
    ['100\u03a9', 100],
    ['100\u2126', 100],
    ['1e3k', 1e6],
  ])('reads %s', (text, value) => {
    expect(read(text)).toMatchObject({ value });
  });

  it('is exact to the last bit, as the literal with an exponent is', () => {
    for (const digits of ['22', '4.7', '0.33', '8.2', '1.5']) {
      expect(read(`${digits}n`)).toMatchObject({ value: Number(`${digits}e-9`) });
      expect(read(`${digits}p`)).toMatchObject({ value: Number(`${digits}e-12`) });
    }
  });

  it('tells a scale suffix from unit letters', () => {
    expect(read('0.5')).toMatchObject({ isScaled: false });
    expect(read('0.5V')).toMatchObject({ isScaled: false });
    expect(read('500m')).toMatchObject({ isScaled: true });
  });

  it.each(['1mil', '3A', '1e999', '1e306k', '9e307meg'])('refuses %s rather than guess', (text) => {
    expect(read(text)).toHaveProperty('expected');
  });
});
