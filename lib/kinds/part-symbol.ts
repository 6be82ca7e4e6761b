import type { Point } from "../circuit/drawing";

/** A line of a symbol: SVG path data, origin at the centre of the part, before turning. */
export interface Stroke {
  readonly path: string;
  /** `heavy` is a bar; `solid` is filled with ink; `body` may be filled with paper; `dashed` is a link. */
  readonly look?: "heavy" | "solid" | "dashed" | "body";
}

/** Left, top, right, bottom. */
export type Box = readonly [left: number, top: number, right: number, bottom: number];

/** How a kind is drawn, in the manner of IEC 60617; pins lie on a grid of 10. */
export interface PartSymbol {
  readonly strokes: readonly Stroke[];
  /** `any`: pins bear any names and stand below one another, the symbol repeated at each. */
  readonly pins: Readonly<Record<string, Point>> | "any";
  readonly box: Box;
  /** Other strokes where a parameter says so, such as the arrow of a pnp transistor. */
  readonly variant?: {
    readonly parameter: string;
    readonly strokes: Readonly<Record<string, readonly Stroke[]>>;
  };
}
