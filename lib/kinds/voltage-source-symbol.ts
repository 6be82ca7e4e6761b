import type { PartSymbol } from "./part-symbol";

export const voltageSourceSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H20" },
    { path: "M-10 0a10 10 0 1 0 20 0a10 10 0 1 0 -20 0Z" },
    { path: "M-17 -6H-12M-14.5 -8.5V-3.5" },
  ],
  pins: { plus: [-20, 0], minus: [20, 0] },
  box: [-20, -10, 20, 10],
};
