import type { FileBlock } from "../circuit/circuit-file";
import type { NetLabel, Point, WireEnd } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { grown } from "./box";
import { clusters, endKey } from "./net-of-wires";
import type { PlacedSymbol } from "./pin-place";
import { type RouteEnd, route } from "./route";
import type { Dot, DrawnWire, Ground } from "./sheet-drawing";

export interface WireWork {
  readonly wires: readonly DrawnWire[];
  readonly dots: readonly Dot[];
  readonly grounds: readonly Ground[];
  /** Flags and plain names, with the side they are reached from. */
  readonly labels: readonly { readonly label: NetLabel; readonly from: Point }[];
  /** Pins that neither wire nor label reaches. */
  readonly lonePins: readonly { readonly part: string; readonly pin: string }[];
}

/**
 * Routes the wires and labels of a block between placed parts. `only` keeps those that touch the parts
 * named: what a removed part was tied with. An end that is not drawn leaves its wire out.
 */
export function drawWires(
  block: FileBlock,
  placed: ReadonlyMap<string, PlacedSymbol>,
  only: ReadonlySet<string> | null,
): WireWork {
  const obstacles = [...placed.values()].map(({ box }) => body(box));
  const { netOf } = clusters(block);
  const removed = only !== null;
  const wires: DrawnWire[] = [];
  const grounds: Ground[] = [];
  const labels: { label: NetLabel; from: Point }[] = [];
  const meetings = new Meetings();
  const reached = new Set<string>();
  const place = (end: WireEnd): RouteEnd | null => placeOf(end, block, placed);
  const join = (from: RouteEnd, to: RouteEnd, net: string | null, index: number | null): void => {
    if (from.at.join() === to.at.join()) return;
    wires.push({ net, points: route(from, to, obstacles), removed, index });
  };

  (block.wires ?? []).forEach(({ a, b }, index) => {
    const [from, to] = [place(a), place(b)];
    if (from === null || to === null) return;
    if (only !== null && !touches(a, only) && !touches(b, only)) return;
    for (const end of [a, b]) reached.add(endKey(end));
    join(from, to, netOf(a), index);
    meetings.add(from.at);
    meetings.add(to.at);
  });
  for (const label of block.sheet?.labels ?? []) {
    const from = place(label.end);
    if (from === null || (only !== null && !touches(label.end, only))) continue;
    if (isPlaceless(label, from.at)) continue;
    reached.add(endKey(label.end));
    if (label.shape !== "name") {
      meetings.add(from.at);
      const outward: Point = label.shape === "ground" ? [0, -1] : sideOf(label.at, from.at);
      join(from, { at: label.at, outward }, label.net, null);
    }
    if (label.shape === "ground") grounds.push({ at: label.at, net: label.net, removed });
    else labels.push({ label, from: from.at });
  }

  const pins = [...placed].flatMap(([part, { pins: all }]) =>
    all.map((pin) => ({ part, pin: pin.name, at: pin.at })),
  );
  if (!removed) for (const { at } of pins) meetings.addWhereMet(at);
  const dots = meetings.ofThree().map((at) => ({ at, removed }));
  const lonePins = pins
    .filter((pin) => !reached.has(endKey(pin)))
    .map(({ part, pin }) => ({ part, pin }));
  return { wires, dots, grounds, labels, lonePins };
}

/** Counts the wire ends and pins at each place: where three meet stands a dot. */
class Meetings {
  readonly #places = new Map<string, { at: Point; count: number }>();

  add(at: Point): void {
    const key = at.join(" ");
    this.#places.set(key, { at, count: (this.#places.get(key)?.count ?? 0) + 1 });
  }

  addWhereMet(at: Point): void {
    if (this.#places.has(at.join(" "))) this.add(at);
  }

  ofThree(): readonly Point[] {
    return [...this.#places.values()].filter(({ count }) => count >= 3).map(({ at }) => at);
  }
}

function touches(end: WireEnd, parts: ReadonlySet<string>): boolean {
  return "part" in end && parts.has(end.part);
}

function placeOf(
  end: WireEnd,
  block: FileBlock,
  placed: ReadonlyMap<string, PlacedSymbol>,
): RouteEnd | null {
  if ("junction" in end) {
    const at = block.sheet?.junctions[end.junction];
    return at === undefined ? null : { at, outward: null };
  }
  const pin = placed.get(end.part)?.pins.find(({ name }) => name === end.pin);
  if (pin === undefined) return null;
  // A test point stands on a wire, which passes it either way.
  const stands = block.parts.some(({ ref, kind }) => ref === end.part && kind === "testPoint");
  return { at: pin.at, outward: stands ? null : pin.outward };
}

/** A flag is reached from the side where its net comes from. */
function sideOf(flag: Point, from: Point): Point {
  return from[0] <= flag[0] ? [-1, 0] : [1, 0];
}

/** A wire may touch a part at its edge, where the pins are. */
function body(box: Box): Box {
  return grown(box, -1);
}

/** A name that stands on its end has no place of its own: the net is lettered where it is clear. */
function isPlaceless(label: NetLabel, [x, y]: Point): boolean {
  return label.shape === "name" && label.at[0] === x && label.at[1] === y;
}
