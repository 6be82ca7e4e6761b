import type { PartSymbol } from "./part-symbol";

export const currentSourceSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H-10M10 0H20M0 -10V10" },
    { path: "M-10 0a10 10 0 1 0 20 0a10 10 0 1 0 -20 0Z" },
    { path: "M13 -7L18 -7M15.5 -9.5L18 -7L15.5 -4.5" },
  ],
  pins: { from: [-20, 0], to: [20, 0] },
  box: [-20, -10, 20, 10],
};
