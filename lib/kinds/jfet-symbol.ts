import type { PartSymbol } from "./part-symbol";

export const jfetSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H-4M-4 -6H10V-20M-4 6H10V20" },
    { path: "M-4 -11V11", look: "heavy" },
    { path: "M-5 0L-12 -3.2V3.2Z", look: "solid" },
  ],
  pins: { drain: [10, -20], gate: [-20, 0], source: [10, 20] },
  box: [-20, -20, 11, 20],
  variant: {
    parameter: "channel",
    strokes: {
      p: [
        { path: "M-20 0H-4M-4 -6H10V-20M-4 6H10V20" },
        { path: "M-4 -11V11", look: "heavy" },
        { path: "M-12 0L-5 -3.2V3.2Z", look: "solid" },
      ],
    },
  },
};
