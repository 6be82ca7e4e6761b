import { notNegative, unitInterval } from "../values/range";
import type { KindDescription } from "./description";
import { required, tolerance } from "./parameter";

export const potentiometer: KindDescription<"potentiometer"> = {
  kind: "potentiometer",
  pins: ["1", "wiper", "2"],
  parameters: {
    resistance: required("resistance", notNegative),
    position: required("ratio", unitInterval),
    tolerance,
  },
};
