import type { Point, Sheet } from "../circuit/drawing";
import type { Box } from "../kinds/part-symbol";
import type { Segment, ZoneMarks } from "./sheet-drawing";

type SheetSize = Sheet["size"];

/** Trimmed sizes of ISO 5457 in mm, lying; and the number of fields along each side. */
const SHEETS: Readonly<Record<SheetSize, { mm: Point; fields: Point }>> = {
  A4: { mm: [297, 210], fields: [6, 4] },
  A3: { mm: [420, 297], fields: [8, 6] },
  A2: { mm: [594, 420], fields: [12, 8] },
  A1: { mm: [841, 594], fields: [16, 12] },
  A0: { mm: [1189, 841], fields: [24, 16] },
};
/** A3 is 900 units wide. */
const UNITS_PER_MM = 900 / 420;
const FIELD_MM = 50;
const LETTERS = "ABCDEFGHJKLMNPQRSTUVWXYZ";
/** Depth of the border that bears the letters and numerals. */
const BORDER = 14;

export interface Paper {
  readonly size: SheetSize;
  readonly width: number;
  readonly height: number;
  /** 20 mm from the left edge, 10 mm from the others. */
  readonly frame: Box;
}

export function paper(size: SheetSize): Paper {
  const [across, down] = SHEETS[size].mm;
  const width = Math.round(across * UNITS_PER_MM);
  const height = Math.round(down * UNITS_PER_MM);
  const [wide, narrow] = [Math.round(20 * UNITS_PER_MM), Math.round(10 * UNITS_PER_MM)];
  return { size, width, height, frame: [wide, narrow, width - narrow, height - narrow] };
}

/** The dividing lines along one side: 50 mm fields counted from the centring mark, the end fields take the rest. */
function divisions(length: number, fields: number): number[] {
  const half = fields / 2;
  return Array.from(
    { length: fields - 1 },
    (_, index) => length / 2 + (index + 1 - half) * FIELD_MM * UNITS_PER_MM,
  );
}

function sides({ size, width, height }: Paper): readonly [number[], number[]] {
  const [across, down] = SHEETS[size].fields;
  return [divisions(width, across), divisions(height, down)];
}

/** The zone of a place: letter downward, numeral to the right, as `E2`. */
export function zoneAt(sheet: Paper, [x, y]: Point): string {
  const [columns, rows] = sides(sheet);
  const column = columns.filter((line) => line <= x).length;
  const row = rows.filter((line) => line <= y).length;
  return `${LETTERS.charAt(row)}${column + 1}`;
}

export function zoneMarks(sheet: Paper): ZoneMarks {
  const { width, height, frame } = sheet;
  const [left, top, right, bottom] = frame;
  const [columns, rows] = sides(sheet);
  const lines: Segment[] = [];
  const names: { at: Point; text: string }[] = [];
  for (const x of columns) {
    lines.push(
      [
        [x, top - BORDER],
        [x, top],
      ],
      [
        [x, bottom],
        [x, bottom + BORDER],
      ],
    );
  }
  for (const y of rows) {
    lines.push(
      [
        [left - BORDER, y],
        [left, y],
      ],
      [
        [right, y],
        [right + BORDER, y],
      ],
    );
  }
  middles(left, columns, right).forEach((x, index) => {
    const text = String(index + 1);
    names.push({ at: [x, top - 6.5], text }, { at: [x, bottom + 13.5], text });
  });
  middles(top, rows, bottom).forEach((y, index) => {
    const text = LETTERS.charAt(index);
    names.push({ at: [left - 9, y + 4], text }, { at: [right + 10, y + 4], text });
  });
  const centring: Segment[] = [
    [
      [width / 2, 0],
      [width / 2, top + 6],
    ],
    [
      [width / 2, bottom - 6],
      [width / 2, height],
    ],
    [
      [0, height / 2],
      [left + 6, height / 2],
    ],
    [
      [right - 6, height / 2],
      [width, height / 2],
    ],
  ];
  return { names, lines, centring };
}

function middles(from: number, lines: readonly number[], to: number): number[] {
  const edges = [from, ...lines, to];
  return lines.concat(to).map((line, index) => ((edges[index] ?? from) + line) / 2);
}
