import type { Point } from "../circuit/drawing";
import { textWidth } from "./lettering";
import type { DrawnPin, DrawnWire, Ground, Lettering } from "./sheet-drawing";

/** Length of the line between a pin and the ground drawn for it. */
const STUB = 10;

/** A pin that no wire reaches still says where it belongs: the reference by its symbol, any other net by its name. */
export function namePin(
  pin: DrawnPin,
  reference: string | null,
): { letter: Lettering | null; ground: Ground | null; wire: DrawnWire | null } {
  const { net, at, outward } = pin;
  if (net === null) return { letter: null, ground: null, wire: null };
  if (net !== reference) return { letter: nameAt(net, at, outward), ground: null, wire: null };
  const end: Point = [at[0] + STUB * outward[0], at[1] + STUB * outward[1]];
  const foot: Point = outward[1] === 0 ? [end[0], end[1] + STUB] : end;
  const points = outward[1] === 0 ? [at, end, foot] : [at, end];
  return {
    letter: null,
    ground: { at: foot, net, removed: false },
    wire: { net, points, removed: false, index: null },
  };
}

function nameAt(net: string, [x, y]: Point, [across, down]: Point): Lettering {
  const style = "net";
  if (across < 0) return { at: [x - 3, y - 3], text: net, style, anchor: "end" };
  if (across > 0) return { at: [x + 3, y - 3], text: net, style, anchor: "start" };
  const left = x - textWidth(net, style) / 2;
  return { at: [left, down < 0 ? y - 4 : y + 12], text: net, style, anchor: "start" };
}
