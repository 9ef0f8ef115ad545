import { findRoot } from './find-root';
import { maximum } from './maximum';

/** Between two breakpoints a sum of exposures is smooth; this many points find its hills. */
const POINTS_BETWEEN_BREAKPOINTS = 24;

/**
 * The largest distance at which a ratio of exposure to limit is 1 or more; 0 when there is none.
 *
 * @param ratio falls to 0 beyond the last breakpoint and is smooth between them; it may step there.
 * @param breakpointsM distances above 0 at which the ratio steps or turns, in any order.
 */
export function largestReach(
  ratio: (distanceM: number) => number,
  breakpointsM: readonly number[],
): number {
  const edges = [...new Set(breakpointsM)].sort((a, b) => a - b);
  const last = edges.at(-1) ?? 0;
  const beyond = reachWhereFalling(ratio, last);
  if (beyond > 0) return beyond;
  for (let i = edges.length - 1; i >= 0; i--) {
    const from = i === 0 ? 0 : (edges[i - 1] as number);
    const found = reachBetween(ratio, from, edges[i] as number);
    if (found > 0) return found;
  }
  return 0;
}

/** The root beyond a distance from which on the ratio falls; 0 when it is below 1 there already. */
function reachWhereFalling(ratio: (distanceM: number) => number, fromM: number): number {
  let near = justAfter(fromM);
  if (!(ratio(near) >= 1)) return 0;
  let far = Math.max(1, 2 * fromM);
  while (ratio(far) >= 1) {
    near = far;
    far *= 4;
  }
  return rootOf(ratio, near, far);
}

/** The largest reach inside one smooth stretch; 0 when there is none. */
function reachBetween(ratio: (distanceM: number) => number, fromM: number, toM: number): number {
  if (ratio(justBefore(toM)) >= 1) return toM;
  const points = spread(justAfter(fromM), justBefore(toM));
  for (let i = points.length - 2; i >= 0; i--) {
    const point = points[i] as number;
    if (ratio(point) >= 1) return rootOf(ratio, point, points[i + 1] as number);
  }
  const top = maximum(ratio, points);
  return ratio(top) >= 1 ? rootOf(ratio, top, justBefore(toM)) : 0;
}

function rootOf(ratio: (distanceM: number) => number, near: number, far: number): number {
  return findRoot((distanceM) => Math.log(ratio(distanceM)), near, far);
}

/** Points of a stretch, in equal ratios where it does not begin at 0. */
export function spread(from: number, to: number): number[] {
  const start = from > to * 1e-6 ? from : to * 1e-6;
  const step = (to / start) ** (1 / POINTS_BETWEEN_BREAKPOINTS);
  const points = from < start ? [from] : [];
  for (let i = 0; i < POINTS_BETWEEN_BREAKPOINTS; i++) points.push(start * step ** i);
  points.push(to);
  return points;
}

/** A distance on the near side of a step. */
export function justBefore(distanceM: number): number {
  return distanceM * (1 - 4 * Number.EPSILON);
}

/** A distance on the far side of a step. */
export function justAfter(distanceM: number): number {
  return distanceM * (1 + 4 * Number.EPSILON);
}
