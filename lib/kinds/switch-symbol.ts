import type { PartSymbol } from "./part-symbol";

export const switchSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H-10L9 -8M10 0H20M10 -3V3" }],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -9, 20, 4],
};
