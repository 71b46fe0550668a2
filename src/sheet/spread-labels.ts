/** Labels that touch each other and are moved together. */
interface Cluster {
  /** Sum of where its members would like the first one to be. */
  sum: number;
  count: number;
}

/**
 * Moves labels along one axis so that none lie on each other, each as little as it can: neighbours
 * that touch share the move (least squares under an order constraint, by pooling adjacent violators;
 * Ayer et al., Annals of Mathematical Statistics 26, 1955).
 *
 * @param wanted where each label would like to be, in any order; finite.
 * @param gap least distance between two labels.
 * @param from lowest place allowed. @param to highest; where there is not room for all, the gap shrinks.
 * @returns the places, in the order of `wanted`.
 */
export function spreadLabels(
  wanted: readonly number[],
  gap: number,
  from = Number.NEGATIVE_INFINITY,
  to = Number.POSITIVE_INFINITY,
): number[] {
  const room = wanted.length > 1 ? (to - from) / (wanted.length - 1) : gap;
  const step = Math.min(gap, Math.max(room, 0));
  const order = wanted.map((_, index) => index).sort((a, b) => wanted[a]! - wanted[b]! || a - b);
  const clusters: Cluster[] = [];
  order.forEach((index, rank) => {
    let last: Cluster = { sum: wanted[index]! - rank * step, count: 1 };
    for (let before = clusters.at(-1); before !== undefined; before = clusters.at(-1)) {
      if (before.sum / before.count <= last.sum / last.count) break;
      clusters.pop();
      last = { sum: before.sum + last.sum, count: before.count + last.count };
    }
    clusters.push(last);
  });
  const places = new Array<number>(wanted.length);
  let rank = 0;
  for (const { sum, count } of clusters) {
    const highest = to - (wanted.length - 1) * step;
    const base = Math.min(Math.max(sum / count, from), highest);
    for (let member = 0; member < count; member += 1, rank += 1) places[order[rank]!] = base + rank * step;
  }
  return places;
}
