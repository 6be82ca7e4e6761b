import type { FilePart } from "../circuit/circuit-file";
import type { Point } from "../circuit/drawing";
import { kinds } from "../kinds/catalogue";
import type { Box, PartSymbol, Stroke } from "../kinds/part-symbol";
import { symbols } from "../kinds/symbols";
import { shifted } from "./box";
import type { DrawnPin } from "./sheet-drawing";

/** Distance between the pins of a connector or of a use of a block. */
const PITCH = 20;

export interface Placing {
  readonly at: Point;
  readonly turn: 0 | 1 | 2 | 3;
  readonly mirror: boolean;
}

/** A part's symbol, turned and in its place. */
export interface PlacedSymbol {
  readonly strokes: readonly Stroke[];
  readonly origins: readonly Point[];
  readonly pins: readonly DrawnPin[];
  readonly box: Box;
}

/** A point of a symbol on the sheet: mirrored about the vertical, turned clockwise, moved. */
function onSheet([x, y]: Point, { at, turn, mirror }: Placing): Point {
  const [across, down] = turned([mirror ? -x : x, y], turn);
  return [at[0] + across, at[1] + down];
}

/** Quarter turns clockwise, y pointing down. No negative zero comes out. */
function turned([x, y]: Point, turn: 0 | 1 | 2 | 3): Point {
  const turns: readonly Point[] = [
    [x, y],
    [0 - y, x],
    [0 - x, 0 - y],
    [y, 0 - x],
  ];
  return turns[turn] ?? [x, y];
}

/** Draws any part: what is no known kind comes out as a box with its pins, so that nothing is undrawable. */
export function placeSymbol(part: FilePart, placing: Placing): PlacedSymbol {
  const kind = kinds.find((known) => known === part.kind);
  const names = Object.keys(part.pins ?? {});
  const symbol = kind === undefined ? blockSymbol(names) : symbols[kind];
  const repeated = symbol.pins === "any";
  const places: (readonly [string, Point])[] =
    symbol.pins === "any"
      ? names.map((name, index) => [name, [0, PITCH * index]])
      : Object.entries(symbol.pins);
  const [left, top, right, bottom] = symbol.box;
  const reach: Box = repeated
    ? [left, top, right, bottom + PITCH * Math.max(0, names.length - 1)]
    : symbol.box;
  const still: Placing = { ...placing, at: [0, 0] };
  const pins = places.map(([name, place]): DrawnPin => {
    const outward = repeated ? alone(part.kind) : direction(place, symbol.box);
    return {
      name,
      net: part.pins?.[name] ?? null,
      at: onSheet(place, placing),
      outward: onSheet(outward, still),
    };
  });
  return {
    strokes: strokesOf(symbol, part),
    origins: repeated ? places.map(([, place]) => onSheet(place, placing)) : [placing.at],
    pins,
    box: turnedBox(reach, placing),
  };
}

function strokesOf(symbol: PartSymbol, part: FilePart): readonly Stroke[] {
  const chosen = symbol.variant && part.params?.[symbol.variant.parameter];
  const other = typeof chosen === "string" ? symbol.variant?.strokes[chosen] : undefined;
  return other ?? symbol.strokes;
}

function turnedBox(box: Box, placing: Placing): Box {
  const [left, top, right, bottom] = box;
  const a = onSheet([left, top], { ...placing, at: [0, 0] });
  const b = onSheet([right, bottom], { ...placing, at: [0, 0] });
  return shifted(
    [Math.min(a[0], b[0]), Math.min(a[1], b[1]), Math.max(a[0], b[0]), Math.max(a[1], b[1])],
    placing.at,
  );
}

/** A pin of a part that has nothing but pins: a test point stands above its wire, a connector left of it. */
function alone(kind: string): Point {
  return kind === "testPoint" ? [0, 1] : [1, 0];
}

/** The side of the box a pin stands at. At a corner the vertical wins: collectors and drains go up and down. */
function direction([x, y]: Point, [left, top, right, bottom]: Box): Point {
  if (y <= top) return [0, -1];
  if (y >= bottom) return [0, 1];
  if (x <= left) return [-1, 0];
  if (x >= right) return [1, 0];
  return Math.abs(x) >= Math.abs(y) ? [Math.sign(x), 0] : [0, Math.sign(y)];
}

/** A use of a block: half of its pins to the left, half to the right. */
function blockSymbol(names: readonly string[]): PartSymbol {
  const rows = Math.max(1, Math.ceil(names.length / 2));
  const half = (PITCH / 2) * rows;
  const pins = names.map((name, index): readonly [string, Point] => {
    const row = index % rows;
    return [name, [index < rows ? -40 : 40, -half + PITCH / 2 + PITCH * row]];
  });
  const leads = pins.map(([, [x, y]]) => `M${x} ${y}H${x < 0 ? -30 : 30}`).join("");
  return {
    strokes: [
      { path: `M-30 ${-half}H30V${half}H-30Z`, look: "body" },
      { path: `M-27 ${-half}V${half}M27 ${-half}V${half}${leads}` },
    ],
    pins: Object.fromEntries(pins),
    box: [-40, -half, 40, half],
  };
}
