import type { PartSymbol } from "./part-symbol";

export const inductorSymbol: PartSymbol = {
  strokes: [
    {
      path: "M-20 0H-14a3.5 3.5 0 0 1 7 0a3.5 3.5 0 0 1 7 0a3.5 3.5 0 0 1 7 0a3.5 3.5 0 0 1 7 0H20",
    },
  ],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -5, 20, 5],
};
