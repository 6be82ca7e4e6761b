import type { PartSymbol } from "./part-symbol";

export const bjtSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H-4M10 -20V-14L-4 -5M10 20V14L-4 5" },
    { path: "M-4 -11V11", look: "heavy" },
    { path: "M7.6 12.4L1.4 11.4L4.2 7.2Z", look: "solid" },
  ],
  pins: { collector: [10, -20], base: [-20, 0], emitter: [10, 20] },
  box: [-20, -20, 11, 20],
  variant: {
    parameter: "polarity",
    strokes: {
      pnp: [
        { path: "M-20 0H-4M10 -20V-14L-4 -5M10 20V14L-4 5" },
        { path: "M-4 -11V11", look: "heavy" },
        { path: "M-2.4 6L3.8 7L1 11.2Z", look: "solid" },
      ],
    },
  },
};
