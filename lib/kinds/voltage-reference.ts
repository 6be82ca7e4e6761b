import { notNegative, positive } from "../values/range";
import type { KindDescription } from "./description";
import { required, withDefault } from "./parameter";

export const voltageReference: KindDescription<"voltageReference"> = {
  kind: "voltageReference",
  pins: ["cathode", "anode", "adjust"],
  optionalPins: ["adjust"],
  parameters: {
    voltage: required("voltage", positive),
    resistance: withDefault("resistance", 0.2, notNegative),
    minimumCurrent: withDefault("current", 0, notNegative),
  },
};
