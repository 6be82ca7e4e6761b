import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { grown, lineBox, middle } from "./box";
import type { Choice, ClearSpace } from "./clear-space";
import type { Balloon } from "./sheet-drawing";
import type { FindingMark } from "./sheet-facts";

/** Half the size of a balloon, with a little room. */
const HALF = 11;

/** A balloon at what its finding is about, tied to it by one straight line; null where nothing is drawn of it. */
export function drawBalloon(
  finding: FindingMark,
  target: Box,
  zone: string,
  space: ClearSpace,
): Balloon | null {
  const { id, number, severity } = finding;
  const place = space.settle(choices(target));
  return place === null ? null : { id, number, severity, zone, ...place };
}

type Place = Pick<Balloon, "at" | "leader">;

function* choices(target: Box): Generator<Choice<Place>> {
  const [left, top, right, bottom] = target;
  const [x, y] = middle(target);
  for (const away of [8, 16, 26, 40, 60, 90]) {
    const out = away + HALF;
    for (const share of [0, -0.8, 0.8]) {
      const across = x + (share * (right - left)) / 2;
      const down = y + (share * (bottom - top)) / 2;
      yield tied([left - out, down], [left, down], [1, 0]);
      yield tied([right + out, down], [right, down], [-1, 0]);
      yield tied([across, top - out], [across, top], [0, 1]);
      yield tied([across, bottom + out], [across, bottom], [0, -1]);
    }
  }
}

function tied(at: Point, target: Point, [across, down]: Point): Choice<Place> {
  const start: Point = [at[0] + across * (HALF - 1), at[1] + down * (HALF - 1)];
  const short: Point = [target[0] - across * 3, target[1] - down * 3];
  const box: Box = [at[0] - HALF, at[1] - HALF, at[0] + HALF, at[1] + HALF];
  return {
    boxes: [grown(box, 1), lineBox(start, short, 1)],
    value: { at, leader: [start, target] },
  };
}
