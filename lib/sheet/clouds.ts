import type { Point } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import { around, grown, overlap } from "./box";
import type { ClearSpace } from "./clear-space";
import { letteringBox } from "./lettering";
import type { Cloud, DrawnPart } from "./sheet-drawing";

/** How far a cloud keeps from what it holds. */
const ROOM = 7;
const TRIANGLE = { half: 9.5, height: 16 };

/** Clouds around the parts that changed; those that would meet become one. Each bears the letter of the revision. */
export function drawClouds(
  parts: readonly DrawnPart[],
  letter: string,
  space: ClearSpace,
): readonly Cloud[] {
  let groups = parts.map((part) => ({
    box: grown(around(bodyOf(part.box), ...part.letters.map(letteringBox)), ROOM),
    parts: [part.ref],
  }));
  for (let before = -1; before !== groups.length; ) {
    before = groups.length;
    groups = merged(groups);
  }
  for (const { box } of groups) space.take(...edges(box));
  return groups.map(({ box, parts: refs }) => {
    const triangle = space.settle(
      triangles(box).map((apex) => ({ boxes: [triangleBox(apex)], value: apex })),
    );
    return { box, parts: refs, letter, triangle: triangle ?? [box[0], box[3]] };
  });
}

/** A part without the ends of its leads, so that the cloud keeps off the wires it hangs on. */
function bodyOf([left, top, right, bottom]: Box): Box {
  const lead = 8;
  return bottom - top > right - left
    ? [left, top + lead, right, bottom - lead]
    : [left + lead, top, right - lead, bottom];
}

interface Group {
  readonly box: Box;
  readonly parts: string[];
}

function merged(groups: readonly Group[]): Group[] {
  const result: Group[] = [];
  for (const group of groups) {
    const met = result.findIndex(({ box }) => overlap(box, group.box) > 0);
    const other = result[met];
    if (other === undefined) result.push(group);
    else
      result[met] = { box: around(other.box, group.box), parts: [...other.parts, ...group.parts] };
  }
  return result;
}

/** A cloud is a line: lettering may stand inside it. */
function edges([left, top, right, bottom]: Box): Box[] {
  return [
    grown([left, top, right, top], 3),
    grown([left, bottom, right, bottom], 3),
    grown([left, top, left, bottom], 3),
    grown([right, top, right, bottom], 3),
  ];
}

/** Places for the apex: a little inside the line, so that triangle and cloud belong together. */
function triangles([left, top, right, bottom]: Box): Point[] {
  const across = [0.2, 0.5, 0.8].map((part) => left + (right - left) * part);
  const { half, height } = TRIANGLE;
  return [
    ...across.map((x): Point => [x, bottom + 4]),
    ...across.map((x): Point => [x, top - height - 4]),
    [right + half + 4, bottom - height],
    [left - half - 4, bottom - height],
    [right + half + 4, top],
    [left - half - 4, top],
  ];
}

function triangleBox([x, y]: Point): Box {
  const { half, height } = TRIANGLE;
  return [x - half, y, x + half, y + height];
}
