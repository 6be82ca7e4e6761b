import type { Point } from "../../lib/circuit/drawing";

const GRID = 10;

/** A place of the window in sheet units. */
export function sheetPoint(svg: SVGSVGElement, clientX: number, clientY: number): Point {
  const matrix = svg.getScreenCTM();
  if (matrix === null) return [0, 0];
  const { x, y } = new DOMPoint(clientX, clientY).matrixTransform(matrix.inverse());
  return [x, y];
}

/** The nearest place on the grid. */
export function onGrid([x, y]: Point): Point {
  return [Math.round(x / GRID) * GRID, Math.round(y / GRID) * GRID];
}
