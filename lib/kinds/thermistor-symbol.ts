import type { PartSymbol } from "./part-symbol";

export const thermistorSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H-12M12 0H20" },
    { path: "M-12 -4.5h24v9h-24Z" },
    { path: "M-15 10H-10L10 -10" },
  ],
  pins: { 1: [-20, 0], 2: [20, 0] },
  box: [-20, -10, 20, 10],
};
