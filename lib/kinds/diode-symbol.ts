import type { PartSymbol } from "./part-symbol";

/** The diode family: one triangle, four cathodes. */
const pins = { anode: [-20, 0], cathode: [20, 0] } as const;

export const diodeSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H20M6 -7V7" }, { path: "M-6 -7L6 0L-6 7Z" }],
  pins,
  box: [-20, -7, 20, 7],
};

export const zenerSymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H20M2 -7H6V7" }, { path: "M-6 -7L6 0L-6 7Z" }],
  pins,
  box: [-20, -7, 20, 7],
};

export const ledSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H20M6 -7V7" },
    { path: "M-6 -7L6 0L-6 7Z" },
    { path: "M-1 -9L5 -16M1.5 -15.5L5 -16L4.7 -12.6M6 -9L12 -16M8.5 -15.5L12 -16L11.7 -12.6" },
  ],
  pins,
  box: [-20, -17, 20, 7],
};

export const schottkySymbol: PartSymbol = {
  strokes: [{ path: "M-20 0H20M2.5 -4.5V-7H6V7H9.5V4.5" }, { path: "M-6 -7L6 0L-6 7Z" }],
  pins,
  box: [-20, -7, 20, 7],
};
