import type { PartSymbol } from "./part-symbol";

export const voltageReferenceSymbol: PartSymbol = {
  strokes: [
    { path: "M0 -20V20" },
    { path: "M-7 6L0 -6L7 6Z" },
    { path: "M-7 -6H7V-2.5" },
    { path: "M-20 0H-3.5" },
  ],
  pins: { cathode: [0, -20], anode: [0, 20], adjust: [-20, 0] },
  box: [-20, -20, 8, 20],
};
