import type { PartSymbol } from "./part-symbol";

export const mosfetSymbol: PartSymbol = {
  strokes: [
    {
      path: "M-20 0H-8M-8 -9V9M-4 -11V-6M-4 -2.5V2.5M-4 6V11M-4 -8.5H10V-20M-4 8.5H10V20M-4 0H10V8.5",
    },
    { path: "M-4 0L2 -3V3Z", look: "solid" },
  ],
  pins: { drain: [10, -20], gate: [-20, 0], source: [10, 20] },
  box: [-20, -20, 11, 20],
  variant: {
    parameter: "channel",
    strokes: {
      p: [
        {
          path: "M-20 0H-8M-8 -9V9M-4 -11V-6M-4 -2.5V2.5M-4 6V11M-4 -8.5H10V-20M-4 8.5H10V20M-4 0H10V8.5",
        },
        { path: "M4 0L-2 -3V3Z", look: "solid" },
      ],
    },
  },
};
