import type { PartSymbol } from "./part-symbol";

export const linearRegulatorSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 -12h40v24h-40Z", look: "body" },
    { path: "M-30 0H-20M20 0H30M0 12V20" },
    { path: "M-12 4V-3H4M1 -6L5 -3L1 0" },
  ],
  pins: { in: [-30, 0], out: [30, 0], common: [0, 20] },
  box: [-30, -12, 30, 20],
};
