import type { PartSymbol } from "./part-symbol";

export const transformerSymbol: PartSymbol = {
  strokes: [
    {
      path: "M-20 -20H-8V-14a3.5 3.5 0 0 1 0 7a3.5 3.5 0 0 1 0 7a3.5 3.5 0 0 1 0 7a3.5 3.5 0 0 1 0 7V20H-20M20 -20H8V-14a3.5 3.5 0 0 0 0 7a3.5 3.5 0 0 0 0 7a3.5 3.5 0 0 0 0 7a3.5 3.5 0 0 0 0 7V20H20",
    },
    { path: "M-1.6 -15V15M1.6 -15V15" },
  ],
  pins: { primary1: [-20, -20], primary2: [-20, 20], secondary1: [20, -20], secondary2: [20, 20] },
  box: [-20, -21, 20, 21],
};
