import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { grown, lineBox } from "./box";
import type { Choice, ClearSpace } from "./clear-space";
import { letter, textWidth } from "./lettering";
import { pointsAlong } from "./points-along";
import type { Lettering, Segment, Tag } from "./sheet-drawing";
import type { NetReading, PartReading } from "./sheet-facts";

const PAD = 4;
const BOX_HEIGHT = 28;
/** How far from its place a box is tried. */
const AWAY = [16, 26, 40, 56, 76, 100, 130, 170];
/** What a corner of the leader counts against its length. */
const CORNER = 30;

type Caption = Pick<PartReading, "caption" | "is" | "was" | "shift" | "level">;

/** A number that moved or is past a limit: a box near the net, with a line to it of at most one corner. */
export function boxNet(
  reading: NetReading,
  wires: readonly Segment[],
  space: ClearSpace,
): Tag | null {
  return boxed({ ...reading, caption: reading.net }, pointsAlong(wires), space);
}

/** The same at a part. */
export function boxPart(reading: PartReading, at: readonly Point[], space: ClearSpace): Tag | null {
  return boxed(reading, at, space);
}

/** A quiet number that finds no room along its wires: aside, with a line to it but no box. */
export function letterAside(
  name: string | null,
  value: string | null,
  wires: readonly Segment[],
  space: ClearSpace,
): Tag | null {
  const words: Caption = { caption: name ?? "", is: value ?? "", level: "quiet" };
  const tag = boxed(words, pointsAlong(wires), space);
  if (tag === null) return null;
  const letters = tag.letters.filter(({ text }) => text !== "");
  return {
    ...tag,
    box: null,
    letters: letters.map((one) => (one.style === "number" ? { ...one, style: "quiet" } : one)),
  };
}

function boxed(words: Caption, points: readonly Point[], space: ClearSpace): Tag | null {
  const tried = thinned(points);
  const choices = tried.flatMap((point) => boxesAround(words, point));
  const cost = new Map(choices.map((choice) => [choice, leaderCost(choice.value.leader)]));
  return space.settle(choices.sort((one, other) => (cost.get(one) ?? 0) - (cost.get(other) ?? 0)));
}

/** So many places along a net at most, spread evenly. */
const PLACES = 20;

function thinned(points: readonly Point[]): readonly Point[] {
  const every = Math.ceil(points.length / PLACES);
  return points.filter((_, index) => index % every === 0);
}

function leaderCost(leader: readonly Point[]): number {
  const length = leader.slice(1).reduce((sum, [x, y], index) => {
    const [fromX, fromY] = leader[index] ?? [x, y];
    return sum + Math.abs(x - fromX) + Math.abs(y - fromY);
  }, 0);
  return length + CORNER * (leader.length - 2);
}

function boxesAround(words: Caption, [x, y]: Point): Choice<Tag>[] {
  const wide = boxWidth(words);
  const half = BOX_HEIGHT / 2;
  const straight = AWAY.flatMap((away) => [
    ...[x - 24, x - wide / 2, x - wide + 24].flatMap((left) => [
      tagAt(
        words,
        [left, y - away - BOX_HEIGHT],
        [
          [x, y - away],
          [x, y],
        ],
      ),
      tagAt(
        words,
        [left, y + away],
        [
          [x, y + away],
          [x, y],
        ],
      ),
    ]),
    tagAt(
      words,
      [x + away, y - half],
      [
        [x + away, y],
        [x, y],
      ],
    ),
    tagAt(
      words,
      [x - away - wide, y - half],
      [
        [x - away, y],
        [x, y],
      ],
    ),
  ]);
  const cornered = AWAY.slice(0, 4).flatMap((aside) =>
    AWAY.slice(0, 7).flatMap((away) =>
      [x - aside, x + aside].flatMap((column) =>
        [column - 24, column - wide + 24].flatMap((left) => [
          tagAt(
            words,
            [left, y - away - BOX_HEIGHT],
            [
              [column, y - away],
              [column, y],
              [x, y],
            ],
          ),
          tagAt(
            words,
            [left, y + away],
            [
              [column, y + away],
              [column, y],
              [x, y],
            ],
          ),
        ]),
      ),
    ),
  );
  return [...straight, ...cornered];
}

function boxWidth(words: Caption): number {
  const { caption, is, was, shift } = words;
  const first = textWidth(caption, "net") + (was === undefined ? 0 : textWidth(was, "number") + 12);
  const second =
    textWidth(is, "number") + (shift === undefined ? 0 : textWidth(shift, "number") + 12);
  return Math.ceil(Math.max(first, second, words.level === "quiet" ? 0 : 60)) + 2 * PAD;
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
