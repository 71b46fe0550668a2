import type { Block, BlockSettings } from '../../src/blocks/block.ts';
import { powerFeedback } from '../../src/blocks/power-feedback.ts';
import { defaultSettings, valuesOf, withKnob } from '../../src/blocks/settings.ts';
import { elementValues, type Span, spansOf, spanTransfer } from '../../src/blocks/span.ts';
import { toneThreeKnob } from '../../src/blocks/tone-three-knob.ts';
import { bilinear } from '../../src/filter/bilinear.ts';
import { factor } from '../../src/filter/factor.ts';
import { magnitudeInto } from '../../src/response/curve.ts';
import { DEFAULT_GRID } from '../../src/response/grid.ts';
import type { TransferFunction } from '../../src/transfer-function.ts';
import { rotation } from '../../src/units.ts';
import { bareLoop } from './bare-loop.ts';
import { type Row, ratio, type Work } from './harness.ts';
import { type ClosedFormValues, threeKnobClosedForm } from './three-knob-closed-form.ts';

const out = new Float64Array(DEFAULT_GRID.frequencies.length);
const POSITIONS = 16;

/** Settings of a block for some positions of one of its knobs, made before the clock starts: they are what a move hands in. */
function moves(block: Block, knob: string, choices: Readonly<Record<string, string>> = {}): BlockSettings[] {
  const start = { ...defaultSettings(block), choices: { ...defaultSettings(block).choices, ...choices } };
  return Array.from({ length: POSITIONS }, (_, index) =>
    withKnob(start, knob, rotation(index / (POSITIONS - 1))),
  );
}

function spanOf(block: Block, settings: BlockSettings): Span {
  return spansOf([{ block, settings }])[0]!;
}

/** Sections and the curve of one transfer function. */
function follow(transfer: TransferFunction): number {
  let sum = 0;
  for (const section of factor(transfer)) sum += bilinear(section, 48000).feedforward[0]!;
  magnitudeInto(out, transfer, DEFAULT_GRID);
  return sum + out[0]!;
}

/** Coefficients by the compiled network alone. */
function coefficients(span: Span): TransferFunction {
  const circuit = span.circuits.at(-1)!;
  return circuit.network.transfer(elementValues(circuit, span.blocks));
}

/** Goes through the positions, one a call. */
function turning(spans: readonly (readonly Span[])[], step: (span: Span) => number): Work {
  let position = 0;
  return () => {
    position = (position + 1) % spans.length;
    let sum = 0;
    for (const span of spans[position]!) sum += step(span);
    return sum;
  };
}

function closedFormValues(settings: BlockSettings): ClosedFormValues {
  const { part, ratio: track } = valuesOf(settings);
  return {
    t: track('treble'),
    l: track('bass'),
    m: track('middle'),
    R1: part('treblePot'),
    R2: part('bassPot'),
    R3: part('middlePot'),
    R4: part('slope'),
    C1: part('trebleCap'),
    C2: part('bassCap'),
    C3: part('midCap'),
  };
}

/** Largest relative difference between two transfer functions' coefficients, the denominator's first made 1. */
function difference(first: TransferFunction, second: TransferFunction): number {
  const errors = (['numerator', 'denominator'] as const).flatMap((side) =>
    second[side].map((value, power) => {
      const own = (first[side][power] ?? 0) / first.denominator[0]!;
      return value === 0 ? Math.abs(own) : Math.abs(own / (value / second.denominator[0]!) - 1);
    }),
  );
  return Math.max(...errors);
}

/** The engine's evaluation and the closed form do the same before either is timed. */
function assertSame(unloaded: readonly BlockSettings[]): void {
  for (const settings of unloaded) {
    const gap = difference(
      coefficients(spanOf(toneThreeKnob, settings)),
      threeKnobClosedForm(closedFormValues(settings)),
    );
    // The closed form subtracts, so it is the less accurate of the two.
    if (!(gap < 1e-11)) throw new RangeError(`engine and closed form differ by ${gap}`);
  }
}

/** One knob move, and where its time goes. */
export function rows(): readonly Row[] {
  const tone = moves(toneThreeKnob, 'treble');
  const power = moves(powerFeedback, 'presence');
  const both = tone.map((settings, index) => [
    spanOf(toneThreeKnob, settings),
    spanOf(powerFeedback, power[index]!),
  ]);
  const unloaded = moves(toneThreeKnob, 'middle', { load: 'none' });
  assertSame(unloaded);
  const bare = unloaded.map((settings) => [spanOf(toneThreeKnob, settings)]);
  const values = unloaded.map(closedFormValues);
  const elements = bare.map(([span]) => elementValues(span!.circuits.at(-1)!, span!.blocks));
  const network = bare[0]![0]!.circuits.at(-1)!.network;
  let turn = 0;
  const engine = () => network.transfer(elements[turn++ % POSITIONS]!).denominator[1]!;
  const closedForm = () => threeKnobClosedForm(values[turn++ % POSITIONS]!).denominator[1]!;
  return [
    {
      what: 'one knob move, both blocks: coefficients, sections, curves, against the bare cubic loop',
      ratio: ratio(
        turning(both, (span) => follow(coefficients(span))),
        bareLoop,
      ),
      aim: 4,
    },
    {
      what: 'the same with the power block referred to its gain at 1 kHz',
      ratio: ratio(
        turning(both, (span) => follow(spanTransfer(span).transfer)),
        bareLoop,
      ),
      aim: 4,
    },
    {
      what: '  of which coefficients of both blocks',
      ratio: ratio(
        turning(both, (span) => coefficients(span).denominator[0]!),
        bareLoop,
      ),
    },
    {
      what: 'engine evaluation against the closed form, three knobs unloaded',
      ratio: ratio(engine, closedForm),
    },
  ];
}
