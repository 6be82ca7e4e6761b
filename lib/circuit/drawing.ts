/** How a block is drawn. Units: grid units of the sheet; A3 is 900 x 636 of them. Solving never reads this. */

/** A place: x to the right, y downward. */
export type Point = readonly [x: number, y: number];

/** One end of a wire: a part's pin, or a junction (also used as a corner). Never a coordinate, so a move keeps the connection. */
export type WireEnd =
  | { readonly part: string; readonly pin: string }
  | { readonly junction: string };

export interface Wire {
  readonly a: WireEnd;
  readonly b: WireEnd;
}

/**
 * A name on a net: `ground` draws the reference symbol, `flag` a port flag where the net goes on
 * elsewhere, `name` plain lettering. `end` ties it to the drawing.
 */
export interface NetLabel {
  readonly shape: "ground" | "flag" | "name";
  readonly net: string;
  readonly at: Point;
  readonly end: WireEnd;
}

/** Lettering that belongs to no part. */
export interface SheetText {
  readonly at: Point;
  readonly text: string;
  readonly style: "heading" | "note";
}

export interface Sheet {
  readonly size: "A4" | "A3" | "A2" | "A1" | "A0";
  readonly junctions: Readonly<Record<string, Point>>;
  readonly labels: readonly NetLabel[];
  readonly texts: readonly SheetText[];
}
