import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { orNone, required, tolerance, withDefault } from "./parameter";

export const capacitor: KindDescription<"capacitor"> = {
  kind: "capacitor",
  pins: ["1", "2"],
  parameters: {
    capacitance: required("capacitance", notNegative),
    tolerance,
    seriesResistance: withDefault("resistance", 0, notNegative),
    leakageResistance: orNone("resistance", positive),
  },
};
