import { type RefObject, useEffect, useState } from "react";
import type { Point } from "../../lib/circuit/drawing";
import { sheetPoint } from "./sheet-point";

/** The part of the sheet in view: its upper left corner, and how many times it is enlarged. */
export interface View {
  readonly at: Point;
  readonly scale: number;
}

const WHOLE: View = { at: [0, 0], scale: 1 };
const MOST = 8;
const STEP = 1.25;

/** Enlarged about a place that stays where it is; never smaller than the whole sheet, never beyond its edges. */
function zoomed(view: View, factor: number, about: Point, size: Point): View {
  const scale = Math.min(MOST, Math.max(1, view.scale * factor));
  const ratio = view.scale / scale;
  return held(
    {
      scale,
      at: [about[0] - (about[0] - view.at[0]) * ratio, about[1] - (about[1] - view.at[1]) * ratio],
    },
    size,
  );
}

function panned(view: View, by: Point, size: Point): View {
  return held({ ...view, at: [view.at[0] + by[0], view.at[1] + by[1]] }, size);
}

function held({ at, scale }: View, size: Point): View {
  const most = (axis: 0 | 1) => size[axis] * (1 - 1 / scale);
  return { scale, at: [clamp(at[0], most(0)), clamp(at[1], most(1))] };
}

function clamp(value: number, most: number): number {
  return Math.min(most, Math.max(0, value));
}

export interface Zoom {
  readonly view: View;
  readonly viewBox: string;
  readonly enlarge: () => void;
  readonly reduce: () => void;
  readonly fit: () => void;
  readonly pan: (by: Point) => void;
}

/**
 * The view of a sheet of this size. With Ctrl held (or pinching) the wheel zooms at the pointer; the plain
 * wheel scrolls the page, and the enlarged sheet once there is something to scroll.
 */
export function useZoom(svg: RefObject<SVGSVGElement | null>, width: number, height: number): Zoom {
  const [view, setView] = useState(WHOLE);
  useEffect(() => {
    const element = svg.current;
    if (element === null) return;
    const size: Point = [width, height];
    const onWheel = (event: WheelEvent): void => {
      const about = sheetPoint(element, event.clientX, event.clientY);
      if (event.ctrlKey || event.metaKey) {
        event.preventDefault();
        setView((before) => zoomed(before, Math.exp(-event.deltaY / 300), about, size));
      } else if (element.dataset["enlarged"] === "true") {
        event.preventDefault();
        setView((before) =>
          panned(before, [event.deltaX / before.scale, event.deltaY / before.scale], size),
        );
      }
    };
    // React's own listeners are passive: they could not keep the page from scrolling.
    element.addEventListener("wheel", onWheel, { passive: false });
    return () => element.removeEventListener("wheel", onWheel);
  }, [svg, width, height]);

  const size: Point = [width, height];
  const centre: Point = [view.at[0] + width / view.scale / 2, view.at[1] + height / view.scale / 2];
  return {
    view,
    viewBox: `${view.at[0]} ${view.at[1]} ${width / view.scale} ${height / view.scale}`,
    enlarge: () => setView(zoomed(view, STEP, centre, size)),
    reduce: () => setView(zoomed(view, 1 / STEP, centre, size)),
    fit: () => setView(WHOLE),
    pan: (by) => setView(panned(view, by, size)),
  };
}
