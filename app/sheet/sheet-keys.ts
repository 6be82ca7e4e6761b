import type { KeyboardEvent } from "react";
import type { Point } from "../../lib/circuit/drawing";
import type { DrawnPart } from "../../lib/sheet/sheet-drawing";
import type { Selection } from "./selection";
import type { SheetEditing } from "./sheet-props";

const GRID = 10;
const ARROWS: Readonly<Record<string, Point>> = {
  ArrowLeft: [-1, 0],
  ArrowRight: [1, 0],
  ArrowUp: [0, -1],
  ArrowDown: [0, 1],
};

/** The direction of an arrow key; null for any other. */
export function arrowOf(event: KeyboardEvent): Point | null {
  return ARROWS[event.key] ?? null;
}

/**
 * Editing with the keyboard: Alt and an arrow moves a part by a step of the grid, T turns it, M mirrors it,
 * Delete removes what is picked. True where the key was one of these.
 */
export function editByKey(
  event: KeyboardEvent,
  selection: Selection,
  parts: readonly DrawnPart[],
  editing: SheetEditing,
): boolean {
  if (event.key === "Delete" || event.key === "Backspace") {
    editing.onRemove(selection);
    return true;
  }
  if (!("part" in selection) || event.ctrlKey || event.metaKey) return false;
  const part = parts.find(({ ref, removed }) => ref === selection.part && !removed);
  const arrow = arrowOf(event);
  if (part !== undefined && arrow !== null && event.altKey) {
    editing.onMove(part.ref, [part.at[0] + arrow[0] * GRID, part.at[1] + arrow[1] * GRID]);
    return true;
  }
  if (event.key.toLowerCase() === "t") editing.onTurn(selection.part);
  else if (event.key.toLowerCase() === "m") editing.onMirror(selection.part);
  else return false;
  return true;
}
