import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { required, tolerance, withDefault } from "./parameter";

export const inductor: KindDescription<"inductor"> = {
  kind: "inductor",
  pins: ["1", "2"],
  parameters: {
    inductance: required("inductance", positive),
    tolerance,
    seriesResistance: withDefault("resistance", 0, notNegative),
  },
};
