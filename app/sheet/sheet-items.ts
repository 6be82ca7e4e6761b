import type { Point } from "../../lib/circuit/drawing";
import type { Box } from "../../lib/kinds/part-symbol";
import { around, lineBox, middle } from "../../lib/sheet/box";
import { readingOrder } from "../../lib/sheet/pencil";
import type { DrawnPart, SheetDrawing } from "../../lib/sheet/sheet-drawing";
import type { Selection } from "./selection";
import { netWords, partWords } from "./spoken";

/** Something on the sheet that can be reached and picked. */
export interface SheetItem {
  readonly key: string;
  readonly selection: Selection;
  /** Read aloud. */
  readonly words: string;
  readonly box: Box;
  readonly at: Point;
}

/** The parts and nets of a sheet in reading order. What was removed cannot be picked. */
export function sheetItems(drawing: SheetDrawing): readonly SheetItem[] {
  const parts = drawing.parts
    .filter(({ removed }) => !removed)
    .map((part): SheetItem => {
      const selection = { part: part.ref };
      return {
        key: itemKey(selection),
        selection,
        words: partWords(part),
        box: part.box,
        at: part.at,
      };
    });
  const nets = drawing.nets.map((net): SheetItem => {
    const selection = { net: net.net };
    const box = netBox(drawing, net.net);
    return { key: itemKey(selection), selection, words: netWords(net), box, at: net.at };
  });
  return [...parts, ...nets].sort((one, other) => readingOrder(one.at, other.at));
}

export function itemKey(selection: Selection): string {
  return "part" in selection ? `part ${selection.part}` : `net ${selection.net}`;
}

function netBox(drawing: SheetDrawing, name: string): Box {
  const net = drawing.nets.find((one) => one.net === name);
  if (net?.tag?.box) return net.tag.box;
  const place = net?.at ?? [0, 0];
  const points = drawing.wires.find((wire) => wire.net === name && !wire.removed)?.points ?? [];
  return around(lineBox(place, place, 4), ...points.map((point) => lineBox(point, point, 4)));
}

/** The next item in the direction of an arrow key; the first in line counts before a nearer one aside. */
export function itemToward(
  items: readonly SheetItem[],
  from: SheetItem,
  [across, down]: Point,
): SheetItem | null {
  const [x, y] = middle(from.box);
  let best: SheetItem | null = null;
  let least = Number.POSITIVE_INFINITY;
  for (const item of items) {
    const [itemX, itemY] = middle(item.box);
    const [dx, dy] = [itemX - x, itemY - y];
    const ahead = dx * across + dy * down;
    const aside = Math.abs(dx * down) + Math.abs(dy * across);
    const cost = ahead + 2 * aside;
    if (item !== from && ahead > 1 && cost < least) {
      least = cost;
      best = item;
    }
  }
  return best;
}

/** The part and pin under a place, within reach of a finger. */
export function pinAt(parts: readonly DrawnPart[], [x, y]: Point, reach = 7) {
  for (const part of parts) {
    for (const pin of part.removed ? [] : part.pins) {
      if (Math.hypot(pin.at[0] - x, pin.at[1] - y) <= reach)
        return { part: part.ref, pin: pin.name };
    }
  }
  return null;
}

/** The wire of the file under a place, and the place on the grid where it is met. */
export function wireAt(drawing: SheetDrawing, [x, y]: Point, reach = 6) {
  for (const { index, points } of drawing.wires) {
    for (const [next, to] of points.entries()) {
      const from = points[next - 1];
      if (index === null || from === undefined) continue;
      const on: Point = [between(x, from[0], to[0]), between(y, from[1], to[1])];
      if (Math.hypot(on[0] - x, on[1] - y) <= reach) return { wire: index, at: on };
    }
  }
  return null;
}

/** The grid place nearest to a value on a run from a to b. */
function between(value: number, a: number, b: number): number {
  const place = Math.round(value / 10) * 10;
  return Math.min(Math.max(a, b), Math.max(Math.min(a, b), place));
}
