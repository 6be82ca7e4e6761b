import type { PartSymbol } from "./part-symbol";

export const potentiometerSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 0H-12M12 0H20M0 -20V-6" },
    { path: "M-12 -4.5h24v9h-24Z" },
    { path: "M0 -4.8L-2.8 -10.5H2.8Z", look: "solid" },
  ],
  pins: { 1: [-20, 0], wiper: [0, -20], 2: [20, 0] },
  box: [-20, -20, 20, 5],
};
