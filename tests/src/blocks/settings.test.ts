import { describe, expect, it } from 'vitest';
import type { Block } from '../../../src/blocks/block.ts';
import { driverPlainSource } from '../../../src/blocks/driver-plain-source.ts';
import { driverPlate } from '../../../src/blocks/driver-plate.ts';
import { inputGrid } from '../../../src/blocks/input-grid.ts';
import {
  defaultSettings,
  isUsedPart,
  potentiometerHalves,
  valuesOf,
  withKnob,
  withPart,
} from '../../../src/blocks/settings.ts';
import { stageCommonCathode } from '../../../src/blocks/stage-common-cathode.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { AUDIO } from '../../../src/parts/taper.ts';
import { rotation } from '../../../src/units.ts';
import { placed } from './placed.ts';

describe('settings of a new block', () => {
  it('hold the catalogue’s value of everything', () => {
    const settings = defaultSettings(toneThreeKnob);
    expect(settings.parts['slope']).toBe(toneThreeKnob.parts['slope']!.fallback);
    expect(settings.knobs['treble']).toBe(0.6);
    expect(settings.tapers['bass']).toEqual(AUDIO);
    expect(settings.choices).toEqual({ middleWiring: 'wiper', load: 'grid' });
    expect(Object.keys(settings.parts)).toEqual(Object.keys(toneThreeKnob.parts));
  });
});

describe('reading settings by name', () => {
  it('gives parts, track ratios with the taper applied, and choices', () => {
    const values = valuesOf(withKnob(defaultSettings(toneThreeKnob), 'bass', rotation(0.5)));
    expect(values.part('slope')).toBe(47e3);
    expect(values.ratio('bass')).toBeCloseTo(0.15, 12); // what the audio taper has at half turn
    expect(values.choice('middleWiring')).toBe('wiper');
  });

  it('says which names there are when asked for another', () => {
    const values = valuesOf(defaultSettings(toneThreeKnob));
    expect(() => values.part('nonesuch')).toThrow(/no part “nonesuch” here; there are treblePot, bassPot/);
    expect(() => values.ratio('presence')).toThrow(/no knob “presence”.*treble, bass, middle/);
    expect(() => values.choice('colour')).toThrow(/no choice “colour”.*middleWiring, load/);
    expect(() => valuesOf(defaultSettings(driverPlainSource)).choice('x')).toThrow(/there are none/);
  });
});

describe('halves of a potentiometer', () => {
  it('add up to all of it, wiper to the anticlockwise end first', () => {
    const settings = withKnob(defaultSettings(toneThreeKnob), 'middle', rotation(0.2));
    expect(potentiometerHalves(toneThreeKnob, settings, 'middle')).toEqual({
      lower: expect.closeTo(5000, 6),
      upper: expect.closeTo(20e3, 6),
    });
  });

  it('are nothing and all at the stops', () => {
    for (const [turn, lower, upper] of [
      [0, 0, 500e3],
      [1, 500e3, 0],
    ] as const) {
      const settings = withKnob(defaultSettings(toneThreeKnob), 'bass', rotation(turn));
      expect(potentiometerHalves(toneThreeKnob, settings, 'bass')).toEqual({ lower, upper });
    }
  });

  it('of a knob that is not there are an error', () => {
    const settings = defaultSettings(toneThreeKnob);
    expect(() => potentiometerHalves(toneThreeKnob, settings, 'volume')).toThrow(/no knob “volume”/);
  });
});

describe('changed settings', () => {
  it('differ in the one thing and leave the old ones as they were', () => {
    const before = defaultSettings(toneThreeKnob);
    const knob = withKnob(before, 'bass', rotation(1));
    const part = withPart(before, 'slope', 56e3);
    expect(before).toEqual(defaultSettings(toneThreeKnob));
    expect(knob).toEqual({ ...before, knobs: { ...before.knobs, bass: 1 } });
    expect(part).toEqual({ ...before, parts: { ...before.parts, slope: 56e3 } });
    expect(knob.parts).toBe(before.parts);
  });
});

describe('whether a part is used', () => {
  const used = (block: Block, name: string, choices = {}) =>
    isUsedPart(block, placed(block, { choices }).settings, name);

  it('follows the wiring', () => {
    expect(used(toneThreeKnob, 'loadResistance')).toBe(true);
    expect(used(toneThreeKnob, 'loadResistance', { load: 'none' })).toBe(false);
    expect(used(toneThreeKnob, 'middlePot', { middleWiring: 'rheostat' })).toBe(true);
    expect(used(stageCommonCathode, 'bypassResistor')).toBe(false);
    expect(used(stageCommonCathode, 'bypassResistor', { bypass: 'partial' })).toBe(true);
    expect(used(stageCommonCathode, 'bypassCap', { bypass: 'none' })).toBe(false);
  });

  it('sees what computed values read', () => {
    expect(used(inputGrid, 'stageGain')).toBe(true);
    expect(used(stageCommonCathode, 'mu')).toBe(false);
    expect(used(stageCommonCathode, 'mu', { valve: 'typed' })).toBe(true);
    expect(used(stageCommonCathode, 'supply')).toBe(false);
    expect(used(stageCommonCathode, 'supply', { figures: 'rest' })).toBe(true);
  });

  it('counts direct voltages, which the signal does not show', () => {
    expect(used(driverPlainSource, 'supply')).toBe(true);
    expect(used(driverPlate, 'cathodeResistor')).toBe(true);
    expect(used(driverPlate, 'restVoltage')).toBe(false);
    expect(used(driverPlate, 'restVoltage', { rest: 'typed' })).toBe(true);
    expect(used(driverPlate, 'couplingCap', { coupling: 'direct' })).toBe(false);
  });

  it('does so even where the values give no state of rest', () => {
    const { settings } = placed(driverPlainSource, { parts: { supply: 100, restVoltage: 200 } });
    expect(isUsedPart(driverPlainSource, settings, 'restVoltage')).toBe(true);
  });
});
