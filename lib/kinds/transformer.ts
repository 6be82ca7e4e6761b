import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { required, withDefault } from "./parameter";

export const transformer: KindDescription<"transformer"> = {
  kind: "transformer",
  pins: ["primary1", "primary2", "secondary1", "secondary2"],
  parameters: {
    turnsRatio: required("ratio", positive),
    magnetisingInductance: required("inductance", positive),
    leakageInductance: withDefault("inductance", 0, notNegative),
    primaryResistance: withDefault("resistance", 0, notNegative),
    secondaryResistance: withDefault("resistance", 0, notNegative),
  },
};
