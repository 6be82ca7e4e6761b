import type { Point } from "../circuit/drawing";
import type { Segment } from "./sheet-drawing";

/** Steps along a wire where lettering is tried. */
const STEP = 10;

/** Places along wires, the longest first, each from its start. */
export function pointsAlong(wires: readonly Segment[]): Point[] {
  const length = ([a, b]: Segment) => Math.abs(a[0] - b[0]) + Math.abs(a[1] - b[1]);
  return [...wires]
    .sort((one, other) => length(other) - length(one))
    .flatMap(([a, b]) => {
      const steps = Math.max(1, Math.floor(length([a, b]) / STEP));
      return Array.from({ length: steps + 1 }, (_, index): Point => {
        const part = index / steps;
        return [a[0] + (b[0] - a[0]) * part, a[1] + (b[1] - a[1]) * part];
      });
    });
}
