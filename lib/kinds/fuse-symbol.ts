import type { PartSymbol } from "./part-symbol";

export const fuseSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H20" }, { path: "M-12 -4.5h24v9h-24Z" }],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -5, 20, 5],
};
