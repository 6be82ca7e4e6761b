import type { Point } from "../../lib/circuit/drawing";
import type { Box } from "../../lib/kinds/part-symbol";

/** Path data through points. */
export function through(points: readonly Point[]): string {
  return points.map(([x, y], index) => `${index === 0 ? "M" : "L"}${x} ${y}`).join("");
}

/** Path data of a revision cloud around a box: bows of nearly one size, outward. */
export function cloudPath([left, top, right, bottom]: Box): string {
  const [across, down] = [right - left, bottom - top];
  const bows = (length: number) => Math.max(2, Math.round(length / 7));
  const side = (dx: number, dy: number): string => {
    const count = bows(Math.abs(dx + dy));
    return `a3.72 3.72 0 0 1 ${(dx / count).toFixed(2)} ${(dy / count).toFixed(2)}`.repeat(count);
  };
  return `M${left} ${top}${side(across, 0)}${side(0, down)}${side(-across, 0)}${side(0, -down)}Z`;
}

/** SVG attributes of a box. */
export function rectOf([left, top, right, bottom]: Box) {
  return { x: left, y: top, width: right - left, height: bottom - top };
}

/** Corner marks around a box. */
export function cornersOf([left, top, right, bottom]: Box): string {
  const arm = Math.min(8, (right - left) / 3, (bottom - top) / 3);
  return [
    `M${left} ${top + arm}V${top}H${left + arm}`,
    `M${right - arm} ${top}H${right}V${top + arm}`,
    `M${right} ${bottom - arm}V${bottom}H${right - arm}`,
    `M${left + arm} ${bottom}H${left}V${bottom - arm}`,
  ].join("");
}
