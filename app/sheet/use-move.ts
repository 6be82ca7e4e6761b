import { type PointerEvent, useState } from "react";
import type { Point } from "../../lib/circuit/drawing";
import type { DrawnPart } from "../../lib/sheet/sheet-drawing";
import { onGrid, sheetPoint } from "./sheet-point";
import type { SheetEditing } from "./sheet-props";

/** A part on its way: where it was taken, and how far it has come, on the grid. */
export interface Carried {
  readonly part: string;
  readonly from: Point;
  readonly by: Point;
}

export interface Moving {
  readonly carried: Carried | null;
  readonly take: (part: DrawnPart, svg: SVGSVGElement, event: PointerEvent) => void;
  readonly carry: (svg: SVGSVGElement, event: PointerEvent) => void;
  /** Puts it down; true where it has moved. */
  readonly put: (parts: readonly DrawnPart[]) => boolean;
}

/** Dragging a part over the grid. The file changes once, when it is put down. */
export function useMove(editing: SheetEditing | undefined): Moving {
  const [carried, setCarried] = useState<Carried | null>(null);
  return {
    carried,
    take(part, svg, event) {
      if (editing === undefined) return;
      svg.setPointerCapture(event.pointerId);
      setCarried({
        part: part.ref,
        from: sheetPoint(svg, event.clientX, event.clientY),
        by: [0, 0],
      });
    },
    carry(svg, event) {
      const [x, y] = sheetPoint(svg, event.clientX, event.clientY);
      setCarried(
        (before) => before && { ...before, by: onGrid([x - before.from[0], y - before.from[1]]) },
      );
    },
    put(parts) {
      setCarried(null);
      const part = parts.find(({ ref }) => ref === carried?.part);
      if (carried === null || part === undefined) return false;
      const [x, y] = carried.by;
      if (x === 0 && y === 0) return false;
      editing?.onMove(part.ref, onGrid([part.at[0] + x, part.at[1] + y]));
      return true;
    },
  };
}
