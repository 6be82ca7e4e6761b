"use client";

import { type KeyboardEvent, type PointerEvent, useMemo, useRef, useState } from "react";
import { OpenWireShape } from "./open-wire";
import { PinHandles } from "./pin-handles";
import { SheetDefs } from "./sheet-defs";
import { SheetFigure } from "./sheet-figure";
import { itemKey, itemToward, type SheetItem, sheetItems } from "./sheet-items";
import { arrowOf, editByKey } from "./sheet-keys";
import { onGrid, sheetPoint } from "./sheet-point";
import type { SheetProps } from "./sheet-props";
import { useMove } from "./use-move";
import { useWiring } from "./use-wiring";
import { useZoom } from "./use-zoom";
import { ZoomButtons } from "./zoom-buttons";

/**
 * A sheet to read, to pick from and, with `editing`, to draw on. Tab reaches one part or net, arrow keys go
 * from one to the next, Enter picks; + and - zoom, 0 shows the whole sheet, Escape lets go.
 */
export function SheetView(props: SheetProps) {
  const { drawing, selection, editing } = props;
  const svg = useRef<SVGSVGElement>(null);
  /** A drag ends in a click of its own, which must not count as one on empty paper. */
  const dragged = useRef(false);
  const zoom = useZoom(svg, drawing.width, drawing.height);
  const wiring = useWiring(drawing, editing);
  const moving = useMove(editing);
  const items = useMemo(() => sheetItems(drawing), [drawing]);
  const [visited, setVisited] = useState<string | null>(null);

  const onItemKey = (item: SheetItem, event: KeyboardEvent): void => {
    const arrow = arrowOf(event);
    if (editing !== undefined && editByKey(event, item.selection, drawing.parts, editing)) {
      // Done; nothing else listens to this key.
    } else if (arrow !== null) focusItem(svg.current, itemToward(items, item, arrow));
    else return;
    event.preventDefault();
    event.stopPropagation();
  };

  const onSheetKey = (event: KeyboardEvent): void => {
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    if (event.key === "+" || event.key === "=") zoom.enlarge();
    else if (event.key === "-") zoom.reduce();
    else if (event.key === "0") zoom.fit();
    else if (event.key === "Escape" && wiring.open !== null) wiring.cancel();
    else if (event.key === "Escape") props.onSelect?.(null);
    else return;
    event.preventDefault();
  };

  const onPointerMove = (event: PointerEvent<SVGSVGElement>): void => {
    if (wiring.open?.to) wiring.draw(sheetPoint(event.currentTarget, event.clientX, event.clientY));
    else if (moving.carried !== null) moving.carry(event.currentTarget, event);
  };

  const onPointerUp = (event: PointerEvent<SVGSVGElement>): void => {
    const carried = moving.carried;
    dragged.current = carried !== null || Boolean(wiring.open?.to);
    if (wiring.open?.to) wiring.drop(sheetPoint(event.currentTarget, event.clientX, event.clientY));
    else if (carried !== null && !moving.put(drawing.parts))
      props.onSelect?.({ part: carried.part });
  };

  const words = wiring.open === null ? "" : wireWords(wiring.open.from);
  return (
    <div className="sheetview">
      <svg
        ref={svg}
        className={editing === undefined ? "dwg" : "dwg editing"}
        viewBox={zoom.viewBox}
        role="application"
        aria-label={props.label}
        data-enlarged={zoom.view.scale > 1}
        onKeyDown={onSheetKey}
        onClick={() => {
          if (!dragged.current) props.onSelect?.(null);
          dragged.current = false;
        }}
        onPointerMove={onPointerMove}
        onPointerUp={onPointerUp}
        onDragOver={(event) => {
          if (editing !== undefined) event.preventDefault();
        }}
        onDrop={(event) => {
          const kind = event.dataTransfer.getData("text/plain");
          if (kind === "" || editing === undefined) return;
          event.preventDefault();
          editing.onPlace(
            kind,
            onGrid(sheetPoint(event.currentTarget, event.clientX, event.clientY)),
          );
        }}
      >
        <SheetDefs />
        <SheetFigure
          sheet={props}
          items={items}
          current={currentKey(items, visited, selection)}
          moving={moving}
          onVisit={setVisited}
          onItemKey={onItemKey}
        />
        {editing !== undefined && (
          <PinHandles
            parts={drawing.parts}
            picked={selection !== null && "part" in selection ? selection.part : null}
            wiring={wiring}
          />
        )}
        <OpenWireShape wiring={wiring} />
      </svg>
      <ZoomButtons zoom={zoom} />
      <p className="sr" aria-live="polite">
        {words}
      </p>
    </div>
  );
}

function wireWords({ part, pin }: { readonly part: string; readonly pin: string }): string {
  return `A wire begins at pin ${pin} of ${part}. Press Enter at another pin to end it, Escape to let it go.`;
}

/** Where Tab enters the sheet: where one was last, else at what is picked, else at the first item. */
function currentKey(
  items: readonly SheetItem[],
  visited: string | null,
  selection: SheetProps["selection"],
): string | null {
  const wanted = [visited, selection === null ? null : itemKey(selection)];
  const found =
    items.find(({ key }) => key === wanted[0]) ?? items.find(({ key }) => key === wanted[1]);
  return (found ?? items[0])?.key ?? null;
}

function focusItem(svg: SVGSVGElement | null, item: SheetItem | null): void {
  if (item === null) return;
  svg?.querySelector<SVGGElement>(`[data-item="${CSS.escape(item.key)}"]`)?.focus();
}
