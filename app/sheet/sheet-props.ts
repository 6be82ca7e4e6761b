import type { Point, WireEnd } from "../../lib/circuit/drawing";
import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import type { Selection } from "./selection";
import type { RevisionRow, TitleFacts } from "./title-facts";

/** What another person has picked. */
export interface Presence {
  readonly initials: string;
  readonly name: string;
  readonly selection: Selection;
}

/** Where a new wire may end: at a pin, or on a wire of the file, which then gets a junction there. */
export type WireTarget = WireEnd | { readonly wire: number; readonly at: Point };

/** What a draft's sheet lets one do. Places come on the grid. */
export interface SheetEditing {
  readonly onMove: (part: string, at: Point) => void;
  readonly onConnect: (from: WireEnd, to: WireTarget) => void;
  readonly onTurn: (part: string) => void;
  readonly onMirror: (part: string) => void;
  readonly onRemove: (selection: Selection) => void;
  /** A kind dragged onto the sheet (its name as `text/plain`). */
  readonly onPlace: (kind: string, at: Point) => void;
}

export interface SheetProps {
  readonly drawing: SheetDrawing;
  /** Read aloud for the sheet as a whole. */
  readonly label: string;
  readonly selection: Selection | null;
  readonly onSelect?: (selection: Selection | null) => void;
  readonly openFinding?: string | null;
  readonly onOpenFinding?: (finding: string) => void;
  readonly others?: readonly Presence[];
  readonly title?: TitleFacts;
  readonly revisions?: readonly RevisionRow[];
  readonly onSign?: () => void;
  readonly editing?: SheetEditing;
}
