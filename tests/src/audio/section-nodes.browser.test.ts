import { expect } from '@open-wc/testing';
import { OfflineAudioContext } from 'standardized-audio-context';
import { buildSections, checkSections } from '../../../src/audio/section-nodes.ts';
import { NotchworkError } from '../../../src/errors.ts';
import { bilinear } from '../../../src/filter/bilinear.ts';
import type { AnalogueSection, DigitalSection } from '../../../src/filter/section.ts';
import { magnitudeAt } from '../../../src/transfer-function.ts';
import type { RadiansPerSecond } from '../../../src/units.ts';
import { presenceTransfer, sectionsOf, toneSections, toneTransfer } from './line-sections.ts';

const RATES = [44_100, 48_000, 96_000, 192_000];

/** Renders an impulse through the nodes, in the library's own offline context. */
async function impulseResponse(
  sections: readonly DigitalSection[],
  sampleRate: number,
): Promise<Float32Array> {
  // Long enough for a pole at 10 Hz to fall below single precision: e^(−2π·10·0.35 s) is −190 dB.
  const length = Math.round(0.35 * sampleRate);
  const context = new OfflineAudioContext({ numberOfChannels: 1, length, sampleRate });
  const buffer = context.createBuffer(1, length, sampleRate);
  buffer.copyToChannel(Float32Array.of(1), 0);
  const source = context.createBufferSource();
  source.buffer = buffer;
  const built = buildSections(context as unknown as BaseAudioContext, sections);
  source.connect(built.nodes[0] as never);
  (built.nodes.at(-1) as unknown as typeof source).connect(context.destination);
  source.start(0);
  return (await context.startRendering()).getChannelData(0);
}

/** Magnitude in dB of a rendered response at a frequency: the Fourier sum itself. */
function renderedMagnitude(response: Float32Array, frequency: number, sampleRate: number): number {
  const step = (2 * Math.PI * frequency) / sampleRate;
  let real = 0;
  let imaginary = 0;
  response.forEach((value, index) => {
    real += value * Math.cos(step * index);
    imaginary -= value * Math.sin(step * index);
  });
  return 20 * Math.log10(Math.hypot(real, imaginary));
}

/**
 * What the rendering should have: the analogue response at `2·fs·tan(ω/2fs)`, the identity of the
 * bilinear transform (A. Tustin 1947). Computed from the analogue coefficients, so that neither the
 * digital coefficients nor the nodes take part.
 */
function expectedMagnitude(section: AnalogueSection, frequency: number, sampleRate: number): number {
  const omega = 2 * sampleRate * Math.tan((Math.PI * frequency) / sampleRate);
  const size = (polynomial: readonly number[]): number => {
    const at = (power: number): number => (polynomial[power] ?? 0) * omega ** power;
    return Math.hypot(at(0) - at(2), at(1) - at(3));
  };
  return 20 * Math.log10(size(section.numerator) / size(section.denominator));
}

/** Third order with poles at 15, 250 and 5000 Hz: as wide apart as those of a tone network. */
function wideSection(): AnalogueSection {
  const times = [15, 250, 5000].map((corner) => 1 / (2 * Math.PI * corner));
  const [a, b, c] = times as [number, number, number];
  return {
    numerator: [0, 0.3 * a, 0.12 * (a * b + a * c), 0.8 * a * b * c],
    denominator: [1, a + b + c, a * b + a * c + b * c, a * b * c],
  };
}

function frequencies(): number[] {
  return Array.from({ length: 61 }, (_, index) => 20 * 1000 ** (index / 60));
}

function codeOf(action: () => unknown): string {
  try {
    action();
  } catch (error) {
    return error instanceof NotchworkError ? error.code : String(error);
  }
  return 'nothing thrown';
}

describe('sections as nodes', () => {
  for (const sampleRate of RATES) {
    it(`have the expected response within 0.001 dB at ${sampleRate} Hz`, async () => {
      const first: AnalogueSection = { numerator: [0.2, 1e-4], denominator: [1, 1e-4] };
      const second = wideSection();
      const response = await impulseResponse(
        [bilinear(first, sampleRate), bilinear(second, sampleRate)],
        sampleRate,
      );
      for (const frequency of frequencies()) {
        const expected =
          expectedMagnitude(first, frequency, sampleRate) + expectedMagnitude(second, frequency, sampleRate);
        expect(renderedMagnitude(response, frequency, sampleRate), `${frequency} Hz`).to.be.closeTo(
          expected,
          0.001,
        );
      }
    });
  }

  const positions: [string, Record<string, number>, number][] = [
    ['all at 0', { treble: 0, bass: 0, middle: 0 }, 0],
    ['all at 10', { treble: 1, bass: 1, middle: 1 }, 1],
    ['treble at 10, the rest at 0', { treble: 1, bass: 0, middle: 0 }, 0.5],
    // Drawn once with a die.
    ['anywhere', { treble: 0.37, bass: 0.81, middle: 0.14 }, 0.73],
  ];
  for (const sampleRate of RATES) {
    for (const [name, knobs, presence] of positions) {
      it(`play the line at ${sampleRate} Hz as the circuit says, within 0.001 dB: ${name}`, async () => {
        const transfers = [toneTransfer(knobs), presenceTransfer(presence)];
        const sections = transfers.flatMap((transfer) => sectionsOf(transfer, sampleRate));
        const response = await impulseResponse(sections, sampleRate);
        for (const frequency of frequencies()) {
          const omega = (2 * sampleRate * Math.tan((Math.PI * frequency) / sampleRate)) as RadiansPerSecond;
          const expected = transfers.reduce(
            (sum, transfer) => sum + 20 * Math.log10(magnitudeAt(transfer, omega)),
            0,
          );
          expect(renderedMagnitude(response, frequency, sampleRate), `${frequency} Hz`).to.be.closeTo(
            expected,
            0.001,
          );
        }
      });
    }
  }

  it('filter every channel for itself', async () => {
    const context = new OfflineAudioContext({ numberOfChannels: 2, length: 256, sampleRate: 48_000 });
    const buffer = context.createBuffer(2, 256, 48_000);
    buffer.copyToChannel(Float32Array.of(1), 0);
    buffer.copyToChannel(Float32Array.of(0, 0, 0, -0.5), 1);
    const source = context.createBufferSource();
    source.buffer = buffer;
    const pole: DigitalSection = { feedforward: [1, 0], feedback: [1, -0.5] };
    const built = buildSections(context as unknown as BaseAudioContext, [pole]);
    source.connect(built.nodes[0] as never);
    (built.nodes[0] as unknown as typeof source).connect(context.destination);
    source.start(0);
    const rendered = await context.startRendering();
    const [left, right] = [rendered.getChannelData(0), rendered.getChannelData(1)];
    for (let index = 0; index < 20; index += 1) {
      // h[n] = 0.5ⁿ is exact in single precision.
      expect(left[index]).to.equal(0.5 ** index);
      expect(right[index + 3]).to.equal(-0.5 * 0.5 ** index);
    }
  });

  it('pass nothing where a volume control is at zero', async () => {
    const silent: DigitalSection = { feedforward: [0, 0], feedback: [1, -0.5] };
    const response = await impulseResponse([silent, ...toneSections({})], 48_000);
    expect(response.every((value) => value === 0)).to.equal(true);
  });

  it('make a plain gain of a section of order 0', async () => {
    const response = await impulseResponse([{ feedforward: [0.25], feedback: [1] }], 48_000);
    expect(response[0]).to.equal(0.25);
    expect(response[1]).to.equal(0);
  });
});

describe('sections that cannot be played', () => {
  const refused: [string, DigitalSection, string][] = [
    ['a pole outside the unit circle', { feedforward: [1, 0], feedback: [1, -1.01] }, 'filter-unstable'],
    ['a pole on the unit circle', { feedforward: [1, 0], feedback: [1, -1] }, 'filter-unstable'],
    ['NaN', { feedforward: [Number.NaN, 0], feedback: [1, -0.5] }, 'filter-invalid'],
    ['unequal lengths', { feedforward: [1], feedback: [1, -0.5] }, 'filter-invalid'],
    ['a first feedback coefficient of 2', { feedforward: [1, 0], feedback: [2, -0.5] }, 'filter-invalid'],
    ['no coefficients', { feedforward: [], feedback: [] }, 'filter-invalid'],
  ];
  for (const [name, section, code] of refused) {
    it(`${name}: refused before a node is made`, () => {
      const context = new OfflineAudioContext({ numberOfChannels: 1, length: 1, sampleRate: 48_000 });
      let made = 0;
      const watched = {
        createGain: () => {
          made += 1;
          return context.createGain();
        },
        createIIRFilter: (feedforward: number[], feedback: number[]) => {
          made += 1;
          return context.createIIRFilter(feedforward, feedback);
        },
      } as unknown as BaseAudioContext;
      expect(codeOf(() => buildSections(watched, [...toneSections({}), section]))).to.equal(code);
      expect(codeOf(() => checkSections([section]))).to.equal(code);
      expect(made).to.equal(0);
    });
  }
});
