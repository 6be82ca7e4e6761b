import type { NetLabel, Point } from "../circuit/drawing";
import { textWidth } from "./lettering";
import type { Flag } from "./sheet-drawing";
import { type Paper, zoneAt } from "./zones";

const HALF = 7;
const NOSE = 8;

/** A flag where a net goes on elsewhere, with the zones of its fellows on the sheet. */
export function drawFlag(
  { net, at }: NetLabel,
  from: Point,
  others: readonly NetLabel[],
  sheet: Paper,
): Flag {
  const [x, y] = at;
  const length = Math.ceil(textWidth(net, "ref")) + 10;
  const side = from[0] <= x ? 1 : -1;
  const [nose, end] = [x + side * NOSE, x + side * (NOSE + length)];
  const zones = [...new Set(others.map((other) => zoneAt(sheet, other.at)))].join(", ");
  const where = zones === "" ? "" : `${side > 0 ? "to" : "from"} ${zones}`;
  return {
    net,
    outline: [
      [x, y],
      [nose, y - HALF],
      [end, y - HALF],
      [end, y + HALF],
      [nose, y + HALF],
    ],
    letters: [
      { at: [(nose + end) / 2, y + 4], text: net, style: "ref", anchor: "middle" },
      ...(where === ""
        ? []
        : [
            {
              at: [Math.min(nose, end), y - HALF - 4] as const,
              text: where,
              style: "net" as const,
              anchor: "start" as const,
            },
          ]),
    ],
  };
}
