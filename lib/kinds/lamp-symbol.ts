import type { PartSymbol } from "./part-symbol";

export const lampSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H-9M9 0H20M-6.4 -6.4L6.4 6.4M-6.4 6.4L6.4 -6.4" },
    { path: "M-9 0a9 9 0 1 0 18 0a9 9 0 1 0 -18 0Z" },
  ],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -9, 20, 9],
};
