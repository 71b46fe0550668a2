import { expect } from '@open-wc/testing';
import { isWhole, regionBetween, SHORTEST_REGION, withEdge } from '../../../components/nw-waveform/region.ts';

describe('a part of a clip', () => {
  const region = { start: 2, end: 5 };

  it('keeps its other edge when one moves', () => {
    expect(withEdge(region, 'start', 3, 8)).to.deep.equal({ start: 3, end: 5 });
    expect(withEdge(region, 'end', 7, 8)).to.deep.equal({ start: 2, end: 7 });
  });

  it('stays in the clip', () => {
    expect(withEdge(region, 'start', -1, 8).start).to.equal(0);
    expect(withEdge(region, 'end', 99, 8).end).to.equal(8);
  });

  it('never turns over, nor gets too short to hear', () => {
    expect(withEdge(region, 'start', 6, 8).start).to.equal(5 - SHORTEST_REGION);
    expect(withEdge(region, 'end', 1, 8).end).to.equal(2 + SHORTEST_REGION);
  });

  it('can be drawn in either direction', () => {
    expect(regionBetween(5, 2, 8)).to.deep.equal(region);
    expect(regionBetween(2, 5, 8)).to.deep.equal(region);
  });

  it('is drawn within the clip, and long enough', () => {
    expect(regionBetween(7.99, 12, 8)).to.deep.equal({ start: 8 - SHORTEST_REGION, end: 8 });
    expect(regionBetween(3, 3, 8)).to.deep.equal({ start: 3, end: 3 + SHORTEST_REGION });
  });

  it('is the whole of a clip shorter than the shortest', () => {
    expect(regionBetween(0.01, 0.02, 0.05)).to.deep.equal({ start: 0, end: 0.05 });
    expect(withEdge({ start: 0, end: 0.05 }, 'start', 0.03, 0.05)).to.deep.equal({ start: 0, end: 0.05 });
  });

  it('knows when it is everything', () => {
    expect([isWhole({ start: 0, end: 8 }, 8), isWhole({ start: 0.1, end: 8 }, 8)]).to.deep.equal([
      true,
      false,
    ]);
  });
});
