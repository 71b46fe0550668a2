import { describe, expect, it } from 'vitest';
import type { Block } from '../../../src/blocks/block.ts';
import { blocksOf } from '../../../src/blocks/catalogue.ts';
import { driverCathodeFollower } from '../../../src/blocks/driver-cathode-follower.ts';
import { driverPlainSource } from '../../../src/blocks/driver-plain-source.ts';
import { driverPlate } from '../../../src/blocks/driver-plate.ts';
import { powerFeedback } from '../../../src/blocks/power-feedback.ts';
import type { PlacedBlock } from '../../../src/blocks/span.ts';
import { toneBaxandall } from '../../../src/blocks/tone-baxandall.ts';
import { toneBridgedT } from '../../../src/blocks/tone-bridged-t.ts';
import { toneJames } from '../../../src/blocks/tone-james.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { toneTrebleCut } from '../../../src/blocks/tone-treble-cut.ts';
import { triodePoint } from '../../../src/parts/triode-model.ts';
import { TRIODES } from '../../../src/parts/valve.ts';
import { type DcStress, dcStress, type PartStress } from '../../../src/study/dc-stress.ts';
import { everyChoice } from '../blocks/every-choice.ts';
import { placed } from '../blocks/placed.ts';

const RESTING = { supply: 320, restVoltage: 190 };

function stressOf(...blocks: readonly PlacedBlock[]): DcStress {
  const found = dcStress(blocks);
  if (found === undefined) throw new Error('no driver was found');
  return found;
}

function part({ parts }: DcStress, name: string): PartStress {
  const found = parts.find((entry) => entry.part === name);
  if (found === undefined) throw new Error(`there is no ${name} among the stresses`);
  return found;
}

describe('what a three-knob network stands behind a source at 190 V, supply 320 V', () => {
  const stress = stressOf(placed(driverPlainSource, { parts: RESTING }), placed(toneThreeKnob));

  it('its treble, bass and mid capacitors stand all of it, warm and cold', () => {
    for (const name of ['trebleCap', 'bassCap', 'midCap']) {
      // The slope resistor carries no direct current, so all three hang on the input.
      expect(part(stress, name).running).toBeCloseTo(190, 9);
      expect(part(stress, name).cold).toBeCloseTo(320, 9);
      expect(part(stress, name).byLeakage).toBe(false);
    }
  });

  it('nothing reaches the next grid, and resistors and tracks carry no direct current', () => {
    expect(stress.running).toEqual({ input: 190, output: expect.closeTo(0, 9) });
    expect(stress.cold).toEqual({ input: 320, output: expect.closeTo(0, 9) });
    for (const name of ['slope', 'loadResistance', 'treblePot', 'bassPot', 'middlePot']) {
      expect(part(stress, name).cold).toBeCloseTo(0, 9);
      expect(part(stress, name).dissipation).toBeCloseTo(0, 12);
    }
  });

  it('each rating is the next usual one above 320 V and a quarter', () => {
    // 400 V exactly; a ceramic or mica capacitor has 500 V next.
    expect(part(stress, 'bassCap')).toMatchObject({ kind: 'film-capacitor', rating: 400, margin: 0.25 });
    expect(part(stress, 'midCap').rating).toBe(400);
    expect(part(stress, 'trebleCap')).toMatchObject({ kind: 'ceramic-capacitor', rating: 500 });
  });

  it('a volt more of supply asks for the next rating', () => {
    const more = stressOf(
      placed(driverPlainSource, { parts: { ...RESTING, supply: 321 } }),
      placed(toneThreeKnob),
    );
    expect(part(more, 'bassCap').rating).toBe(630);
  });

  it('leaves out what nobody buys, and says that there is no stage in it', () => {
    const names = stress.parts.map((entry) => entry.part);
    expect(names).not.toContain('loadCapacitance');
    expect(names).not.toContain('sourceResistance');
    expect(new Set(names).size).toBe(names.length);
    expect(stress.hasOwnStage).toBe(false);
    expect(stress.supply).toBe(320);
  });

  it('is the same with the power stage behind it, whose grid draws nothing', () => {
    const line = [
      placed(driverPlainSource, { parts: RESTING }),
      placed(toneThreeKnob),
      placed(powerFeedback),
    ];
    expect(dcStress(line)).toEqual(stress);
  });
});

describe('networks that pass direct current, by Ohm’s law', () => {
  it('a treble cut hands 10/11 of the voltage on, and its resistor and load stand the rest', () => {
    const stress = stressOf(
      placed(driverPlainSource, { parts: RESTING }),
      placed(toneTrebleCut, { parts: { seriesResistor: 100e3, loadResistance: 1e6 } }),
    );
    expect(stress.running.output).toBeCloseTo((190 * 10) / 11, 6);
    expect(stress.cold.output).toBeCloseTo((320 * 10) / 11, 6);
    expect(part(stress, 'seriesResistor').cold).toBeCloseTo(320 / 11, 6);
    // Cold is worse than warm: (320 V/1.1 MΩ)² · 100 kΩ and · 1 MΩ.
    expect(part(stress, 'seriesResistor').dissipation).toBeCloseTo((320 / 1.1e6) ** 2 * 100e3, 9);
    expect(part(stress, 'loadResistance').dissipation).toBeCloseTo((320 / 1.1e6) ** 2 * 1e6, 9);
    // 85 mW with 100 % in hand is an eighth of a watt no more; 291 V across it ask for the half-watt body.
    expect(part(stress, 'loadResistance').rating).toBe(0.5);
    expect(part(stress, 'cutCap').cold).toBeCloseTo((320 * 10) / 11, 6);
  });

  it('counts the stops of knobs, not only where they stand', () => {
    const stress = stressOf(
      placed(driverPlainSource, { parts: RESTING }),
      placed(toneBridgedT, { knobs: { scoop: 0 } }),
    );
    const [first, second] = [part(stress, 'firstCap'), part(stress, 'secondCap')];
    // Its middle is at 0 V through the leg whatever the knob does; both ends are up.
    expect(first.cold).toBeCloseTo(320, 6);
    expect(second.cold).toBeCloseTo((320 * 1e6) / 1.22e6, 6);
    expect(part(stress, 'leg').dissipation).toBe(0);
  });

  describe('passive bass and treble, whose bass control divides direct voltages', () => {
    const parts = { bassTop: 100e3, bassPot: 1e6, bassBottom: 10e3, join: 100e3, loadResistance: 1e6 };
    const stress = stressOf(
      placed(driverPlainSource, { parts: RESTING }),
      placed(toneJames, { parts, knobs: { bass: 0.5, treble: 0.5 } }),
    );
    const parallel = (first: number, second: number) => 1 / (1 / first + 1 / second);

    it('hands most on turned fully up, whatever the knob is set to', () => {
      const behind = parallel(1.01e6, 1.1e6);
      const share = (behind / (100e3 + behind)) * (1 / 1.1);
      expect(stress.running.output).toBeCloseTo(190 * share, 6);
      expect(stress.cold.output).toBeCloseTo(320 * share, 6);
    });

    it('puts most on its upper capacitor turned fully down', () => {
      const total = 1.1e6 + parallel(10e3, 1.1e6);
      expect(part(stress, 'bassTopCap').cold).toBeCloseTo((320 * 1e6) / total, 6);
      expect(part(stress, 'bassTopCap').running).toBeCloseTo((190 * 1e6) / total, 6);
    });

    it('rates the track as if all of it carried the current of its busier half', () => {
      const current = 320 / (100e3 + 500e3 + parallel(510e3, 1.1e6)); // the upper half, as set
      expect(part(stress, 'bassPot').dissipation).toBeCloseTo(current ** 2 * 1e6, 9);
      // 114 mW, with as much again in hand.
      expect(part(stress, 'bassPot').rating).toBe(0.25);
    });
  });

  it('leaves a stage within the network out, and says so', () => {
    const stress = stressOf(placed(driverPlainSource, { parts: RESTING }), placed(toneBaxandall));
    expect(stress.hasOwnStage).toBe(true);
    expect(part(stress, 'bassCap').cold).toBeGreaterThan(0);
  });
});

describe('a driver from its plate', () => {
  const parts = { plateLoad: 100e3, cathodeResistor: 1500, supply: 300 };

  it('its coupling capacitor stands the plate warm and the supply cold; the network behind nothing for certain', () => {
    const stress = stressOf(placed(driverPlate, { parts }), placed(toneTrebleCut));
    const coupling = part(stress, 'couplingCap');
    expect(coupling.cold).toBeCloseTo(300, 9);
    expect(coupling.running).toBeGreaterThan(100);
    expect(coupling.running).toBeLessThan(300);
    expect(coupling.byLeakage).toBe(false);
    expect(stress.cold.output).toBeCloseTo(0, 9);
    expect(part(stress, 'cutCap').cold).toBeCloseTo(0, 9);
  });

  it('in series with a network’s own capacitors, every one of them is rated for all of it', () => {
    const stress = stressOf(placed(driverPlate, { parts }), placed(toneThreeKnob));
    for (const name of ['couplingCap', 'trebleCap', 'bassCap', 'midCap']) {
      expect(part(stress, name)).toMatchObject({ cold: expect.closeTo(300, 9), byLeakage: true });
    }
  });

  it('rests where the valve’s curve meets the load line, the network’s direct current counted', () => {
    const load = { seriesResistor: 47e3, loadResistance: 100e3 };
    const stress = stressOf(
      placed(driverPlate, { parts, choices: { coupling: 'direct' } }),
      placed(toneTrebleCut, { parts: load }),
    );
    const plate = stress.running.input;
    const cathode = part(stress, 'cathodeResistor').running;
    const current = cathode / 1500;
    // Kirchhoff at the plate, and the valve's own law.
    expect((300 - plate) / 100e3).toBeCloseTo(current + plate / 147e3, 9);
    expect(triodePoint(TRIODES.ECC83.model, plate - cathode, -cathode).current).toBeCloseTo(current, 9);
    expect(part(stress, 'plateLoad').dissipation).toBeCloseTo((300 - plate) ** 2 / 100e3, 9);
    expect(part(stress, 'cathodeResistor').dissipation).toBeCloseTo(cathode ** 2 / 1500, 9);
    expect(stress.cold.input).toBe(300);
  });

  it('takes the voltage typed in where it is asked to, or where the valve is typed in', () => {
    for (const choice of ['rest', 'valve']) {
      const choices = { [choice]: 'typed' };
      const driver = placed(driverPlate, { parts: { ...parts, restVoltage: 210 }, choices });
      const stress = stressOf(driver, placed(toneThreeKnob));
      expect(part(stress, 'couplingCap').running).toBeCloseTo(210, 9);
      expect(part(stress, 'plateLoad').running).toBeCloseTo(90, 9);
      expect(part(stress, 'cathodeResistor').running).toBeCloseTo(0.9e-3 * 1500, 9);
    }
  });
});

describe('a cathode follower', () => {
  it('holds the network at its cathode, a little above its grid, and cold at the supply', () => {
    const driver = placed(driverCathodeFollower, { parts: { supply: 320, gridVoltage: 180 } });
    const stress = stressOf(driver, placed(toneThreeKnob));
    expect(stress.running.input).toBeGreaterThan(180);
    expect(stress.running.input).toBeLessThan(185); // an ECC83 has at most a few volts of bias here
    expect(part(stress, 'midCap').running).toBeCloseTo(stress.running.input, 9);
    expect(part(stress, 'midCap').cold).toBeCloseTo(320, 9);
    // 320 V on 100 kΩ: 1.02 W; with as much again in hand 3 W.
    expect(part(stress, 'cathodeLoad')).toMatchObject({ cold: 320, dissipation: expect.closeTo(1.024, 9) });
  });

  it('through a capacitor leaves the network’s resistors without direct current', () => {
    const driver = placed(driverCathodeFollower, { choices: { coupling: 'capacitor' } });
    const stress = stressOf(driver, placed(toneTrebleCut));
    expect(part(stress, 'couplingCap').cold).toBeCloseTo(300, 9);
    expect(stress.cold.output).toBeCloseTo(0, 9);
  });

  it('feeds a network that passes direct current from its cathode, its own current then less', () => {
    const driver = placed(driverCathodeFollower, { parts: { gridVoltage: 150, supply: 300 } });
    const alone = stressOf(driver);
    const loaded = stressOf(
      driver,
      placed(toneTrebleCut, { parts: { seriesResistor: 100e3, loadResistance: 220e3 } }),
    );
    expect(loaded.running.input).toBeLessThan(alone.running.input);
    const cathode = loaded.running.input;
    const current = cathode / 100e3 + cathode / 320e3;
    expect(triodePoint(TRIODES.ECC83.model, 300 - cathode, 150 - cathode).current).toBeCloseTo(current, 9);
  });
});

describe('the study as a whole', () => {
  it('says so where a network asks more of a follower than its valve can give', () => {
    const tone = placed(toneTrebleCut, { parts: { seriesResistor: 10e3, loadResistance: 22e3 } });
    expect(() => dcStress([placed(driverCathodeFollower), tone])).toThrow(
      /above the cathode and draw current/,
    );
  });

  it('has nothing to say without a driver', () => {
    expect(dcStress([placed(toneThreeKnob), placed(powerFeedback)])).toBeUndefined();
    expect(dcStress([])).toBeUndefined();
  });

  it('says what is wrong with a voltage at rest above the supply', () => {
    const driver = placed(driverPlainSource, { parts: { supply: 200, restVoltage: 250 } });
    expect(() => dcStress([driver, placed(toneThreeKnob)])).toThrow(/250 V.*supply of 200 V/);
  });

  const pairs = blocksOf('driver').flatMap((driver) =>
    blocksOf('tone').map((tone) => [driver.variant, tone.variant, driver, tone] as const),
  );

  it.each(pairs)(
    '%s into %s: every choice, cold never under what the supply allows',
    (_, __, driver, tone) => {
      const each = (block: Block) => everyChoice(block).map((settings): PlacedBlock => ({ block, settings }));
      for (const first of each(driver)) {
        for (const second of each(tone)) {
          const stress = stressOf(first, second);
          const rated = Object.entries(tone.parts).filter(([, { kind }]) => kind !== 'quantity');
          expect(stress.parts.length).toBeGreaterThan(rated.length / 2);
          for (const entry of stress.parts) {
            expect(entry.running).toBeLessThanOrEqual(stress.supply * (1 + 1e-9));
            expect(entry.cold).toBeLessThanOrEqual(stress.supply * (1 + 1e-9));
            expect(entry.dissipation).toBeGreaterThanOrEqual(0);
            expect(Number.isFinite(entry.dissipation)).toBe(true);
          }
        }
      }
    },
  );

  it('resistors of a capacitor-coupled network dissipate nothing, so that the least rating does', () => {
    const stress = stressOf(placed(driverPlate), placed(toneThreeKnob));
    expect(part(stress, 'slope').rating).toBe(0.125);
    expect(part(stress, 'treblePot').rating).toBe(0.1);
  });
});
