import type { PartSymbol } from "./part-symbol";

export const capacitorSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H-2.5M2.5 0H20M-2.5 -9V9M2.5 -9V9" }],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -9, 20, 9],
};
