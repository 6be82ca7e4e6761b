import { useState } from "react";
import type { Point } from "../../lib/circuit/drawing";
import type { SheetDrawing } from "../../lib/sheet/sheet-drawing";
import { pinAt, wireAt } from "./sheet-items";
import type { SheetEditing, WireTarget } from "./sheet-props";

export interface PinName {
  readonly part: string;
  readonly pin: string;
}

/** A wire being drawn from a pin; `to` is null while it is drawn by keyboard. */
export interface OpenWire {
  readonly from: PinName;
  readonly start: Point;
  readonly to: Point | null;
}

export interface Wiring {
  readonly open: OpenWire | null;
  readonly begin: (from: PinName, start: Point, to: Point | null) => void;
  readonly draw: (to: Point) => void;
  /** Ends a wire drawn by pointer at whatever lies there. */
  readonly drop: (at: Point) => void;
  /** Begins at a pin, or ends the wire begun there before. */
  readonly pick: (pin: PinName, at: Point) => void;
  readonly cancel: () => void;
}

/** The gesture from pin to pin: drawn by pointer, or picked pin after pin with the keyboard. */
export function useWiring(drawing: SheetDrawing, editing: SheetEditing | undefined): Wiring {
  const [open, setOpen] = useState<OpenWire | null>(null);
  const finish = (target: WireTarget | null): void => {
    if (open !== null && target !== null && !same(open.from, target)) {
      editing?.onConnect(open.from, target);
    }
    setOpen(null);
  };
  return {
    open,
    begin: (from, start, to) => setOpen({ from, start, to }),
    draw: (to) => setOpen((before) => before && { ...before, to }),
    drop: (at) => finish(pinAt(drawing.parts, at) ?? wireAt(drawing, at)),
    pick: (pin, at) => (open === null ? setOpen({ from: pin, start: at, to: null }) : finish(pin)),
    cancel: () => setOpen(null),
  };
}

function same(pin: PinName, target: WireTarget): boolean {
  return "pin" in target && target.part === pin.part && target.pin === pin.pin;
}
