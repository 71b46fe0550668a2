import { describe, expect, it } from 'vitest';
import { driverCathodeFollower } from '../../../src/blocks/driver-cathode-follower.ts';
import { driverPlate } from '../../../src/blocks/driver-plate.ts';
import { valuesOf } from '../../../src/blocks/settings.ts';
import { stageCommonCathode } from '../../../src/blocks/stage-common-cathode.ts';
import { knownTriode, type RestOf, triode, triodeFigures, valveWords } from '../../../src/blocks/triode.ts';
import { commonCathodePoint } from '../../../src/parts/operating-point.ts';
import { TRIODE_NAMES, TRIODES } from '../../../src/parts/valve.ts';
import { oneSpan, placed } from './placed.ts';

const REST = { supply: 250, plateLoad: 100e3, cathodeResistor: 1500 };
const rest: RestOf = (_, model) => commonCathodePoint(model, REST);
const values = (choices: Readonly<Record<string, string>>, parts = {}) =>
  valuesOf(placed(stageCommonCathode, { choices, parts }).settings);

describe('figures of a triode', () => {
  it.each(TRIODE_NAMES)('of an %s are the published ones', (valve) => {
    const { gm, plateResistance } = TRIODES[valve].published;
    const found = triodeFigures(values({ valve }), rest);
    expect(found).toEqual({ gm, plateResistance, mu: gm * plateResistance });
    expect(knownTriode(values({ valve }))).toBe(TRIODES[valve]);
  });

  it('typed in make the plate resistance µ/gm', () => {
    const typed = values({ valve: 'typed', figures: 'rest' }, { mu: 33, gm: 3e-3 });
    expect(triodeFigures(typed, rest)).toEqual({ mu: 33, gm: 3e-3, plateResistance: 33 / 3e-3 });
    expect(knownTriode(typed)).toBeUndefined();
  });

  it.each(TRIODE_NAMES)('of an %s at its point of rest are the model’s there', (valve) => {
    const found = triodeFigures(values({ valve, figures: 'rest' }), rest);
    const { gm, plateResistance, mu } = commonCathodePoint(TRIODES[valve].model, REST);
    expect(found).toEqual({ gm, plateResistance, mu });
    expect(found.gm).not.toBe(TRIODES[valve].published.gm);
  });

  it('of a valve that draws no current are an error that says what to do', () => {
    const cut: RestOf = (_, model) => ({
      ...commonCathodePoint(model, REST),
      plateResistance: Number.POSITIVE_INFINITY,
    });
    expect(() => triodeFigures(values({ figures: 'rest' }), cut)).toThrow(/no current.*Raise the supply/);
  });

  it('change the gain of a stage with its parts, where they are taken at rest', () => {
    for (const block of [stageCommonCathode, driverPlate]) {
      const gain = (supply: number, figures: string) =>
        oneSpan(placed(block, { parts: { supply }, choices: { figures } })).reference;
      expect(gain(350, 'published')).toBe(gain(150, 'published'));
      expect(gain(350, 'rest')).toBeGreaterThan(gain(150, 'rest') * 1.02);
    }
    const follower = (gridVoltage: number) =>
      oneSpan(placed(driverCathodeFollower, { parts: { gridVoltage }, choices: { figures: 'rest' } }));
    expect(follower(100).reference).not.toBe(follower(150).reference);
  });
});

describe('the triode as elements', () => {
  it('is a transconductance from plate to cathode and its plate resistance across them', () => {
    const [transconductance, resistance, ...others] = triode('g', 'p', 'k', rest);
    expect(others).toEqual([]);
    expect(transconductance).toMatchObject({
      kind: 'transconductance',
      nodes: ['p', 'k'],
      control: ['g', 'k'],
    });
    expect(resistance).toMatchObject({ kind: 'resistor', nodes: ['p', 'k'] });
  });

  it('is named by its valve', () => {
    expect(valveWords(placed(stageCommonCathode, { choices: { valve: 'ECC81' } }).settings)).toBe('ECC81');
    expect(valveWords(placed(stageCommonCathode, { choices: { valve: 'typed' } }).settings)).toBe(
      'own valve',
    );
  });
});
