import type { PartSymbol } from "./part-symbol";

export const couplingSymbol: PartSymbol = {
  strokes: [
    { path: "M-14 0A14 8 0 0 1 14 0", look: "dashed" },
    { path: "M-17 -4L-14 0L-10 -3M17 -4L14 0L10 -3" },
  ],
  pins: {},
  box: [-18, -9, 18, 3],
};
