import type { PartSymbol } from "./part-symbol";

export const comparatorSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 -24L22 0L-20 24Z", look: "body" },
    { path: "M-30 -10H-20M-30 10H-20M22 0H30M0 -12.6V-30M0 12.6V30" },
    { path: "M-16 -10H-10M-13 -13V-7M-16 10H-10" },
    { path: "M-4 4H1V-4H6" },
  ],
  pins: {
    inPlus: [-30, -10],
    inMinus: [-30, 10],
    out: [30, 0],
    supplyPlus: [0, -30],
    supplyMinus: [0, 30],
  },
  box: [-30, -30, 30, 30],
};
