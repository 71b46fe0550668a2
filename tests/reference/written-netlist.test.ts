import { describe, expect, it } from 'vitest';
import type { Block, BlockSettings } from '../../src/blocks/block.ts';
import { driverPlainSource } from '../../src/blocks/driver-plain-source.ts';
import { powerFeedback } from '../../src/blocks/power-feedback.ts';
import { defaultSettings } from '../../src/blocks/settings.ts';
import { elementValues, type PlacedBlock, spansOf } from '../../src/blocks/span.ts';
import { toneThreeKnob } from '../../src/blocks/tone-three-knob.ts';
import { compile } from '../../src/circuit/compile.ts';
import type { Network } from '../../src/circuit/network.ts';
import { LEAST_RESISTANCE, writeNetlist } from '../../src/circuit/spice/write-netlist.ts';
import { seededRandom } from '../../src/study/blind-trial.ts';
import { rotation } from '../../src/units.ts';
import { randomCircuit } from '../src/circuit/random-wiring.ts';
import { type AcRun, runAc } from './netlist-run.ts';

/**
 * Every circuit is solved twice: by our trees, and by a SPICE engine from the text that our writer
 * makes. SPICE solves nodal equations with conductances, so a resistor of r ohms among conductances
 * of 1/R costs it log10(R/r) of its 16 digits. So that the check judges us and not its cancellation:
 *
 * - a potentiometer's end stop is 10 mΩ instead of 0 for both (with 1 mΩ the engine and we differ by
 *   1.0e-6 dB, with 10 mΩ by 2e-7: the difference falls with the ratio, as its elimination's error does);
 * - random netlists have values within a few decades, and where the elimination is known to lose more
 *   than the tolerance (the output is under −140 dB of the source, or controlled sources all but
 *   cancel: changing one value by 1e-13 of itself moves the level by 1e-8 dB) the case is drawn anew.
 *   Which cases go is decided from our side alone, never by how the comparison comes out, and their
 *   number is bounded.
 */
const SWEEP = { from: 10, to: 40_000, perDecade: 12 };
const END_STOP = 1e-2; // ohms

const LEVEL_TOLERANCE = 1e-6; // dB; the engine's own elimination keeps 2e-7 with these end stops (measured)
const PHASE_TOLERANCE = 1e-5; // degrees; 1e-6 dB is 1.15e-7 of the voltage, 6.6e-6 degrees turned sideways

interface Deviation {
  readonly level: number;
  readonly phase: number;
}

function response(
  network: Network,
  values: ArrayLike<number>,
  frequency: number,
): { level: number; phase: number } {
  const { numerators, denominator } = network.evaluate(values);
  const omega = 2 * Math.PI * frequency;
  const at = (coefficients: readonly number[]): [number, number] => {
    let [re, im] = [0, 0];
    for (let power = coefficients.length - 1; power >= 0; power -= 1) {
      [re, im] = [coefficients[power]! - omega * im, omega * re];
    }
    return [re, im];
  };
  const [topRe, topIm] = at(numerators[0]!);
  const [bottomRe, bottomIm] = at(denominator);
  return {
    level: 20 * Math.log10(Math.hypot(topRe, topIm) / Math.hypot(bottomRe, bottomIm)),
    phase: ((Math.atan2(topIm, topRe) - Math.atan2(bottomIm, bottomRe)) * 180) / Math.PI,
  };
}

function deviation(network: Network, values: ArrayLike<number>, run: AcRun): Deviation {
  let [level, phase] = [0, 0];
  run.frequencies.forEach((frequency, index) => {
    const ours = response(network, values, frequency);
    const turn = (((ours.phase - run.phases[index]! + 180) % 360) + 360) % 360;
    level = Math.max(level, Math.abs(ours.level - run.levels[index]!));
    phase = Math.max(phase, Math.abs(turn - 180));
  });
  return { level, phase };
}

async function spiceRun(network: Network, values: ArrayLike<number>): Promise<AcRun> {
  const { elements, source, outputs } = network.wiring;
  const text = writeNetlist({
    title: 'Comparison',
    elements: elements.map((element, index) => ({ ...element, value: values[index]! })),
    source,
    output: outputs[0]![0],
  });
  return runAc(text, 'out', SWEEP);
}

async function expectAgreement(network: Network, values: ArrayLike<number>): Promise<void> {
  const run = await spiceRun(network, values);
  expect(run.frequencies.length).toBe(44); // 3.6 decades of 12 points, the first one counted too
  expect(run.frequencies[0]).toBeCloseTo(10, 9);
  const { level, phase } = deviation(network, values, run);
  expect(level).toBeLessThan(LEVEL_TOLERANCE);
  expect(phase).toBeLessThan(PHASE_TOLERANCE);
}

const random = seededRandom(1973);
const between = (low: number, high: number): number => low * (high / low) ** random();
const position = () => {
  const draw = random();
  return rotation(draw < 0.15 ? 0 : draw > 0.85 ? 1 : random());
};

function drawn(
  block: Block,
  ranges: Readonly<Record<string, readonly [number, number]>>,
  choices: BlockSettings['choices'],
): PlacedBlock {
  const settings = defaultSettings(block);
  const parts = Object.fromEntries(
    Object.entries(ranges).map(([name, [low, high]]) => [name, between(low, high)]),
  );
  const knobs = Object.fromEntries(Object.keys(block.knobs).map((name) => [name, position()]));
  return {
    block,
    settings: {
      ...settings,
      parts: { ...settings.parts, ...parts },
      knobs,
      choices: { ...settings.choices, ...choices },
    },
  };
}

async function expectBlocksAgree(placed: readonly PlacedBlock[]): Promise<void> {
  const [span, ...others] = spansOf(placed);
  expect(others).toEqual([]);
  const circuit = span!.circuits.at(-1)!;
  const values = elementValues(circuit, span!.blocks).map((value, index) =>
    circuit.elements[index]!.element.kind === 'resistor' ? Math.max(value, END_STOP) : value,
  );
  expect(END_STOP).toBeGreaterThan(LEAST_RESISTANCE); // so that the writer changes nothing
  await expectAgreement(circuit.network, values);
}

const TONE_RANGES = {
  treblePot: [100e3, 1e6],
  bassPot: [100e3, 1e6],
  middlePot: [4.7e3, 50e3],
  slope: [22e3, 150e3],
  trebleCap: [100e-12, 1e-9],
  bassCap: [10e-9, 220e-9],
  midCap: [10e-9, 100e-9],
  loadResistance: [220e3, 2.2e6],
  loadCapacitance: [10e-12, 220e-12],
} as const;

const POWER_RANGES = {
  gain: [10, 300],
  sourceImpedance: [5, 200],
  loadResistance: [4, 16],
  feedbackResistor: [10e3, 100e3],
  presencePot: [2.2e3, 25e3],
  tailResistor: [1e3, 10e3],
  presenceCap: [22e-9, 680e-9],
} as const;

describe('the blocks, as written netlists, against a SPICE engine, 10 Hz to 40 kHz', () => {
  it.each(['wiper', 'rheostat'].flatMap((wiring) => ['grid', 'none'].map((load) => [wiring, load] as const)))(
    'three-knob tone network with its driver: middle %s, load %s, 25 cases',
    async (middleWiring, load) => {
      for (let index = 0; index < 25; index += 1) {
        const driver = drawn(driverPlainSource, { sourceResistance: [100, 100e3] }, {});
        await expectBlocksAgree([driver, drawn(toneThreeKnob, TONE_RANGES, { middleWiring, load })]);
      }
    },
  );

  it.each(['tail-pot', 'across-tail'])(
    'feedback amplifier: presence %s, 50 cases',
    async (presenceCircuit) => {
      for (let index = 0; index < 50; index += 1) {
        await expectBlocksAgree([drawn(powerFeedback, POWER_RANGES, { presenceCircuit })]);
      }
    },
  );
});

/** Whether SPICE can be expected to keep the tolerance, judged by our own response alone. */
function isWellConditioned(
  network: Network,
  values: readonly number[],
  frequencies: readonly number[],
): boolean {
  const nudged = values.map((value, index) => value * (1 + (index % 2 === 0 ? 1e-13 : -1e-13)));
  return frequencies.every((frequency) => {
    const { level } = response(network, values, frequency);
    return level > -140 && Math.abs(level - response(network, nudged, frequency).level) < 1e-8;
  });
}

describe('random circuits, as written netlists, against a SPICE engine', () => {
  it('100 circuits of R, C, L, G and E with up to 12 nodes', async () => {
    const draw = seededRandom(60_063);
    const frequencies = Array.from({ length: 100 }, (_, index) => 10 * 4000 ** (index / 99));
    let [accepted, refused] = [0, 0];
    const kinds = new Set<string>();
    while (accepted < 100) {
      const { wiring, values } = randomCircuit(draw, 3 + Math.floor(draw() * 10), {
        inductors: true,
        controlled: true,
      });
      const network = compile({ ...wiring, outputs: [['out', '0']] });
      if (!isWellConditioned(network, values, frequencies)) {
        refused += 1;
        continue;
      }
      accepted += 1;
      for (const element of wiring.elements) kinds.add(element.kind);
      await expectAgreement(network, values);
    }
    expect([...kinds].sort()).toEqual([
      'capacitor',
      'inductor',
      'resistor',
      'transconductance',
      'voltage-gain',
    ]);
    expect(refused).toBeLessThan(50); // the choice above must stay an exception
  });
});
