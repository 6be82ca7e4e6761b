import type { PartSymbol } from "./part-symbol";

export const relayCoilSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H-6M6 0H20" }, { path: "M-6 -13h12v26h-12Z" }],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -13, 20, 13],
};
