import { expect } from '@open-wc/testing';
import { HALF_HEIGHT, wavePath } from '../../../components/nw-waveform/wave-path.ts';

/** Points of a path: x and y in turn. */
function points(path: string): readonly (readonly [number, number])[] {
  return path
    .slice(1, -1)
    .split('L')
    .map((pair) => pair.split(' ').map(Number) as [number, number]);
}

const overview = (high: number[], low = high.map((value) => -value)) => ({
  low: Float32Array.from(low),
  high: Float32Array.from(high),
});

describe('outline of a waveform', () => {
  it('goes along the highest samples and back along the lowest', () => {
    const drawn = points(wavePath(overview([0.5, 1], [-0.25, -0.5]), 100));
    // Two steps, their middles at 25 and 75; the peak of 1 nearly fills the half height, up is negative.
    expect(drawn).to.deep.equal([
      [25, -24],
      [75, -48],
      [75, 24],
      [25, 12],
    ]);
  });

  it('keeps the extremes of all buckets of a step', () => {
    const high = Array.from({ length: 10_000 }, (_, index) => (index === 4321 ? 1 : 0.1));
    const drawn = points(wavePath(overview(high), 100));
    expect(drawn.length).to.equal(200);
    const [x] = drawn.find(([, y]) => y === -0.96 * HALF_HEIGHT)!;
    expect(x).to.equal(43.5); // bucket 4321 of 10 000 lies in the 44th of 100 steps
  });

  it('shows silence as a thin line and does not blow up noise', () => {
    const silence = points(wavePath(overview([0, 0, 0]), 100));
    expect(Math.max(...silence.map(([, y]) => Math.abs(y)))).to.be.within(0.1, 1);
    const noise = points(wavePath(overview([0.001, 0.001]), 100)); // −60 dBFS
    expect(Math.max(...noise.map(([, y]) => Math.abs(y)))).to.be.lessThan(HALF_HEIGHT / 5);
  });

  it('is empty without a clip, and never says NaN', () => {
    expect(wavePath(overview([]), 100)).to.equal('');
    expect(wavePath(overview([0.5]), 1000)).not.to.contain('NaN');
  });

  it('stays short for a clip of twenty minutes', () => {
    const buckets = 20 * 60 * 100;
    const began = performance.now();
    const path = wavePath(overview(Array.from({ length: buckets }, (_, index) => Math.sin(index) / 2)), 1000);
    console.log(`waveform of ${buckets} buckets: ${(performance.now() - began).toFixed(1)} ms`);
    expect(path.length).to.be.lessThan(2000 * 14); // two points a step, each a dozen letters
  });
});
