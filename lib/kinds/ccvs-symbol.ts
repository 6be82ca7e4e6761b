import type { PartSymbol } from "./part-symbol";

export const ccvsSymbol: PartSymbol = {
  strokes: [
    { path: "M20 -20V20" },
    { path: "M20 -11L31 0L20 11L9 0Z" },
    { path: "M-20 -12V12M-23 6L-20 12L-17 6" },
  ],
  pins: { plus: [20, -20], minus: [20, 20] },
  box: [-23, -20, 31, 20],
};
