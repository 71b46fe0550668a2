import type { PlotCurve } from '../../src/sheet/plot-model.ts';

/** Colours and type of a drawing, already resolved: a canvas knows nothing of custom properties. */
export interface PlotColours {
  readonly ink: string;
  readonly soft: string;
  readonly hairline: string;
  readonly rule: string;
  readonly ground: string;
  readonly curves: Readonly<Record<PlotCurve['colour'], string>>;
  /** Families of the type, as CSS wants them. */
  readonly font: string;
}

/** Reads the tokens in force at an element. */
export function readPlotColours(element: Element): PlotColours {
  const style = getComputedStyle(element);
  const token = (name: string): string => style.getPropertyValue(`--nw-${name}`).trim();
  const soft = token('ink-soft');
  return {
    ink: token('ink'),
    soft,
    hairline: token('hairline'),
    rule: token('rule'),
    ground: token('sheet'),
    curves: {
      a: token('curve-a'),
      b: token('curve-b'),
      c: token('curve-c'),
      d: token('curve-d'),
      e: token('curve-e'),
      f: token('curve-f'),
      g: token('curve-g'),
      h: token('curve-h'),
      soft,
    },
    font: token('font') || style.fontFamily,
  };
}
