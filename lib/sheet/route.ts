import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { lineBox, overlap } from "./box";

/** An end of a wire: where it is, and the way it must leave; null where any way will do. */
export interface RouteEnd {
  readonly at: Point;
  readonly outward: Point | null;
}

/** What a fault of a route counts against its length in units. */
const CROSSING = 4000;
const BACKWARD = 1000;
const CORNER = 30;
/** How far a detour keeps from what it goes around. */
const CLEAR = 10;

/**
 * A path along the grid's directions from one end to the other: straight where they are in line,
 * else with the fewest corners that cross no part. Always ends at both points; may cross a part
 * where no path of up to four corners does not.
 */
export function route(from: RouteEnd, to: RouteEnd, parts: readonly Box[]): readonly Point[] {
  const near = parts.filter((box) => overlap(box, reach(from.at, to.at)) > 0);
  let best: readonly Point[] = [from.at, to.at];
  let least = Number.POSITIVE_INFINITY;
  for (const paths of [simplePaths, detours]) {
    for (const path of paths(from, to, near)) {
      const cost = costOf(path, from, to, near);
      if (cost < least) {
        least = cost;
        best = path;
      }
    }
    // Most wires are plain: the many detours are looked at only where something stands in the way.
    if (least < BACKWARD) break;
  }
  return best;
}

function reach(a: Point, b: Point): Box {
  return lineBox(a, b, 100);
}

function simplePaths(from: RouteEnd, to: RouteEnd): (readonly Point[])[] {
  const [ax, ay] = from.at;
  const [bx, by] = to.at;
  const [x, y] = [onGrid((ax + bx) / 2), onGrid((ay + by) / 2)];
  const paths: Point[][] = [
    [[bx, ay]],
    [[ax, by]],
    [
      [x, ay],
      [x, by],
    ],
    [
      [ax, y],
      [bx, y],
    ],
  ];
  return whole(paths, from, to);
}

function detours(from: RouteEnd, to: RouteEnd, parts: readonly Box[]): (readonly Point[])[] {
  const [ax, ay] = from.at;
  const [bx, by] = to.at;
  const columns = places([ax, bx], [from, to], 0, parts);
  const rows = places([ay, by], [from, to], 1, parts);
  const paths: Point[][] = [
    ...columns.map((x): Point[] => [
      [x, ay],
      [x, by],
    ]),
    ...rows.map((y): Point[] => [
      [ax, y],
      [bx, y],
    ]),
    ...columns.flatMap((x) =>
      rows.flatMap((y): Point[][] => [
        [
          [x, ay],
          [x, y],
          [bx, y],
        ],
        [
          [ax, y],
          [x, y],
          [x, by],
        ],
      ]),
    ),
  ];
  return whole(paths, from, to);
}

function whole(paths: Point[][], from: RouteEnd, to: RouteEnd): (readonly Point[])[] {
  return paths.map((corners) => tidied([from.at, ...corners, to.at]));
}

/** Where a detour may run along one axis: half way, a step beyond each end, and past each part in between. */
function places(
  [a, b]: readonly [number, number],
  ends: readonly RouteEnd[],
  axis: 0 | 1,
  parts: readonly Box[],
): number[] {
  const half = Math.round((a + b) / 20) * 10;
  const steps = ends.flatMap(({ at, outward }) =>
    [-2 * CLEAR, 2 * CLEAR]
      .concat(outward === null ? [] : 2 * CLEAR * outward[axis])
      .map((step) => at[axis] + step),
  );
  const past = parts
    .slice(0, 12)
    .flatMap((box) => [onGrid(box[axis] - CLEAR), onGrid(box[axis + 2] ?? 0) + CLEAR]);
  return [...new Set([half, ...steps, ...past])];
}

function onGrid(value: number): number {
  return Math.round(value / 10) * 10;
}

/** Without points that repeat or that lie within a straight run. */
function tidied(points: readonly Point[]): readonly Point[] {
  const path: Point[] = [];
  for (const point of points) {
    const last = path.at(-1);
    if (last !== undefined && last[0] === point[0] && last[1] === point[1]) continue;
    const before = path.at(-2);
    const inLine =
      last !== undefined &&
      before !== undefined &&
      [0, 1].some((axis) => before[axis] === last[axis] && last[axis] === point[axis]);
    if (inLine) path.pop();
    path.push(point);
  }
  return path;
}

function costOf(
  path: readonly Point[],
  from: RouteEnd,
  to: RouteEnd,
  parts: readonly Box[],
): number {
  let cost = (path.length - 2) * CORNER;
  path.slice(1).forEach((point, index) => {
    const before = path[index] ?? point;
    cost += Math.abs(point[0] - before[0]) + Math.abs(point[1] - before[1]);
    const line = lineBox(before, point, 0.5);
    cost += CROSSING * parts.filter((box) => overlap(box, line) > 0).length;
  });
  const [second = to.at, last = from.at] = [path[1], path.at(-2)];
  if (leavesBackward(from, second)) cost += BACKWARD;
  if (leavesBackward(to, last)) cost += BACKWARD;
  return cost;
}

/** Whether the first step goes otherwise than the pin points. */
function leavesBackward({ at, outward }: RouteEnd, next: Point): boolean {
  if (outward === null) return false;
  const along = (next[0] - at[0]) * outward[0] + (next[1] - at[1]) * outward[1];
  return !(along > 0);
}
