import { describe, expect, it } from 'vitest';
import type { Block } from '../../../src/blocks/block.ts';
import { driverPlainSource } from '../../../src/blocks/driver-plain-source.ts';
import { powerFeedback } from '../../../src/blocks/power-feedback.ts';
import { elementValues, spansOf, spanTransfer } from '../../../src/blocks/span.ts';
import { speakerResistive } from '../../../src/blocks/speaker-resistive.ts';
import { stageCommonCathode } from '../../../src/blocks/stage-common-cathode.ts';
import { toneThreeKnob } from '../../../src/blocks/tone-three-knob.ts';
import { toneTrebleCut } from '../../../src/blocks/tone-treble-cut.ts';
import { volumeBright } from '../../../src/blocks/volume-bright.ts';
import { levelOf } from '../../../src/response/curve.ts';
import { oneSpan, placed } from './placed.ts';

describe('cutting a line into spans', () => {
  it('begins a new one at every grid, and only there', () => {
    const line = [
      placed(stageCommonCathode),
      placed(volumeBright),
      placed(driverPlainSource),
      placed(toneThreeKnob),
      placed(powerFeedback),
      placed(speakerResistive),
    ];
    expect(spansOf(line).map((span) => span.blocks.map(({ block }) => block.slot))).toEqual([
      ['stage', 'volume'],
      ['driver', 'tone'],
      ['power', 'speaker'],
    ]);
  });

  it('has a first span even where the first input is no grid, and none for no blocks', () => {
    expect(spansOf([placed(toneThreeKnob)]).map((span) => span.blocks.length)).toEqual([1]);
    expect(spansOf([])).toEqual([]);
  });

  it('compiles a wiring once: other values give the same circuits, other choices others', () => {
    const [first] = spansOf([placed(toneThreeKnob)]);
    const [values] = spansOf([placed(toneThreeKnob, { parts: { slope: 56e3 }, knobs: { bass: 1 } })]);
    const [choice] = spansOf([placed(toneThreeKnob, { choices: { load: 'none' } })]);
    expect(values!.circuits).toBe(first!.circuits);
    expect(values!.key).toBe(first!.key);
    expect(choice!.circuits).not.toBe(first!.circuits);
  });

  it('lets the speaker be the power stage’s load instead of its own', () => {
    const alone = spansOf([placed(powerFeedback)])[0]!.circuits[0]!;
    const joined = spansOf([placed(powerFeedback), placed(speakerResistive)])[0]!.circuits.at(-1)!;
    const names = (circuit: typeof alone) => circuit.elements.map(({ element }) => element.name);
    expect(names(alone)).toContain('power.loadResistance');
    expect(names(joined)).not.toContain('power.loadResistance');
    expect(names(joined)).toContain('speaker.loadResistance');
  });
});

describe('values of a span’s elements', () => {
  it('come from parts, halves of tracks and what is computed, each from its own block', () => {
    const [span] = spansOf([
      placed(driverPlainSource, { parts: { sourceResistance: 4700 } }),
      placed(toneThreeKnob, { parts: { middlePot: 10e3, slope: 33e3 }, knobs: { middle: 0.3 } }),
    ]);
    const circuit = span!.circuits.at(-1)!;
    const values = elementValues(circuit, span!.blocks);
    const of = (name: string) => values[circuit.elements.findIndex(({ element }) => element.name === name)];
    expect(of('driver.sourceResistance')).toBe(4700);
    expect(of('tone.slope')).toBe(33e3);
    expect(of('tone.middleLower')).toBeCloseTo(3e3, 9);
    expect(of('tone.middleUpper')).toBeCloseTo(7e3, 9);
  });
});

describe('transfer of a span', () => {
  it('of two blocks is not the product of theirs: the second loads the first', () => {
    const source = placed(driverPlainSource, { parts: { sourceResistance: 100e3 } });
    const cut = placed(toneTrebleCut, {
      parts: { seriesResistor: 100e3, loadResistance: 1e6 },
      knobs: { tone: 1 },
    });
    const both = oneSpan(source, cut);
    const level = levelOf(both.transfer);
    // At 1 Hz by Ohm’s law: 1 MΩ over 1.2 MΩ; the capacitor with its megohm is open but for 1e-3.
    expect(level(1)).toBeCloseTo(20 * Math.log10(1 / 1.2), 2);
    expect(levelOf(both.cumulative[0]!)(1)).toBeCloseTo(0, 12);
    expect(both.transfer).toBe(both.cumulative[1]);
    expect(both.reference).toBe(1);
  });

  it('puts a block with a gain of its own at 0 dB at 1 kHz, whatever drives it, and tells its gain', () => {
    const stage = oneSpan(placed(stageCommonCathode, { parts: { plateLoad: 220e3 } }));
    expect(levelOf(stage.transfer)(1000)).toBeCloseTo(0, 9);
    expect(stage.reference).toBeGreaterThan(50);
    expect(stage.reference).toBeLessThan(100);
  });

  it('takes the reference with the knobs named, so that the knob itself still shows', () => {
    const at = (presence: number) =>
      levelOf(oneSpan(placed(powerFeedback, { knobs: { presence } })).transfer)(1000);
    expect(at(0)).toBeCloseTo(0, 9);
    expect(at(1)).toBeGreaterThan(1);
  });

  it('of a stage that passes nothing is silence, not an error', () => {
    const { transfer } = oneSpan(placed(powerFeedback, { parts: { gain: 0 } }));
    expect(transfer.numerator.every((value) => value === 0)).toBe(true);
    expect(levelOf(transfer)(1000)).toBe(Number.NEGATIVE_INFINITY);
  });

  it('passes on what the compiler has against a wiring', () => {
    const loose: Block = {
      ...toneTrebleCut,
      variant: 'loose',
      elements: () => [
        { kind: 'resistor', name: 'r', nodes: ['x', 'out'], value: { part: 'seriesResistor' } },
      ],
    };
    expect(() => spanTransfer(spansOf([placed(loose)])[0]!)).toThrow(
      expect.objectContaining({ code: 'netlist-topology' }),
    );
  });
});
