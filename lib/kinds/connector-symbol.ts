import type { PartSymbol } from "./part-symbol";

export const connectorSymbol: PartSymbol = {
  strokes: [{ path: "M0 0H-7" }, { path: "M-13 0a3 3 0 1 0 6 0a3 3 0 1 0 -6 0Z" }],
  pins: "any",
  box: [-13, -4, 0, 4],
};
