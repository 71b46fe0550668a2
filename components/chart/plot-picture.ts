import type { AxisRange } from '../../src/sheet/plot-axes.ts';
import type { PlotCurve, PlotQuantity } from '../../src/sheet/plot-model.ts';
import type { Hertz } from '../../src/units.ts';
import type { PlotColours } from './plot-colours.ts';

/** Everything the chart draws. */
export interface PlotPicture {
  readonly curves: readonly PlotCurve[];
  readonly quantity: PlotQuantity;
  readonly range: AxisRange;
  /** Reading cursor; undefined draws none. */
  readonly cursor: Hertz | undefined;
  readonly colours: PlotColours;
}
