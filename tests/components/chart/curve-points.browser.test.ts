import { expect } from '@open-wc/testing';
import { endValue, fillPoints, type Point } from '../../../components/chart/curve-points.ts';
import type { PlotCurve } from '../../../src/sheet/plot-model.ts';
import { sampleCurves } from './sample-curves.ts';

const curve = (frequencies: number[], values: number[]): PlotCurve => ({
  ...sampleCurves()[0]!,
  frequencies: Float64Array.from(frequencies),
  values: Float64Array.from(values),
});

describe('points of a curve', () => {
  it('are its frequencies and values', () => {
    const points: Point[] = [];
    fillPoints(points, curve([10, 100], [-1, -2]));
    expect(points).to.deep.equal([
      { x: 10, y: -1 },
      { x: 100, y: -2 },
    ]);
  });

  it('are written into the points that are there', () => {
    const points: Point[] = [];
    fillPoints(points, curve([10, 100, 1000], [-1, -2, -3]));
    const [first, second] = points;
    fillPoints(points, curve([20, 200], [-4, -5]));
    expect(points.length).to.equal(2);
    expect(points[0]).to.equal(first);
    expect(points[1]).to.equal(second);
    expect(points[1]).to.deep.equal({ x: 200, y: -5 });
  });

  it('lift the pen once where values are not finite, and not at all before the first', () => {
    const points: Point[] = [];
    const { NaN: none, NEGATIVE_INFINITY: silence } = Number;
    fillPoints(points, curve([10, 20, 30, 40, 50], [none, -1, none, silence, -2]));
    expect(points.map(({ x }) => x)).to.deep.equal([20, 30, 50]);
    expect(points[1]!.y).to.be.NaN;
  });

  it('leave out what lies outside the axis', () => {
    const points: Point[] = [];
    fillPoints(points, curve([5, 10, 40_000, 50_000], [0, -1, -2, 0]));
    expect(points.map(({ x }) => x)).to.deep.equal([10, 40_000]);
  });

  it('leave out what a logarithmic axis cannot show', () => {
    const points: Point[] = [];
    fillPoints(points, curve([10, 20, 30], [5, 0, -5]), true);
    expect(points.map(({ y }) => y).filter(Number.isFinite)).to.deep.equal([5]);
  });

  it('end where the curve ends on the axis', () => {
    expect(endValue(curve([10, 20_000, 50_000], [-1, -2, -3]))).to.equal(-2);
    expect(endValue(curve([10, 20_000], [-1, Number.NaN]))).to.equal(-1);
    expect(endValue(curve([], []))).to.be.NaN;
  });
});
