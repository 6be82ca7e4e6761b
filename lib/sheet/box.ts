import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";

/** The area that two boxes share; 0 where they only touch. */
export function overlap(a: Box, b: Box): number {
  const width = Math.min(a[2], b[2]) - Math.max(a[0], b[0]);
  const height = Math.min(a[3], b[3]) - Math.max(a[1], b[1]);
  return width > 0 && height > 0 ? width * height : 0;
}

export function grown(box: Box, by: number): Box {
  return [box[0] - by, box[1] - by, box[2] + by, box[3] + by];
}

export function shifted(box: Box, [x, y]: Point): Box {
  return [box[0] + x, box[1] + y, box[2] + x, box[3] + y];
}

/** The smallest box around several; the first alone where there is one. */
export function around(first: Box, ...others: readonly Box[]): Box {
  return others.reduce<Box>(
    (all, box) => [
      Math.min(all[0], box[0]),
      Math.min(all[1], box[1]),
      Math.max(all[2], box[2]),
      Math.max(all[3], box[3]),
    ],
    first,
  );
}

export function inside(inner: Box, outer: Box): boolean {
  return (
    inner[0] >= outer[0] && inner[1] >= outer[1] && inner[2] <= outer[2] && inner[3] <= outer[3]
  );
}

/** The box of a line from one point to another, of a little thickness. */
export function lineBox(a: Point, b: Point, half = 1): Box {
  return grown(
    [Math.min(a[0], b[0]), Math.min(a[1], b[1]), Math.max(a[0], b[0]), Math.max(a[1], b[1])],
    half,
  );
}

export function middle(box: Box): Point {
  return [(box[0] + box[2]) / 2, (box[1] + box[3]) / 2];
}
