import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { grown, lineBox } from "./box";
import type { Choice, ClearSpace } from "./clear-space";
import { letteringBox, textWidth } from "./lettering";
import type { Lettering, Segment, Tag } from "./sheet-drawing";
import type { NetReading, PartReading } from "./sheet-facts";

const LINE = 12;
const PAD = 4;
const BOX_HEIGHT = 28;
/** Steps along a wire where lettering is tried. */
const STEP = 10;

/** The name and number of a net inside its band: bare lettering along one of its wires. */
export function letterQuietNet(
  name: string | null,
  value: string | null,
  wires: readonly Segment[],
  space: ClearSpace,
): Tag | null {
  const letters = space.settle(quietChoices(name, value, wires));
  return letters === null ? null : { level: "quiet", box: null, letters, leader: [] };
}

/** A number that moved or is past a limit: a box near the net, with a line to it of at most one corner. */
export function boxNet(
  reading: NetReading,
  wires: readonly Segment[],
  space: ClearSpace,
): Tag | null {
  return boxed({ caption: reading.net, ...reading }, pointsAlong(wires), space);
}

/** The same at a part. */
export function boxPart(reading: PartReading, at: readonly Point[], space: ClearSpace): Tag | null {
  return boxed(reading, at, space);
}

type Caption = Pick<PartReading, "caption" | "is" | "was" | "shift" | "level">;

function boxed(words: Caption, points: readonly Point[], space: ClearSpace): Tag | null {
  return space.settle(boxChoices(words, points));
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
    yield choice(lines(name, value, [x + 5, y], "start"));
    yield choice(lines(name, value, [x - 5, y], "end"));
  }
  for (const [x, y] of pointsAlong(wires)) {
    for (const step of [12, 24, 36]) {
      yield choice(lines(name, value, [x + 6, y - step - 6], "start"));
      yield choice(lines(name, value, [x + 6, y + step + 8], "start"));
      yield choice(lines(name, value, [x - 6, y - step - 6], "end"));
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

function letter(
  style: Lettering["style"],
  text: string,
  at: Point,
  anchor: Lettering["anchor"],
): Lettering {
  return { at, text, style, anchor };
}

/** Places along wires, the longest first, its middle last reached from the start. */
function pointsAlong(wires: readonly Segment[]): Point[] {
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

function* boxChoices(words: Caption, points: readonly Point[]): Generator<Choice<Tag>> {
  const wide = boxWidth(words);
  for (const away of [16, 26, 40, 56, 76, 100, 130, 170]) {
    for (const [x, y] of points) {
      for (const left of [x - 24, x - wide / 2, x - wide + 24]) {
        yield tagAt(
          words,
          [left, y - away - BOX_HEIGHT],
          [
            [x, y - away],
            [x, y],
          ],
        );
        yield tagAt(
          words,
          [left, y + away],
          [
            [x, y + away],
            [x, y],
          ],
        );
      }
      for (const top of [y - BOX_HEIGHT / 2, y - BOX_HEIGHT - 12, y + 12]) {
        const level = top + BOX_HEIGHT / 2;
        const corner: Point[] = level === y ? [] : [[x, level]];
        yield tagAt(words, [x + away, top], [[x + away, level], ...corner, [x, y]]);
        yield tagAt(words, [x - away - wide, top], [[x - away, level], ...corner, [x, y]]);
      }
    }
  }
}

function boxWidth({ caption, is, was, shift }: Caption): number {
  const first = textWidth(caption, "net") + (was === undefined ? 0 : textWidth(was, "number") + 12);
  const second =
    textWidth(is, "number") + (shift === undefined ? 0 : textWidth(shift, "number") + 12);
  return Math.ceil(Math.max(first, second, 60)) + 2 * PAD;
}

function tagAt(words: Caption, [left, top]: Point, leader: readonly Point[]): Choice<Tag> {
  const { caption, is, was, shift, level } = words;
  const wide = boxWidth(words);
  const box: Box = [left, top, left + wide, top + BOX_HEIGHT];
  const [near, far] = [left + PAD, left + wide - PAD];
  const past = level === "past" ? { pencil: "past" as const } : {};
  const letters: Lettering[] = [
    letter("net", caption, [near, top + 11], "start"),
    ...(was === undefined
      ? []
      : [{ ...letter("number", was, [far, top + 11], "end"), pencil: "was" as const }]),
    { ...letter("number", is, [near, top + 23.5], "start"), ...(shift === undefined ? past : {}) },
    ...(shift === undefined
      ? []
      : [{ ...letter("number", shift, [far, top + 23.5], "end"), ...past }]),
  ];
  return { boxes: [grown(box, 3), ...runs(leader)], value: { level, box, letters, leader } };
}

/** The room of a leader, without its end at the wire, where it must meet ink. */
function runs(leader: readonly Point[]): Box[] {
  return leader.slice(1).map((point, index) => {
    const from = leader[index] ?? point;
    const back = index === leader.length - 2 ? 4 : 0;
    const end: Point = [
      point[0] - back * Math.sign(point[0] - from[0]),
      point[1] - back * Math.sign(point[1] - from[1]),
    ];
    return lineBox(from, end, 2);
  });
}
