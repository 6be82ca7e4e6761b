import type { Stroke } from "./part-symbol";

/** The reference net: 0 V. Its pin is at the origin. */
export const referenceSymbol: readonly Stroke[] = [
  { path: "M0 0V6" },
  { path: "M-8 6H8", look: "heavy" },
];
