import type { Point } from "../circuit/drawing";
import { grown } from "./box";
import type { Choice, ClearSpace } from "./clear-space";
import { letter, letteringBox, textWidth } from "./lettering";
import { letterAside } from "./number-box";
import { pointsAlong } from "./points-along";
import type { Lettering, Segment, Tag } from "./sheet-drawing";

const LINE = 12;

/** The name and number of a net inside its band: bare lettering along one of its wires. */
export function letterQuietNet(
  name: string | null,
  value: string | null,
  wires: readonly Segment[],
  space: ClearSpace,
): Tag | null {
  const letters = space.clear(quietChoices(name, value, wires));
  if (letters !== null) return { level: "quiet", box: null, letters, leader: [] };
  return letterAside(name, value, wires, space);
}

function* quietChoices(
  name: string | null,
  value: string | null,
  wires: readonly Segment[],
): Generator<Choice<readonly Lettering[]>> {
  const lying = wires.filter(([a, b]) => a[1] === b[1]);
  const upright = wires.filter(([a, b]) => a[0] === b[0] && a[1] !== b[1]);
  for (const at of pointsAlong(lying)) {
    for (const form of forms(name, value, at)) yield choice(form);
  }
  for (const [x, y] of pointsAlong(upright)) {
    for (const aside of [5, 12]) {
      yield choice(lines(name, value, [x + aside, y], "start"));
      yield choice(lines(name, value, [x - aside, y], "end"));
    }
  }
}

function choice(letters: readonly Lettering[]): Choice<readonly Lettering[]> {
  return { boxes: letters.map((letter) => grown(letteringBox(letter), 1)), value: letters };
}

/** Along a lying wire: in one line above or below, around it, or stacked. */
function forms(name: string | null, value: string | null, [x, y]: Point): Lettering[][] {
  const above = y - 5;
  const below = y + 12.5;
  if (name === null || value === null) {
    return [lines(name, value, [x, above], "start"), lines(name, value, [x, below], "start")];
  }
  const left = letter("net", name, [x, above], "start");
  const after = x + textWidth(name, "net") + 5;
  return [
    [left, letter("quiet", value, [x, below], "start")],
    [left, letter("quiet", value, [after, above], "start")],
    [letter("net", name, [x, below], "start"), letter("quiet", value, [after, below], "start")],
    lines(name, value, [x, above - LINE], "start"),
    lines(name, value, [x, below], "start"),
    lines(name, value, [x, above - LINE], "end"),
    lines(name, value, [x, below], "end"),
  ];
}

function lines(
  name: string | null,
  value: string | null,
  [x, y]: Point,
  anchor: Lettering["anchor"],
): Lettering[] {
  const first = name === null ? [] : [letter("net", name, [x, y], anchor)];
  const second =
    value === null ? [] : [letter("quiet", value, [x, name === null ? y : y + LINE], anchor)];
  return [...first, ...second];
}
