import type { PartSymbol } from "./part-symbol";

export const resistorSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H-12M12 0H20" }, { path: "M-12 -4.5h24v9h-24Z" }],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -5, 20, 5],
};
