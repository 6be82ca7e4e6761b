import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { middle } from "./box";
import type { Choice, ClearSpace } from "./clear-space";
import { letteringBox, textWidth } from "./lettering";
import type { Lettering } from "./sheet-drawing";

/** Between two lines, and between the lettering and what it stands at. */
const LINE = 11.5;
const GAP = 6;

/** What is lettered at a part: its designator, and its value with what it was. */
export interface PartLettering {
  readonly ref: string;
  readonly value: string;
  /** Struck before the value; null where it has not changed. */
  readonly was: string | null;
  /** The part is gone: all is struck. */
  readonly removed: boolean;
}

/** Letters a part where it is clear: beside an upright one, above and below a lying one. */
export function letterPart(
  words: PartLettering,
  box: Box,
  space: ClearSpace,
): readonly Lettering[] {
  return space.settle(choices(words, box)) ?? [];
}

function* choices(words: PartLettering, box: Box): Generator<Choice<readonly Lettering[]>> {
  const [left, top, right, bottom] = box;
  const [x, y] = middle(box);
  const upright = bottom - top >= right - left;
  const below = bottom + GAP + 8;
  const two = words.value !== "" || words.was !== null;
  const rise = two ? 2 : -4;
  const beside = [0, -8, 8, -16, 16].flatMap((step) => [
    stacked(words, [right + GAP, y - rise + step], "start"),
    stacked(words, [left - GAP, y - rise + step], "end"),
  ]);
  const oneLine =
    words.was === null && !words.removed && two ? [inOneLine(words, [x, top - GAP])] : [];
  const lying = [
    ...oneLine,
    split(words, [x, top - GAP], [x, below]),
    stacked(words, [x, top - GAP - (two ? LINE : 0)], "middle"),
    stacked(words, [x, below], "middle"),
  ];
  const corners = [
    stacked(words, [right - 8, top + 4], "start"),
    stacked(words, [right - 8, bottom - 4], "start"),
    stacked(words, [left + 8, top + 4], "end"),
  ];
  const far = [14, 26, 38].flatMap((step) => [
    stacked(words, [right + step, top - step / 2], "start"),
    stacked(words, [x, top - step - LINE], "middle"),
    stacked(words, [x, below + step], "middle"),
    stacked(words, [left - step, top - step / 2], "end"),
  ]);
  const large = right - left >= 50 && bottom - top >= 50;
  const order = large
    ? [...corners, ...beside, ...lying]
    : upright
      ? [...beside, ...lying, ...corners]
      : [...lying, ...beside, ...corners];
  for (const letters of [...order, ...far])
    yield { boxes: letters.map(letteringBox), value: letters };
}

function stacked(words: PartLettering, [x, y]: Point, anchor: Lettering["anchor"]): Lettering[] {
  return [refAt(words, [x, y], anchor), ...valueAt(words, [x, y + LINE], anchor)];
}

function split(words: PartLettering, above: Point, below: Point): Lettering[] {
  return [refAt(words, above, "middle"), ...valueAt(words, below, "middle")];
}

function inOneLine({ ref, value }: PartLettering, [x, y]: Point): Lettering[] {
  const [first, second] = [textWidth(ref, "ref"), textWidth(value, "value")];
  const left = x - (first + 5 + second) / 2;
  return [
    { at: [left, y], text: ref, style: "ref", anchor: "start" },
    { at: [left + first + 5, y], text: value, style: "value", anchor: "start" },
  ];
}

function refAt({ ref, removed }: PartLettering, at: Point, anchor: Lettering["anchor"]): Lettering {
  return { at, text: ref, style: "ref", anchor, ...(removed && { pencil: "was" as const }) };
}

/** The struck value and the new one side by side. */
function valueAt(words: PartLettering, [x, y]: Point, anchor: Lettering["anchor"]): Lettering[] {
  const { value, was, removed } = words;
  const texts = [was, value].filter((text): text is string => text !== null && text !== "");
  const space = 4;
  const widths = texts.map((text) => textWidth(text, "value"));
  const whole =
    widths.reduce((sum, width) => sum + width, 0) + space * Math.max(0, texts.length - 1);
  let at = anchor === "start" ? x : anchor === "end" ? x - whole : x - whole / 2;
  return texts.map((text, index): Lettering => {
    const place: Point = [at, y];
    at += (widths[index] ?? 0) + space;
    const struck = removed || (was !== null && index === 0);
    const style = was !== null && index === 1 ? "ref" : "value";
    return { at: place, text, style, anchor: "start", ...(struck && { pencil: "was" as const }) };
  });
}
