import type { Region } from '../../src/audio/engine-types.ts';
import type { Seconds } from '../../src/units.ts';

/** Which end of a region. */
export type RegionEdge = keyof Region;

/** Shortest region that can be made by hand: long enough to be heard as a loop, not as a buzz. */
export const SHORTEST_REGION: Seconds = 0.1;

/** How far apart the ends of a region must stay in a clip of some length. */
function leastLength(duration: Seconds): Seconds {
  return Math.min(SHORTEST_REGION, duration);
}

/** A region with one edge moved, kept within the clip and no shorter than {@link SHORTEST_REGION}. */
export function withEdge(region: Region, edge: RegionEdge, to: Seconds, duration: Seconds): Region {
  const least = leastLength(duration);
  if (edge === 'start')
    return { ...region, start: Math.min(Math.max(to, 0), Math.max(region.end - least, 0)) };
  return { ...region, end: Math.max(Math.min(to, duration), Math.min(region.start + least, duration)) };
}

/** The region between two places, in either order, kept within the clip and long enough. */
export function regionBetween(first: Seconds, second: Seconds, duration: Seconds): Region {
  const least = leastLength(duration);
  const start = Math.min(Math.max(Math.min(first, second), 0), duration - least);
  return { start, end: Math.max(Math.min(Math.max(first, second), duration), start + least) };
}

/** Whether a region is the whole clip, to within what a tenth of a pixel can show. */
export function isWhole({ start, end }: Region, duration: Seconds): boolean {
  const slack = duration * 1e-4;
  return start <= slack && end >= duration - slack;
}
