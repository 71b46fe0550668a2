import { spansOf, spanTransfer } from '../../src/blocks/span.ts';
import { defaultLine } from '../../src/design/design.ts';
import { placedLine } from '../../src/design/placed-line.ts';
import { bilinear } from '../../src/filter/bilinear.ts';
import { Cascade } from '../../src/filter/cascade.ts';
import { factor } from '../../src/filter/factor.ts';
import type { Row } from './harness.ts';

const RATE = 48_000;
const SECONDS = 60;

/** Rendering a minute of mono through the default line, as a share of the minute itself. */
export function rows(): readonly Row[] {
  const sections = spansOf(placedLine(defaultLine()))
    .map(spanTransfer)
    .flatMap(({ transfer }) => factor(transfer).map((section) => bilinear(section, RATE)));
  const block = Float64Array.from({ length: RATE * SECONDS }, (_, frame) => Math.sin(frame / 7));
  const shares: number[] = [];
  for (let run = 0; run < 5; run += 1) {
    const cascade = new Cascade(sections);
    const start = performance.now();
    cascade.process(block);
    shares.push((performance.now() - start) / 1000 / SECONDS);
  }
  const median = shares.sort((first, second) => first - second)[2]!;
  return [{ what: 'rendering a clip through the line, against its duration', ratio: median, aim: 0.05 }];
}
