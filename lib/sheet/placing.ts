import type { FileBlock } from "../circuit/circuit-file";
import type { Box } from "../kinds/part-symbol";
import { grown, overlap } from "./box";
import { type Placing, placeSymbol } from "./pin-place";
import { type Paper, paper } from "./zones";

/** A place for each part, with room for its lettering and the names at its pins. */
const CELL = [130, 90] as const;
const MARGIN = 60;
/** What the title block takes at least, lower right. */
const TITLE = [400, 200] as const;
const SIZES = ["A4", "A3", "A2", "A1", "A0"] as const;

/**
 * Where every part of a block stands, and on which paper. A part without a place gets the next free cell of a grid,
 * row by row in file order; where the paper has no free cell left, the next size is taken. Beyond A0
 * parts go on below the frame. The same file always gives the same places.
 */
export function placeParts(block: FileBlock): { sheet: Paper; placings: readonly Placing[] } {
  const drawn = block.sheet?.size;
  const least = drawn === undefined ? 0 : SIZES.indexOf(drawn);
  const open = block.parts.filter((part) => part.at === undefined).length;
  for (const size of SIZES.slice(drawn === undefined && open === 0 ? 1 : Math.max(0, least))) {
    const sheet = paper(size);
    const placings = onPaper(block, sheet, size === "A0");
    if (placings !== null) return { sheet, placings };
  }
  return { sheet: paper("A3"), placings: [] };
}

function onPaper(block: FileBlock, sheet: Paper, last: boolean): readonly Placing[] | null {
  const taken: Box[] = block.parts.flatMap((part) =>
    part.at === undefined ? [] : [grown(placeSymbol(part, placingOf(part, part.at)).box, 20)],
  );
  const cells = freeCells(sheet, last, taken);
  const placings: Placing[] = [];
  for (const part of block.parts) {
    const at = part.at ?? cells.next().value;
    if (at === undefined) return null;
    placings.push(placingOf(part, at));
  }
  return placings;
}

function placingOf(part: FileBlock["parts"][number], at: Placing["at"]): Placing {
  return { at, turn: part.turn ?? 0, mirror: part.mirror ?? false };
}

function* freeCells(
  sheet: Paper,
  endless: boolean,
  taken: readonly Box[],
): Generator<Placing["at"], undefined> {
  const [left, top, right, bottom] = sheet.frame;
  const title: Box = [right - TITLE[0], bottom - TITLE[1], right, bottom];
  const rightmost = right - MARGIN;
  for (let y = top + MARGIN + 29; endless || y <= bottom - MARGIN; y += CELL[1]) {
    for (let x = left + MARGIN + 7; x <= rightmost; x += CELL[0]) {
      const cell: Box = [x - 40, y - 30, x + 60, y + 30];
      if (![title, ...taken].some((box) => overlap(box, cell) > 0)) yield [x, y];
    }
  }
  return undefined;
}
