import { describe, expect, it } from 'vitest';
import { driverPlainSource } from '../../../src/blocks/driver-plain-source.ts';
import { driverPlate } from '../../../src/blocks/driver-plate.ts';
import { sourceImpedance } from '../../../src/blocks/source-impedance.ts';
import { stageCommonCathode } from '../../../src/blocks/stage-common-cathode.ts';
import { toneTrebleCut } from '../../../src/blocks/tone-treble-cut.ts';
import { responseAt } from '../../../src/response/curve.ts';
import { placed } from './placed.ts';

describe('source impedance of a run of blocks', () => {
  it('of a plain source is its resistance at every frequency', () => {
    const found = sourceImpedance([placed(driverPlainSource, { parts: { sourceResistance: 1500 } })]);
    for (const frequency of [1, 1e3, 1e5]) {
      expect(responseAt(found, frequency).re).toBeCloseTo(1500, 9);
      expect(responseAt(found, frequency).im).toBeCloseTo(0, 9);
    }
  });

  it('counts what stands behind the driver too, and nothing before its grid', () => {
    const source = placed(driverPlainSource, { parts: { sourceResistance: 100e3 } });
    const tone = placed(toneTrebleCut, {
      parts: { seriesResistor: 100e3, cutPot: 1e3 },
      choices: { load: 'none' },
      knobs: { tone: 0 },
    });
    const found = sourceImpedance([placed(stageCommonCathode), source, tone]);
    // 200 kΩ with 4.7 nF across, by Ohm’s law.
    const reactance = -1 / (2 * Math.PI * 1000 * 4.7e-9);
    const scale = 200e3 ** 2 + reactance ** 2;
    expect(responseAt(found, 1000).re).toBeCloseTo((200e3 * reactance ** 2) / scale, 6);
    expect(responseAt(found, 1000).im).toBeCloseTo((200e3 ** 2 * reactance) / scale, 6);
  });

  it('of a coupled plate rises without bound downwards', () => {
    const found = sourceImpedance([placed(driverPlate, { parts: { couplingCap: 100e-9 } })]);
    expect(responseAt(found, 10).im).toBeCloseTo(-1 / (2 * Math.PI * 10 * 100e-9), 6);
  });
});
