import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { orNone, required, withDefault } from "./parameter";

export const linearRegulator: KindDescription<"linearRegulator"> = {
  kind: "linearRegulator",
  pins: ["in", "out", "common"],
  parameters: {
    outputVoltage: required("voltage", positive),
    dropout: withDefault("voltage", 2, notNegative),
    quiescentCurrent: withDefault("current", 0, notNegative),
    currentLimit: orNone("current", positive),
    outputResistance: withDefault("resistance", 0, notNegative),
  },
};
