import type { Point } from "../circuit/drawing";
import type { Box, Stroke } from "../kinds/part-symbol";
import type { NetReading, ReadingLevel } from "./sheet-facts";

/** A sheet as pure geometry, in sheet units (A3 is 900 x 636). Everything a view needs; nothing about how it looks. */
export interface SheetDrawing {
  readonly width: number;
  readonly height: number;
  readonly frame: Box;
  readonly zones: ZoneMarks;
  readonly parts: readonly DrawnPart[];
  readonly wires: readonly DrawnWire[];
  readonly dots: readonly Dot[];
  readonly grounds: readonly Ground[];
  readonly flags: readonly Flag[];
  readonly texts: readonly Lettering[];
  /** One for each net of the sheet but the reference, in reading order. */
  readonly nets: readonly DrawnNet[];
  /** Numbers that stand at a part, such as a junction temperature past its limit. */
  readonly partTags: readonly PartTag[];
  readonly clouds: readonly Cloud[];
  readonly balloons: readonly Balloon[];
  readonly titleBlock: Box;
  readonly revisionBlock: Box | null;
}

/** ISO 5457: field letters and numerals, their dividing lines, and the centring marks. */
export interface ZoneMarks {
  readonly names: readonly { readonly at: Point; readonly text: string }[];
  readonly lines: readonly Segment[];
  readonly centring: readonly Segment[];
}

export type Segment = readonly [from: Point, to: Point];

export type LetterStyle = "ref" | "value" | "net" | "number" | "quiet" | "heading" | "note";

export interface Lettering {
  /** On the base line. */
  readonly at: Point;
  readonly text: string;
  readonly style: LetterStyle;
  readonly anchor: "start" | "middle" | "end";
  /** `was`: struck; `past`: of a number past its limit. */
  readonly pencil?: "was" | "past";
}

export interface DrawnPin {
  readonly name: string;
  readonly net: string | null;
  readonly at: Point;
  /** Unit step away from the part. */
  readonly outward: Point;
}

export interface DrawnPart {
  readonly ref: string;
  readonly kind: string;
  readonly strokes: readonly Stroke[];
  /** Where the symbol's origin goes: one place, or one for each pin of a connector. */
  readonly origins: readonly Point[];
  /** Quarter turns, clockwise, after mirroring about the vertical. */
  readonly turn: 0 | 1 | 2 | 3;
  readonly mirror: boolean;
  readonly at: Point;
  readonly pins: readonly DrawnPin[];
  readonly box: Box;
  readonly letters: readonly Lettering[];
  /** The main value as written, for reading aloud. */
  readonly value: string;
  readonly zone: string;
  /** Drawn from the base: the proposed circuit no longer has it. */
  readonly removed: boolean;
  readonly checked: boolean;
}

export interface DrawnWire {
  readonly net: string | null;
  readonly points: readonly Point[];
  readonly removed: boolean;
  /** Index in the file's wires; null for what joins a label or a pin's own name. */
  readonly index: number | null;
}

export interface Dot {
  readonly at: Point;
  readonly removed: boolean;
}

export interface Ground {
  readonly at: Point;
  readonly net: string;
  readonly removed: boolean;
}

/** Where a net goes on elsewhere. */
export interface Flag {
  readonly net: string;
  readonly outline: readonly Point[];
  readonly letters: readonly Lettering[];
}

/** A box or bare lettering with a number at a net or part. `box` is null where the number is quiet. */
export interface Tag {
  readonly level: ReadingLevel;
  readonly box: Box | null;
  readonly letters: readonly Lettering[];
  readonly leader: readonly Point[];
}

export interface DrawnNet {
  readonly net: string;
  /** Where it is first met, reading the sheet. */
  readonly at: Point;
  readonly zone: string;
  readonly tag: Tag | null;
  readonly reading: NetReading | null;
}

export interface PartTag extends Tag {
  readonly part: string;
}

/** A revision cloud with its triangle. */
export interface Cloud {
  readonly box: Box;
  readonly parts: readonly string[];
  readonly letter: string;
  /** Apex of the triangle. */
  readonly triangle: Point;
}

export interface Balloon {
  readonly id: string;
  readonly number: number;
  readonly severity: "major" | "minor" | "observation" | "question";
  readonly at: Point;
  readonly leader: readonly Point[];
  readonly zone: string;
}
