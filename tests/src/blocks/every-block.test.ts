import { describe, expect, it } from 'vitest';
import { type Block, type BlockSettings, SLOTS } from '../../../src/blocks/block.ts';
import { blockOf, blocksOf, defaultVariant } from '../../../src/blocks/catalogue.ts';
import { defaultSettings, isUsedPart, valuesOf, withKnob } from '../../../src/blocks/settings.ts';
import { spansOf, spanTransfer } from '../../../src/blocks/span.ts';
import { isHurwitz } from '../../../src/filter/hurwitz.ts';
import { seriesValues } from '../../../src/parts/series.ts';
import { levelOf } from '../../../src/response/curve.ts';
import type { TransferFunction } from '../../../src/transfer-function.ts';
import { rotation } from '../../../src/units.ts';
import { EVERY_BLOCK, everyChoice } from './every-choice.ts';

const FREQUENCIES = [1, 10, 100, 1000, 10e3, 40e3, 200e3];

function transferOf(block: Block, settings: BlockSettings): TransferFunction {
  const [span, ...others] = spansOf([{ block, settings }]);
  expect(others).toEqual([]);
  return spanTransfer(span!).transfer;
}

/** Every combination of knobs at 0, at a half and at 1. */
function knobStops(block: Block, settings: BlockSettings): readonly BlockSettings[] {
  return Object.keys(block.knobs).reduce<readonly BlockSettings[]>(
    (all, knob) =>
      all.flatMap((entry) => [0, 0.5, 1].map((position) => withKnob(entry, knob, rotation(position)))),
    [settings],
  );
}

/** Parts at the ends of their ranges, one at a time. */
function rangeEnds(block: Block, settings: BlockSettings): readonly BlockSettings[] {
  return Object.entries(block.parts).flatMap(([name, { range }]) =>
    range.map((value) => ({ ...settings, parts: { ...settings.parts, [name]: value } })),
  );
}

describe('the catalogue', () => {
  it('has a block for every place of the line, each variant once', () => {
    for (const slot of SLOTS) {
      const variants = blocksOf(slot).map((block) => block.variant);
      expect(variants.length).toBeGreaterThan(0);
      expect(new Set(variants).size).toBe(variants.length);
      expect(defaultVariant(slot)).toBe(blocksOf(slot)[0]);
      for (const block of blocksOf(slot)) {
        expect(block.slot).toBe(slot);
        expect(blockOf(slot, block.variant)).toBe(block);
        expect(block.variant).toMatch(/^[a-z]+(-[a-z]+)*$/); // part of the file format
      }
    }
  });

  it('says which blocks there are when asked for another', () => {
    expect(() => blockOf('tone', 'nonesuch')).toThrow(/tone block “nonesuch”.*three-knob.*james/);
  });
});

describe.each(EVERY_BLOCK)('%s', (_, block) => {
  it('compiles with every combination of choices, is stable and finite at every knob stop', () => {
    for (const chosen of everyChoice(block)) {
      for (const settings of knobStops(block, chosen)) {
        const transfer = transferOf(block, settings);
        expect(isHurwitz(transfer.denominator)).toBe(true);
        const level = levelOf(transfer);
        for (const frequency of FREQUENCIES) expect(level(frequency)).toBeLessThan(80);
        for (const coefficient of transfer.numerator) expect(Number.isFinite(coefficient)).toBe(true);
      }
    }
  });

  it('passes something at 1 kHz as it comes, whatever is chosen', () => {
    for (const settings of everyChoice(block)) {
      expect(levelOf(transferOf(block, settings))(1000)).toBeGreaterThan(-60);
    }
  });

  it('has an answer, and a stable one, at either end of every part’s range', () => {
    for (const settings of rangeEnds(block, defaultSettings(block))) {
      const { denominator, numerator } = transferOf(block, settings);
      expect(isHurwitz(denominator)).toBe(true);
      for (const coefficient of [...numerator, ...denominator])
        expect(Number.isFinite(coefficient)).toBe(true);
    }
  });

  it('has its fallbacks within the ranges, and parts that are bought at preferred values', () => {
    for (const [name, { fallback, range, kind }] of Object.entries(block.parts)) {
      expect(range[0], name).toBeLessThan(range[1]);
      expect(fallback, name).toBeGreaterThanOrEqual(range[0]);
      expect(fallback, name).toBeLessThanOrEqual(range[1]);
      if (kind === 'resistor' || kind === 'capacitor') {
        const mantissa = fallback / 10 ** Math.floor(Math.log10(fallback));
        const nearest = Math.min(...seriesValues('E24').map((value) => Math.abs(value / mantissa - 1)));
        expect(nearest, `${name} is not in E24`).toBeLessThan(1e-9);
      }
    }
  });

  it('uses each designator once', () => {
    const designators = Object.values(block.parts).flatMap(({ designator }) => designator.split(', '));
    expect(new Set(designators).size).toBe(designators.length);
  });

  it('uses every part with some choice, and every element is named once', () => {
    const settings = everyChoice(block);
    for (const part of Object.keys(block.parts)) {
      expect(
        settings.some((entry) => isUsedPart(block, entry, part)),
        `${part} does nothing`,
      ).toBe(true);
    }
    for (const entry of settings) {
      const names = block.elements(entry, { before: undefined, after: undefined }).map(({ name }) => name);
      expect(new Set(names).size).toBe(names.length);
      for (const name of names) expect(name).toMatch(/^[a-z]/i);
    }
  });

  it('has knobs on potentiometers of its own, and every potentiometer is turned', () => {
    const turned = new Set(Object.values(block.knobs).map(({ part }) => part));
    for (const part of turned) expect(block.parts[part]?.kind).toBe('potentiometer');
    for (const [name, { kind }] of Object.entries(block.parts)) {
      if (kind === 'potentiometer') expect(turned.has(name), name).toBe(true);
    }
    for (const { fallback } of Object.values(block.knobs)) expect(rotation(fallback)).toBe(fallback);
  });

  it('helps in plain words: each part says what raising it does', () => {
    for (const [name, { help, label, short }] of Object.entries(block.parts)) {
      expect(help, name).toMatch(/(^|[.;,] (.*, )?)[Rr]aise (it|them) and .|[Ll]ower it and ./);
      expect(help, name).toMatch(/\.$/);
      expect(short.length, name).toBeLessThanOrEqual(14); // what a chip has room for
      expect(label, name).not.toBe('');
    }
    for (const { help } of [...Object.values(block.knobs), ...Object.values(block.choices)]) {
      expect(help).toMatch(/^[A-Z].*\.$/);
    }
    expect(block.summary).toMatch(/\.$/);
    expect(block.title).not.toBe('');
  });

  it('says in a few words what it is doing, for every choice, and differs where the wiring does', () => {
    for (const settings of everyChoice(block)) {
      const words = block.describe(settings);
      expect(words).toMatch(/\S/);
      expect(words).not.toMatch(/undefined|NaN/);
      expect(words.length).toBeLessThanOrEqual(48);
    }
  });

  it('takes its values from parts that it has, by names that exist', () => {
    for (const settings of everyChoice(block)) {
      const values = valuesOf(settings);
      for (const { value, kind, control } of block.elements(settings, {
        before: undefined,
        after: undefined,
      })) {
        if ('part' in value) expect(block.parts).toHaveProperty(value.part);
        else if ('knob' in value) expect(block.knobs).toHaveProperty(value.knob);
        else {
          expect(value.compute(values)).toBeGreaterThanOrEqual(0);
          expect(value.text).toMatch(/\S/);
        }
        const isControlled = kind === 'transconductance' || kind === 'voltage-gain';
        expect(control !== undefined).toBe(isControlled);
      }
    }
  });
});
