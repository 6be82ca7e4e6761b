import type { PartSymbol } from "./part-symbol";

export const optocouplerSymbol: PartSymbol = {
  strokes: [
    { path: "M-20 -18h40v36h-40Z", look: "body" },
    { path: "M-30 -10H-11V-5M-30 10H-11V5M-16 5H-6" },
    { path: "M-16 -5H-6L-11 5Z" },
    { path: "M-3 -2H2M0.3 -3.8L2.2 -2L0.3 -0.2M-3 3H2M0.3 1.2L2.2 3L0.3 4.8" },
    { path: "M30 -10H14L6 -3.5M30 10H14L6 3.5" },
    { path: "M6 -8V8", look: "heavy" },
    { path: "M12.6 9L7.6 7.8L10 4.6Z", look: "solid" },
  ],
  pins: { anode: [-30, -10], cathode: [-30, 10], collector: [30, -10], emitter: [30, 10] },
  box: [-30, -18, 30, 18],
};
