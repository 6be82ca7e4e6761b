import type { PartSymbol } from "./part-symbol";

export const vcvsSymbol: PartSymbol = {
  strokes: [
    { path: "M20 -20V20" },
    { path: "M20 -11L31 0L20 11L9 0Z" },
    { path: "M-20 -20V-14M-20 20V14" },
    { path: "M-22 -12a2 2 0 1 0 4 0a2 2 0 1 0 -4 0Z" },
    { path: "M-22 12a2 2 0 1 0 4 0a2 2 0 1 0 -4 0Z" },
    { path: "M-16 -18H-12M-14 -20V-16" },
  ],
  pins: { plus: [20, -20], minus: [20, 20], controlPlus: [-20, -20], controlMinus: [-20, 20] },
  box: [-20, -20, 31, 20],
};
