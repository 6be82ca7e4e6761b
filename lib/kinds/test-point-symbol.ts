import type { PartSymbol } from "./part-symbol";

export const testPointSymbol: PartSymbol = {
  strokes: [{ path: "M0 0V-8" }, { path: "M-3 -11a3 3 0 1 0 6 0a3 3 0 1 0 -6 0Z" }],
  pins: "any",
  box: [-4, -14, 4, 0],
};
