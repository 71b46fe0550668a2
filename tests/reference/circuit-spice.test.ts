import { describe, expect, it } from 'vitest';
import { type Block, SLOTS } from '../../src/blocks/block.ts';
import { blocksOf } from '../../src/blocks/catalogue.ts';
import { defaultSettings } from '../../src/blocks/settings.ts';
import { elementValues, type PlacedBlock, spansOf } from '../../src/blocks/span.ts';
import { compile } from '../../src/circuit/compile.ts';
import type { Wiring } from '../../src/circuit/wiring.ts';
import { NotchworkError } from '../../src/errors.ts';
import { responseAt } from '../../src/response/curve.ts';
import { seededRandom } from '../../src/study/blind-trial.ts';
import { rotation } from '../../src/units.ts';
import { randomCircuit } from '../src/circuit/random-wiring.ts';
import { runSpice, spiceText } from './spice-engine.ts';

const SWEEP = '.ac dec 12 10 40k';

/** The largest differences from the SPICE engine, in dB and in degrees, over 10 Hz to 40 kHz. */
async function differences(
  wiring: Wiring,
  values: ArrayLike<number>,
): Promise<{ decibels: number; degrees: number }> {
  // The engine writes a short as a milliohm, so ours is given the same.
  const same = Array.from(wiring.elements, (element, index) =>
    element.kind === 'resistor' ? Math.max(values[index]!, 1e-3) : values[index]!,
  );
  const transfer = compile({ ...wiring, outputs: [wiring.outputs[0]!] }).transfer(same);
  const { frequencies, re, im } = await runSpice(spiceText(wiring, same, SWEEP), wiring.outputs[0]![0]);
  const worst = { decibels: 0, degrees: 0 };
  frequencies.forEach((frequency, index) => {
    const ours = responseAt(transfer, frequency);
    const [a, b] = [Math.hypot(ours.re, ours.im), Math.hypot(re[index]!, im[index]!)];
    // SPICE solves in double precision: under −120 dB its own rounding is as large as the tolerance.
    if (b < 1e-6) return;
    const turn = Math.atan2(ours.im, ours.re) - Math.atan2(im[index]!, re[index]!);
    worst.decibels = Math.max(worst.decibels, Math.abs(20 * Math.log10(a / b)));
    worst.degrees = Math.max(
      worst.degrees,
      Math.abs(turn - 2 * Math.PI * Math.round(turn / (2 * Math.PI))) * (180 / Math.PI),
    );
  });
  return worst;
}

/** A block with random values (a decade about its defaults), positions (stops included) and choices. */
function randomPlaced(block: Block, random: () => number): PlacedBlock {
  const fallback = defaultSettings(block);
  const parts = Object.fromEntries(
    Object.entries(block.parts).map(([name, { range }]) => {
      const value = fallback.parts[name]! * 10 ** (random() - 0.5);
      return [name, Math.min(Math.max(value, range[0]), range[1])];
    }),
  );
  const knobs = Object.fromEntries(
    Object.keys(block.knobs).map((name) => {
      const draw = random();
      return [name, rotation(draw < 0.1 ? 0 : draw > 0.9 ? 1 : random())];
    }),
  );
  const choices = Object.fromEntries(
    Object.entries(block.choices).map(([name, { options }]) => [
      name,
      options[Math.floor(random() * options.length)]!.value,
    ]),
  );
  return { block, settings: { ...fallback, parts, knobs, choices } };
}

/** Random settings whose valve, if it is taken at its point of rest, has one: a grid may not stand above its cathode. */
function randomWithRest(block: Block, random: () => number): PlacedBlock {
  for (;;) {
    const placed = randomPlaced(block, random);
    const [span] = spansOf([placed]);
    try {
      elementValues(span!.circuits[0]!, span!.blocks);
      return placed;
    } catch (error) {
      if (!(error instanceof NotchworkError) || error.code !== 'circuit-unsolvable') throw error;
    }
  }
}

async function expectAgreement(placed: readonly PlacedBlock[]): Promise<void> {
  for (const span of spansOf(placed)) {
    const circuit = span.circuits.at(-1)!;
    const { decibels, degrees } = await differences(
      circuit.network.wiring,
      elementValues(circuit, span.blocks),
    );
    expect(decibels).toBeLessThan(1e-6);
    expect(degrees).toBeLessThan(1e-5);
  }
}

// The SPICE engine is ngspice compiled to WebAssembly, from the npm registry: an independent program.
describe('against the SPICE engine, 1e-6 dB and 1e-5 degrees', () => {
  const [source] = blocksOf('driver');
  const [threeKnob] = blocksOf('tone');
  const [power] = blocksOf('power');

  it('source and three-knob network, 50 random cases', async () => {
    const random = seededRandom(31);
    for (let index = 0; index < 50; index += 1) {
      await expectAgreement([randomPlaced(source!, random), randomPlaced(threeKnob!, random)]);
    }
  });

  it('feedback and presence, 50 random cases', async () => {
    const random = seededRandom(32);
    for (let index = 0; index < 50; index += 1) await expectAgreement([randomPlaced(power!, random)]);
  });

  it.each(
    SLOTS.flatMap((slot) => blocksOf(slot).map((block) => [`${slot} ${block.variant}`, block] as const)),
  )('%s, 6 random cases', async (_, block) => {
    const random = seededRandom(33);
    for (let index = 0; index < 6; index += 1) {
      // A driver is loaded by a network, as it is in a line; alone it would feed nothing.
      const placed = [randomWithRest(block, random)];
      if (block.slot === 'driver') placed.push(randomPlaced(threeKnob!, random));
      await expectAgreement(placed);
    }
  });

  it('100 random circuits of R, C, L, G and E with up to 12 nodes', async () => {
    const random = seededRandom(34);
    let compared = 0;
    while (compared < 100) {
      const { wiring, values } = randomCircuit(random, 3 + Math.floor(random() * 10), {
        inductors: true,
        controlled: true,
      });
      // High resonances and near-cancellations lose SPICE digits; such a circuit says nothing of either.
      if (isTouchy(wiring, values)) continue;
      compared += 1;
      const { decibels, degrees } = await differences(wiring, values);
      expect(decibels).toBeLessThan(1e-6);
      expect(degrees).toBeLessThan(1e-5);
    }
  });
});

/** Whether a change of one part in 10¹² of every value moves the curve by more than a hundredth of the tolerance. */
function isTouchy(wiring: Wiring, values: readonly number[]): boolean {
  const network = compile({ ...wiring, outputs: [wiring.outputs[0]!] });
  const exact = network.transfer(values);
  return values.some((value, index) => {
    const nudged = network.transfer(values.with(index, value * (1 + 1e-10)));
    return [10, 30, 100, 300, 1000, 3000, 10_000, 40_000].some((frequency) => {
      const [a, b] = [responseAt(exact, frequency), responseAt(nudged, frequency)];
      const size = Math.hypot(a.re, a.im);
      return !(size > 1e-4) || Math.hypot(a.re - b.re, a.im - b.im) / size > 1e-9;
    });
  });
}
